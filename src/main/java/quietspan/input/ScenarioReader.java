package quietspan.input;

import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import quietspan.model.Aim;
import quietspan.model.Attitude;
import quietspan.model.Blocked;
import quietspan.model.Calendars;
import quietspan.model.ConfirmedContact;
import quietspan.model.ContactRules;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.DataClass;
import quietspan.model.DataRules;
import quietspan.model.Dish;
import quietspan.model.Generation;
import quietspan.model.Guarded;
import quietspan.model.HighGainAntenna;
import quietspan.model.Identity;
import quietspan.model.Interruption;
import quietspan.model.LinkBudget;
import quietspan.model.Margins;
import quietspan.model.Orbit;
import quietspan.model.Profile;
import quietspan.model.RateLadder;
import quietspan.model.Rules;
import quietspan.model.Scenario;
import quietspan.model.ScienceRules;
import quietspan.model.StartState;
import quietspan.model.Station;
import quietspan.model.Steering;
import quietspan.problem.InputException;
import quietspan.problem.Place;
import quietspan.problem.Problem;
import quietspan.problem.Problems;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;
import quietspan.units.DataRate;

/** Reads a scenario folder. */
public final class ScenarioReader {

  private static final Duration MARGIN = Duration.ofDays(3);

  private final Problems problems = new Problems();
  private final Folder folder;

  private ScenarioReader(Path root) {
    this.folder = new Folder(root, problems);
  }

  /**
   * Reads {@code mission.yaml}, {@code stations.yaml}, {@code state.yaml} and the calendars they
   * name.
   *
   * @param issued time stamp to use in place of the mission's own
   * @throws InputException with every complaint when anything is wrong
   */
  public static ScenarioReading read(Path root, Optional<Instant> issued) {
    ScenarioReader reader = new ScenarioReader(root);
    if (!reader.folder.exists()) {
      throw new InputException(
          Problem.error(
              Place.wholeFile(root.toString()),
              "",
              "there is no such folder",
              "a scenario folder"));
    }
    return reader.read(issued);
  }

  private ScenarioReading read(Optional<Instant> issued) {
    Optional<Values> mission = file(MissionFields.FILE, MissionFields.TABLE);
    Optional<Values> stationFile = file(StationFields.FILE, StationFields.TABLE);
    Optional<Values> state = file(StateFields.FILE, StateFields.TABLE);
    if (mission.isPresent() && stationFile.isPresent() && state.isPresent()) {
      new CrossCheck(mission.get(), stationFile.get(), state.get()).run();
    }
    Optional<List<LocatedEvents>> calendars = mission.map(this::calendars);
    mission.ifPresent(this::otherFiles);
    problems.throwIfErrors();
    Scenario scenario =
        scenario(
            mission.orElseThrow(),
            stationFile.orElseThrow(),
            state.orElseThrow(),
            calendars.orElseThrow(),
            issued);
    problems.throwIfErrors();
    return new ScenarioReading(scenario, problems.warnings());
  }

  private Optional<Values> file(String name, Block table) {
    return folder
        .text(name, Place.wholeFile(name), "")
        .flatMap(text -> YamlFile.read(text, table, new Source(name, problems)));
  }

  // ---------------------------------------------------------------- calendars

  /** The events of one calendar with what the mission says of it. */
  private record LocatedEvents(Values calendar, List<CalendarEvent> events, Source source) {}

