package quietspan.link;

import java.util.List;
import quietspan.model.RateLadder;
import quietspan.units.DataRate;

/** A plain table of rates by off-pointing, for planners without a budget. */
final class TableLink implements Link {

  private final Beam beam;
  private final double[] upTo;
  private final long[] rates;

  TableLink(Beam beam, RateLadder.ByOffPointing table) {
    this.beam = beam;
    List<RateLadder.ByOffPointing.Row> rows = table.rows();
    this.upTo = rows.stream().mapToDouble(row -> row.upTo().radians()).toArray();
    this.rates = rows.stream().mapToLong(row -> row.rate().bitsPerSecond()).toArray();
  }

  @Override
  public double centreDbHz(double elevationRadians, double rangeMetres) {
    return elevationRadians > 0 ? Double.POSITIVE_INFINITY : Double.NEGATIVE_INFINITY;
  }

  @Override
  public long highestBitsPerSecond(double centreDbHz, double offPointingRadians) {
    if (centreDbHz == Double.NEGATIVE_INFINITY || !beam.holds(offPointingRadians)) {
      return 0;
    }
    double offAxis = beam.offAxis(offPointingRadians);
    for (int i = 0; i < rates.length; i++) {
      if (offAxis <= upTo[i]) {
        return rates[i];
      }
    }
    return 0;
  }

  @Override
  public double marginDb(
      DataRate rate, double elevationRadians, double rangeMetres, double offPointingRadians) {
    long highest =
        highestBitsPerSecond(centreDbHz(elevationRadians, rangeMetres), offPointingRadians);
    boolean allowed = highest > 0 && rate.bitsPerSecond() <= highest;
    return allowed ? 0 : Double.NEGATIVE_INFINITY;
  }
}
