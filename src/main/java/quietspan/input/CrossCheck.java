package quietspan.input;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import quietspan.problem.Nearest;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;
import quietspan.units.DataRate;

/** What no single field can say: names that must be known, orders, and values that go together. */
final class CrossCheck {

  private final Values mission;
  private final Values stations;
  private final Values state;

  CrossCheck(Values mission, Values stations, Values state) {
    this.mission = mission;
    this.stations = stations;
    this.state = state;
  }

  void run() {
    period();
    Set<String> craft =
        ScenarioReader.names(mission.items(MissionFields.CRAFT), MissionFields.Craft.NAME);
    Set<String> classes = classes();
    for (Located<Values> one : mission.items(MissionFields.CRAFT)) {
      craft(one.value(), classes);
    }
    Set<String> known =
        ScenarioReader.names(stations.items(StationFields.STATIONS), StationFields.Station.NAME);
    for (Located<Values> one : stations.items(StationFields.STATIONS)) {
      station(one.value());
    }
    for (Located<Values> one : mission.items(MissionFields.CALENDARS)) {
      calendar(one.value(), known, craft);
    }
    states(craft, classes);
  }

  private void period() {
    Optional<Values> period = mission.maybe(MissionFields.PERIOD);
    Optional<OnboardInstant> begin = period.flatMap(one -> one.maybe(MissionFields.Period.BEGIN));
    Optional<OnboardInstant> end = period.flatMap(one -> one.maybe(MissionFields.Period.END));
    if (begin.isPresent() && end.isPresent()) {
      if (!begin.get().isBefore(end.get())) {
        period.get().refuse(MissionFields.Period.END, "is not after the begin", "a later instant");
      } else if (end.get().secondsSince(begin.get()) > 800 * 86_400.0) {
        period
            .get()
            .refuse(
                MissionFields.Period.END, "makes a period of more than 800 days", "at most 800");
      } else if (end.get().secondsSince(begin.get()) < 3600) {
        period
            .get()
            .refuse(
                MissionFields.Period.END, "makes a period of less than an hour", "at least 1 h");
      }
    }
  }

  private Set<String> classes() {
    Optional<Values> data = mission.maybe(MissionFields.DATA);
    if (data.isEmpty()) {
      return Set.of();
    }
    List<Located<Values>> rows = data.get().items(MissionFields.Data.CLASSES);
    Set<Integer> priorities = new HashSet<>();
    for (Located<Values> row : rows) {
      row.value()
          .maybe(MissionFields.DataClass.PRIORITY)
          .ifPresent(
              priority -> {
                if (!priorities.add(priority)) {
                  row.value()
                      .refuse(
                          MissionFields.DataClass.PRIORITY,
                          priority + " is taken by another class",
                          "a priority of its own");
                }
              });
    }
    return ScenarioReader.names(rows, MissionFields.DataClass.NAME);
  }

