package quietspan.input;

import java.io.IOException;
import java.io.StringReader;
import java.time.DateTimeException;
import java.time.Duration;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.Period;
import java.time.temporal.TemporalAmount;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import net.fortuna.ical4j.data.CalendarBuilder;
import net.fortuna.ical4j.data.ParserException;
import net.fortuna.ical4j.model.Recur;
import net.fortuna.ical4j.model.TemporalAmountAdapter;
import net.fortuna.ical4j.model.component.VTimeZone;

/**
 * Turns a calendar file into occurrences in UTC. What it does not understand it refuses with the
 * line it stands on; where it makes a choice it says so in a warning.
 */
final class CalendarReader {

  private static final Set<String> RULE_PARTS =
      Set.of("FREQ", "INTERVAL", "COUNT", "UNTIL", "BYDAY", "BYMONTHDAY", "WKST");
  private static final Set<String> FREQUENCIES = Set.of("DAILY", "WEEKLY", "MONTHLY");
  private static final int MOST_OCCURRENCES = 20_000;

  private final Source source;
  private final Instant from;
  private final Instant to;
  private CalendarZones zones = new CalendarZones(Map.of());

  /**
   * @param from occurrences that end before are left out
   * @param to occurrences that begin at or after are left out
   */
  CalendarReader(Source source, Instant from, Instant to) {
    this.source = source;
    this.from = from;
    this.to = to;
  }

  /** An event as written, before recurrence. */
  private record Written(
      CalendarPart part,
      String uid,
      CalendarStamp start,
      TemporalAmount length,
      Optional<Instant> replaces) {}

  List<CalendarEvent> read(String text) {
    Optional<CalendarPart> calendar = CalendarLines.read(text, source);
    if (calendar.isEmpty()) {
      return List.of();
    }
    zones = zones(calendar.orElseThrow());
    List<Written> written = new ArrayList<>();
    for (CalendarPart part : calendar.orElseThrow().parts()) {
      switch (part.name()) {
        case "VTIMEZONE" -> {}
        case "VEVENT" -> event(part).ifPresent(written::add);
        default -> refuse(part.line(), part.name() + " is not read here", "events: BEGIN:VEVENT");
      }
    }
    return occurrences(written);
  }

  private void refuse(int line, String what, String right) {
    source.problems().error(source.at(line, 1), "", what, right);
  }

  private void remark(int line, String what) {
    source.problems().warning(source.at(line, 1), "", what, "");
  }

  private CalendarZones zones(CalendarPart calendar) {
    Map<String, CalendarZone> byId = new HashMap<>();
    for (CalendarPart part : calendar.parts()) {
      if (!part.name().equals("VTIMEZONE")) {
        continue;
      }
      Optional<CalendarLine> id = part.first("TZID");
      if (id.isEmpty()) {
        refuse(part.line(), "the VTIMEZONE has no TZID", "RFC 5545, 3.6.5");
        continue;
      }
      try {
        String whole =
            "BEGIN:VCALENDAR\r\nVERSION:2.0\r\nPRODID:-//quietspan//zone//EN\r\n"
                + part.text()
                + "END:VCALENDAR\r\n";
        VTimeZone zone =
            new CalendarBuilder()
                .build(new StringReader(whole))
                .<VTimeZone>getComponent("VTIMEZONE")
                .orElseThrow();
        byId.put(id.orElseThrow().value(), CalendarZone.of(zone));
      } catch (IOException | ParserException | RuntimeException broken) {
        refuse(part.line(), "the VTIMEZONE cannot be understood", "RFC 5545, 3.6.5");
      }
    }
    return new CalendarZones(byId);
  }

