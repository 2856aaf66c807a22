package quietspan.check;

import java.util.List;
import java.util.Optional;

/**
 * How near a plan comes to its limits. Absent where there is nothing to measure; negative where the
 * limit is passed.
 *
 * @param offPointingDegrees least distance inside the usable cone during contacts (deg)
 * @param linkDecibels least margin of a stated rate beyond the required link margin (dB)
 * @param turnRoundSeconds least time to spare between two contacts of one antenna beyond its
 *     teardown and setup, or changeover (s)
 * @param afterRepointSeconds least on-board time between the end of a repoint's settling and its
 *     craft's next contact (s)
 * @param highestFillPercent highest fill of a store (percent of its capacity)
 * @param longestLatencySeconds longest latency of each data class that has any (s)
 */
public record CheckMargins(
    Optional<Extreme> offPointingDegrees,
    Optional<Extreme> linkDecibels,
    Optional<Extreme> turnRoundSeconds,
    Optional<Extreme> afterRepointSeconds,
    Optional<Extreme> highestFillPercent,
    List<Extreme> longestLatencySeconds) {

  /**
   * The extreme of a quantity.
   *
   * @param subject id of the contact, name of the craft or of the data class
   */
  public record Extreme(double value, String subject) {}

  public CheckMargins {
    longestLatencySeconds = List.copyOf(longestLatencySeconds);
  }
}
