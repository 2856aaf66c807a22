package quietspan.model;

import java.time.Instant;
import quietspan.units.Angle;
import quietspan.units.Distance;

/** Where a craft's trajectory comes from. */
public sealed interface Orbit {

  /**
   * Heliocentric Kepler elements in the J2000 ecliptic.
   *
   * @param epochTdb epoch, read as TDB (its digits, not UTC)
   */
  record Elements(
      Instant epochTdb,
      Distance semiMajorAxis,
      double eccentricity,
      Angle inclination,
      Angle node,
      Angle argumentOfPerihelion,
      Angle meanAnomaly)
      implements Orbit {}

  /**
   * A corner of an equilateral triangle that turns once a year (Dhurandhar et al. 2005,
   * gr-qc/0410093).
   *
   * @param epochTdb instant at which {@code lead} and {@code phase} hold, read as TDB
   * @param arm length of a side
   * @param lead heliocentric ecliptic longitude of the triangle's centre minus the mean longitude
   *     of the Earth; negative when the formation trails
   * @param phase turns the triangle in its plane: node of the first craft at the epoch, from the
   *     direction of the centre
   * @param secondOrderTilt tilt 60 deg + 5 alpha / 8 instead of 60 deg
   * @param corner 0, 1 or 2
   */
  record Formation(
      Instant epochTdb, Distance arm, Angle lead, Angle phase, boolean secondOrderTilt, int corner)
      implements Orbit {}

  /**
   * A CCSDS orbit ephemeris message.
   *
   * @param file relative to the scenario folder, with forward slashes
   * @param object OBJECT_NAME or OBJECT_ID to take from the file; empty when it holds one object
   */
  record Ephemeris(String file, String object) implements Orbit {}
}