  private void craft(Values craft, Set<String> classes) {
    craft
        .maybe(MissionFields.Craft.ORBIT)
        .ifPresent(
            orbit -> {
              if (orbit.maybe(MissionFields.Orbit.CORNER).isPresent()
                  && mission.maybe(MissionFields.FORMATION).isEmpty()) {
                orbit.refuse(
                    MissionFields.Orbit.CORNER, "there is no formation", "formation: in this file");
              }
            });
    if (craft.maybe(MissionFields.Craft.ATTITUDE).orElse(null) == MissionFields.AttitudeLaw.INERTIAL
        && craft.maybe(MissionFields.Craft.INERTIAL_FRAME).isEmpty()) {
      craft.refuse(MissionFields.Craft.ATTITUDE, "inertial needs a frame", "inertial_frame:");
    }
    craft
        .maybe(MissionFields.Craft.ANTENNA)
        .ifPresent(
            antenna -> {
              Optional<Angle> cone = antenna.maybe(MissionFields.Antenna.HALF_CONE);
              Optional<Angle> width = antenna.maybe(MissionFields.Antenna.HALF_POWER_WIDTH);
              if (cone.isPresent()
                  && width.isPresent()
                  && cone.get().radians() > width.get().radians() / 2 + 1e-12) {
                antenna.refuse(
                    MissionFields.Antenna.HALF_CONE,
                    "reaches beyond half power, where the pointing loss formula ends",
                    "at most half of half_power_width");
              }
              double allowances =
                  mission
                      .maybe(MissionFields.MARGINS)
                      .map(
                          margins ->
                              margins
                                      .maybe(MissionFields.Margins.POINTING_ALLOWANCE)
                                      .map(Angle::radians)
                                      .orElse(0.0)
                                  + margins
                                      .maybe(MissionFields.Margins.CONE_ALLOWANCE)
                                      .map(Angle::radians)
                                      .orElse(0.0))
                      .orElse(0.0);
              if (cone.isPresent() && cone.get().radians() <= allowances) {
                antenna.refuse(
                    MissionFields.Antenna.HALF_CONE,
                    "leaves nothing once the allowances are taken off",
                    "more than pointing_allowance + cone_allowance");
              }
            });
    craft.maybe(MissionFields.Craft.RATES).ifPresent(this::rates);
    Set<String> made = new HashSet<>();
    for (Located<Values> generation : craft.items(MissionFields.Craft.GENERATION)) {
      generation
          .value()
          .maybe(MissionFields.Generation.DATA_CLASS)
          .ifPresent(
              name -> {
                known(generation.value(), MissionFields.Generation.DATA_CLASS, name, classes);
                if (!made.add(name)) {
                  generation
                      .value()
                      .refuse(
                          MissionFields.Generation.DATA_CLASS,
                          "\"" + name + "\" stands here a second time",
                          "one entry for each class");
                }
              });
      OnboardInstant before = null;
      for (Located<Values> phase : generation.value().items(MissionFields.Generation.PHASES)) {
        Optional<OnboardInstant> from = phase.value().maybe(MissionFields.Phase.FROM);
        if (from.isPresent()) {
          if (before != null && !before.isBefore(from.get())) {
            phase
                .value()
                .refuse(
                    MissionFields.Phase.FROM, "is not later than the phase before", "time order");
          }
          before = from.get();
        }
      }
    }
  }

  private void rates(Values rates) {
    List<Located<DataRate>> ladder = rates.items(MissionFields.Rates.LADDER);
    for (int i = 1; i < ladder.size(); i++) {
      if (ladder.get(i - 1).value().compareTo(ladder.get(i).value()) >= 0) {
        ladder.get(i).refuse("is not above the rate before", "rates in rising order");
      }
    }
    if (!ladder.isEmpty()) {
      if (rates.maybe(MissionFields.Rates.EIRP).isEmpty()) {
        rates.refuse("has a ladder but no power to choose from it", "eirp: 49.2 dBW");
      }
      if (mission.maybe(MissionFields.LINK).isEmpty()) {
        rates.refuse("has a ladder but the mission has no link budget", "link: in this file");
      }
    }
    List<Located<Values>> rows = rates.items(MissionFields.Rates.BY_OFF_POINTING);
    for (int i = 1; i < rows.size(); i++) {
      Optional<Angle> before = rows.get(i - 1).value().maybe(MissionFields.RateRow.UP_TO);
      Optional<Angle> here = rows.get(i).value().maybe(MissionFields.RateRow.UP_TO);
      if (before.isPresent() && here.isPresent() && before.get().compareTo(here.get()) >= 0) {
        rows.get(i)
            .value()
            .refuse(MissionFields.RateRow.UP_TO, "is not above the row before", "rising angles");
      }
      Optional<DataRate> more = rows.get(i - 1).value().maybe(MissionFields.RateRow.RATE);
      Optional<DataRate> less = rows.get(i).value().maybe(MissionFields.RateRow.RATE);
      if (more.isPresent() && less.isPresent() && more.get().compareTo(less.get()) <= 0) {
        rows.get(i)
            .value()
            .refuse(MissionFields.RateRow.RATE, "is not below the row before", "falling rates");
      }
    }
  }

