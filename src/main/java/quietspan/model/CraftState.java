package quietspan.model;

import java.util.List;
import java.util.Optional;
import quietspan.time.GroundInstant;
import quietspan.time.OnboardInstant;
import quietspan.units.DataVolume;

/**
 * A craft at the start of the period.
 *
 * @param aim where its antenna is held
 * @param fill what its store holds, one entry per data class that is there
 * @param lastContactEnd end of its last contact before the period; absent: the start of the period
 *     plus light time
 * @param lastRepoint start of its last repoint; absent: long ago
 */
public record CraftState(
    String craft,
    Aim aim,
    List<Fill> fill,
    Optional<GroundInstant> lastContactEnd,
    Optional<OnboardInstant> lastRepoint) {

  /**
   * Data aboard at the start.
   *
   * @param oldest generation instant of the oldest bit, ages linear to the start of the period;
   *     absent: all made at the start
   */
  public record Fill(String dataClass, DataVolume volume, Optional<OnboardInstant> oldest) {}

  public CraftState {
    fill = List.copyOf(fill);
  }
}
