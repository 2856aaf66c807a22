package quietspan.link;

import quietspan.model.Dish;
import quietspan.model.LinkBudget;
import quietspan.model.RateLadder;
import quietspan.units.DataRate;

/** A ladder of rates from which a link budget chooses. */
final class BudgetLink implements Link {

  private final Beam beam;
  private final LinkBudget budget;
  private final GainCurve gOverT;
  private final double zenithDb;
  private final double fixedDb;
  private final long[] rates;
  private final double[] neededDbHz;

  BudgetLink(Beam beam, LinkBudget budget, RateLadder.ByBudget ladder, Dish dish) {
    this.beam = beam;
    this.budget = budget;
    this.gOverT = GainCurve.of(dish.gOverT());
    this.zenithDb = dish.zenithAttenuationDb();
    this.fixedDb = ladder.eirpDbw() - budget.otherLossesDb() - Losses.boltzmannDb();
    this.rates = ladder.rates().stream().mapToLong(DataRate::bitsPerSecond).toArray();
    this.neededDbHz = new double[rates.length];
    for (int i = 0; i < rates.length; i++) {
      neededDbHz[i] = neededDbHz(rates[i]);
    }
  }

  /** C/N0 that a rate needs, with losses of the receiver and the margin that must remain. */
  private double neededDbHz(long bitsPerSecond) {
    return Losses.decibels((double) bitsPerSecond)
        + budget.requiredEbN0Db()
        + budget.implementationLossDb()
        + budget.marginDb();
  }

  @Override
  public double centreDbHz(double elevationRadians, double rangeMetres) {
    if (elevationRadians <= 0) {
      return Double.NEGATIVE_INFINITY;
    }
    return fixedDb
        + gOverT.at(elevationRadians)
        - Losses.freeSpaceDb(rangeMetres, budget.frequencyHz())
        - Losses.atmosphereDb(zenithDb, elevationRadians);
  }

  /** C/N0 off the axis. */
  private double receivedDbHz(double centreDbHz, double offPointing) {
    double offAxis = beam.offAxis(offPointing);
    if (!beam.holds(offPointing) || 2 * offAxis > beam.halfPowerWidth()) {
      return Double.NEGATIVE_INFINITY;
    }
    return centreDbHz - Losses.pointingDb(offAxis, beam.halfPowerWidth());
  }

  @Override
  public long highestBitsPerSecond(double centreDbHz, double offPointingRadians) {
    double received = receivedDbHz(centreDbHz, offPointingRadians);
    for (int i = rates.length - 1; i >= 0; i--) {
      if (received >= neededDbHz[i]) {
        return rates[i];
      }
    }
    return 0;
  }

  @Override
  public double marginDb(
      DataRate rate, double elevationRadians, double rangeMetres, double offPointingRadians) {
    double received = receivedDbHz(centreDbHz(elevationRadians, rangeMetres), offPointingRadians);
    return received - neededDbHz(rate.bitsPerSecond());
  }
}
