package quietspan.input;

import java.util.ArrayList;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Optional;
import quietspan.model.Attitude;
import quietspan.model.Craft;
import quietspan.model.Generation;
import quietspan.model.HighGainAntenna;
import quietspan.model.Orbit;
import quietspan.model.Profile;
import quietspan.model.RateLadder;
import quietspan.model.Steering;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;
import quietspan.units.DataRate;

/** What the mission says of one craft: the checks that no single field can make, and the craft. */
final class CraftSection {

  private final Values craft;
  private final Values mission;
  private final Folder folder;
  private final IdentityHashMap<Values, List<Profile.Step>> tables = new IdentityHashMap<>();

  CraftSection(Values craft, Values mission, Folder folder) {
    this.craft = craft;
    this.mission = mission;
    this.folder = folder;
  }

  Optional<String> name() {
    return craft.maybe(MissionFields.Craft.NAME);
  }

  Optional<Integer> corner() {
    return craft
        .maybe(MissionFields.Craft.ORBIT)
        .flatMap(orbit -> orbit.maybe(MissionFields.Orbit.CORNER));
  }

  boolean needsBudget() {
    return craft
        .maybe(MissionFields.Craft.RATES)
        .filter(rates -> rates.has(MissionFields.Rates.LADDER))
        .isPresent();
  }

  Values values() {
    return craft;
  }

  /** Reads the files that the craft names, and complains about what does not go together. */
  void check(List<String> classes) {
    craft.maybe(MissionFields.Craft.ORBIT).ifPresent(this::checkOrbit);
    checkAttitude();
    craft.maybe(MissionFields.Craft.ANTENNA).ifPresent(this::checkAntenna);
    craft.maybe(MissionFields.Craft.RATES).ifPresent(this::checkRates);
    List<Values> generation = craft.blocks(MissionFields.Craft.GENERATION);
    Rows.distinct(generation, MissionFields.Generation.DATA_CLASS);
    for (Values one : generation) {
      one.maybe(MissionFields.Generation.DATA_CLASS)
          .ifPresent(name -> Rows.known(one, MissionFields.Generation.DATA_CLASS, name, classes));
      Rows.rising(one.blocks(MissionFields.Generation.PHASES), MissionFields.Phase.FROM);
      one.located(MissionFields.Generation.CSV).ifPresent(file -> readTable(one, file));
    }
  }

  private void checkOrbit(Values orbit) {
    if (orbit.has(MissionFields.Orbit.CORNER) && !mission.has(MissionFields.FORMATION)) {
      orbit.refuse(
          MissionFields.Orbit.CORNER, "there is no formation to be a corner of", "formation: too");
    }
    orbit
        .maybe(MissionFields.Orbit.OEM)
        .flatMap(oem -> oem.located(MissionFields.Ephemeris.FILE))
        .ifPresent(file -> folder.bytes(file.value(), file.place(), file.path()));
  }

  private void checkAttitude() {
    Optional<MissionFields.AttitudeLaw> law = craft.maybe(MissionFields.Craft.ATTITUDE);
    boolean framed = craft.has(MissionFields.Craft.INERTIAL_FRAME);
    boolean inertial = law.filter(MissionFields.AttitudeLaw.INERTIAL::equals).isPresent();
    if (inertial && !framed) {
      craft.refuse(
          MissionFields.Craft.ATTITUDE, "inertial needs a frame", "inertial_frame: beside it");
    }
    if (law.isPresent() && !inertial && framed) {
      craft.refuse(
          MissionFields.Craft.INERTIAL_FRAME, "goes with attitude inertial only", "no frame");
    }
    if (law.filter(MissionFields.AttitudeLaw.IN_FORMATION::equals).isPresent()
        && mission.items(MissionFields.CRAFT).size() == 1) {
      craft.refuse(
          MissionFields.Craft.ATTITUDE,
          "in_formation needs a second craft",
          "attitude: sun_pointing or inertial");
    }
  }

