package quietspan.rules;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import quietspan.Seeds;
import quietspan.fixture.SyntheticSky;
import quietspan.fixture.TestScenario;
import quietspan.fixture.Variations;
import quietspan.link.Link;
import quietspan.model.Blocked;
import quietspan.model.Calendars;
import quietspan.model.Dish;
import quietspan.model.Geometry;
import quietspan.model.Look;
import quietspan.model.Pass;
import quietspan.model.RateLadder;
import quietspan.model.Scenario;
import quietspan.model.Station;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.IntervalSet;
import quietspan.units.Angle;
import quietspan.units.DataRate;

final class OpportunitiesTest {

  private static final double HOUR = 3_600;

  private final TestScenario world = TestScenario.one();
  private final FlatSky sky = new FlatSky();
  private double lowest = 5;
  private double highest = 90;
  private double sepLimit = 3;
  private List<Dish.Sector> deadZones = List.of();

  private List<String> found(double fromNoon, double toNoon, int guard) {
    withLimits();
    Geometry geometry = sky.pass("Vellmarch", "Hask", fromNoon, toNoon, guard);
    return Opportunities.of(world.build(), geometry).stream()
        .map(one -> seconds(one.during().begin()) + " to " + seconds(one.during().end()))
        .toList();
  }

  private static String seconds(GroundInstant instant) {
    double since = instant.secondsSince(FlatSky.NOON);
    assertThat(since).isEqualTo(Math.rint(since));
    return Long.toString((long) since);
  }

  private void withLimits() {
    world.stations.replaceAll(station -> limited(station, lowest, highest, sepLimit, deadZones));
  }

  private static Station limited(
      Station station, double lowest, double highest, double sep, List<Dish.Sector> zones) {
    Dish dish = station.dishes().get(0);
    return Variations.withDish(
        station,
        Angle.ofDegrees(sep),
        Variations.withSight(
            dish,
            dish.gOverT(),
            dish.zenithAttenuationDb(),
            Angle.ofDegrees(lowest),
            Angle.ofDegrees(highest),
            zones));
  }

  private void block(double fromNoon, double toNoon) {
    List<Blocked> blocked = new ArrayList<>(world.calendars.blocked());
    blocked.add(
        new Blocked(
            Blocked.Why.OUTAGE,
            "Vellmarch",
            Optional.empty(),
            Interval.of(FlatSky.noonPlus(fromNoon), FlatSky.noonPlus(toNoon)),
            "maintenance"));
    world.calendars = new Calendars(blocked, List.of(), List.of(), List.of());
  }

  @Test
  void aPassIsRoundedInwardAndByTheGuard() {
    assertThat(found(-4 * HOUR + 0.25, 4 * HOUR + 0.75, 1)).containsExactly("-14398 to 14399");
    assertThat(found(-4 * HOUR + 0.25, 4 * HOUR + 0.75, 0)).containsExactly("-14399 to 14400");
  }

  /** Setup 45 min, teardown 15 min. */
  @Test
  void setupAndTeardownStayOutOfAnOutage() {
    block(0, HOUR);
    assertThat(found(-4 * HOUR, 4 * HOUR, 0)).containsExactly("-14400 to -900", "6300 to 14400");
  }

  @ParameterizedTest(name = "{0} {1}")
  @CsvSource({"Elsewhere,", "Vellmarch, second"})
  void whatBlocksAnotherAntennaChangesNothing(String station, String antenna) {
    Blocked lent =
        new Blocked(
            Blocked.Why.LENT,
            station,
            Optional.ofNullable(antenna),
            Interval.of(FlatSky.noonPlus(0), FlatSky.noonPlus(HOUR)),
            "lent");
    world.calendars = new Calendars(List.of(lent), List.of(), List.of(), List.of());
    assertThat(found(-4 * HOUR, 4 * HOUR, 0)).containsExactly("-14400 to 14400");
  }

