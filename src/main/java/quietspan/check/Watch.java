package quietspan.check;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import quietspan.model.Aim;
import quietspan.model.BodyDirection;
import quietspan.model.Contact;
import quietspan.model.Craft;
import quietspan.model.Decisions;
import quietspan.model.Dish;
import quietspan.model.Look;
import quietspan.model.RateStep;
import quietspan.model.Repoint;
import quietspan.model.Scenario;
import quietspan.model.Station;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.IntervalSet;
import quietspan.time.OnboardInstant;

/**
 * A contact, sampled from end to end.
 *
 * @param onboard its image on board, not rounded
 * @param aboveMask margin (rad); time over which the craft's place is unknown counts as below
 * @param insideLimits margin to dead zones and elevation limits (rad)
 * @param sep Sun-Earth-probe angle less the station's limit (rad)
 * @param insideCone usable cone less off-pointing (rad), outside repoints
 * @param link spare margin (dB), where there is a beam above the mask and no repoint
 */
record Watch(
    Contact contact,
    Interval<OnboardInstant> onboard,
    Survey aboveMask,
    Survey insideLimits,
    Survey sep,
    Survey insideCone,
    Survey link) {

  static Watch of(Scenario scenario, Sight sight, Decisions decisions, Contact contact) {
    Optional<Interval<GroundInstant>> part = sight.sampled(contact.craft(), contact.during());
    Interval<OnboardInstant> onboard = sight.onboard(contact.craft(), contact.during());
    if (part.isEmpty()) {
      GroundInstant begin = contact.during().begin();
      Survey hidden = Survey.NOTHING.withBreach(begin, contact.during().end());
      Survey none = Survey.NOTHING;
      return new Watch(contact, onboard, hidden, none, none, none, none);
    }
    return new Sampling(scenario, sight, decisions, contact, part.get()).watch(onboard);
  }

  /** The sampling of one contact, with what it looks up once. */
  private static final class Sampling {

    private final Scenario scenario;
    private final Sight sight;
    private final Decisions decisions;
    private final Contact contact;
    private final Interval<GroundInstant> part;
    private final Station station;
    private final Dish dish;
    private final Craft craft;
    private final double usableCone;
    private final List<GroundInstant> instants;

    Sampling(
        Scenario scenario,
        Sight sight,
        Decisions decisions,
        Contact contact,
        Interval<GroundInstant> part) {
      this.scenario = scenario;
      this.sight = sight;
      this.decisions = decisions;
      this.contact = contact;
      this.part = part;
      this.station = scenario.station(contact.station());
      this.dish = station.dish(contact.antenna()).orElseThrow();
      this.craft = scenario.craft(contact.craft());
      this.usableCone = scenario.usableHalfCone(craft).radians();
      this.instants = Sweep.instants(sight, contact, part);
    }

    Watch watch(Interval<OnboardInstant> onboard) {
      Survey aboveMask = Survey.of(instants, t -> Horizon.aboveMask(station, look(t)));
      if (part.begin().isAfter(contact.during().begin())) {
        aboveMask = aboveMask.withBreach(contact.during().begin(), part.begin());
      }
      if (part.end().isBefore(contact.during().end())) {
        aboveMask = aboveMask.withBreach(part.end(), contact.during().end());
      }
      double sepLimit = station.sepLimit().radians();
      Survey insideCone = Survey.NOTHING;
      Survey link = Survey.NOTHING;
      for (Interval<GroundInstant> still : still()) {
        BodyDirection aim = aimAt(sight.onboard(craft.name(), still.begin())).direction();
        List<GroundInstant> inside = Sweep.within(instants, still);
        insideCone = insideCone.and(Survey.of(inside, t -> usableCone - offPointing(aim, t)));
        link = link.and(link(aim, still));
      }
      return new Watch(
          contact,
          onboard,
          aboveMask,
          Survey.of(instants, t -> Horizon.insideLimits(dish, look(t))),
          Survey.of(instants, t -> sight.sepRadians(craft.name(), t) - sepLimit),
          insideCone,
          link);
    }

    private Look look(GroundInstant at) {
      return sight.look(station.name(), craft.name(), at);
    }

    private double offPointing(BodyDirection aim, GroundInstant at) {
      return aim.separation(sight.earth(craft.name(), at));
    }

    /** The parts of the contact outside its craft's repoints. */
    private List<Interval<GroundInstant>> still() {
      List<Interval<GroundInstant>> moving = new ArrayList<>();
      for (Repoint repoint : decisions.repoints()) {
        if (repoint.craft().equals(craft.name())) {
          Interval<OnboardInstant> during = Science.during(scenario, repoint);
          moving.add(
              Interval.of(
                  sight.ground(craft.name(), during.begin()),
                  sight.ground(craft.name(), during.end())));
        }
      }
      return new IntervalSet<>(List.of(part)).minus(IntervalSet.of(moving)).parts();
    }

    private Aim aimAt(OnboardInstant instant) {
      return Aims.held(scenario, decisions, craft.name(), instant);
    }

    /** Each rate over the whole of its segment, the segment's end included. */
    private Survey link(BodyDirection aim, Interval<GroundInstant> still) {
      LinkMargin margin = new LinkMargin(scenario, craft, dish);
      Survey link = Survey.NOTHING;
      List<RateStep> steps = contact.steps();
      for (int i = 0; i < steps.size(); i++) {
        RateStep step = steps.get(i);
        GroundInstant until =
            i + 1 < steps.size() ? steps.get(i + 1).from() : contact.during().end();
        if (!step.from().isBefore(until)) {
          continue;
        }
        Optional<Interval<GroundInstant>> segment =
            Interval.of(step.from(), until).intersection(still);
        if (segment.isPresent()) {
          link =
              link.and(
                  Survey.of(
                      Sweep.within(instants, segment.get()), t -> spare(margin, step, aim, t)));
        }
      }
      return link;
    }

    private double spare(LinkMargin margin, RateStep step, BodyDirection aim, GroundInstant at) {
      Look look = look(at);
      double offPointing = offPointing(aim, at);
      // Those are the business of other rules; a link outside them has no margin to speak of.
      if (offPointing > usableCone || Horizon.aboveMask(station, look) < 0) {
        return Double.POSITIVE_INFINITY;
      }
      return margin.spareDb(step.rate(), look, offPointing);
    }
  }
}
