package quietspan.planning;

import quietspan.model.Aim;
import quietspan.model.Steering;
import quietspan.units.Angle;

/** Aims that an antenna can take, near a direction. */
final class Aiming {

  private Aiming() {}

  /** The aim that has the Earth as near its centre as the antenna allows at a second on board. */
  static Aim at(Tables tables, int craft, int second) {
    int sample = Math.max(0, Math.min(tables.samples - 1, second / Tables.STEP));
    return nearest(tables, craft, tables.azimuth[craft][sample], tables.elevation[craft][sample]);
  }

  /** The aim nearest to a body direction (rad) within travel and on the steps. */
  static Aim nearest(Tables tables, int craft, double azimuth, double elevation) {
    Steering steering = tables.scenario.craft().get(craft).antenna().steering();
    double az = limited(azimuth, steering);
    if (steering instanceof Steering.TwoAxes axes) {
      double el =
          Math.max(
              axes.elevationFrom().radians(), Math.min(axes.elevationTo().radians(), elevation));
      el =
          stepped(
              el,
              axes.elevationFrom().radians(),
              axes.step().radians(),
              axes.elevationTo().radians());
      return Aim.nearest(Angle.ofRadians(az), Angle.ofRadians(el));
    }
    Steering.AzimuthOnly fixed = (Steering.AzimuthOnly) steering;
    return Aim.nearest(Angle.ofRadians(az), fixed.elevation());
  }

  private static double limited(double azimuth, Steering steering) {
    double from = steering.azimuthFrom().radians();
    double width = positive(steering.azimuthTo().radians() - from);
    double into = positive(azimuth - from);
    if (width > 1e-9 && into > width) {
      // Outside the travel: the nearer end.
      into = into - width < 2 * Math.PI - into ? width : 0;
    }
    return from + stepped(into, 0, steering.step().radians(), width > 1e-9 ? width : 2 * Math.PI);
  }

  private static double stepped(double value, double from, double step, double to) {
    if (step <= 0) {
      return value;
    }
    double steps = Math.rint((value - from) / step);
    if (from + steps * step > to + 1e-12) {
      steps--;
    }
    return from + steps * step;
  }

  private static double positive(double angle) {
    return angle - 2 * Math.PI * Math.floor(angle / (2 * Math.PI));
  }
}