  private List<LocatedEvents> calendars(Values mission) {
    Optional<Values> period = mission.maybe(MissionFields.PERIOD);
    Instant from =
        period
            .flatMap(values -> values.maybe(MissionFields.Period.BEGIN))
            .map(begin -> begin.utc().minus(MARGIN))
            .orElse(Instant.EPOCH);
    Instant to =
        period
            .flatMap(values -> values.maybe(MissionFields.Period.END))
            .map(end -> end.utc().plus(MARGIN))
            .orElse(Instant.EPOCH.plus(MARGIN));
    List<LocatedEvents> all = new ArrayList<>();
    for (Located<Values> calendar : mission.items(MissionFields.CALENDARS)) {
      Optional<Located<String>> file = calendar.value().located(MissionFields.Calendar.FILE);
      if (file.isEmpty()) {
        continue;
      }
      Source source = new Source(file.get().value(), problems);
      folder
          .text(file.get().value(), file.get().place(), file.get().path())
          .ifPresent(
              text ->
                  all.add(
                      new LocatedEvents(
                          calendar.value(),
                          new CalendarReader(source, from, to).read(text),
                          source)));
    }
    return all;
  }

  private void otherFiles(Values mission) {
    for (Located<Values> craft : mission.items(MissionFields.CRAFT)) {
      craft
          .value()
          .maybe(MissionFields.Craft.ORBIT)
          .flatMap(orbit -> orbit.maybe(MissionFields.Orbit.OEM))
          .flatMap(oem -> oem.located(MissionFields.Ephemeris.FILE))
          .ifPresent(file -> folder.bytes(file.value(), file.place(), file.path()));
    }
  }

  private Calendars calendars(List<LocatedEvents> all, List<Station> stations, List<Craft> craft) {
    List<Blocked> blocked = new ArrayList<>();
    List<Guarded> guarded = new ArrayList<>();
    List<Interruption> interruptions = new ArrayList<>();
    List<ConfirmedContact> confirmed = new ArrayList<>();
    for (LocatedEvents one : all) {
      CalendarMeaning meaning = one.calendar().get(MissionFields.Calendar.MEANING);
      for (CalendarEvent event : one.events()) {
        switch (meaning) {
          case OUTAGE, LENT ->
              blocked.add(
                  new Blocked(
                      meaning == CalendarMeaning.OUTAGE ? Blocked.Why.OUTAGE : Blocked.Why.LENT,
                      one.calendar().get(MissionFields.Calendar.STATION),
                      one.calendar().maybe(MissionFields.Calendar.ANTENNA),
                      ground(event),
                      event.label()));
          case PROTECTED -> guarded.add(new Guarded(onboard(event), event.label()));
          case INTERRUPTION -> interruptions.add(new Interruption(onboard(event), event.label()));
          case CONFIRMED -> confirmed(one, event, stations, craft).ifPresent(confirmed::add);
        }
      }
    }
    blocked.sort(
        Comparator.comparing((Blocked b) -> b.during().begin()).thenComparing(Blocked::station));
    guarded.sort(Comparator.comparing(one -> one.during().begin()));
    interruptions.sort(Comparator.comparing(one -> one.during().begin()));
    confirmed.sort(Comparator.comparing(one -> one.during().begin()));
    return new Calendars(blocked, guarded, interruptions, confirmed);
  }

  private Optional<ConfirmedContact> confirmed(
      LocatedEvents one, CalendarEvent event, List<Station> stations, List<Craft> craft) {
    String stationName = one.calendar().get(MissionFields.Calendar.STATION);
    Station station =
        stations.stream().filter(s -> s.name().equals(stationName)).findFirst().orElseThrow();
    Optional<String> antenna = one.calendar().maybe(MissionFields.Calendar.ANTENNA);
    if (antenna.isEmpty() && station.dishes().size() > 1) {
      one.source()
          .problems()
          .error(
              one.source().at(event.line(), 1),
              "",
              stationName + " has several antennas",
              "antenna: in the mission file");
      return Optional.empty();
    }
    List<String> names = craft.stream().map(Craft::name).toList();
    Optional<String> heard =
        one.calendar()
            .maybe(MissionFields.Calendar.CRAFT)
            .or(() -> event.craft().stream().filter(names::contains).findFirst());
    if (heard.isEmpty()) {
      one.source()
          .problems()
          .error(
              one.source().at(event.line(), 1),
              "",
              "the confirmed contact names no craft",
              "X-QUIETSPAN-CRAFT or CATEGORIES with one of " + String.join(", ", names));
      return Optional.empty();
    }
    return Optional.of(
        new ConfirmedContact(
            event.uid(),
            stationName,
            antenna.orElse(station.dishes().get(0).name()),
            heard.get(),
            ground(event),
            event.label()));
  }

