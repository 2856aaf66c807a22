package quietspan.check;

import quietspan.link.Link;
import quietspan.model.Craft;
import quietspan.model.Dish;
import quietspan.model.Look;
import quietspan.model.RateLadder;
import quietspan.model.Scenario;
import quietspan.units.DataRate;

/** By how much a stated rate closes between one craft and one antenna on the ground. */
final class LinkMargin {

  /** Stands for "no link at all" where a finite amount is needed (dB). */
  static final double NO_LINK_DB = -99;

  private final Link link;
  private final RateLadder rates;
  private final double allowanceRadians;

  LinkMargin(Scenario scenario, Craft craft, Dish dish) {
    this.link = Link.of(scenario, craft, dish);
    this.rates = craft.rates();
    this.allowanceRadians = scenario.rules().margins().pointingAllowance().radians();
  }

  /**
   * What remains above the required link margin (dB); negative: the rate does not close. A plain
   * table of rates is turned into decibels of rate.
   *
   * @param offPointingRadians without the pointing allowance (rad)
   */
  double spareDb(DataRate rate, Look look, double offPointingRadians) {
    if (rates instanceof RateLadder.ByOffPointing table) {
      return decibelsOfRate(table, rate, offPointingRadians + allowanceRadians);
    }
    double spare =
        link.marginDb(rate, look.elevationRadians(), look.rangeMetres(), offPointingRadians);
    return Math.max(NO_LINK_DB, spare);
  }

  private static double decibelsOfRate(
      RateLadder.ByOffPointing table, DataRate rate, double offAxisRadians) {
    for (RateLadder.ByOffPointing.Row row : table.rows()) {
      if (offAxisRadians <= row.upTo().radians()) {
        double ratio = (double) row.rate().bitsPerSecond() / rate.bitsPerSecond();
        return Math.max(NO_LINK_DB, 10 * StrictMath.log10(ratio));
      }
    }
    return NO_LINK_DB;
  }
}
