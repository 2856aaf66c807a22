package quietspan.link;

import java.math.BigDecimal;
import quietspan.model.Craft;
import quietspan.model.Dish;
import quietspan.model.RateLadder;
import quietspan.model.Scenario;
import quietspan.units.DataRate;

/**
 * The downlink from one craft's antenna to one antenna on the ground, prepared once and then asked
 * as often as needed without allocating.
 *
 * <p>Off-pointing is the angle between the aim and the Earth as {@code model.SightLines} gives it;
 * the pointing allowance of the scenario is added here. There is no link outside the usable cone,
 * none past half power (where the pointing formula ends), and none at or below the horizon; masks
 * and elevation limits of antennas are not looked at.
 */
public sealed interface Link permits BudgetLink, TableLink {

  /** The link that the craft's rate ladder asks for. */
  static Link of(Scenario scenario, Craft craft, Dish dish) {
    RateLadder rates = craft.rates();
    if (rates instanceof RateLadder.ByOffPointing table) {
      return new TableLink(Beam.of(scenario, craft), table);
    }
    return new BudgetLink(
        Beam.of(scenario, craft),
        scenario
            .rules()
            .link()
            .orElseThrow(
                () -> new IllegalArgumentException("no link budget for craft " + craft.name())),
        (RateLadder.ByBudget) rates,
        dish);
  }

  /**
   * What is left of a stated rate after frame overhead and the usable share of contact volume, each
   * step rounded down to the bit per second.
   */
  static DataRate effectiveRate(Scenario scenario, DataRate rate) {
    double payload =
        BigDecimal.ONE
            .subtract(BigDecimal.valueOf(scenario.rules().contacts().overheadShare()))
            .doubleValue();
    return rate.share(payload).share(scenario.rules().margins().usableVolumeShare());
  }

  /**
   * Carrier power over noise density at the centre of the craft's beam (dBHz); minus infinity at or
   * below the horizon. With a plain rate table, which needs no budget, plus infinity above it. It
   * depends on place and time but not on the aim, so a planner may keep it.
   *
   * @param elevationRadians where the station sees the craft (rad)
   * @param rangeMetres how far (m)
   */
  double centreDbHz(double elevationRadians, double rangeMetres);

  /**
   * The highest rate of the ladder that closes with the scenario's link margin (bit/s); zero when
   * none does.
   *
   * @param centreDbHz as {@link #centreDbHz} gives it
   * @param offPointingRadians without the pointing allowance (rad)
   */
  long highestBitsPerSecond(double centreDbHz, double offPointingRadians);

  /**
   * By how much a rate closes beyond the required Eb/N0, the losses and the scenario's link margin
   * (dB): never below zero exactly where the rate may be used; minus infinity where there is no
   * link. A plain rate table knows no decibels: zero where it allows at least this rate, else minus
   * infinity.
   *
   * @param offPointingRadians without the pointing allowance (rad)
   */
  double marginDb(
      DataRate rate, double elevationRadians, double rangeMetres, double offPointingRadians);

  /** The highest rate of the ladder that closes; zero when none does. */
  default DataRate highestRate(
      double elevationRadians, double rangeMetres, double offPointingRadians) {
    return new DataRate(
        highestBitsPerSecond(centreDbHz(elevationRadians, rangeMetres), offPointingRadians));
  }
}