  private static Interval<GroundInstant> ground(CalendarEvent event) {
    return Interval.of(new GroundInstant(event.begin()), new GroundInstant(event.end()));
  }

  private static Interval<OnboardInstant> onboard(CalendarEvent event) {
    return Interval.of(new OnboardInstant(event.begin()), new OnboardInstant(event.end()));
  }

  // ---------------------------------------------------------------- assembly

  private Scenario scenario(
      Values mission,
      Values stationFile,
      Values state,
      List<LocatedEvents> calendars,
      Optional<Instant> issued) {
    Values period = mission.get(MissionFields.PERIOD);
    List<Craft> craft = new ArrayList<>();
    for (Located<Values> one : mission.items(MissionFields.CRAFT)) {
      craft.add(craft(one.value(), mission));
    }
    List<Station> stations =
        stationFile.items(StationFields.STATIONS).stream()
            .map(one -> station(one.value()))
            .toList();
    Calendars read = calendars(calendars, stations, craft);
    return new Scenario(
        new Identity(
            mission.get(MissionFields.MISSION),
            issued.orElse(mission.get(MissionFields.ISSUED)),
            folder.inputs()),
        Interval.of(period.get(MissionFields.Period.BEGIN), period.get(MissionFields.Period.END)),
        craft,
        stations,
        rules(mission),
        read,
        start(state, craft));
  }

  private Craft craft(Values craft, Values mission) {
    Values antenna = craft.get(MissionFields.Craft.ANTENNA);
    Angle cone = antenna.get(MissionFields.Antenna.HALF_CONE);
    return new Craft(
        craft.get(MissionFields.Craft.NAME),
        orbit(craft.get(MissionFields.Craft.ORBIT), mission),
        attitude(craft),
        new HighGainAntenna(
            steering(antenna),
            cone,
            antenna.maybe(MissionFields.Antenna.HALF_POWER_WIDTH).orElse(cone.plus(cone)),
            antenna.get(MissionFields.Antenna.MOVE),
            antenna.get(MissionFields.Antenna.SETTLE),
            antenna.get(MissionFields.Antenna.REPOINT_SPACING)),
        rates(craft.get(MissionFields.Craft.RATES)),
        craft.get(MissionFields.Craft.STORE),
        craft.get(MissionFields.Craft.CROSS_LINK),
        generation(craft, mission));
  }

  private static Orbit orbit(Values orbit, Values mission) {
    Optional<Integer> corner = orbit.maybe(MissionFields.Orbit.CORNER);
    if (corner.isPresent()) {
      Values formation = mission.get(MissionFields.FORMATION);
      Angle lead =
          formation
              .maybe(MissionFields.Formation.LEADING)
              .orElseGet(() -> Angle.ZERO.minus(formation.get(MissionFields.Formation.TRAILING)));
      return new Orbit.Formation(
          formation.get(MissionFields.Formation.EPOCH),
          formation.get(MissionFields.Formation.ARM),
          lead,
          formation.get(MissionFields.Formation.PHASE),
          formation.get(MissionFields.Formation.TILT),
          corner.get() - 1);
    }
    Optional<Values> oem = orbit.maybe(MissionFields.Orbit.OEM);
    if (oem.isPresent()) {
      return new Orbit.Ephemeris(
          oem.get().get(MissionFields.Ephemeris.FILE),
          oem.get().get(MissionFields.Ephemeris.OBJECT));
    }
    Values elements = orbit.get(MissionFields.Orbit.ELEMENTS);
    return new Orbit.Elements(
        elements.get(MissionFields.Elements.EPOCH),
        elements.get(MissionFields.Elements.SEMI_MAJOR_AXIS),
        elements.get(MissionFields.Elements.ECCENTRICITY),
        elements.get(MissionFields.Elements.INCLINATION),
        elements.get(MissionFields.Elements.NODE),
        elements.get(MissionFields.Elements.PERIHELION),
        elements.get(MissionFields.Elements.MEAN_ANOMALY));
  }