  private void station(Values station) {
    ScenarioReader.names(station.items(StationFields.Station.ANTENNAS), StationFields.Antenna.NAME);
    rising(station.items(StationFields.Station.MASK_BY_AZIMUTH), StationFields.MaskPoint.AT);
    for (Located<Values> antenna : station.items(StationFields.Station.ANTENNAS)) {
      Values values = antenna.value();
      rising(values.items(StationFields.Antenna.G_OVER_T_BY_ELEVATION), StationFields.GainPoint.AT);
      var least = values.maybe(StationFields.Antenna.MINIMUM_CONTACT);
      var most = values.maybe(StationFields.Antenna.MAXIMUM_CONTACT);
      if (least.isPresent() && most.isPresent() && least.get().compareTo(most.get()) > 0) {
        values.refuse(
            StationFields.Antenna.MAXIMUM_CONTACT,
            "is shorter than minimum_contact",
            "at least minimum_contact");
      }
      var low = values.maybe(StationFields.Antenna.LOWEST);
      var high = values.maybe(StationFields.Antenna.HIGHEST);
      if (low.isPresent() && high.isPresent() && low.get().compareTo(high.get()) >= 0) {
        values.refuse(
            StationFields.Antenna.HIGHEST, "is not above lowest_elevation", "a higher elevation");
      }
      boolean budget =
          mission.items(MissionFields.CRAFT).stream()
              .map(craft -> craft.value().maybe(MissionFields.Craft.RATES))
              .flatMap(Optional::stream)
              .anyMatch(rates -> !rates.items(MissionFields.Rates.LADDER).isEmpty());
      if (budget
          && values.maybe(StationFields.Antenna.G_OVER_T).isEmpty()
          && values.items(StationFields.Antenna.G_OVER_T_BY_ELEVATION).isEmpty()) {
        values.refuse("has no G/T for the link budget", "g_over_t: 50.1 dB/K");
      }
    }
  }

  private void rising(List<Located<Values>> rows, Field<Angle> field) {
    for (int i = 1; i < rows.size(); i++) {
      Optional<Angle> before = rows.get(i - 1).value().maybe(field);
      Optional<Angle> here = rows.get(i).value().maybe(field);
      if (before.isPresent() && here.isPresent() && before.get().compareTo(here.get()) >= 0) {
        rows.get(i)
            .value()
            .refuse(field, "is not above the point before", "points in rising order");
      }
    }
  }

  private void calendar(Values calendar, Set<String> known, Set<String> craft) {
    Optional<CalendarMeaning> meaning = calendar.maybe(MissionFields.Calendar.MEANING);
    Optional<CalendarClock> clock = calendar.maybe(MissionFields.Calendar.CLOCK);
    if (meaning.isPresent() && clock.isPresent() && clock.get() != meaning.get().clock()) {
      calendar.refuse(
          MissionFields.Calendar.CLOCK,
          "is not the clock of " + meaning.get().word(),
          meaning.get().clock().name().toLowerCase(java.util.Locale.ROOT));
    }
    Optional<String> station = calendar.maybe(MissionFields.Calendar.STATION);
    if (meaning.isPresent() && meaning.get().concernsStation() && station.isEmpty()) {
      calendar.refuse("says not which station it concerns", "station: one of " + sorted(known));
    }
    if (meaning.isPresent() && !meaning.get().concernsStation() && station.isPresent()) {
      calendar.refuse(
          MissionFields.Calendar.STATION, "does not go with " + meaning.get().word(), "no station");
    }
    station.ifPresent(name -> known(calendar, MissionFields.Calendar.STATION, name, known));
    calendar
        .maybe(MissionFields.Calendar.CRAFT)
        .ifPresent(name -> known(calendar, MissionFields.Calendar.CRAFT, name, craft));
    calendar
        .maybe(MissionFields.Calendar.ANTENNA)
        .ifPresent(
            antenna -> {
              Set<String> antennas = new HashSet<>();
              for (Located<Values> one : stations.items(StationFields.STATIONS)) {
                if (one.value().maybe(StationFields.Station.NAME).equals(station)) {
                  one.value()
                      .items(StationFields.Station.ANTENNAS)
                      .forEach(
                          row ->
                              row.value()
                                  .maybe(StationFields.Antenna.NAME)
                                  .ifPresent(antennas::add));
                }
              }
              known(calendar, MissionFields.Calendar.ANTENNA, antenna, antennas);
            });
  }

