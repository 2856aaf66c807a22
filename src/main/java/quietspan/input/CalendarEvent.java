package quietspan.input;

import java.time.Instant;
import java.util.List;

/**
 * One occurrence of an event.
 *
 * @param uid of the event; occurrences of a recurrence carry their begin behind it
 * @param label its SUMMARY, or the UID
 * @param craft named by the event itself (X-QUIETSPAN-CRAFT, else CATEGORIES), in order
 */
record CalendarEvent(
    Instant begin, Instant end, String uid, String label, List<String> craft, int line) {}