  private void checkAntenna(Values antenna) {
    Optional<Angle> cone = antenna.maybe(MissionFields.Antenna.HALF_CONE);
    Optional<Angle> width = antenna.maybe(MissionFields.Antenna.HALF_POWER_WIDTH);
    // The pointing loss is good to about half power only.
    if (cone.isPresent() && width.isPresent() && 2 * cone.get().degrees() > width.get().degrees()) {
      antenna.refuse(
          MissionFields.Antenna.HALF_CONE,
          "is more than half of half_power_width",
          "at most half of it: there is no link beyond half power");
    }
    if (needsBudget() && !antenna.has(MissionFields.Antenna.HALF_POWER_WIDTH)) {
      antenna.refuse(
          "lacks half_power_width, which a link budget needs", "half_power_width: 4.6 deg");
    }
    Optional<Values> margins = mission.maybe(MissionFields.MARGINS);
    Optional<Angle> pointing =
        margins.flatMap(values -> values.maybe(MissionFields.Margins.POINTING_ALLOWANCE));
    Optional<Angle> aberration =
        margins.flatMap(values -> values.maybe(MissionFields.Margins.CONE_ALLOWANCE));
    if (cone.isPresent()
        && pointing.isPresent()
        && aberration.isPresent()
        && cone.get().compareTo(pointing.get().plus(aberration.get())) <= 0) {
      antenna.refuse(
          MissionFields.Antenna.HALF_CONE,
          "leaves nothing when the allowances are taken off",
          "more than pointing_allowance and cone_allowance together");
    }
    antenna
        .maybe(MissionFields.Antenna.TWO_AXES)
        .ifPresent(
            axes -> {
              Optional<Angle> from = axes.maybe(MissionFields.TwoAxes.ELEVATION_FROM);
              Optional<Angle> to = axes.maybe(MissionFields.TwoAxes.ELEVATION_TO);
              if (from.isPresent() && to.isPresent() && from.get().compareTo(to.get()) > 0) {
                axes.refuse(
                    MissionFields.TwoAxes.ELEVATION_TO,
                    "is below elevation_from",
                    "at least elevation_from");
              }
            });
    antenna
        .maybe(MissionFields.Antenna.AZIMUTH_ONLY)
        .ifPresent(
            axis ->
                StateFile.onGrid(
                    axis, MissionFields.AzimuthOnly.ELEVATION, "the grid of all aims"));
  }

  private void checkRates(Values rates) {
    DataRate before = DataRate.ZERO;
    for (Located<DataRate> rate : rates.items(MissionFields.Rates.LADDER)) {
      if (rate.value().compareTo(before) <= 0) {
        rate.refuse("is not above the one before", "rising order");
      }
      before = rate.value();
    }
    if (rates.has(MissionFields.Rates.LADDER)) {
      if (!rates.has(MissionFields.Rates.EIRP)) {
        rates.refuse("lacks eirp, which a ladder needs", "eirp: 49.2 dBW");
      }
      if (!mission.has(MissionFields.LINK)) {
        rates.refuse(
            MissionFields.Rates.LADDER, "there is no link budget to choose by", "link: too");
      }
    }
    List<Values> rows = rates.blocks(MissionFields.Rates.BY_OFF_POINTING);
    Rows.rising(rows, MissionFields.RateRow.UP_TO);
    Rows.falling(rows, MissionFields.RateRow.RATE);
  }

  private void readTable(Values generation, Located<String> file) {
    Source source = new Source(file.value(), file.source().problems());
    folder
        .text(file.value(), file.place(), file.path())
        .ifPresent(text -> tables.put(generation, ProfileTable.read(text, source)));
  }

  /** The craft; only when nothing was complained about. */
  Craft model() {
    Values antenna = craft.get(MissionFields.Craft.ANTENNA);
    Angle cone = antenna.get(MissionFields.Antenna.HALF_CONE);
    return new Craft(
        craft.get(MissionFields.Craft.NAME),
        orbit(craft.get(MissionFields.Craft.ORBIT)),
        attitude(),
        new HighGainAntenna(
            steering(antenna),
            cone,
            antenna.maybe(MissionFields.Antenna.HALF_POWER_WIDTH).orElse(cone.plus(cone)),
            antenna.get(MissionFields.Antenna.MOVE),
            antenna.get(MissionFields.Antenna.SETTLE),
            antenna.get(MissionFields.Antenna.REPOINT_SPACING)),
        ladder(craft.get(MissionFields.Craft.RATES)),
        craft.get(MissionFields.Craft.STORE),
        craft.get(MissionFields.Craft.CROSS_LINK),
        craft.blocks(MissionFields.Craft.GENERATION).stream().map(this::generation).toList());
  }

