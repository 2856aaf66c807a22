package quietspan.model;

import java.util.List;

/** What the calendars of a scenario say, each list in time order. */
public record Calendars(
    List<Blocked> blocked,
    List<Guarded> guarded,
    List<Interruption> interruptions,
    List<ConfirmedContact> confirmed) {

  public Calendars {
    blocked = List.copyOf(blocked);
    guarded = List.copyOf(guarded);
    interruptions = List.copyOf(interruptions);
    confirmed = List.copyOf(confirmed);
  }

  public static Calendars none() {
    return new Calendars(List.of(), List.of(), List.of(), List.of());
  }
}
