package quietspan.link;

import java.util.List;
import quietspan.model.Dish;

/** G/T by elevation: linear between points, constant outside them. */
final class GainCurve {

  private final double[] elevations;
  private final double[] gains;

  private GainCurve(double[] elevations, double[] gains) {
    this.elevations = elevations;
    this.gains = gains;
  }

  static GainCurve of(List<Dish.GainPoint> points) {
    return new GainCurve(
        points.stream().mapToDouble(point -> point.elevation().radians()).toArray(),
        points.stream().mapToDouble(Dish.GainPoint::dbPerKelvin).toArray());
  }

  /** G/T (dB/K) at an elevation (rad). */
  double at(double elevation) {
    int next = 0;
    while (next < elevations.length && elevations[next] <= elevation) {
      next++;
    }
    if (next == 0) {
      return gains[0];
    }
    if (next == elevations.length) {
      return gains[next - 1];
    }
    double part = (elevation - elevations[next - 1]) / (elevations[next] - elevations[next - 1]);
    return gains[next - 1] + part * (gains[next] - gains[next - 1]);
  }
}
