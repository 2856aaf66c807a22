package quietspan.input;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import quietspan.model.Blocked;
import quietspan.model.Calendars;
import quietspan.model.ConfirmedContact;
import quietspan.model.Guarded;
import quietspan.model.Interruption;
import quietspan.problem.Nearest;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * The calendars that the mission lists: what their events mean, whom they concern, on which clock.
 */
final class CalendarFiles {

  /** Events this long before and after the period are kept: light time and setup reach over it. */
  private static final Duration MARGIN = Duration.ofDays(2);

  /** Longer than any light time to the craft of a period, so that none of its contacts is lost. */
  private static final Duration LONGEST_LIGHT_TIME = Duration.ofHours(2);

  private final Values mission;
  private final List<String> craft;
  private final Optional<StationsFile> stations;
  private final Folder folder;

  private final List<Blocked> blocked = new ArrayList<>();
  private final List<Guarded> guarded = new ArrayList<>();
  private final List<Interruption> interruptions = new ArrayList<>();
  private final List<ConfirmedContact> confirmed = new ArrayList<>();

  CalendarFiles(
      Values mission, List<String> craft, Optional<StationsFile> stations, Folder folder) {
    this.mission = mission;
    this.craft = craft;
    this.stations = stations;
    this.folder = folder;
  }

  /** Reads every calendar file; complains about all that is wrong with listing and files. */
  void read() {
    Map<String, Located<String>> seen = new TreeMap<>();
    for (Located<Values> row : mission.items(MissionFields.CALENDARS)) {
      Values calendar = row.value();
      checkParty(calendar);
      Optional<Located<String>> file = calendar.located(MissionFields.Calendar.FILE);
      if (file.isEmpty()) {
        continue;
      }
      if (seen.putIfAbsent(file.get().value(), file.get()) != null) {
        file.get().refuse("is listed a second time", "each calendar file once");
        continue;
      }
      readEvents(calendar, file.get());
    }
    remarkInterruptionsInside();
  }

  private void checkParty(Values calendar) {
    Optional<CalendarMeaning> meaning = calendar.maybe(MissionFields.Calendar.MEANING);
    Optional<CalendarClock> clock = calendar.maybe(MissionFields.Calendar.CLOCK);
    Optional<String> station = calendar.maybe(MissionFields.Calendar.STATION);
    Optional<String> antenna = calendar.maybe(MissionFields.Calendar.ANTENNA);
    Optional<String> heard = calendar.maybe(MissionFields.Calendar.CRAFT);
    if (meaning.isPresent()) {
      String word = meaning.get().word();
      String right = meaning.get().clock().name().toLowerCase(Locale.ROOT);
      if (clock.isPresent() && clock.get() != meaning.get().clock()) {
        calendar.refuse(MissionFields.Calendar.CLOCK, "is not the clock of meaning " + word, right);
      }
      if (meaning.get().concernsStation() && !calendar.has(MissionFields.Calendar.STATION)) {
        calendar.refuse(
            "lacks station, which meaning " + word + " needs",
            "station: " + stations.map(file -> Rows.words(file.names())).orElse("its name"));
      }
      if (!meaning.get().concernsStation() && station.isPresent()) {
        calendar.refuse(
            MissionFields.Calendar.STATION, "does not go with meaning " + word, "no station");
      }
      if (meaning.get() != CalendarMeaning.CONFIRMED && heard.isPresent()) {
        calendar.refuse(
            MissionFields.Calendar.CRAFT, "does not go with meaning " + word, "no craft");
      }
    }
    if (antenna.isPresent() && !calendar.has(MissionFields.Calendar.STATION)) {
      calendar.refuse(MissionFields.Calendar.ANTENNA, "stands without a station", "station: too");
    }
    heard.ifPresent(name -> Rows.known(calendar, MissionFields.Calendar.CRAFT, name, craft));
    if (stations.isPresent() && station.isPresent()) {
      List<String> antennas = stations.get().antennas(station.get());
      if (Rows.known(
          calendar, MissionFields.Calendar.STATION, station.get(), stations.get().names())) {
        antenna.ifPresent(
            name -> Rows.known(calendar, MissionFields.Calendar.ANTENNA, name, antennas));
        if (antenna.isEmpty()
            && antennas.size() > 1
            && meaning.filter(CalendarMeaning.CONFIRMED::equals).isPresent()) {
          calendar.refuse(
              "lacks antenna, because the station has several", "antenna: " + Rows.words(antennas));
        }
      }
    }
  }

  private void readEvents(Values calendar, Located<String> file) {
    Source source = new Source(file.value(), file.source().problems());
    Optional<String> text = folder.text(file.value(), file.place(), file.path());
    Optional<Values> period = mission.maybe(MissionFields.PERIOD);
    Instant begin =
        period
            .flatMap(values -> values.maybe(MissionFields.Period.BEGIN))
            .map(OnboardInstant::utc)
            .orElse(Instant.EPOCH);
    Instant end =
        period
            .flatMap(values -> values.maybe(MissionFields.Period.END))
            .map(OnboardInstant::utc)
            .filter(begin::isBefore)
            .orElse(begin.plusSeconds(1));
    if (text.isEmpty()) {
      return;
    }
    List<CalendarEvent> events =
        CalendarReader.read(text.get(), source, begin.minus(MARGIN), end.plus(MARGIN));
    if (events.isEmpty() && !source.problems().hasErrors()) {
      file.remark("no event of this calendar falls into the period", "");
    }
    Optional<CalendarMeaning> meaning = calendar.maybe(MissionFields.Calendar.MEANING);
    if (meaning.isPresent()) {
      for (CalendarEvent event : events) {
        add(
            meaning.get(),
            calendar,
            event,
            source,
            Interval.of(new GroundInstant(begin), new GroundInstant(end.plus(LONGEST_LIGHT_TIME))));
      }
    }
  }

