package quietspan.link;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.time.Duration;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import quietspan.Seeds;
import quietspan.fixture.TestScenario;
import quietspan.fixture.Variations;
import quietspan.model.ContactRules;
import quietspan.model.Dish;
import quietspan.model.LinkBudget;
import quietspan.model.Margins;
import quietspan.model.RateLadder;
import quietspan.model.Scenario;
import quietspan.model.Station;
import quietspan.units.Angle;
import quietspan.units.DataRate;

final class LinkTest {

  private static final double ZENITH = Math.PI / 2;

  private final TestScenario world = TestScenario.one();

  private Link link() {
    Scenario scenario = world.build();
    return Link.of(scenario, scenario.craft().get(0), scenario.stations().get(0).dishes().get(0));
  }

  private void withRates(RateLadder rates) {
    world.craft.set(0, Variations.withRates(world.craft.get(0), rates));
  }

  private void withLadder(double eirpDbw, long... rates) {
    withRates(
        new RateLadder.ByBudget(eirpDbw, LongStream.of(rates).mapToObj(DataRate::new).toList()));
  }

  private void withDish(double zenithDb, Dish.GainPoint... gains) {
    Station station = world.stations.get(0);
    Dish dish = station.dishes().get(0);
    world.stations.set(
        0,
        Variations.withDish(
            station,
            station.sepLimit(),
            Variations.withSight(
                dish,
                List.of(gains),
                zenithDb,
                dish.lowestElevation(),
                dish.highestElevation(),
                dish.deadZones())));
  }

  private static Dish.GainPoint gain(double elevationDegrees, double dbPerKelvin) {
    return new Dish.GainPoint(Angle.ofDegrees(elevationDegrees), dbPerKelvin);
  }

  /**
   * NOAA, EMWIN-N link budget (web page, no date), downlink: EIRP 44.8 dBm, 1692.70 MHz, 41 127 km,
   * atmosphere 0.4 dB at 5 deg, polarisation 0.2 dB, G/T -0.3 dB/K: C/N0 53.2 dBHz, each printed to
   * 0.1. Here the atmosphere is 0.4 dB sin 5 deg at the zenith.
   */
  @Test
  void carrierOverNoiseIsThatOfAPublishedBudget() {
    withLadder(44.8 - 30, 9_600);
    withDish(0.4 * StrictMath.sin(Math.toRadians(5)), gain(5, -0.3));
    world.link = Optional.of(new LinkBudget(1692.70e6, 2.6, 3.0, 0.2, 0));

    assertThat(link().centreDbHz(Math.toRadians(5), 41_127e3)).isCloseTo(53.2, within(0.1));
  }

  /**
   * The same budget carried on: 9 600 bit/s are 39.8 dBHz, required Eb/N0 with degradations 5.6 dB,
   * so 53.2 - 39.8 - 5.6 = 7.8 dB remain (printed there 7.7 with the uplink's noise added).
   */
  @Test
  void marginIsThatOfAPublishedBudget() {
    withLadder(44.8 - 30, 9_600);
    withDish(0.4 * StrictMath.sin(Math.toRadians(5)), gain(5, -0.3));
    world.link = Optional.of(new LinkBudget(1692.70e6, 2.6, 3.0, 0.2, 0));
    world.margins = new Margins(1, 1, Angle.ZERO, Angle.ZERO);

    assertThat(link().marginDb(new DataRate(9_600), Math.toRadians(5), 41_127e3, 0))
        .isCloseTo(7.8, within(0.1));
  }

  @ParameterizedTest(name = "at {0} deg: {1} dB/K")
  @CsvSource({"5, 47", "10, 47", "20, 48", "30, 49", "60, 49.6", "90, 49.6"})
  void gainIsLinearBetweenItsPointsAndConstantOutside(double elevation, double expected) {
    GainCurve curve = GainCurve.of(List.of(gain(10, 47), gain(30, 49), gain(60, 49.6)));
    assertThat(curve.at(Math.toRadians(elevation))).isCloseTo(expected, within(1e-12));
  }

  @Test
  void pointingLossCountsTheAllowance() {
    Link link = link();
    DataRate rate = new DataRate(12_000);
    double allowed = Math.toRadians(0.1);
    double width = Math.toRadians(4.6);
    double off = Math.toRadians(1.5);

    double difference =
        link.marginDb(rate, ZENITH, 7.5e10, 0) - link.marginDb(rate, ZENITH, 7.5e10, off);

    double expected =
        12 * ((off + allowed) * (off + allowed) - allowed * allowed) / (width * width);
    assertThat(difference).isCloseTo(expected, within(1e-9));
  }

