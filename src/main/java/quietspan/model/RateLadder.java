package quietspan.model;

import java.util.List;
import quietspan.units.Angle;
import quietspan.units.DataRate;

/** Which downlink rates a craft can send, and what decides among them. */
public sealed interface RateLadder {

  /**
   * The rates that a link budget chooses from, rising.
   *
   * @param eirpDbw effective isotropic radiated power on the beam's axis (dBW)
   */
  record ByBudget(double eirpDbw, List<DataRate> rates) implements RateLadder {
    public ByBudget {
      rates = List.copyOf(rates);
    }
  }

  /** A plain table: up to this off-pointing (with the pointing allowance added), this rate. */
  record ByOffPointing(List<Row> rows) implements RateLadder {

    /** Rows in order of rising off-pointing and falling rate. */
    public record Row(Angle upTo, DataRate rate) {}

    public ByOffPointing {
      rows = List.copyOf(rows);
    }
  }
}
