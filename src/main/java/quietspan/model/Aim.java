package quietspan.model;

import quietspan.units.Angle;

/**
 * A held body direction of an antenna, in hundredths of a degree: the grid on which aims are
 * decided.
 *
 * @param azimuthCentidegrees from body X towards body Y, 0 to 35 999
 * @param elevationCentidegrees from the body X-Y plane towards body Z, -9 000 to 9 000
 */
public record Aim(int azimuthCentidegrees, int elevationCentidegrees) {

  public Aim {
    if (azimuthCentidegrees < 0 || azimuthCentidegrees >= 36_000) {
      throw new IllegalArgumentException("azimuth is 0 to 359.99 deg: " + azimuthCentidegrees);
    }
    if (elevationCentidegrees < -9_000 || elevationCentidegrees > 9_000) {
      throw new IllegalArgumentException("elevation is -90 to 90 deg: " + elevationCentidegrees);
    }
  }

  /** The nearest aim on the grid; any azimuth is brought into [0, 360) deg. */
  public static Aim nearest(Angle azimuth, Angle elevation) {
    return new Aim(
        (int) Math.floorMod(Math.round(azimuth.degrees() * 100), 36_000L),
        (int) Math.max(-9_000, Math.min(9_000, Math.round(elevation.degrees() * 100))));
  }

  public BodyDirection direction() {
    return new BodyDirection(
        Math.toRadians(azimuthCentidegrees / 100.0), Math.toRadians(elevationCentidegrees / 100.0));
  }
}
