package quietspan.input;

import java.time.Duration;
import java.time.Instant;
import java.time.LocalDateTime;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;

/**
 * Turns a calendar file into occurrences in UTC. What it does not understand it refuses with the
 * line it stands on; where it makes a choice it says so in a warning.
 */
final class CalendarReader {

  /** More than any zone moves digits against UTC. */
  private static final Duration ZONE_SHIFT = Duration.ofDays(2);

  private final Source source;
  private final Instant from;
  private final Instant to;
  private CalendarZones zones;

  private CalendarReader(Source source, Instant from, Instant to) {
    this.source = source;
    this.from = from;
    this.to = to;
  }

  /**
   * The occurrences that overlap a stretch of time, by begin.
   *
   * @param from occurrences that end until then are left out
   * @param to occurrences that begin from then on are left out
   */
  static List<CalendarEvent> read(String text, Source source, Instant from, Instant to) {
    return CalendarLines.read(text, source)
        .map(calendar -> new CalendarReader(source, from, to).events(calendar))
        .orElse(List.of());
  }

  private List<CalendarEvent> events(CalendarPart calendar) {
    expect(calendar, "VERSION", "2.0");
    expect(calendar, "CALSCALE", "GREGORIAN");
    expect(calendar, "METHOD", "PUBLISH");
    zones = CalendarZones.read(calendar, source, to.plus(ZONE_SHIFT));
    List<CalendarEntry> entries = new ArrayList<>();
    for (CalendarPart part : calendar.parts()) {
      switch (part.name()) {
        case "VTIMEZONE" -> {}
        case "VEVENT" -> CalendarEntry.read(part, zones, source).ifPresent(entries::add);
        default -> source.refuse(part.line(), part.name(), "is not read here", "VEVENT");
      }
    }
    return occurrences(entries);
  }

  private void expect(CalendarPart calendar, String property, String value) {
    for (CalendarLine line : calendar.all(property)) {
      if (!line.value().strip().toUpperCase(Locale.ROOT).equals(value)) {
        source.refuse(
            line.line(), property, Refusal.quoted(line.value()) + " is not understood", value);
      }
    }
  }

  /** The events of one UID: the series itself, and what stands in place of single occurrences. */
  private static final class Series {
    Optional<CalendarEntry> master = Optional.empty();
    final Map<Instant, CalendarEntry> instead = new TreeMap<>();
  }

  private List<CalendarEvent> occurrences(List<CalendarEntry> entries) {
    Map<String, Series> byUid = new LinkedHashMap<>();
    for (CalendarEntry entry : entries) {
      Series series = byUid.computeIfAbsent(entry.uid(), uid -> new Series());
      boolean twice;
      if (entry.replaces().isPresent()) {
        twice = series.instead.putIfAbsent(entry.replaces().get().instant(), entry) != null;
      } else {
        twice = series.master.isPresent();
        series.master = series.master.or(() -> Optional.of(entry));
      }
      if (twice) {
        source.refuse(
            entry.lineOf("UID"),
            "UID",
            Refusal.quoted(entry.uid()) + " stands on another event as well",
            "a UID of its own, or a RECURRENCE-ID of its own");
      }
    }
    List<CalendarEvent> found = new ArrayList<>();
    byUid.values().forEach(series -> add(series, found));
    found.sort(Comparator.comparing(CalendarEvent::begin).thenComparing(CalendarEvent::uid));
    return found;
  }

  private void add(Series series, List<CalendarEvent> found) {
    if (series.master.isPresent() && !counts(series.master.get())) {
      return;
    }
    Map<Instant, CalendarStamp> starts = series.master.map(this::starts).orElse(Map.of());
    boolean several = series.master.filter(CalendarReader::repeats).isPresent();
    series.instead.forEach(
        (original, entry) -> {
          if (series.master.isPresent() && starts.remove(original) == null && seen(original)) {
            source.refuse(
                entry.lineOf("RECURRENCE-ID"),
                "RECURRENCE-ID",
                "is no occurrence of its event",
                "the begin of an occurrence");
          }
          if (counts(entry)) {
            add(entry.at(entry.start(), true), found);
          }
        });
    starts.values().forEach(start -> add(series.master.get().at(start, several), found));
  }

  private boolean seen(Instant instant) {
    return !instant.isBefore(from) && instant.isBefore(to);
  }

  private void add(CalendarEvent event, List<CalendarEvent> found) {
    if (event.end().isAfter(from) && event.begin().isBefore(to)) {
      found.add(event);
    }
  }

