package quietspan.model;

import java.time.Duration;
import java.util.List;
import java.util.Optional;
import quietspan.units.Angle;
import quietspan.units.Distance;

/**
 * A ground station.
 *
 * @param latitude geodetic, WGS84
 * @param longitude east positive
 * @param altitude above the ellipsoid
 * @param mask skyline: elevation by azimuth, azimuths rising from 0 to 360 deg, linear between; one
 *     point for a constant mask
 * @param sepLimit least Sun-Earth-probe angle for a contact; zero for none
 * @param deliveryDelay from reception to delivery
 * @param zone local time zone for display, an IANA name; {@code UTC} when none is given
 * @param dishes its antennas, at least one
 */
public record Station(
    String name,
    Angle latitude,
    Angle longitude,
    Distance altitude,
    List<MaskPoint> mask,
    Angle sepLimit,
    Duration deliveryDelay,
    String zone,
    List<Dish> dishes) {

  /** A corner of the skyline. */
  public record MaskPoint(Angle azimuth, Angle elevation) {}

  public Station {
    mask = List.copyOf(mask);
    dishes = List.copyOf(dishes);
  }

  public Optional<Dish> dish(String antenna) {
    return dishes.stream().filter(dish -> dish.name().equals(antenna)).findFirst();
  }
}