  @Test
  void noLinkBeyondTheUsableConeWhateverTheMargin() {
    withLadder(90, 12_000);
    Link link = link();
    double cone = world.build().usableHalfCone(world.craft.get(0)).radians();

    assertThat(link.highestRate(ZENITH, 7.5e10, cone)).isEqualTo(new DataRate(12_000));
    assertThat(link.highestRate(ZENITH, 7.5e10, cone + 1e-9)).isEqualTo(DataRate.ZERO);
    assertThat(link.marginDb(new DataRate(12_000), ZENITH, 7.5e10, cone + 1e-9))
        .isEqualTo(Double.NEGATIVE_INFINITY);
  }

  @Test
  void noLinkPastHalfPowerEvenInsideTheCone() {
    world.craft.clear();
    world.states.clear();
    world.addCraft("Hask", 3.0, 4.0, 90, Duration.ofMinutes(20), Duration.ofHours(4));
    Link link = link();

    assertThat(link.highestRate(ZENITH, 7.5e10, Math.toRadians(1.899)).bitsPerSecond())
        .isPositive();
    assertThat(link.highestRate(ZENITH, 7.5e10, Math.toRadians(1.901))).isEqualTo(DataRate.ZERO);
  }

  @Test
  void noLinkAtOrBelowTheHorizon() {
    Link link = link();
    assertThat(link.highestRate(0, 7.5e10, 0)).isEqualTo(DataRate.ZERO);
    assertThat(link.highestRate(-0.1, 7.5e10, 0)).isEqualTo(DataRate.ZERO);
    assertThat(link.marginDb(new DataRate(12_000), 0, 7.5e10, 0))
        .isEqualTo(Double.NEGATIVE_INFINITY);
  }

  @Seeds(count = 5)
  void theHighestRateClosesAndTheNextDoesNot(SplittableRandom random) {
    Scenario scenario = world.build();
    Link link = link();
    List<DataRate> ladder = ((RateLadder.ByBudget) scenario.craft().get(0).rates()).rates();
    for (int i = 0; i < 2_000; i++) {
      double elevation = random.nextDouble(0.1, ZENITH);
      double range = random.nextDouble(2e10, 3e11);
      double off = random.nextDouble(0, Math.toRadians(2.1));

      DataRate highest = link.highestRate(elevation, range, off);

      for (DataRate rate : ladder) {
        assertThat(link.marginDb(rate, elevation, range, off) >= 0)
            .as("%s of %s", rate, highest)
            .isEqualTo(rate.compareTo(highest) <= 0);
      }
    }
  }

  @ParameterizedTest(name = "off {0} deg: {1} bit/s")
  @CsvSource({"0, 90000", "0.899, 90000", "0.901, 40000", "1.899, 40000", "1.901, 0"})
  void plainTableCountsTheAllowance(double offDegrees, long expected) {
    withRates(table());
    assertThat(link().highestRate(ZENITH, 1, Math.toRadians(offDegrees)))
        .isEqualTo(new DataRate(expected));
  }

  @Test
  void plainTableKnowsOnlyAllowedAndNotAllowed() {
    withRates(table());
    Link link = link();
    double off = Math.toRadians(1);
    assertThat(link.marginDb(new DataRate(40_000), ZENITH, 1, off)).isZero();
    assertThat(link.marginDb(new DataRate(90_000), ZENITH, 1, off))
        .isEqualTo(Double.NEGATIVE_INFINITY);
    assertThat(link.marginDb(new DataRate(40_000), -0.1, 1, off))
        .isEqualTo(Double.NEGATIVE_INFINITY);
  }

  private static RateLadder table() {
    return new RateLadder.ByOffPointing(
        List.of(
            new RateLadder.ByOffPointing.Row(Angle.ofDegrees(1), new DataRate(90_000)),
            new RateLadder.ByOffPointing.Row(Angle.ofDegrees(2), new DataRate(40_000))));
  }

  /** 0.9 as 1 - 0.1, and 0.3 as 1 - 0.7, which binary fractions would miss by one bit. */
  @ParameterizedTest(name = "{0} bit/s, overhead {1}, usable {2}: {3} bit/s")
  @CsvSource({"1000, 0.1, 0.9, 810", "10, 0.7, 1, 3", "12001, 0.1, 0.9, 9720", "7, 0, 1, 7"})
  void effectiveRateRoundsDownTwice(long rate, double overhead, double usable, long expected) {
    var rules = world.contacts;
    world.contacts =
        new ContactRules(
            rules.lockUp(),
            rules.rateSteps(),
            rules.relock(),
            rules.contactsAtOnce(),
            rules.craftSwitch(),
            overhead);
    world.margins = new Margins(usable, 0.8, Angle.ZERO, Angle.ZERO);

    assertThat(Link.effectiveRate(world.build(), new DataRate(rate)))
        .isEqualTo(new DataRate(expected));
  }

  @Test
  void aLadderWithoutABudgetIsRefused() {
    world.link = Optional.empty();
    assertThatThrownBy(this::link)
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("Hask");
  }
}