  /** Whether the event counts at all; says which choices were made. */
  private boolean counts(CalendarEntry entry) {
    String shown = "event " + Refusal.quoted(entry.uid());
    if (entry.isCancelled()) {
      source.remark(entry.lineOf("STATUS"), "STATUS", shown + " is cancelled and left out", "");
      return false;
    }
    if (entry.isTransparent()) {
      source.remark(
          entry.lineOf("TRANSP"), "TRANSP", shown + " is transparent but counts all the same", "");
    }
    if (entry.start().date()) {
      source.remark(
          entry.lineOf("DTSTART"), "DTSTART", shown + " lasts whole days, taken from 0 h UTC", "");
    }
    return true;
  }

  private static boolean repeats(CalendarEntry entry) {
    return entry.part().first("RRULE").isPresent() || entry.part().first("RDATE").isPresent();
  }

  /** Where the occurrences of a series begin, as far as they may matter. */
  private Map<Instant, CalendarStamp> starts(CalendarEntry master) {
    Map<Instant, CalendarStamp> starts = new TreeMap<>();
    starts.put(master.start().instant(), master.start());
    for (CalendarLine line : master.part().all("RRULE")) {
      try {
        for (CalendarStamp start : recurrence(line, master)) {
          starts.put(start.instant(), start);
        }
      } catch (Refusal refusal) {
        source.refuse(line.line(), "RRULE", refusal.what(), refusal.right());
      }
    }
    for (CalendarStamp more : stamps(master, "RDATE")) {
      starts.put(more.instant(), more);
    }
    for (CalendarLine line : master.part().all("EXDATE")) {
      for (CalendarStamp less : stamps(master, line)) {
        if (starts.remove(less.instant()) == null && seen(less.instant())) {
          source.remark(line.line(), "EXDATE", "leaves out what is no occurrence", "");
        }
      }
    }
    return starts;
  }

  private List<CalendarStamp> stamps(CalendarEntry master, String property) {
    return master.part().all(property).stream()
        .flatMap(line -> stamps(master, line).stream())
        .toList();
  }

  private List<CalendarStamp> stamps(CalendarEntry master, CalendarLine line) {
    List<CalendarStamp> stamps = new ArrayList<>();
    for (String value : line.value().split(",", -1)) {
      Optional<CalendarStamp> stamp = CalendarEntry.stamp(line, value, zones, source);
      if (stamp.isPresent() && stamp.get().date() != master.start().date()) {
        source.refuse(
            line.line(), line.name(), "is not the kind of value that DTSTART is", "the same kind");
      } else {
        stamp.ifPresent(stamps::add);
      }
    }
    return stamps;
  }

  private List<CalendarStamp> recurrence(CalendarLine line, CalendarEntry master) throws Refusal {
    CalendarRule rule = CalendarRule.ofEvent(line.value());
    CalendarStamp first = master.start();
    if (!rule.holds(first.local())) {
      // RFC 5545, 3.8.5.3, leaves open what such a rule means.
      throw new Refusal("DTSTART is not an occurrence of the rule", "a DTSTART that follows it");
    }
    Optional<Instant> last = Optional.empty();
    if (rule.until().isPresent()) {
      last = Optional.of(until(rule.until().get(), first));
    }
    Duration reach = Duration.between(first.instant(), master.end(first)).plus(ZONE_SHIFT);
    LocalDateTime begin = CalendarStamp.utc(from.minus(reach));
    LocalDateTime end = CalendarStamp.utc(to.plus(ZONE_SHIFT));
    List<CalendarStamp> stamps = new ArrayList<>();
    for (LocalDateTime digits : rule.digits(first.local(), begin, end)) {
      CalendarStamp stamp = first.at(digits);
      if (last.isEmpty() || !stamp.instant().isAfter(last.get())) {
        stamps.add(stamp);
      }
    }
    return stamps;
  }

  /** The last instant of a rule: a date where DTSTART is one, else in UTC (RFC 5545, 3.3.10). */
  private Instant until(String value, CalendarStamp first) throws Refusal {
    boolean date = value.matches("[0-9]{8}");
    if (date != first.date() || (!date && !value.endsWith("Z"))) {
      throw new Refusal(
          "UNTIL=" + value + " does not go with DTSTART",
          first.date() ? "a date such as 20311128" : "UTC such as 20311128T235959Z");
    }
    return CalendarStamp.parse(value, date, "", zones).instant();
  }
}
