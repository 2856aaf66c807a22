package quietspan.input;

import java.time.DateTimeException;
import java.time.LocalDateTime;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import net.fortuna.ical4j.model.Recur;

/**
 * A recurrence rule (RFC 5545, 3.3.10) on local digits. Its end by UNTIL is an instant and left to
 * the caller; the arithmetic of days, weeks and months is the calendar library's.
 *
 * @param rule without UNTIL
 * @param until as written
 */
record CalendarRule(String rule, Optional<String> until) {

  private static final String DAY = "(?:MO|TU|WE|TH|FR|SA|SU)";
  private static final String NUMBERED_DAY = "(?:[+-]?[1-5])?" + DAY;
  private static final String MONTH_DAY = "(?:[+-]?(?:[1-9]|[12][0-9]|3[01]))";
  private static final String MONTH = "(?:[1-9]|1[0-2])";

  /** The parts that are understood, and how each may be written. */
  private static final Map<String, String> PARTS =
      new TreeMap<>(
          Map.of(
              "FREQ",
              "[A-Z]+",
              "INTERVAL",
              "0*[1-9][0-9]{0,2}",
              "COUNT",
              "0*[1-9][0-9]{0,5}",
              "UNTIL",
              "[0-9TZ]+",
              "BYDAY",
              list(NUMBERED_DAY),
              "BYMONTHDAY",
              list(MONTH_DAY),
              "BYMONTH",
              list(MONTH),
              "WKST",
              DAY));

  private static String list(String one) {
    return one + "(?:," + one + ")*";
  }

  /** The rule of an event: by days, weeks or months. */
  static CalendarRule ofEvent(String text) throws Refusal {
    Map<String, String> parts = parts(text, Set.of("DAILY", "WEEKLY", "MONTHLY"));
    if (parts.containsKey("BYMONTH")) {
      throw new Refusal("BYMONTH is not understood here", understood());
    }
    return of(parts);
  }

  /** The rule of a zone's change of clocks: by years. */
  static CalendarRule ofZone(String text) throws Refusal {
    return of(parts(text, Set.of("YEARLY")));
  }

  private static CalendarRule of(Map<String, String> parts) throws Refusal {
    String frequency = parts.get("FREQ");
    if (parts.containsKey("COUNT") && parts.containsKey("UNTIL")) {
      throw new Refusal("the rule has both COUNT and UNTIL", "one of them");
    }
    boolean numbered = parts.getOrDefault("BYDAY", "").matches(".*[0-9].*");
    boolean byMonth = frequency.equals("MONTHLY") || frequency.equals("YEARLY");
    if (!byMonth && (numbered || parts.containsKey("BYMONTHDAY"))) {
      throw new Refusal(
          "numbered days do not go with " + frequency, "FREQ=MONTHLY, or BYDAY without numbers");
    }
    Optional<String> until = Optional.ofNullable(parts.remove("UNTIL"));
    List<String> kept =
        parts.entrySet().stream().map(part -> part.getKey() + "=" + part.getValue()).toList();
    return new CalendarRule(String.join(";", kept), until);
  }

  private static String understood() {
    return "FREQ, INTERVAL, COUNT, UNTIL, BYDAY, BYMONTHDAY and WKST are understood";
  }

  private static Map<String, String> parts(String text, Set<String> frequencies) throws Refusal {
    Map<String, String> parts = new TreeMap<>();
    for (String part : text.strip().toUpperCase(Locale.ROOT).split(";", -1)) {
      int equals = Math.max(0, part.indexOf('='));
      String name = part.substring(0, equals);
      String shape = PARTS.get(name);
      if (shape == null) {
        throw new Refusal("the part " + Refusal.quoted(part) + " is not understood", understood());
      }
      if (!part.substring(equals + 1).matches(shape)) {
        throw new Refusal("the part " + Refusal.quoted(part) + " cannot be read", understood());
      }
      if (parts.put(name, part.substring(equals + 1)) != null) {
        throw new Refusal("the part " + name + " stands twice", "each part once");
      }
    }
    if (!frequencies.contains(parts.getOrDefault("FREQ", ""))) {
      throw new Refusal(
          "the frequency " + Refusal.quoted(parts.getOrDefault("FREQ", "")) + " is not understood",
          "one of " + String.join(", ", frequencies.stream().sorted().toList()));
    }
    return parts;
  }

  /** The digits from {@code from} up to {@code to}, counted from the first digits of all. */
  List<LocalDateTime> digits(LocalDateTime first, LocalDateTime from, LocalDateTime to)
      throws Refusal {
    if (!to.isAfter(first)) {
      return List.of();
    }
    LocalDateTime start = from.isBefore(first) ? first : from;
    try {
      return new Recur<LocalDateTime>(rule).getDates(first, start, to);
    } catch (DateTimeException | IllegalArgumentException e) {
      throw new Refusal(Refusal.quoted(rule) + " cannot be followed", understood());
    }
  }

  /** Whether the first digits are themselves among those of the rule. */
  boolean holds(LocalDateTime first) throws Refusal {
    return digits(first, first, first.plusSeconds(1)).contains(first);
  }
}
