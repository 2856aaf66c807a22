package quietspan.input;

import java.util.Locale;

/** What the events of a calendar are, and the one clock on which that can be said. */
enum CalendarMeaning {
  OUTAGE(CalendarClock.GROUND),
  LENT(CalendarClock.GROUND),
  PROTECTED(CalendarClock.ONBOARD),
  INTERRUPTION(CalendarClock.ONBOARD),
  CONFIRMED(CalendarClock.GROUND);

  private final CalendarClock clock;

  CalendarMeaning(CalendarClock clock) {
    this.clock = clock;
  }

  CalendarClock clock() {
    return clock;
  }

  boolean concernsStation() {
    return clock == CalendarClock.GROUND;
  }

  /** As it is written in the file. */
  String word() {
    return name().toLowerCase(Locale.ROOT);
  }
}
