package quietspan.planning;

import java.time.Duration;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.SplittableRandom;
import quietspan.fixture.SyntheticSky;
import quietspan.fixture.TestScenario;
import quietspan.model.Aim;
import quietspan.model.Blocked;
import quietspan.model.Calendars;
import quietspan.model.ConfirmedContact;
import quietspan.model.ContactRules;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.DataClass;
import quietspan.model.DataRules;
import quietspan.model.Generation;
import quietspan.model.Geometry;
import quietspan.model.Guarded;
import quietspan.model.HighGainAntenna;
import quietspan.model.Interruption;
import quietspan.model.Margins;
import quietspan.model.Profile;
import quietspan.model.Scenario;
import quietspan.model.ScienceRules;
import quietspan.model.Waiver;
import quietspan.rules.Opportunities;
import quietspan.rules.Opportunity;
import quietspan.rules.Waivers;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;
import quietspan.units.DataRate;
import quietspan.units.DataVolume;

/**
 * A scenario of a few days that can be searched through: one to three craft, one or two stations,
 * an Earth that drifts fast through narrow beams. Whatever features are in force, the same seed
 * draws the same numbers, so that a world without one of its features differs in nothing else.
 */
record TinyWorld(
    long seed,
    Set<Feature> features,
    Scenario scenario,
    Geometry geometry,
    List<Waiver> waivers,
    List<Opportunity> opportunities) {

  /** What a world may hold besides repoints and passes. */
  enum Feature {
    /** An interruption at an odd second, beside which a pause may begin or end. */
    OFF_GRID_INTERRUPTION,
    UNEQUAL_BEAMS,
    /** Bulk data may wait for three days and more. */
    LONG_LATENCY,
    PHASED_RATES,
    /** The present quiet span began before the period. */
    QUIET_SINCE,
    /** Start fills carry the age of their oldest bit. */
    AGED_FILL,
    /** Aims at the start are in the middle of a hold, not far from the Earth. */
    AIM_IN_MID_HOLD,
    /** The Earth may be in no beam for a while. */
    COVERAGE_GAP,
    /** Outages force limits to be waived. */
    WAIVER,
    TWO_AT_ONCE,
    THREE_AT_ONCE,
    PROTECTED,
    REPOINT_SPACING,
    SEVERAL_CLASSES,
    CONFIRMED,
    END_FILL,
    END_COVERAGE
  }

  private static final int HOUR = 3600;
  private static final int DAYS_OF_STORE = 12;

  /** What a craft makes in a day, as a share of its store. */
  private static final double DAY_SHARE = 1.0 / DAYS_OF_STORE;

  /**
   * The same world without a feature. What to do with interruptions and gaps is the search's
   * choice; dropping the waivers leaves the outage that forces them.
   */
  TinyWorld without(Feature feature) {
    EnumSet<Feature> left = EnumSet.copyOf(features);
    left.remove(feature);
    return switch (feature) {
      case OFF_GRID_INTERRUPTION, COVERAGE_GAP ->
          new TinyWorld(seed, left, scenario, geometry, waivers, opportunities);
      case WAIVER -> new TinyWorld(seed, left, scenario, geometry, List.of(), opportunities);
      default -> of(seed, left);
    };
  }

  /** Features that show only where not all antennas have to move at once. */
  private static final Set<Feature> NEED_AIMS =
      EnumSet.of(Feature.QUIET_SINCE, Feature.AGED_FILL, Feature.PHASED_RATES, Feature.WAIVER);

  /** A world about one feature. */
  static TinyWorld about(Feature feature, long seed) {
    EnumSet<Feature> features = EnumSet.of(Feature.COVERAGE_GAP, feature);
    if (NEED_AIMS.contains(feature)) {
      features.add(Feature.AIM_IN_MID_HOLD);
    }
    return of(seed, features);
  }

  /** A world with a few features at random. */
  static TinyWorld of(long seed) {
    SplittableRandom random = new SplittableRandom(seed * 31 + 7);
    EnumSet<Feature> features = EnumSet.of(Feature.COVERAGE_GAP);
    Feature[] all = Feature.values();
    for (int i = 1 + random.nextInt(4); i > 0; i--) {
      features.add(all[random.nextInt(all.length)]);
    }
    return of(seed, features);
  }

  static TinyWorld of(long seed, Set<Feature> features) {
    return new Maker(seed, features).make();
  }

  private static final class Maker {

    private final long seed;
    private final SplittableRandom random;
    private final Set<Feature> on;
    private final TestScenario world = new TestScenario();

    Maker(long seed, Set<Feature> on) {
      this.seed = seed;
      this.random = new SplittableRandom(seed);
      this.on = on;
    }

    private boolean has(Feature feature) {
      return on.contains(feature);
    }

    private long between(long from, long to) {
      return random.nextLong(from, to + 1);
    }

    private double between(double from, double to) {
      return random.nextDouble(from, to);
    }

    private OnboardInstant at(long second) {
      return new OnboardInstant(world.begin).plusSeconds(second);
    }

    private Interval<OnboardInstant> onboard(long from, long to) {
      return Interval.of(at(from), at(to));
    }

    private int craftCount() {
      int draw = random.nextInt(10);
      if (has(Feature.REPOINT_SPACING) || has(Feature.LONG_LATENCY) || has(Feature.PROTECTED)) {
        draw /= 2;
      }
      int drawn = draw < 4 ? 1 : draw < 8 ? 2 : 3;
      int least =
          on.contains(Feature.THREE_AT_ONCE)
              ? 3
              : on.contains(Feature.TWO_AT_ONCE) || on.contains(Feature.UNEQUAL_BEAMS) ? 2 : 1;
      return Math.max(least, drawn);
    }

    TinyWorld make() {
      int craft = craftCount();
      world.days = (int) between(3, 4) + (seed % 3 == 0 ? 1 : 0);
      long seconds = world.days * 86_400L;
      double drift = between(1.5, 3.2);
      double tightness = between(0.25, 1.15);
      int settle = (int) between(1, 9) * 1800;
      int shorter = (int) between(0, 2) * 1200;
      int phase = (int) between(seconds / 4, seconds * 3 / 4);
      double early = random.nextBoolean() ? between(0.0, 0.3) : between(1.5, 1.8);
      classes();
      double startShare = between(0, 0.9);
      long age = between(12 * HOUR, 34 * HOUR);
      int spacing = (int) between(18 * HOUR, 60 * HOUR);
      double narrow = between(0.8, 1.4);
      double[] ahead = {between(-0.5, 1.8), between(-0.5, 1.8), between(-0.5, 1.8)};
      boolean tightStore = random.nextInt(3) == 0;
      String[] names = {"Hask", "Merle", "Tovin"};
      for (int c = 0; c < craft; c++) {
        boolean other = has(Feature.UNEQUAL_BEAMS) && c == 0;
        world.addCraft(
            names[c],
            other ? narrow : 2.1,
            other ? narrow * 2 : 4.6,
            49.2,
            Duration.ofMinutes(20),
            Duration.ofSeconds(Math.max(600, settle - (long) c * shorter)));
        Craft plain = world.craft.get(c);
        // A pass of six hours brings down some two Gbit.
        long rate = (long) (22_000 * tightness / craft);
        HighGainAntenna antenna = plain.antenna();
        world.craft.set(
            c,
            new Craft(
                plain.name(),
                plain.orbit(),
                plain.attitude(),
                new HighGainAntenna(
                    antenna.steering(),
                    antenna.ratedHalfCone(),
                    antenna.halfPowerWidth(),
                    antenna.move(),
                    antenna.settle(),
                    has(Feature.REPOINT_SPACING)
                        ? Duration.ofSeconds(spacing)
                        : antenna.repointLength()),
                plain.rates(),
                new DataVolume(rate * (tightStore ? 3 * 86_400L : DAYS_OF_STORE * 86_400L)),
                new DataRate(60_000),
                generation(rate, phase, early)));
        long fill = (long) (startShare * rate * 86_400);
        Optional<OnboardInstant> oldest =
            has(Feature.AGED_FILL) ? Optional.of(at(-age)) : Optional.empty();
        double azimuth = 40 + 120 * c + (has(Feature.AIM_IN_MID_HOLD) ? ahead[c] : 30);
        world.states.set(
            c,
            new CraftState(
                plain.name(),
                Aim.nearest(Angle.ofDegrees(azimuth), Angle.ofDegrees(8 + c)),
                List.of(new CraftState.Fill("bulk", new DataVolume(fill), oldest)),
                Optional.empty(),
                Optional.empty()));
      }
      stations();
      rules();
      List<Interruption> interruptions = interruptions(seconds);
      List<Guarded> guarded = guarded(seconds);
      List<Blocked> blocked = blocked(seconds);
      long pick = between(0, 1_000);
      long cut = between(0, 40 * 60);
      world.calendars = new Calendars(blocked, guarded, interruptions, List.of());
      Scenario built = world.build();
      SyntheticSky sky = sky(built, drift);
      Geometry geometry = sky.geometry();
      List<Opportunity> opportunities = Opportunities.of(built, geometry);
      if (has(Feature.CONFIRMED) && !opportunities.isEmpty()) {
        Opportunity one = opportunities.get((int) (pick % opportunities.size()));
        long spare = one.during().length().toSeconds() - 40 * 60;
        Interval<GroundInstant> during =
            Interval.of(
                one.during().begin().plusSeconds(Math.min(cut, spare)),
                one.during().begin().plusSeconds(Math.min(cut, spare) + 40 * 60L));
        world.calendars =
            new Calendars(
                blocked,
                guarded,
                interruptions,
                List.of(
                    new ConfirmedContact(
                        "confirmed", one.station(), one.antenna(), one.craft(), during, "")));
        built = world.build();
        geometry = sky(built, drift).geometry();
      }
      List<Waiver> waivers = Waivers.of(built, geometry, opportunities);
      return new TinyWorld(seed, EnumSet.copyOf(on), built, geometry, waivers, opportunities);
    }

    private static SyntheticSky sky(Scenario scenario, double drift) {
      return new SyntheticSky(scenario, 250, drift, -18);
    }

    private void classes() {
      long quick = between(18, 30) * HOUR;
      long bulk = between(30, 44) * HOUR;
      long patient = between(72, 90) * HOUR;
      DataClass last =
          new DataClass(
              "bulk",
              2,
              Duration.ofSeconds(
                  has(Feature.LONG_LATENCY) || has(Feature.WAIVER) ? patient : bulk));
      world.classes =
          has(Feature.SEVERAL_CLASSES)
              ? List.of(new DataClass("quick", 1, Duration.ofSeconds(quick)), last)
              : List.of(last);
    }

    private List<Generation> generation(long rate, int phase, double early) {
      List<Profile.Step> steps = new ArrayList<>();
      if (has(Feature.PHASED_RATES)) {
        steps.add(new Profile.Step(at(0), new DataRate((long) (rate * early))));
        steps.add(new Profile.Step(at(phase), new DataRate((long) (rate * (1.8 - early)))));
      } else {
        steps.add(new Profile.Step(at(0), new DataRate(rate)));
      }
      List<Generation> all = new ArrayList<>();
      if (has(Feature.SEVERAL_CLASSES)) {
        all.add(
            new Generation(
                "quick",
                new Profile(List.of(new Profile.Step(at(0), new DataRate(rate / 5)))),
                0.15));
      }
      all.add(new Generation("bulk", new Profile(steps), 0.15));
      return all;
    }

    private void stations() {
      world.addStation("Vellmarch", 38.3, 33.2 + between(-60, 60), between(18.0, 27.0), 50.1);
      if (random.nextInt(3) == 0 || has(Feature.TWO_AT_ONCE) || has(Feature.THREE_AT_ONCE)) {
        double beside = between(-30, 60);
        world.addStation("Corrin Downs", -27.1, 33.2 + beside, between(40.0, 55.0), 47.6);
      }
      if (has(Feature.THREE_AT_ONCE)) {
        world.addStation("Ostrand", 33.9, 33.2 + between(-40, 40), 25, 50.4);
      }
    }

    private void rules() {
      long minimum = random.nextInt(3) * between(6, 14) * HOUR;
      long warm = between(1, 8) * 900;
      world.science = new ScienceRules(Duration.ofSeconds(minimum), Duration.ofSeconds(warm));
      long since = between(HOUR, 20 * HOUR);
      world.quietSince = has(Feature.QUIET_SINCE) ? Optional.of(at(-since)) : Optional.empty();
      int atOnce = has(Feature.THREE_AT_ONCE) ? 3 : has(Feature.TWO_AT_ONCE) ? 2 : 1;
      world.contacts =
          new ContactRules(
              Duration.ofMinutes(5), 1, Duration.ofMinutes(1), atOnce, Duration.ofMinutes(10), 0.1);
      boolean gaps = random.nextInt(2) == 0 || has(Feature.WAIVER);
      long gap = has(Feature.WAIVER) ? between(22, 28) * HOUR : between(25, 50) * HOUR;
      double end = between(0.05, 0.5) * DAY_SHARE;
      long covered = between(6, 40) * HOUR;
      world.data =
          new DataRules(
              gaps ? Optional.of(Duration.ofSeconds(gap)) : Optional.empty(),
              Optional.empty(),
              Optional.of(has(Feature.END_FILL) ? end : 1.0),
              has(Feature.END_COVERAGE)
                  ? Optional.of(Duration.ofSeconds(covered))
                  : Optional.empty(),
              Duration.ofHours(1),
              true);
      world.margins = new Margins(0.9, 0.8, Angle.ofDegrees(0.1), Angle.ofDegrees(0.01));
    }

    private List<Interruption> interruptions(long seconds) {
      long first = between(HOUR, seconds - 3 * HOUR);
      long length = between(1_000, 4 * HOUR);
      long second = between(HOUR, seconds - 3 * HOUR);
      long shorter = between(1_000, 2 * HOUR);
      boolean two = random.nextInt(3) == 0;
      List<Interruption> all = new ArrayList<>();
      if (has(Feature.OFF_GRID_INTERRUPTION)) {
        all.add(new Interruption(onboard(first, first + length), "calibration"));
        if (two) {
          all.add(new Interruption(onboard(second, second + shorter), "test"));
        }
      }
      all.sort(java.util.Comparator.comparing(one -> one.during().begin()));
      return all;
    }

    private List<Guarded> guarded(long seconds) {
      long from = between(0, seconds - 10 * HOUR);
      long length = between(16 * HOUR, 48 * HOUR);
      return has(Feature.PROTECTED)
          ? List.of(new Guarded(onboard(from, Math.min(seconds, from + length)), "transit"))
          : List.of();
    }

    private List<Blocked> blocked(long seconds) {
      long from = between(HOUR, seconds - 30 * HOUR);
      long length = between(20 * HOUR, 34 * HOUR);
      List<Blocked> all = new ArrayList<>();
      if (has(Feature.WAIVER)) {
        for (var station : world.stations) {
          GroundInstant begin = new GroundInstant(world.begin).plusSeconds(from);
          all.add(
              new Blocked(
                  Blocked.Why.OUTAGE,
                  station.name(),
                  Optional.empty(),
                  Interval.of(begin, begin.plusSeconds(length)),
                  "maintenance"));
        }
      }
      return all;
    }
  }
}
