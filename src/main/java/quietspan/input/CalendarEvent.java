package quietspan.input;

import java.time.Instant;
import java.util.List;

/**
 * One occurrence of an event, on the clock that its calendar declares.
 *
 * @param uid of the event; occurrences of a recurrence carry their begin behind it
 * @param label its SUMMARY, or the UID
 * @param craft that the event names, by X-QUIETSPAN-CRAFT; empty when it has none
 * @param categories in the order of the file
 * @param tentative whether its STATUS is TENTATIVE
 * @param line of the event in its file
 */
record CalendarEvent(
    Instant begin,
    Instant end,
    String uid,
    String label,
    List<String> craft,
    List<String> categories,
    boolean tentative,
    int line) {

  CalendarEvent {
    craft = List.copyOf(craft);
    categories = List.copyOf(categories);
  }
}
