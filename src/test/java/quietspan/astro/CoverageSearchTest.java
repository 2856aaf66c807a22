package quietspan.astro;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import quietspan.Seeds;
import quietspan.astro.CoverageSearch.Coverage;
import quietspan.fixture.SyntheticSky;
import quietspan.fixture.TestScenario;
import quietspan.model.Aim;
import quietspan.model.Craft;
import quietspan.model.HighGainAntenna;
import quietspan.model.Orbit;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Steering;
import quietspan.time.GroundInstant;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;
import quietspan.units.Distance;

final class CoverageSearchTest {

  private static Craft with(Craft old, Orbit orbit, Steering steering, double halfConeDegrees) {
    HighGainAntenna antenna = old.antenna();
    return new Craft(
        old.name(),
        orbit,
        old.attitude(),
        new HighGainAntenna(
            steering,
            Angle.ofDegrees(halfConeDegrees),
            antenna.halfPowerWidth(),
            antenna.move(),
            antenna.settle(),
            antenna.repointSpacing()),
        old.rates(),
        old.store(),
        old.crossLink(),
        old.generation());
  }

  private static Steering twoAxes(double step) {
    return new Steering.TwoAxes(
        Angle.ZERO, Angle.ZERO, Angle.ofDegrees(-30), Angle.ofDegrees(60), Angle.ofDegrees(step));
  }

  /**
   * Longest coverage from the epoch with a usable half-cone of 2.5 deg, computed outside the
   * project with ERFA and numpy for free aims: 5.1093 and 5.2099 days. Ours lie on a grid of 0.01
   * deg, which costs at most one step of it: at 0.96 deg a day, 0.0104 days. Light time and the 69
   * s between TDB and UTC change the drift by less than 1e-4 of itself.
   */
  @ParameterizedTest
  @CsvSource({"0, 5.1093", "1, 5.2099"})
  void coverageIsThatOfAnIndependentComputation(int index, double days) {
    TestScenario test = TestScenario.three();
    test.begin = Instant.parse("2035-07-07T00:00:00Z");
    test.days = 10;
    double[] node = {270, 30, 150};
    double[] anomaly = {80.30945667251, 320.30945667252, 200.30945667252};
    for (int c = 0; c < 3; c++) {
      Orbit orbit =
          new Orbit.Elements(
              Instant.parse("2035-07-07T00:00:00Z"),
              Distance.ofMetres(Constants.AU),
              0.0031017332125742,
              Angle.ofDegrees(0.30545292182084),
              Angle.ofDegrees(node[c]),
              Angle.ofDegrees(270),
              Angle.ofDegrees(anomaly[c]));
      test.craft.set(c, with(test.craft.get(c), orbit, twoAxes(0), 2.61));
    }
    Scenario scenario = test.build();
    assertThat(scenario.usableHalfCone(scenario.craft().get(index)).degrees())
        .isCloseTo(2.5, within(1e-9));
    SightLines sky =
        GeometryFactory.geometry(scenario, Path.of("."), Optional.empty()).sightLines();
    Coverage coverage =
        CoverageSearch.longest(
                scenario, sky, scenario.craft().get(index), scenario.period().begin())
            .orElseThrow();
    assertThat(coverage.during().seconds() / 86_400).isBetween(days - 0.0104, days + 0.0005);
  }

  /** Every aim of the grid, every minute, against the search; coarse steps keep it short. */
  @Seeds(count = 12)
  void coverageIsThatOfAScanOfAllAims(Random random) {
    TestScenario test = TestScenario.three();
    double step = 0.2 + random.nextInt(4) * 0.1;
    boolean oneAxis = random.nextBoolean();
    Steering steering =
        oneAxis
            ? new Steering.AzimuthOnly(
                Angle.ofDegrees(30 + random.nextInt(12)),
                Angle.ofDegrees(44 + random.nextInt(20)),
                Angle.ofDegrees(7 + random.nextInt(3)),
                Angle.ofDegrees(step))
            : new Steering.TwoAxes(
                Angle.ofDegrees(30 + random.nextInt(12)),
                Angle.ofDegrees(44 + random.nextInt(20)),
                Angle.ofDegrees(random.nextInt(9)),
                Angle.ofDegrees(10 + random.nextInt(4)),
                Angle.ofDegrees(step));
    Craft craft =
        with(test.craft.get(0), test.craft.get(0).orbit(), steering, 1.2 + random.nextDouble());
    test.craft.set(0, craft);
    Scenario scenario = test.build();
    SightLines sky = new SyntheticSky(scenario);
    OnboardInstant from = scenario.period().begin().plusSeconds((long) random.nextInt(300_000));
    Optional<Coverage> found = CoverageSearch.longest(scenario, sky, craft, from);
    double scanned = scan(scenario, sky, craft, from, steering, step);
    if (scanned < 0) {
      assertThat(found).isEmpty();
    } else {
      // The scan's minute, and half a second of the search.
      assertThat(found.orElseThrow().during().seconds()).isCloseTo(scanned, within(61.0));
    }
  }

  /** Seconds until the last aim loses the Earth, to the minute; negative when none has it. */
  private static double scan(
      Scenario scenario,
      SightLines sky,
      Craft craft,
      OnboardInstant from,
      Steering steering,
      double step) {
    double cone = scenario.usableHalfCone(craft).radians();
    double lowest;
    double highest;
    if (steering instanceof Steering.TwoAxes axes) {
      lowest = axes.elevationFrom().degrees();
      highest = axes.elevationTo().degrees();
    } else {
      lowest = ((Steering.AzimuthOnly) steering).elevation().degrees();
      highest = lowest;
    }
    GroundInstant start = sky.ground(craft.name(), from);
    double best = -1;
    double west = steering.azimuthFrom().degrees();
    for (int i = 0; west + i * step <= steering.azimuthTo().degrees() + 1e-9; i++) {
      for (int j = 0; lowest + j * step <= highest + 1e-9; j++) {
        Aim aim = Aim.nearest(Angle.ofDegrees(west + i * step), Angle.ofDegrees(lowest + j * step));
        double seconds = -60;
        while (aim.direction().separation(sky.earth(craft.name(), start.plusSeconds(seconds + 60)))
            <= cone) {
          seconds += 60;
        }
        best = Math.max(best, seconds);
      }
    }
    return best;
  }

  @Test
  void anEarthOutOfReachHasNoCoverage() {
    TestScenario test = TestScenario.three();
    Steering high =
        new Steering.AzimuthOnly(Angle.ZERO, Angle.ZERO, Angle.ofDegrees(30), Angle.ZERO);
    test.craft.set(0, with(test.craft.get(0), test.craft.get(0).orbit(), high, 2.1));
    Scenario scenario = test.build();
    assertThat(
            CoverageSearch.longest(
                scenario,
                new SyntheticSky(scenario),
                scenario.craft().get(0),
                scenario.period().begin()))
        .isEmpty();
  }

  @Test
  void whatIsNotKnownHasNoCoverage() {
    Scenario scenario = TestScenario.three().build();
    assertThat(
            CoverageSearch.longest(
                scenario,
                new SyntheticSky(scenario),
                scenario.craft().get(0),
                scenario.period().end().plus(Duration.ofDays(90))))
        .isEmpty();
  }
}
