package quietspan.export;

import java.time.Instant;
import java.util.UUID;
import quietspan.model.Contact.Status;

/**
 * One event of a calendar.
 *
 * @param uid never changes while the thing itself exists
 * @param begin whole second
 * @param end whole second, exclusive
 * @param description several lines
 * @param free whether a calendar program may show the time as free
 */
record CalendarEntry(
    UUID uid,
    Instant begin,
    Instant end,
    String title,
    String description,
    String category,
    Status status,
    boolean free) {}