  private void states(Set<String> craft, Set<String> classes) {
    Set<String> seen = ScenarioReader.names(state.items(StateFields.CRAFT), StateFields.Craft.NAME);
    for (Located<Values> row : state.items(StateFields.CRAFT)) {
      row.value()
          .maybe(StateFields.Craft.NAME)
          .ifPresent(name -> known(row.value(), StateFields.Craft.NAME, name, craft));
      Set<String> filled = new HashSet<>();
      long total = 0;
      for (Located<Values> fill : row.value().items(StateFields.Craft.FILL)) {
        Optional<String> name = fill.value().maybe(StateFields.Fill.DATA_CLASS);
        name.ifPresent(one -> known(fill.value(), StateFields.Fill.DATA_CLASS, one, classes));
        if (name.isPresent() && !filled.add(name.get())) {
          fill.value()
              .refuse(
                  StateFields.Fill.DATA_CLASS,
                  "\"" + name.get() + "\" stands here a second time",
                  "one entry for each class");
        }
        total +=
            fill.value().maybe(StateFields.Fill.VOLUME).map(volume -> volume.bits()).orElse(0L);
        Optional<OnboardInstant> begin =
            mission
                .maybe(MissionFields.PERIOD)
                .flatMap(period -> period.maybe(MissionFields.Period.BEGIN));
        Optional<OnboardInstant> oldest = fill.value().maybe(StateFields.Fill.OLDEST);
        if (begin.isPresent() && oldest.isPresent() && oldest.get().isAfter(begin.get())) {
          fill.value()
              .refuse(
                  StateFields.Fill.OLDEST,
                  "is after the begin of the period",
                  "an earlier instant");
        }
      }
      long all = total;
      mission.items(MissionFields.CRAFT).stream()
          .filter(
              one ->
                  one.value()
                      .maybe(MissionFields.Craft.NAME)
                      .equals(row.value().maybe(StateFields.Craft.NAME)))
          .findFirst()
          .flatMap(one -> one.value().maybe(MissionFields.Craft.STORE))
          .ifPresent(
              store -> {
                if (all > store.bits()) {
                  row.value()
                      .refuse(
                          StateFields.Craft.FILL,
                          "is more than the store holds",
                          "at most the store");
                }
              });
    }
    List<String> missing = new ArrayList<>(craft);
    missing.removeAll(seen);
    missing.sort(null);
    for (String name : missing) {
      state.refuse(StateFields.CRAFT, "says nothing of " + name, "- name: " + name);
    }
  }

  private static void known(Values where, Field<String> field, String name, Set<String> names) {
    if (!names.contains(name)) {
      where.refuse(
          field,
          "\"" + name + "\" is not known" + Nearest.hint(name, sortedList(names)),
          names.isEmpty() ? "" : "one of " + sorted(names));
    }
  }

  private static List<String> sortedList(Set<String> names) {
    return names.stream().sorted().toList();
  }

  private static String sorted(Set<String> names) {
    return String.join(", ", sortedList(names));
  }
}
