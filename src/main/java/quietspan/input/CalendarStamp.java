package quietspan.input;

import java.time.DateTimeException;
import java.time.Instant;
import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.LocalTime;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.time.format.ResolverStyle;
import java.util.Locale;

/**
 * A date or date-time of a calendar with the zone it was written in.
 *
 * @param local the digits; midnight for a date
 * @param date whether it is a date without time, which is taken as UTC
 * @param zone turns the digits into an instant
 */
record CalendarStamp(LocalDateTime local, boolean date, CalendarZone zone) {

  private static final DateTimeFormatter DATE = formatter("uuuuMMdd");
  private static final DateTimeFormatter DATE_TIME = formatter("uuuuMMdd'T'HHmmss");

  private static DateTimeFormatter formatter(String pattern) {
    return DateTimeFormatter.ofPattern(pattern, Locale.ROOT)
        .withResolverStyle(ResolverStyle.STRICT);
  }

  /**
   * @param tzid of the property; empty when there is none
   * @param zones of the file
   */
  static CalendarStamp parse(String value, boolean asDate, String tzid, CalendarZones zones)
      throws Refusal {
    String shown = Refusal.quoted(value);
    if (asDate || value.matches("[0-9]{8}")) {
      if (!value.matches("[0-9]{8}")) {
        throw new Refusal(shown + " is not a date", "such as 20310901");
      }
      return new CalendarStamp(date(value).atTime(LocalTime.MIDNIGHT), true, CalendarZone.UTC);
    }
    boolean utc = value.endsWith("Z");
    LocalDateTime local = digits(utc ? value.substring(0, value.length() - 1) : value);
    if (utc && !tzid.isEmpty()) {
      throw new Refusal(shown + " has both Z and a TZID", "one of them");
    }
    if (!utc && tzid.isEmpty()) {
      throw new Refusal(
          shown + " is a floating time, which is no instant", "a time with Z, or with a TZID");
    }
    return new CalendarStamp(local, false, utc ? CalendarZone.UTC : zones.zone(tzid));
  }

  /** Digits without zone, in whole seconds. */
  static LocalDateTime digits(String value) throws Refusal {
    if (!value.matches("[0-9]{8}T[0-9]{6}")) {
      throw new Refusal(
          Refusal.quoted(value) + " is not a date-time in whole seconds",
          "such as 20310901T060000");
    }
    try {
      return LocalDateTime.parse(value, DATE_TIME);
    } catch (DateTimeException e) {
      throw new Refusal(
          Refusal.quoted(value) + " is no date-time of the calendar", "such as 20310901T060000");
    }
  }

  private static LocalDate date(String value) throws Refusal {
    try {
      return LocalDate.parse(value, DATE);
    } catch (DateTimeException e) {
      throw new Refusal(Refusal.quoted(value) + " is no date of the calendar", "such as 20310901");
    }
  }

  Instant instant() {
    return zone.instant(local);
  }

  /** Other digits in the same zone. */
  CalendarStamp at(LocalDateTime other) {
    return new CalendarStamp(other, date, zone);
  }

  /** Digits of an instant when the zone is UTC. */
  static LocalDateTime utc(Instant instant) {
    return LocalDateTime.ofInstant(instant, ZoneOffset.UTC);
  }
}
