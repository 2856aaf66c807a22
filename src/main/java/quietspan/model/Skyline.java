package quietspan.model;

import java.util.List;

/** A station's mask as a function of azimuth: linear between its points, round the whole circle. */
public final class Skyline {

  private Skyline() {}

  /** Elevation of the mask at an azimuth from north over east, 0 to 2 pi (rad). */
  public static double elevation(Station station, double azimuthRadians) {
    List<Station.MaskPoint> mask = station.mask();
    if (mask.size() == 1) {
      return mask.get(0).elevation().radians();
    }
    Station.MaskPoint last = mask.get(mask.size() - 1);
    double fromAzimuth = last.azimuth().radians() - 2 * Math.PI;
    double from = last.elevation().radians();
    for (Station.MaskPoint point : mask) {
      if (azimuthRadians <= point.azimuth().radians()) {
        double width = point.azimuth().radians() - fromAzimuth;
        double part = width <= 0 ? 1 : (azimuthRadians - fromAzimuth) / width;
        return from + part * (point.elevation().radians() - from);
      }
      fromAzimuth = point.azimuth().radians();
      from = point.elevation().radians();
    }
    Station.MaskPoint first = mask.get(0);
    double width = first.azimuth().radians() + 2 * Math.PI - fromAzimuth;
    double part = width <= 0 ? 0 : (azimuthRadians - fromAzimuth) / width;
    return from + part * (first.elevation().radians() - from);
  }
}
