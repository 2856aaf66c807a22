package quietspan.input;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import quietspan.problem.Nearest;

/**
 * One VEVENT as it is written, before recurrence.
 *
 * @param days nominal days of its length
 * @param time exact part of its length
 * @param replaces the occurrence of its series that it stands for (RECURRENCE-ID)
 */
record CalendarEntry(
    CalendarPart part,
    String uid,
    CalendarStamp start,
    int days,
    Duration time,
    Optional<CalendarStamp> replaces) {

  private static final Set<String> ONCE =
      Set.of(
          "UID",
          "DTSTART",
          "DTEND",
          "DURATION",
          "RRULE",
          "RECURRENCE-ID",
          "STATUS",
          "TRANSP",
          "SUMMARY",
          "X-QUIETSPAN-CRAFT");

  /** What says nothing about times and parties; other properties are refused, X- ones passed by. */
  private static final Set<String> WITHOUT_BEARING =
      Set.of(
          "DTSTAMP",
          "CREATED",
          "LAST-MODIFIED",
          "SEQUENCE",
          "CLASS",
          "PRIORITY",
          "URL",
          "COLOR",
          "ORGANIZER",
          "ATTENDEE",
          "ATTACH",
          "COMMENT",
          "CONTACT",
          "GEO",
          "DESCRIPTION",
          "LOCATION",
          "IMAGE",
          "CONFERENCE",
          "RESOURCES",
          "RELATED-TO",
          "REQUEST-STATUS",
          "CATEGORIES",
          "RDATE",
          "EXDATE");

  private static final Pattern DURATION =
      Pattern.compile(
          "\\+?P(?:([0-9]{1,4})W|(?:([0-9]{1,5})D)?"
              + "(?:T(?:([0-9]{1,6})H)?(?:([0-9]{1,7})M)?(?:([0-9]{1,8})S)?)?)");

  /** Reads the event; complains at each property that cannot be taken. */
  static Optional<CalendarEntry> read(CalendarPart part, CalendarZones zones, Source source) {
    boolean good = properties(part, source);
    for (CalendarPart inner : part.parts()) {
      if (!inner.name().equals("VALARM")) {
        source.refuse(inner.line(), inner.name(), "is not read inside an event", "VALARM at most");
        good = false;
      }
    }
    Optional<String> uid = part.first("UID").map(line -> line.value().strip());
    if (uid.isEmpty() || uid.get().isEmpty()) {
      source.refuse(part.line(), "VEVENT", "has no UID", "RFC 5545, 3.8.4.7");
      good = false;
    }
    if (part.first("DTSTART").isEmpty()) {
      source.refuse(part.line(), "VEVENT", "has no DTSTART", "RFC 5545, 3.8.2.4");
      return Optional.empty();
    }
    CalendarLine begin = part.first("DTSTART").get();
    Optional<CalendarStamp> start = stamp(begin, begin.value(), zones, source);
    Optional<CalendarLine> replaced = part.first("RECURRENCE-ID");
    Optional<CalendarStamp> replaces =
        replaced.flatMap(line -> stamp(line, line.value(), zones, source));
    if (replaced.isPresent() && replaced.get().parameters().containsKey("RANGE")) {
      source.refuse(
          replaced.get().line(), "RECURRENCE-ID", "RANGE is not understood", "one occurrence each");
      good = false;
    }
    if (start.isEmpty() || replaces.isPresent() != replaced.isPresent()) {
      return Optional.empty();
    }
    Optional<CalendarEntry> entry =
        length(part, uid.orElse(""), start.get(), replaces, zones, source);
    return good ? entry : Optional.empty();
  }

  private static boolean properties(CalendarPart part, Source source) {
    boolean good = true;
    List<String> seen = new ArrayList<>();
    for (CalendarLine line : part.properties()) {
      String name = line.name();
      if (ONCE.contains(name) && seen.contains(name)) {
        source.refuse(line.line(), name, "stands in this event a second time", "once");
        good = false;
      } else if (!ONCE.contains(name)
          && !WITHOUT_BEARING.contains(name)
          && (!name.startsWith("X-") || name.startsWith("X-QUIETSPAN-"))) {
        String hint = Nearest.hint(name, ONCE.stream().sorted().toList());
        source.refuse(line.line(), name, "is not understood" + hint, "a property of RFC 5545");
        good = false;
      }
      seen.add(name);
    }
    good &= word(part, "STATUS", Set.of("CONFIRMED", "TENTATIVE", "CANCELLED"), source);
    good &= word(part, "TRANSP", Set.of("OPAQUE", "TRANSPARENT"), source);
    return good;
  }

  private static boolean word(CalendarPart part, String name, Set<String> known, Source source) {
    Optional<CalendarLine> line = part.first(name);
    if (line.isEmpty() || known.contains(capitals(line.get().value()))) {
      return true;
    }
    source.refuse(
        line.get().line(),
        name,
        Refusal.quoted(line.get().value()) + " is not known",
        "one of " + String.join(", ", known.stream().sorted().toList()));
    return false;
  }

  private static String capitals(String value) {
    return value.strip().toUpperCase(Locale.ROOT);
  }

  /** A date or date-time of one property; complains at its line. */
  static Optional<CalendarStamp> stamp(
      CalendarLine line, String value, CalendarZones zones, Source source) {
    try {
      String kind = capitals(line.parameters().getOrDefault("VALUE", ""));
      if (!Set.of("", "DATE", "DATE-TIME").contains(kind)) {
        throw new Refusal("VALUE=" + kind + " is not understood", "DATE or DATE-TIME");
      }
      String tzid = line.parameters().getOrDefault("TZID", "");
      return Optional.of(CalendarStamp.parse(value.strip(), kind.equals("DATE"), tzid, zones));
    } catch (Refusal refusal) {
      source.refuse(line.line(), line.name(), refusal.what(), refusal.right());
      return Optional.empty();
    }
  }

  private static Optional<CalendarEntry> length(
      CalendarPart part,
      String uid,
      CalendarStamp start,
      Optional<CalendarStamp> replaces,
      CalendarZones zones,
      Source source) {
    Optional<CalendarLine> end = part.first("DTEND");
    Optional<CalendarLine> duration = part.first("DURATION");
    if (end.isPresent() && duration.isPresent()) {
      source.refuse(duration.get().line(), "DURATION", "stands beside DTEND", "one of them");
      return Optional.empty();
    }
    if (end.isPresent()) {
      return stamp(end.get(), end.get().value(), zones, source)
          .flatMap(stop -> exact(start, stop, end.get().line(), source))
          .map(time -> new CalendarEntry(part, uid, start, 0, time, replaces));
    }
    if (duration.isPresent()) {
      return duration(part, uid, start, duration.get(), replaces, source);
    }
    if (start.date()) {
      return Optional.of(new CalendarEntry(part, uid, start, 1, Duration.ZERO, replaces));
    }
    source.refuse(part.line(), "VEVENT", "has no end", "DTEND or DURATION");
    return Optional.empty();
  }

  /** From begin to end as an exact time, which all occurrences share (RFC 5545, 3.8.5.3). */
  private static Optional<Duration> exact(
      CalendarStamp start, CalendarStamp stop, int line, Source source) {
    if (stop.date() != start.date()) {
      source.refuse(line, "DTEND", "is not the kind of value that DTSTART is", "two dates or none");
      return Optional.empty();
    }
    Duration time = Duration.between(start.instant(), stop.instant());
    if (time.isZero() || time.isNegative()) {
      source.refuse(line, "DTEND", "is not after DTSTART", "a later time");
      return Optional.empty();
    }
    return Optional.of(time);
  }

  /** Days and weeks are nominal, hours and less exact (RFC 5545, 3.3.6). */
  private static Optional<CalendarEntry> duration(
      CalendarPart part,
      String uid,
      CalendarStamp start,
      CalendarLine line,
      Optional<CalendarStamp> replaces,
      Source source) {
    Matcher shape = DURATION.matcher(capitals(line.value()));
    if (shape.matches()) {
      int days = 7 * number(shape, 1) + number(shape, 2);
      Duration time =
          Duration.ofHours(number(shape, 3))
              .plusMinutes(number(shape, 4))
              .plusSeconds(number(shape, 5));
      if ((days > 0 || !time.isZero()) && !(start.date() && !time.isZero())) {
        return Optional.of(new CalendarEntry(part, uid, start, days, time, replaces));
      }
    }
    source.refuse(
        line.line(),
        "DURATION",
        Refusal.quoted(line.value()) + " is no length of such an event",
        start.date() ? "whole days, such as P2D" : "such as PT3H");
    return Optional.empty();
  }

  private static int number(Matcher shape, int group) {
    return shape.group(group) == null ? 0 : Integer.parseInt(shape.group(group));
  }

  boolean isCancelled() {
    return has("STATUS", "CANCELLED");
  }

  boolean isTentative() {
    return has("STATUS", "TENTATIVE");
  }

  boolean isTransparent() {
    return has("TRANSP", "TRANSPARENT");
  }

  private boolean has(String name, String word) {
    return part.first(name).map(line -> capitals(line.value())).filter(word::equals).isPresent();
  }

  /** The line to point to for a property, else that of the event. */
  int lineOf(String property) {
    return part.first(property).map(CalendarLine::line).orElse(part.line());
  }

  Instant end(CalendarStamp begin) {
    return begin.at(begin.local().plusDays(days)).instant().plus(time);
  }

  /** The event at one of its occurrences. */
  CalendarEvent at(CalendarStamp begin, boolean oneOfSeveral) {
    Instant instant = begin.instant();
    return new CalendarEvent(
        instant,
        end(begin),
        oneOfSeveral ? uid + "/" + instant : uid,
        part.first("SUMMARY").map(line -> unescaped(line.value())).orElse(uid),
        part.all("X-QUIETSPAN-CRAFT").stream()
            .map(line -> unescaped(line.value()).strip())
            .toList(),
        part.all("CATEGORIES").stream()
            .flatMap(line -> Arrays.stream(line.value().split("(?<!\\\\),", -1)))
            .map(value -> unescaped(value).strip())
            .toList(),
        isTentative(),
        part.line());
  }

  /** Text without the escapes of RFC 5545, 3.3.11, on one line. */
  private static String unescaped(String value) {
    StringBuilder text = new StringBuilder();
    for (int i = 0; i < value.length(); i++) {
      char c = value.charAt(i);
      if (c == '\\' && i + 1 < value.length()) {
        i++;
        c = value.charAt(i) == 'n' || value.charAt(i) == 'N' ? ' ' : value.charAt(i);
      }
      text.append(c);
    }
    return text.toString();
  }
}
