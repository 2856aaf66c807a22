package quietspan.model;

import java.time.Duration;
import quietspan.units.Angle;

/**
 * The antenna that is held at one aim between repoints.
 *
 * @param ratedHalfCone off-pointing up to which the antenna is rated, as given
 * @param halfPowerWidth full width between the half-power points (theta_3dB)
 * @param move time of the move itself, on board
 * @param settle time after the move until the instrument is quiet, on board
 * @param repointSpacing least time between the starts of two repoints of this craft; zero for none
 */
public record HighGainAntenna(
    Steering steering,
    Angle ratedHalfCone,
    Angle halfPowerWidth,
    Duration move,
    Duration settle,
    Duration repointSpacing) {

  /** Move and settling together. */
  public Duration repointLength() {
    return move.plus(settle);
  }
}
