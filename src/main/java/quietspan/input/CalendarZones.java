package quietspan.input;

import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The zones that a calendar file defines, by TZID. */
final class CalendarZones {

  /** Rules that began before are followed from here on; nothing is planned before. */
  private static final int FIRST_YEAR = 1969;

  private final Map<String, CalendarZone> byId;

  private CalendarZones(Map<String, CalendarZone> byId) {
    this.byId = byId;
  }

  CalendarZone zone(String tzid) throws Refusal {
    CalendarZone zone = byId.get(tzid);
    if (zone == null) {
      throw new Refusal(
          "the zone " + Refusal.quoted(tzid) + " has no VTIMEZONE in this file",
          "a VTIMEZONE for it (RFC 5545, 3.2.19), or times with Z");
    }
    return zone;
  }

  /**
   * Reads every VTIMEZONE of a calendar; complains about those that cannot be understood.
   *
   * @param to changes of clocks are followed up to here
   */
  static CalendarZones read(CalendarPart calendar, Source source, Instant to) {
    Map<String, CalendarZone> byId = new HashMap<>();
    for (CalendarPart part : calendar.parts()) {
      if (!part.name().equals("VTIMEZONE")) {
        continue;
      }
      Optional<CalendarLine> id = part.first("TZID");
      if (id.isEmpty()) {
        source.refuse(part.line(), "VTIMEZONE", "has no TZID", "RFC 5545, 3.6.5");
        continue;
      }
      Optional<CalendarZone> zone = zone(part, source, to);
      // A zone that was complained about is known all the same, so that its times are not.
      if (byId.put(id.get().value(), zone.orElse(CalendarZone.UTC)) != null) {
        source.refuse(
            id.get().line(), "TZID", "stands on another VTIMEZONE as well", "each zone once");
      }
    }
    return new CalendarZones(byId);
  }

  private static Optional<CalendarZone> zone(CalendarPart part, Source source, Instant to) {
    List<CalendarZone.Onset> onsets = new ArrayList<>();
    LocalDateTime first = LocalDateTime.MAX;
    ZoneOffset before = ZoneOffset.UTC;
    boolean good = true;
    for (CalendarPart observance : part.parts()) {
      if (!observance.name().equals("STANDARD") && !observance.name().equals("DAYLIGHT")) {
        source.refuse(
            observance.line(), "VTIMEZONE", observance.name() + " is not known", "RFC 5545, 3.6.5");
        good = false;
        continue;
      }
      try {
        ZoneOffset offset = offset(observance, "TZOFFSETTO");
        ZoneOffset from = offset(observance, "TZOFFSETFROM");
        LocalDateTime start = CalendarStamp.digits(required(observance, "DTSTART").value().strip());
        for (LocalDateTime onset : onsets(observance, start, from, to)) {
          onsets.add(new CalendarZone.Onset(onset.toInstant(from), offset));
        }
        if (start.isBefore(first)) {
          first = start;
          before = from;
        }
      } catch (Refusal refusal) {
        source.refuse(observance.line(), observance.name(), refusal.what(), refusal.right());
        good = false;
      }
    }
    if (good && onsets.isEmpty()) {
      source.refuse(part.line(), "VTIMEZONE", "holds no STANDARD or DAYLIGHT", "RFC 5545, 3.6.5");
      good = false;
    }
    return good ? Optional.of(new CalendarZone(before, onsets)) : Optional.empty();
  }

  /** Local digits, before each change, at which the clocks change. */
  private static List<LocalDateTime> onsets(
      CalendarPart observance, LocalDateTime start, ZoneOffset from, Instant to) throws Refusal {
    List<LocalDateTime> onsets = new ArrayList<>();
    onsets.add(start);
    for (CalendarLine more : observance.all("RDATE")) {
      for (String value : more.value().split(",", -1)) {
        onsets.add(CalendarStamp.digits(value.strip()));
      }
    }
    for (CalendarLine line : observance.all("RRULE")) {
      CalendarRule rule = CalendarRule.ofZone(line.value());
      // A yearly rule without count or interval is the same from any year on.
      boolean movable = !rule.rule().contains("COUNT") && !rule.rule().contains("INTERVAL");
      LocalDateTime seed =
          movable && start.getYear() < FIRST_YEAR ? start.withYear(FIRST_YEAR) : start;
      Instant last = rule.until().isPresent() ? until(rule.until().get(), from) : to;
      LocalDateTime end = LocalDateTime.ofInstant(to, from).plusYears(1);
      for (LocalDateTime onset : rule.digits(seed, seed, end)) {
        if (rule.until().isEmpty() || !onset.toInstant(from).isAfter(last)) {
          onsets.add(onset);
        }
      }
    }
    return onsets;
  }

  /** UTC, or local digits as some programs write them. */
  private static Instant until(String value, ZoneOffset from) throws Refusal {
    return value.endsWith("Z")
        ? CalendarStamp.digits(value.substring(0, value.length() - 1)).toInstant(ZoneOffset.UTC)
        : CalendarStamp.digits(value).toInstant(from);
  }

  private static CalendarLine required(CalendarPart observance, String name) throws Refusal {
    return observance
        .first(name)
        .orElseThrow(() -> new Refusal("has no " + name, "RFC 5545, 3.6.5"));
  }

  private static ZoneOffset offset(CalendarPart observance, String name) throws Refusal {
    String value = required(observance, name).value().strip();
    if (!value.matches("[+-](?:0[0-9]|1[0-7])[0-5][0-9](?:[0-5][0-9])?")) {
      throw new Refusal(Refusal.quoted(value) + " is no offset", "such as +0200");
    }
    return ZoneOffset.of(value);
  }
}
