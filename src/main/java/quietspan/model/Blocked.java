package quietspan.model;

import java.util.Optional;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;

/**
 * A stretch in which an antenna is not ours. Setup and teardown of our contacts stay outside it.
 *
 * @param antenna absent: every antenna of the station
 */
public record Blocked(
    Why why,
    String station,
    Optional<String> antenna,
    Interval<GroundInstant> during,
    String label) {

  /** Why the antenna is not ours. */
  public enum Why {
    OUTAGE,
    LENT
  }

  public boolean concerns(String station, String antenna) {
    return this.station.equals(station) && this.antenna.map(antenna::equals).orElse(true);
  }
}