  private Orbit orbit(Values orbit) {
    Optional<Values> oem = orbit.maybe(MissionFields.Orbit.OEM);
    if (oem.isPresent()) {
      return new Orbit.Ephemeris(
          oem.get().get(MissionFields.Ephemeris.FILE),
          oem.get().get(MissionFields.Ephemeris.OBJECT));
    }
    Optional<Values> elements = orbit.maybe(MissionFields.Orbit.ELEMENTS);
    return elements.isPresent()
        ? elements(elements.get())
        : corner(orbit.get(MissionFields.Orbit.CORNER), mission.get(MissionFields.FORMATION));
  }

  private static Orbit elements(Values elements) {
    return new Orbit.Elements(
        elements.get(MissionFields.Elements.EPOCH),
        elements.get(MissionFields.Elements.SEMI_MAJOR_AXIS),
        elements.get(MissionFields.Elements.ECCENTRICITY),
        elements.get(MissionFields.Elements.INCLINATION),
        elements.get(MissionFields.Elements.NODE),
        elements.get(MissionFields.Elements.PERIHELION),
        elements.get(MissionFields.Elements.MEAN_ANOMALY));
  }

  private static Orbit corner(int corner, Values formation) {
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
        corner - 1);
  }

  private Attitude attitude() {
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

  /** How the antenna can be aimed, once its block could be read. */
  Optional<Steering> steering() {
    return craft
        .maybe(MissionFields.Craft.ANTENNA)
        .filter(
            antenna ->
                antenna
                        .maybe(MissionFields.Antenna.TWO_AXES)
                        .filter(MissionFields.TwoAxes.TABLE::isWhole)
                        .isPresent()
                    || antenna
                        .maybe(MissionFields.Antenna.AZIMUTH_ONLY)
                        .filter(MissionFields.AzimuthOnly.TABLE::isWhole)
                        .isPresent())
        .map(CraftSection::steering);
  }

  private static Steering steering(Values antenna) {
    Optional<Values> both = antenna.maybe(MissionFields.Antenna.TWO_AXES);
    if (both.isPresent()) {
      return new Steering.TwoAxes(
          both.get().get(MissionFields.TwoAxes.FROM),
          both.get().get(MissionFields.TwoAxes.TO),
          both.get().get(MissionFields.TwoAxes.ELEVATION_FROM),
          both.get().get(MissionFields.TwoAxes.ELEVATION_TO),
          both.get().get(MissionFields.TwoAxes.STEPS));
    }
    Values axis = antenna.get(MissionFields.Antenna.AZIMUTH_ONLY);
    return new Steering.AzimuthOnly(
        axis.get(MissionFields.AzimuthOnly.FROM),
        axis.get(MissionFields.AzimuthOnly.TO),
        axis.get(MissionFields.AzimuthOnly.ELEVATION),
        axis.get(MissionFields.AzimuthOnly.STEPS));
  }

  private static RateLadder ladder(Values rates) {
    if (rates.maybe(MissionFields.Rates.LADDER).isPresent()) {
      return new RateLadder.ByBudget(
          rates.get(MissionFields.Rates.EIRP),
          rates.items(MissionFields.Rates.LADDER).stream().map(Located::value).toList());
    }
    return new RateLadder.ByOffPointing(
        rates.blocks(MissionFields.Rates.BY_OFF_POINTING).stream()
            .map(
                row ->
                    new RateLadder.ByOffPointing.Row(
                        row.get(MissionFields.RateRow.UP_TO), row.get(MissionFields.RateRow.RATE)))
            .toList());
  }

  private Generation generation(Values generation) {
    return new Generation(
        generation.get(MissionFields.Generation.DATA_CLASS),
        new Profile(steps(generation)),
        generation.get(MissionFields.Generation.SHARE_IN_PAUSES));
  }

  private List<Profile.Step> steps(Values generation) {
    if (tables.containsKey(generation)) {
      return tables.get(generation);
    }
    List<Profile.Step> steps = new ArrayList<>();
    Optional<DataRate> rate = generation.maybe(MissionFields.Generation.RATE);
    OnboardInstant begin = mission.get(MissionFields.PERIOD).get(MissionFields.Period.BEGIN);
    rate.ifPresent(constant -> steps.add(new Profile.Step(begin, constant)));
    for (Values phase : generation.blocks(MissionFields.Generation.PHASES)) {
      steps.add(
          new Profile.Step(
              phase.get(MissionFields.Phase.FROM), phase.get(MissionFields.Phase.RATE)));
    }
    return steps;
  }
}