  /** The shortest contact is 40 min: 2400 s. */
  @Test
  void piecesShorterThanTheShortestContactAreLeftOut() {
    block(-4 * HOUR + 2400 + 900, 5 * HOUR);
    assertThat(found(-4 * HOUR, 4 * HOUR, 0)).containsExactly("-14400 to -12000");
    assertThat(found(-4 * HOUR + 1, 4 * HOUR, 0)).isEmpty();
  }

  /** Elevation 80 deg less one hundredth of a degree each second away from noon; limit 70 deg. */
  @Test
  void aKeyholeCutsThePass() {
    sky.elevation = since -> 80 - Math.abs(since) / 100;
    highest = 70;
    assertThat(found(-2 * HOUR, 2 * HOUR, 0)).containsExactly("-7200 to -1000", "1000 to 7200");
  }

  @Test
  void edgesOfAKeyholeKeepTheGuard() {
    sky.elevation = since -> 80 - Math.abs(since) / 100;
    highest = 70;
    assertThat(found(-2 * HOUR, 2 * HOUR, 1)).containsExactly("-7199 to -1001", "1001 to 7199");
  }

  /** Above the limit for less than two looks; the looks include the culmination. */
  @Test
  void aKeyholeShorterThanTheStepIsFound() {
    sky.elevation = since -> 70.052 - Math.abs(since) / 200;
    highest = 70;
    assertThat(found(-2 * HOUR + 17, 2 * HOUR, 0)).containsExactly("-7183 to -11", "11 to 7200");
  }

  @Test
  void aLowerElevationLimitCutsThePass() {
    sky.elevation = since -> 50 - Math.abs(since) / 200;
    lowest = 20;
    assertThat(found(-2 * HOUR, 2 * HOUR, 0)).containsExactly("-6000 to 6000");
  }

  /** Azimuth 180 to 195 deg is the hour after noon; elevation below 45 deg from 1000 s on. */
  @Test
  void aDeadZoneCutsOnlyBelowItsElevation() {
    sky.elevation = since -> 50 - Math.abs(since) / 200;
    deadZones =
        List.of(new Dish.Sector(Angle.ofDegrees(180), Angle.ofDegrees(195), Angle.ofDegrees(45)));
    assertThat(found(-2 * HOUR, 2 * HOUR, 0)).containsExactly("-7200 to 1000", "3601 to 7200");
  }

  /** The Sun angle falls by one degree in 10 hours and is 3 deg at noon. */
  @Test
  void theSunLimitCutsThePass() {
    sky.sep = since -> 3 - since / (10 * HOUR);
    assertThat(found(-2 * HOUR, 2 * HOUR, 0)).containsExactly("-7200 to 0");
  }

  @Test
  void aSunLimitOfZeroIsNone() {
    sky.sep = since -> 0.1;
    sepLimit = 0;
    assertThat(found(-2 * HOUR, 2 * HOUR, 0)).containsExactly("-7200 to 7200");
  }

  @Test
  void whereNoRateClosesThereIsNoOpportunity() {
    RateLadder tooFast = new RateLadder.ByBudget(49.2, List.of(new DataRate(50_000_000)));
    world.craft.set(0, Variations.withRates(world.craft.get(0), tooFast));
    assertThat(found(-2 * HOUR, 2 * HOUR, 0)).isEmpty();
  }

  /**
   * Random limits on a smooth sky, against a look at every second of every pass: the pieces are the
   * maximal runs of good seconds, and nothing else.
   */
  @Seeds(count = 6)
  void piecesAreTheRunsOfGoodSeconds(SplittableRandom random) {
    TestScenario smooth = TestScenario.one();
    smooth.days = 1;
    smooth.addStation("Tallow Pan", -22.3, 21.4, 12, 20 + random.nextDouble(30));
    List<Dish.Sector> zones = new ArrayList<>();
    if (random.nextBoolean()) {
      double from = random.nextDouble(360);
      zones.add(
          new Dish.Sector(
              Angle.ofDegrees(from),
              Angle.ofDegrees((from + random.nextDouble(90)) % 360),
              Angle.ofDegrees(random.nextDouble(80))));
    }
    double low = random.nextDouble(30);
    double high = low + random.nextDouble(70);
    smooth.stations.replaceAll(station -> limited(station, low, Math.min(90, high), 3, zones));
    Scenario scenario = smooth.build();
    Geometry geometry = new SyntheticSky(scenario).geometry();

    List<Opportunity> found = Opportunities.of(scenario, geometry);

    List<Interval<GroundInstant>> expected = new ArrayList<>();
    for (Pass pass : geometry.passes()) {
      expected.addAll(runs(scenario, geometry, pass));
    }
    assertThat(found.stream().map(Opportunity::during))
        .containsExactlyInAnyOrderElementsOf(expected);
  }

