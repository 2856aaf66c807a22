package quietspan.model;

/**
 * A direction in a craft's body frame.
 *
 * @param azimuthRadians from X towards Y (rad)
 * @param elevationRadians from the X-Y plane towards Z (rad)
 */
public record BodyDirection(double azimuthRadians, double elevationRadians) {

  /**
   * The full two-dimensional angle between two directions (rad), by the haversine formula, which
   * keeps its accuracy at small angles (Sinnott, Sky and Telescope 68:159, 1984; from memory).
   */
  public double separation(BodyDirection other) {
    double sinHalfElevation = StrictMath.sin((elevationRadians - other.elevationRadians) / 2);
    double sinHalfAzimuth = StrictMath.sin((azimuthRadians - other.azimuthRadians) / 2);
    double h =
        sinHalfElevation * sinHalfElevation
            + StrictMath.cos(elevationRadians)
                * StrictMath.cos(other.elevationRadians)
                * sinHalfAzimuth
                * sinHalfAzimuth;
    return 2 * StrictMath.asin(Math.min(1, Math.sqrt(h)));
  }
}