  private static Attitude attitude(Values craft) {
    return switch (craft.get(MissionFields.Craft.ATTITUDE)) {
      case IN_FORMATION -> new Attitude.InFormation();
      case SUN_POINTING -> new Attitude.SunPointing();
      case INERTIAL -> {
        Values frame = craft.get(MissionFields.Craft.INERTIAL_FRAME);
        yield new Attitude.Inertial(
            frame.get(MissionFields.InertialFrame.RIGHT_ASCENSION),
            frame.get(MissionFields.InertialFrame.DECLINATION),
            frame.get(MissionFields.InertialFrame.ROLL));
      }
    };
  }

  private static Steering steering(Values antenna) {
    Optional<Values> both = antenna.maybe(MissionFields.Antenna.TWO_AXES);
    if (both.isPresent()) {
      Values axes = both.get();
      return new Steering.TwoAxes(
          axes.get(MissionFields.TwoAxes.FROM),
          axes.get(MissionFields.TwoAxes.TO),
          axes.get(MissionFields.TwoAxes.ELEVATION_FROM),
          axes.get(MissionFields.TwoAxes.ELEVATION_TO),
          axes.get(MissionFields.TwoAxes.STEPS));
    }
    Values axis = antenna.get(MissionFields.Antenna.AZIMUTH_ONLY);
    return new Steering.AzimuthOnly(
        axis.get(MissionFields.AzimuthOnly.FROM),
        axis.get(MissionFields.AzimuthOnly.TO),
        axis.get(MissionFields.AzimuthOnly.ELEVATION),
        axis.get(MissionFields.AzimuthOnly.STEPS));
  }

  private static RateLadder rates(Values rates) {
    if (rates.maybe(MissionFields.Rates.LADDER).isPresent()) {
      return new RateLadder.ByBudget(
          rates.get(MissionFields.Rates.EIRP),
          rates.items(MissionFields.Rates.LADDER).stream().map(Located::value).toList());
    }
    return new RateLadder.ByOffPointing(
        rates.items(MissionFields.Rates.BY_OFF_POINTING).stream()
            .map(
                row ->
                    new RateLadder.ByOffPointing.Row(
                        row.value().get(MissionFields.RateRow.UP_TO),
                        row.value().get(MissionFields.RateRow.RATE)))
            .toList());
  }

  private List<Generation> generation(Values craft, Values mission) {
    OnboardInstant begin = mission.get(MissionFields.PERIOD).get(MissionFields.Period.BEGIN);
    List<Generation> all = new ArrayList<>();
    for (Located<Values> one : craft.items(MissionFields.Craft.GENERATION)) {
      all.add(
          new Generation(
              one.value().get(MissionFields.Generation.DATA_CLASS),
              profile(one.value(), begin),
              one.value().get(MissionFields.Generation.SHARE_IN_PAUSES)));
    }
    return all;
  }

  private Profile profile(Values generation, OnboardInstant begin) {
    Optional<DataRate> rate = generation.maybe(MissionFields.Generation.RATE);
    if (rate.isPresent()) {
      return new Profile(List.of(new Profile.Step(begin, rate.get())));
    }
    List<Profile.Step> steps = new ArrayList<>();
    Optional<Located<String>> csv = generation.located(MissionFields.Generation.CSV);
    if (csv.isPresent()) {
      folder
          .text(csv.get().value(), csv.get().place(), csv.get().path())
          .ifPresent(
              text ->
                  steps.addAll(ProfileTable.read(text, new Source(csv.get().value(), problems))));
      if (steps.isEmpty()) {
        // Complained about already; something must stand here until the complaints are shown.
        steps.add(new Profile.Step(begin, DataRate.ZERO));
      }
    } else {
      for (Located<Values> phase : generation.items(MissionFields.Generation.PHASES)) {
        steps.add(
            new Profile.Step(
                phase.value().get(MissionFields.Phase.FROM),
                phase.value().get(MissionFields.Phase.RATE)));
      }
    }
    return new Profile(steps);
  }

