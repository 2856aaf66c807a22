package quietspan.input;

/** The clock of a calendar's times. */
enum CalendarClock {
  GROUND,
  ONBOARD
}