  private static List<Interval<GroundInstant>> runs(
      Scenario scenario, Geometry geometry, Pass pass) {
    Dish dish = scenario.station(pass.station()).dishes().get(0);
    List<Interval<GroundInstant>> runs = new ArrayList<>();
    GroundInstant since = null;
    GroundInstant end = pass.visible().end().floorToSecond();
    GroundInstant t = pass.visible().begin().ceilToSecond();
    for (; !t.isAfter(end); t = t.plusSeconds(1L)) {
      boolean good = good(scenario, geometry, pass, dish, t);
      if (good && since == null) {
        since = t;
      }
      if (since != null && (!good || t.equals(end))) {
        GroundInstant last = good ? t : t.plusSeconds(-1L);
        GroundInstant from = since.plusSeconds((long) geometry.guardSeconds());
        GroundInstant to = last.plusSeconds(-(long) geometry.guardSeconds());
        if (from.isBefore(to) && to.since(from).compareTo(dish.minimumContact()) >= 0) {
          runs.add(Interval.of(from, to));
        }
        since = null;
      }
    }
    return runs;
  }

  private static boolean good(
      Scenario scenario, Geometry geometry, Pass pass, Dish dish, GroundInstant t) {
    Look look = geometry.sightLines().look(pass.station(), pass.craft(), t);
    double elevation = Math.toDegrees(look.elevationRadians());
    double azimuth = Math.toDegrees(look.azimuthRadians());
    boolean dead = false;
    for (Dish.Sector zone : dish.deadZones()) {
      double from = zone.from().degrees();
      double to = zone.to().degrees();
      boolean inside =
          from <= to ? from <= azimuth && azimuth <= to : azimuth >= from || azimuth <= to;
      dead |= inside && elevation < zone.upTo().degrees();
    }
    return !dead
        && elevation >= dish.lowestElevation().degrees()
        && elevation <= dish.highestElevation().degrees()
        && Link.of(scenario, scenario.craft(pass.craft()), dish)
                .highestRate(look.elevationRadians(), look.rangeMetres(), 0)
                .bitsPerSecond()
            > 0;
  }

  @Seeds(count = 8)
  void anOutageNeverAddsAnOpportunity(SplittableRandom random) {
    TestScenario smooth = TestScenario.three();
    smooth.days = 4;
    List<Blocked> blocked = new ArrayList<>();
    IntervalSet<GroundInstant> before = IntervalSet.empty();
    for (int i = 0; i < 4; i++) {
      smooth.calendars = new Calendars(blocked, List.of(), List.of(), List.of());
      Scenario scenario = smooth.build();
      IntervalSet<GroundInstant> now =
          Opportunities.covered(Opportunities.of(scenario, new SyntheticSky(scenario).geometry()));
      if (i > 0) {
        assertThat(now.minus(before).isEmpty()).isTrue();
      }
      before = now;
      GroundInstant begin =
          new GroundInstant(smooth.begin).plusSeconds((long) random.nextInt(4 * 86_400));
      String station = smooth.stations.get(random.nextInt(3)).name();
      blocked.add(
          new Blocked(
              Blocked.Why.OUTAGE,
              station,
              Optional.empty(),
              Interval.of(begin, Duration.ofMinutes(1 + random.nextInt(2_000))),
              "outage " + i));
    }
  }
}