  private static Rules rules(Values mission) {
    Values science = mission.get(MissionFields.SCIENCE);
    Values contacts = mission.get(MissionFields.CONTACTS);
    Values data = mission.get(MissionFields.DATA);
    Values margins = mission.get(MissionFields.MARGINS);
    Duration lockUp = contacts.get(MissionFields.Contacts.LOCK_UP);
    return new Rules(
        new ScienceRules(
            science.get(MissionFields.Science.MINIMUM_QUIET_SPAN),
            science.get(MissionFields.Science.WARM_UP)),
        new ContactRules(
            lockUp,
            contacts.get(MissionFields.Contacts.RATE_STEPS),
            contacts.maybe(MissionFields.Contacts.RELOCK).orElse(lockUp),
            contacts.get(MissionFields.Contacts.CONTACTS_AT_ONCE),
            contacts.get(MissionFields.Contacts.CRAFT_SWITCH),
            contacts.get(MissionFields.Contacts.OVERHEAD)),
        new DataRules(
            data.maybe(MissionFields.Data.GAP_LIMIT),
            data.maybe(MissionFields.Data.DIRECT_LIMIT),
            data.maybe(MissionFields.Data.END_FILL),
            data.maybe(MissionFields.Data.END_COVERAGE),
            data.get(MissionFields.Data.FORWARD_AHEAD),
            data.get(MissionFields.Data.CROSS_LINKS_IN_PAUSES)),
        new Margins(
            margins.get(MissionFields.Margins.USABLE_VOLUME),
            margins.get(MissionFields.Margins.PLANNED_FILL),
            margins.get(MissionFields.Margins.POINTING_ALLOWANCE),
            margins.get(MissionFields.Margins.CONE_ALLOWANCE)),
        mission
            .maybe(MissionFields.LINK)
            .map(
                link ->
                    new LinkBudget(
                        link.get(MissionFields.Link.FREQUENCY),
                        link.get(MissionFields.Link.REQUIRED_EB_N0),
                        link.get(MissionFields.Link.IMPLEMENTATION_LOSS),
                        link.get(MissionFields.Link.OTHER_LOSSES),
                        link.get(MissionFields.Link.MARGIN))),
        data.items(MissionFields.Data.CLASSES).stream()
            .map(
                one ->
                    new DataClass(
                        one.value().get(MissionFields.DataClass.NAME),
                        one.value().get(MissionFields.DataClass.PRIORITY),
                        one.value().get(MissionFields.DataClass.LATENCY)))
            .sorted(Comparator.comparingInt(DataClass::priority))
            .toList());
  }

  private static Station station(Values station) {
    List<Station.MaskPoint> mask =
        station
            .maybe(StationFields.Station.MASK)
            .map(height -> List.of(new Station.MaskPoint(Angle.ZERO, height)))
            .orElseGet(
                () ->
                    station.items(StationFields.Station.MASK_BY_AZIMUTH).stream()
                        .map(
                            point ->
                                new Station.MaskPoint(
                                    point.value().get(StationFields.MaskPoint.AT),
                                    point.value().get(StationFields.MaskPoint.HEIGHT)))
                        .toList());
    return new Station(
        station.get(StationFields.Station.NAME),
        station.get(StationFields.Station.LATITUDE),
        station.get(StationFields.Station.LONGITUDE),
        station.get(StationFields.Station.ALTITUDE),
        mask,
        station.get(StationFields.Station.SEP_LIMIT),
        station.get(StationFields.Station.DELIVERY_DELAY),
        station.get(StationFields.Station.ZONE),
        station.items(StationFields.Station.ANTENNAS).stream()
            .map(one -> dish(one.value()))
            .toList());
  }