  private Optional<Written> event(CalendarPart part) {
    try {
      String uid =
          part.first("UID")
              .map(CalendarLine::value)
              .filter(value -> !value.isBlank())
              .orElseThrow(() -> new Refusal("the event has no UID", "RFC 5545, 3.8.4.7"));
      for (String unknown : List.of("EXRULE")) {
        if (part.first(unknown).isPresent()) {
          throw new Refusal(unknown + " is not understood", "EXDATE");
        }
      }
      if (part.all("RRULE").size() > 1) {
        throw new Refusal("the event has several RRULE", "one at most");
      }
      String status = part.first("STATUS").map(CalendarLine::value).orElse("");
      if (status.toUpperCase(Locale.ROOT).equals("CANCELLED")
          && part.first("RECURRENCE-ID").isEmpty()) {
        remark(part.line(), "event " + Refusal.quoted(uid) + " is CANCELLED and counts nothing");
        return Optional.empty();
      }
      if (part.first("TRANSP")
          .map(CalendarLine::value)
          .orElse("")
          .equalsIgnoreCase("TRANSPARENT")) {
        remark(
            part.line(),
            "event " + Refusal.quoted(uid) + " is TRANSPARENT; it counts all the same");
      }
      CalendarLine line =
          part.first("DTSTART")
              .orElseThrow(() -> new Refusal("the event has no DTSTART", "RFC 5545, 3.8.2.4"));
      CalendarStamp start = stamp(line, line.value());
      if (start.date()) {
        remark(line.line(), "an all-day event is taken from 00:00 UTC to 00:00 UTC");
      }
      Optional<Instant> replaces = Optional.empty();
      Optional<CalendarLine> recurrence = part.first("RECURRENCE-ID");
      if (recurrence.isPresent()) {
        if (recurrence.orElseThrow().parameters().containsKey("RANGE")) {
          throw new Refusal("RANGE is not understood", "one occurrence at a time");
        }
        replaces =
            Optional.of(
                stamp(recurrence.orElseThrow(), recurrence.orElseThrow().value()).instant());
      }
      return Optional.of(new Written(part, uid, start, length(part, start), replaces));
    } catch (Refusal refusal) {
      refuse(part.line(), refusal.what(), refusal.right());
      return Optional.empty();
    }
  }

  private CalendarStamp stamp(CalendarLine line, String value) throws Refusal {
    boolean asDate = "DATE".equalsIgnoreCase(line.parameters().getOrDefault("VALUE", ""));
    return CalendarStamp.parse(
        value.strip(), asDate, line.parameters().getOrDefault("TZID", ""), zones);
  }

  /** Days are nominal and seconds exact, as RFC 5545 3.3.6 has it. */
  private TemporalAmount length(CalendarPart part, CalendarStamp start) throws Refusal {
    Optional<CalendarLine> end = part.first("DTEND");
    Optional<CalendarLine> duration = part.first("DURATION");
    if (end.isPresent() && duration.isPresent()) {
      throw new Refusal("the event has both DTEND and DURATION", "one of them");
    }
    if (end.isPresent()) {
      CalendarStamp stop = stamp(end.orElseThrow(), end.orElseThrow().value());
      if (stop.date() != start.date()) {
        throw new Refusal("DTSTART and DTEND are not both dates", "the same kind of value");
      }
      Duration length = Duration.between(start.instant(), stop.instant());
      if (length.isZero() || length.isNegative()) {
        throw new Refusal("the event ends before it begins, or at once", "DTEND after DTSTART");
      }
      return length;
    }
    if (duration.isPresent()) {
      try {
        TemporalAmount length =
            TemporalAmountAdapter.parse(duration.orElseThrow().value().strip()).getDuration();
        boolean never =
            length instanceof Period period
                ? period.isNegative() || period.isZero()
                : ((Duration) length).isNegative() || ((Duration) length).isZero();
        if (never) {
          throw new Refusal("the DURATION is not positive", "such as PT3H");
        }
        return length;
      } catch (DateTimeException | IllegalArgumentException bad) {
        throw new Refusal(
            Refusal.quoted(duration.orElseThrow().value()) + " is no duration", "such as PT3H");
      }
    }
    if (start.date()) {
      return Period.ofDays(1);
    }
    throw new Refusal("the event has no end", "DTEND or DURATION");
  }

  private List<CalendarEvent> occurrences(List<Written> written) {
    Map<String, Written> masters = new LinkedHashMap<>();
    Map<String, Map<Instant, Written>> replaced = new TreeMap<>();
    for (Written one : written) {
      if (one.replaces().isPresent()) {
        replaced
            .computeIfAbsent(one.uid(), key -> new TreeMap<>())
            .put(one.replaces().orElseThrow(), one);
      } else if (masters.putIfAbsent(one.uid(), one) != null) {
        refuse(
            one.part().line(),
            "the UID " + Refusal.quoted(one.uid()) + " stands on another event as well",
            "one UID for each event");
      }
    }
    List<CalendarEvent> found = new ArrayList<>();
    for (Written master : masters.values()) {
      Map<Instant, Written> others = replaced.getOrDefault(master.uid(), Map.of());
      try {
        boolean repeats =
            master.part().first("RRULE").isPresent() || master.part().first("RDATE").isPresent();
        for (CalendarStamp start : starts(master)) {
          if (!others.containsKey(start.instant())) {
            add(found, master, start, repeats);
          }
        }
      } catch (Refusal refusal) {
        refuse(master.part().line(), refusal.what(), refusal.right());
      }
    }
    replaced.forEach(
        (uid, others) ->
            others.forEach(
                (original, other) -> {
                  if (!masters.containsKey(uid)) {
                    remark(other.part().line(), "the event it belongs to is not in this file");
                  }
                  String status = other.part().first("STATUS").map(CalendarLine::value).orElse("");
                  if (!status.equalsIgnoreCase("CANCELLED")) {
                    add(found, other, other.start(), true);
                  }
                }));
    found.sort(Comparator.comparing(CalendarEvent::begin).thenComparing(CalendarEvent::uid));
    return found;
  }

