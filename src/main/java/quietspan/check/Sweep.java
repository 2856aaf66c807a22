package quietspan.check;

import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;
import quietspan.model.Contact;
import quietspan.model.Look;
import quietspan.model.RateStep;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;

/**
 * At which instants a contact is sampled: every {@link #STEP_SECONDS}, its ends, its changes of
 * rate, and in between where the azimuth turns fast.
 */
final class Sweep {

  /** Longest time between two samples. */
  static final long STEP_SECONDS = 30;

  private static final double LARGEST_TURN_RADIANS = Math.toRadians(1);
  private static final double SHORTEST_STEP_SECONDS = 1;

  private Sweep() {}

  static List<GroundInstant> instants(Sight sight, Contact contact, Interval<GroundInstant> part) {
    TreeSet<GroundInstant> regular = new TreeSet<>();
    for (GroundInstant t = part.begin(); t.isBefore(part.end()); t = t.plusSeconds(STEP_SECONDS)) {
      regular.add(t);
    }
    regular.add(part.end());
    for (RateStep step : contact.steps()) {
      if (part.contains(step.from())) {
        regular.add(step.from());
      }
    }
    List<GroundInstant> all = new ArrayList<>();
    GroundInstant before = null;
    for (GroundInstant now : regular) {
      if (before != null) {
        addBetween(all, sight, contact, before, now);
      }
      all.add(now);
      before = now;
    }
    return all;
  }

  private static void addBetween(
      List<GroundInstant> all, Sight sight, Contact contact, GroundInstant from, GroundInstant to) {
    double seconds = to.secondsSince(from);
    if (seconds <= SHORTEST_STEP_SECONDS
        || turn(azimuth(sight, contact, from), azimuth(sight, contact, to))
            <= LARGEST_TURN_RADIANS) {
      return;
    }
    GroundInstant middle = from.plusSeconds(seconds / 2);
    addBetween(all, sight, contact, from, middle);
    all.add(middle);
    addBetween(all, sight, contact, middle, to);
  }

  private static double azimuth(Sight sight, Contact contact, GroundInstant at) {
    Look look = sight.look(contact.station(), contact.craft(), at);
    return look.azimuthRadians();
  }

  private static double turn(double from, double to) {
    double turn = Math.abs(to - from);
    return Math.min(turn, 2 * Math.PI - turn);
  }

  /** Those of the instants inside a stretch, with its two ends. */
  static List<GroundInstant> within(List<GroundInstant> instants, Interval<GroundInstant> part) {
    List<GroundInstant> inside = new ArrayList<>();
    inside.add(part.begin());
    for (GroundInstant each : instants) {
      if (each.isAfter(part.begin()) && each.isBefore(part.end())) {
        inside.add(each);
      }
    }
    inside.add(part.end());
    return inside;
  }
}
