package quietspan.planning.simulation;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import quietspan.link.Link;
import quietspan.model.Contact;
import quietspan.model.ContactRules;
import quietspan.model.RateStep;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * A contact as its craft lives it: whole on-board seconds counted from the begin of the period.
 *
 * @param place its index among all images of a plan
 * @param begin first second of the image
 * @param end second after the last one; equal to {@code begin} when no whole second is left
 * @param pieces stretches with data, in time order
 */
record Image(int place, Contact contact, int craft, long begin, long end, List<Piece> pieces) {

  /** Data at one effective rate over the seconds from {@code begin} to before {@code end}. */
  record Piece(long begin, long end, long bitsPerSecond) {}

  static Image of(Scenario scenario, SightLines sightLines, int place, int craft, Contact contact) {
    OnboardInstant origin = scenario.period().begin();
    String name = contact.craft();
    long begin = seconds(origin, sightLines.onboard(name, contact.during().begin()).ceilToSecond());
    long end = seconds(origin, sightLines.onboard(name, contact.during().end()).floorToSecond());
    ContactRules rules = scenario.rules().contacts();
    long locked = begin + wholeSeconds(rules.lockUp());
    List<Piece> pieces = new ArrayList<>();
    List<RateStep> steps = contact.steps();
    long from = begin;
    for (int i = 0; i < steps.size(); i++) {
      long to = end;
      if (i + 1 < steps.size()) {
        to = seconds(origin, sightLines.onboard(name, steps.get(i + 1).from()).ceilToSecond());
      }
      long silent = i == 0 ? locked : Math.max(locked, from + wholeSeconds(rules.relock()));
      long dataEnd = Math.min(to, end);
      if (silent < dataEnd) {
        long rate = Link.effectiveRate(scenario, steps.get(i).rate()).bitsPerSecond();
        pieces.add(new Piece(silent, dataEnd, rate));
      }
      from = to;
    }
    return new Image(place, contact, craft, begin, Math.max(begin, end), List.copyOf(pieces));
  }

  private static long seconds(OnboardInstant origin, OnboardInstant instant) {
    return instant.epochSecond() - origin.epochSecond();
  }

  private static long wholeSeconds(Duration duration) {
    return duration.plusNanos(999_999_999).toSeconds();
  }

  /** The effective rate of a second; zero without data. */
  long bitsPerSecond(long second) {
    for (Piece piece : pieces) {
      if (piece.begin() <= second && second < piece.end()) {
        return piece.bitsPerSecond();
      }
    }
    return 0;
  }

  /** What could be sent inside a period of that many seconds. */
  long capacityBits(long periodSeconds) {
    long bits = 0;
    for (Piece piece : pieces) {
      long seconds = Math.min(piece.end(), periodSeconds) - Math.max(piece.begin(), 0);
      bits += Math.max(0, seconds) * piece.bitsPerSecond();
    }
    return bits;
  }

  /** The image as an interval; a contact without a whole second on board gets the one it is in. */
  Interval<OnboardInstant> interval(OnboardInstant origin) {
    return Interval.of(origin.plusSeconds(begin), origin.plusSeconds(Math.max(end, begin + 1)));
  }
}