  private void add(
      CalendarMeaning meaning,
      Values calendar,
      CalendarEvent event,
      Source source,
      Interval<GroundInstant> contacts) {
    switch (meaning) {
      case OUTAGE -> block(Blocked.Why.OUTAGE, calendar, event);
      case LENT -> block(Blocked.Why.LENT, calendar, event);
      case PROTECTED -> guarded.add(new Guarded(onboard(event), event.label()));
      case INTERRUPTION -> interruptions.add(new Interruption(onboard(event), event.label()));
      case CONFIRMED -> {
        if (event.tentative()) {
          source.remark(event.line(), "STATUS", "a tentative event confirms no contact", "");
        } else if (contacts.overlaps(ground(event))) {
          confirm(calendar, event, source);
        }
      }
    }
  }

  private void block(Blocked.Why why, Values calendar, CalendarEvent event) {
    calendar
        .maybe(MissionFields.Calendar.STATION)
        .ifPresent(
            station ->
                blocked.add(
                    new Blocked(
                        why,
                        station,
                        calendar.maybe(MissionFields.Calendar.ANTENNA),
                        ground(event),
                        event.label())));
  }

  private void confirm(Values calendar, CalendarEvent event, Source source) {
    Optional<String> heard =
        calendar.maybe(MissionFields.Calendar.CRAFT).or(() -> named(event, source));
    Optional<String> station = calendar.maybe(MissionFields.Calendar.STATION);
    Optional<String> antenna =
        calendar
            .maybe(MissionFields.Calendar.ANTENNA)
            .or(
                () ->
                    stations.flatMap(
                        file -> station.flatMap(name -> file.antennas(name).stream().findFirst())));
    if (heard.isPresent() && station.isPresent() && antenna.isPresent()) {
      confirmed.add(
          new ConfirmedContact(
              event.uid(),
              station.get(),
              antenna.get(),
              heard.get(),
              ground(event),
              event.label()));
    }
  }

  /** The craft that an event names: by a property of its own, else as one of its categories. */
  private Optional<String> named(CalendarEvent event, Source source) {
    List<String> candidates =
        event.craft().isEmpty()
            ? event.categories().stream().filter(craft::contains).distinct().toList()
            : event.craft();
    if (candidates.size() == 1 && craft.contains(candidates.get(0))) {
      return Optional.of(candidates.get(0));
    }
    if (!event.craft().isEmpty()) {
      String name = event.craft().get(0);
      source.refuse(
          event.line(),
          "X-QUIETSPAN-CRAFT",
          Refusal.quoted(name) + " is not known" + Nearest.hint(name, craft),
          Rows.words(craft));
    } else {
      source.refuse(
          event.line(),
          "CATEGORIES",
          candidates.isEmpty() ? "names no craft" : "names several craft",
          "X-QUIETSPAN-CRAFT, or a category: " + Rows.words(craft));
    }
    return Optional.empty();
  }

  private void remarkInterruptionsInside() {
    for (Interruption one : interruptions) {
      for (Guarded guard : guarded) {
        if (guard.during().overlaps(one.during())) {
          mission.remark(
              MissionFields.CALENDARS,
              "the interruption "
                  + Refusal.quoted(one.label())
                  + " of "
                  + one.during().begin()
                  + " lies in the protected interval "
                  + Refusal.quoted(guard.label()),
              "");
        }
      }
    }
  }

  private static Interval<GroundInstant> ground(CalendarEvent event) {
    return Interval.of(new GroundInstant(event.begin()), new GroundInstant(event.end()));
  }

  private static Interval<OnboardInstant> onboard(CalendarEvent event) {
    return Interval.of(new OnboardInstant(event.begin()), new OnboardInstant(event.end()));
  }

  /** What was read, in time order and then by name. */
  Calendars model() {
    blocked.sort(
        Comparator.comparing((Blocked one) -> one.during().begin())
            .thenComparing(Blocked::station)
            .thenComparing(one -> one.antenna().orElse(""))
            .thenComparing(Blocked::label));
    guarded.sort(
        Comparator.comparing((Guarded one) -> one.during().begin()).thenComparing(Guarded::label));
    interruptions.sort(
        Comparator.comparing((Interruption one) -> one.during().begin())
            .thenComparing(Interruption::label));
    confirmed.sort(
        Comparator.comparing((ConfirmedContact one) -> one.during().begin())
            .thenComparing(ConfirmedContact::station)
            .thenComparing(ConfirmedContact::id));
    return new Calendars(blocked, guarded, interruptions, confirmed);
  }
}
