package quietspan.check;

import java.util.ArrayList;
import java.util.List;
import quietspan.model.Contact;
import quietspan.model.Dish;

/**
 * Two contacts on one antenna of a station, the later one not necessarily the next.
 *
 * @param gapSeconds from the end of the earlier to the begin of the later; negative: they overlap
 * @param neededSeconds teardown and setup, or the changeover between two craft
 */
record TurnRound(Contact earlier, Contact later, double gapSeconds, double neededSeconds) {

  double spareSeconds() {
    return gapSeconds - neededSeconds;
  }

  /** All pairs, the earlier by its begin. */
  static List<TurnRound> all(Evidence evidence) {
    List<TurnRound> turns = new ArrayList<>();
    List<Contact> contacts = evidence.contacts();
    for (int i = 0; i < contacts.size(); i++) {
      for (int j = i + 1; j < contacts.size(); j++) {
        Contact earlier = contacts.get(i);
        Contact later = contacts.get(j);
        if (earlier.station().equals(later.station())
            && earlier.antenna().equals(later.antenna())) {
          double gap = later.during().begin().secondsSince(earlier.during().end());
          turns.add(
              new TurnRound(earlier, later, gap, needed(evidence.dish(later), earlier, later)));
        }
      }
    }
    return turns;
  }

  private static double needed(Dish dish, Contact earlier, Contact later) {
    return earlier.craft().equals(later.craft())
        ? Seconds.of(dish.teardown().plus(dish.setup()))
        : Seconds.of(dish.changeover());
  }
}
