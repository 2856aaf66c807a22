package quietspan.check;

import java.util.List;
import quietspan.model.Dish;
import quietspan.model.Look;
import quietspan.model.Station;

/** How far a look is from what hides or forbids it (rad); negative: hidden or forbidden. */
final class Horizon {

  private static final double TURN = 2 * Math.PI;

  private Horizon() {}

  static double aboveMask(Station station, Look look) {
    return look.elevationRadians() - skyline(station.mask(), look.azimuthRadians());
  }

  /** Linear between the corners, across north too. */
  private static double skyline(List<Station.MaskPoint> corners, double azimuth) {
    Station.MaskPoint left = corners.get(corners.size() - 1);
    Station.MaskPoint right = corners.get(0);
    double leftAzimuth = left.azimuth().radians() - TURN;
    double rightAzimuth = right.azimuth().radians() + TURN;
    for (Station.MaskPoint corner : corners) {
      if (corner.azimuth().radians() <= azimuth) {
        left = corner;
        leftAzimuth = corner.azimuth().radians();
      } else {
        right = corner;
        rightAzimuth = corner.azimuth().radians();
        break;
      }
    }
    double width = rightAzimuth - leftAzimuth;
    double part = width > 0 ? (azimuth - leftAzimuth) / width : 0;
    double rise = right.elevation().radians() - left.elevation().radians();
    return left.elevation().radians() + part * rise;
  }

  static double insideLimits(Dish dish, Look look) {
    double elevation = look.elevationRadians();
    double least =
        Math.min(
            elevation - dish.lowestElevation().radians(),
            dish.highestElevation().radians() - elevation);
    for (Dish.Sector zone : dish.deadZones()) {
      least = Math.min(least, outside(zone, look));
    }
    return least;
  }

  private static double outside(Dish.Sector zone, Look look) {
    double width = zone.to().radians() - zone.from().radians();
    if (width < 0) {
      width += TURN;
    }
    double above = look.elevationRadians() - zone.upTo().radians();
    if (width >= TURN) {
      return above;
    }
    double fromLeft = eastwards(zone.from().radians(), look.azimuthRadians());
    double beside =
        fromLeft <= width
            ? -Math.min(fromLeft, width - fromLeft)
            : Math.min(fromLeft - width, TURN - fromLeft);
    return Math.max(above, beside);
  }

  private static double eastwards(double from, double to) {
    double turn = to - from;
    return turn - TURN * Math.floor(turn / TURN);
  }
}
