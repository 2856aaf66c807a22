package quietspan.check;

import java.util.Optional;
import quietspan.model.BodyDirection;
import quietspan.model.Look;
import quietspan.model.SightLines;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * The sampled geometry for decisions that may lie anywhere: outside the time over which a craft is
 * known its light time is that of the nearest known instant, so that a plan which leaves the period
 * gets a finding and not an exception.
 */
record Sight(SightLines lines) {

  /** The part of a stretch over which the craft can be sampled. */
  Optional<Interval<GroundInstant>> sampled(String craft, Interval<GroundInstant> during) {
    return during.intersection(lines.known(craft));
  }

  private GroundInstant nearestKnown(String craft, GroundInstant receive) {
    Interval<GroundInstant> known = lines.known(craft);
    if (receive.isBefore(known.begin())) {
      return known.begin();
    }
    // The end itself is outside a half-open interval; a millisecond changes no light time here.
    return receive.isBefore(known.end()) ? receive : known.end().plusSeconds(-0.001);
  }

  OnboardInstant onboard(String craft, GroundInstant receive) {
    double light = lines.downlinkSeconds(craft, nearestKnown(craft, receive));
    return new OnboardInstant(receive.utc()).plusSeconds(-light);
  }

  Interval<OnboardInstant> onboard(String craft, Interval<GroundInstant> during) {
    return Interval.of(onboard(craft, during.begin()), onboard(craft, during.end()));
  }

  GroundInstant ground(String craft, OnboardInstant sent) {
    Interval<GroundInstant> known = lines.known(craft);
    if (sent.isBefore(onboard(craft, known.begin()))) {
      return plusLight(craft, sent, known.begin());
    }
    // Light time changes by less than 0.2 ms a second for anything slower than 60 km/s.
    if (!sent.isBefore(onboard(craft, known.end().plusSeconds(-1L)))) {
      return plusLight(craft, sent, known.end());
    }
    return lines.ground(craft, sent);
  }

  private GroundInstant plusLight(String craft, OnboardInstant sent, GroundInstant near) {
    double light = lines.downlinkSeconds(craft, nearestKnown(craft, near));
    return new GroundInstant(sent.utc()).plusSeconds(light);
  }

  Look look(String station, String craft, GroundInstant receive) {
    return lines.look(station, craft, nearestKnown(craft, receive));
  }

  BodyDirection earth(String craft, GroundInstant receive) {
    return lines.earth(craft, nearestKnown(craft, receive));
  }

  double sepRadians(String craft, GroundInstant receive) {
    return lines.sepRadians(craft, nearestKnown(craft, receive));
  }
}
