package quietspan.model;

import java.time.Duration;
import java.util.List;
import quietspan.units.Angle;

/**
 * One antenna of a station.
 *
 * @param gOverT figure of merit by elevation (dB/K), rising in elevation, linear between, constant
 *     outside; one row for a constant
 * @param zenithAttenuationDb atmosphere at the zenith (dB), growing as 1 / sin(elevation)
 * @param lowestElevation mechanical lower limit; contacts only above it
 * @param highestElevation keyhole: contacts only below it
 * @param deadZones azimuth sectors in which nothing is received
 * @param setup before the contact, the antenna busy
 * @param teardown after the contact, the antenna busy
 * @param changeover least time between two of our contacts with different craft on this antenna, in
 *     place of teardown and setup; equal to their sum where no shorter one is given
 * @param minimumContact shortest contact
 * @param maximumContact longest contact
 * @param costPerHour station cost units per hour of contact
 * @param costPerContact station cost units per contact
 */
public record Dish(
    String name,
    List<GainPoint> gOverT,
    double zenithAttenuationDb,
    Angle lowestElevation,
    Angle highestElevation,
    List<Sector> deadZones,
    Duration setup,
    Duration teardown,
    Duration changeover,
    Duration minimumContact,
    Duration maximumContact,
    double costPerHour,
    double costPerContact) {

  /** G/T at an elevation. */
  public record GainPoint(Angle elevation, double dbPerKelvin) {}

  /** Azimuth sector from {@code from} eastwards to {@code to}, below {@code upTo} elevation. */
  public record Sector(Angle from, Angle to, Angle upTo) {}

  public Dish {
    gOverT = List.copyOf(gOverT);
    deadZones = List.copyOf(deadZones);
  }
}