  private static Dish dish(Values dish) {
    Duration setup = dish.get(StationFields.Antenna.SETUP);
    Duration teardown = dish.get(StationFields.Antenna.TEARDOWN);
    List<Dish.GainPoint> gain =
        dish.maybe(StationFields.Antenna.G_OVER_T)
            .map(value -> List.of(new Dish.GainPoint(Angle.ofDegrees(90), value)))
            .orElseGet(
                () ->
                    dish.items(StationFields.Antenna.G_OVER_T_BY_ELEVATION).stream()
                        .map(
                            point ->
                                new Dish.GainPoint(
                                    point.value().get(StationFields.GainPoint.AT),
                                    point.value().get(StationFields.GainPoint.VALUE)))
                        .toList());
    return new Dish(
        dish.get(StationFields.Antenna.NAME),
        gain.isEmpty() ? List.of(new Dish.GainPoint(Angle.ofDegrees(90), 0)) : gain,
        dish.get(StationFields.Antenna.ZENITH_ATTENUATION),
        dish.get(StationFields.Antenna.LOWEST),
        dish.get(StationFields.Antenna.HIGHEST),
        dish.items(StationFields.Antenna.DEAD_ZONES).stream()
            .map(
                zone ->
                    new Dish.Sector(
                        zone.value().get(StationFields.DeadZone.FROM),
                        zone.value().get(StationFields.DeadZone.TO),
                        zone.value().get(StationFields.DeadZone.UP_TO)))
            .toList(),
        setup,
        teardown,
        dish.maybe(StationFields.Antenna.CHANGEOVER).orElse(setup.plus(teardown)),
        dish.get(StationFields.Antenna.MINIMUM_CONTACT),
        dish.get(StationFields.Antenna.MAXIMUM_CONTACT),
        dish.get(StationFields.Antenna.COST_PER_HOUR),
        dish.get(StationFields.Antenna.COST_PER_CONTACT));
  }

  private static StartState start(Values state, List<Craft> craft) {
    List<CraftState> states = new ArrayList<>();
    for (Craft one : craft) {
      for (Located<Values> row : state.items(StateFields.CRAFT)) {
        if (row.value().get(StateFields.Craft.NAME).equals(one.name())) {
          states.add(craftState(row.value()));
        }
      }
    }
    return new StartState(
        state.maybe(StateFields.QUIET_SINCE), state.maybe(StateFields.LAST_CONTACT_END), states);
  }

  private static CraftState craftState(Values row) {
    Values aim = row.get(StateFields.Craft.AIM);
    return new CraftState(
        row.get(StateFields.Craft.NAME),
        Aim.nearest(aim.get(StateFields.Aim.AZIMUTH), aim.get(StateFields.Aim.ELEVATION)),
        row.items(StateFields.Craft.FILL).stream()
            .map(
                fill ->
                    new CraftState.Fill(
                        fill.value().get(StateFields.Fill.DATA_CLASS),
                        fill.value().get(StateFields.Fill.VOLUME),
                        fill.value().maybe(StateFields.Fill.OLDEST)))
            .toList(),
        row.maybe(StateFields.Craft.LAST_CONTACT_END),
        row.maybe(StateFields.Craft.LAST_REPOINT));
  }

  /** Names of a list that stand twice are complained about at the second place. */
  static Set<String> names(List<Located<Values>> rows, Field<String> field) {
    Set<String> seen = new HashSet<>();
    for (Located<Values> row : rows) {
      row.value()
          .maybe(field)
          .ifPresent(
              name -> {
                if (!seen.add(name)) {
                  row.value()
                      .refuse(field, "\"" + name + "\" stands here a second time", "unique names");
                }
              });
    }
    return seen;
  }
}