  private List<CalendarStamp> starts(Written master) throws Refusal {
    TreeSet<LocalDateTime> digits = new TreeSet<>();
    digits.add(master.start().local());
    Optional<CalendarLine> rule = master.part().first("RRULE");
    if (rule.isPresent()) {
      digits.addAll(recurrence(rule.orElseThrow(), master.start()));
    }
    List<CalendarStamp> stamps = new ArrayList<>();
    for (LocalDateTime local : digits) {
      stamps.add(master.start().at(local));
    }
    for (CalendarLine more : master.part().all("RDATE")) {
      if ("PERIOD".equalsIgnoreCase(more.parameters().getOrDefault("VALUE", ""))) {
        throw new Refusal("RDATE with periods is not understood", "RDATE with date-times");
      }
      for (String value : more.value().split(",")) {
        stamps.add(stamp(more, value));
      }
    }
    Set<Instant> left = new TreeSet<>();
    for (CalendarLine less : master.part().all("EXDATE")) {
      for (String value : less.value().split(",")) {
        left.add(stamp(less, value).instant());
      }
    }
    stamps.removeIf(stamp -> left.contains(stamp.instant()));
    return stamps;
  }

  private List<LocalDateTime> recurrence(CalendarLine line, CalendarStamp start) throws Refusal {
    Map<String, String> parts = new TreeMap<>();
    for (String part : line.value().strip().toUpperCase(Locale.ROOT).split(";")) {
      int equals = part.indexOf('=');
      if (equals < 1 || !RULE_PARTS.contains(part.substring(0, equals))) {
        throw new Refusal(
            "the rule part " + Refusal.quoted(part) + " is not understood",
            "FREQ, INTERVAL, COUNT, UNTIL, BYDAY, BYMONTHDAY, WKST");
      }
      parts.put(part.substring(0, equals), part.substring(equals + 1));
    }
    if (!FREQUENCIES.contains(parts.getOrDefault("FREQ", ""))) {
      throw new Refusal(
          "the frequency " + Refusal.quoted(parts.getOrDefault("FREQ", "")) + " is not understood",
          "DAILY, WEEKLY or MONTHLY");
    }
    Instant last = to;
    if (parts.containsKey("UNTIL")) {
      // UNTIL is an instant, or digits of the same kind as DTSTART.
      String until = parts.remove("UNTIL");
      CalendarStamp stop = CalendarStamp.parse(until, start.date(), "", zones);
      Instant inclusive = stop.instant().plusSeconds(start.date() ? 86_400 : 1);
      last = inclusive.isBefore(last) ? inclusive : last;
    }
    String rule =
        String.join(
            ";",
            parts.entrySet().stream().map(one -> one.getKey() + "=" + one.getValue()).toList());
    try {
      // Two days more on each side than any zone shifts an instant.
      LocalDateTime end = CalendarStamp.utc(last).plusDays(2);
      List<LocalDateTime> dates =
          new Recur<LocalDateTime>(rule)
              .getDates(start.local(), start.local(), end, MOST_OCCURRENCES);
      Instant stop = last;
      return dates.stream().filter(date -> start.at(date).instant().isBefore(stop)).toList();
    } catch (DateTimeException | IllegalArgumentException bad) {
      throw new Refusal(Refusal.quoted(line.value()) + " cannot be understood", "RFC 5545, 3.3.10");
    }
  }

  private void add(List<CalendarEvent> found, Written event, CalendarStamp start, boolean repeats) {
    Instant begin = start.instant();
    Instant end =
        event.length() instanceof Period
            ? start.at(start.local().plus(event.length())).instant()
            : begin.plus(event.length());
    if (!end.isAfter(from) || !begin.isBefore(to)) {
      return;
    }
    List<String> craft =
        event
            .part()
            .first("X-QUIETSPAN-CRAFT")
            .or(() -> event.part().first("CATEGORIES"))
            .map(line -> Arrays.stream(line.value().split(",")).map(String::strip).toList())
            .orElse(List.of());
    String label =
        event
            .part()
            .first("SUMMARY")
            .map(line -> line.value().replace("\\,", ",").replace("\\;", ";").replace("\\\\", "\\"))
            .orElse(event.uid());
    found.add(
        new CalendarEvent(
            begin,
            end,
            repeats ? event.uid() + "/" + begin : event.uid(),
            label,
            craft,
            event.part().line()));
  }
}
