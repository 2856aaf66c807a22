package quietspan.astro;

/**
 * A trajectory as a table: positions and velocities at equal steps, cubic Hermite between them.
 * With the steps used here (six hours at 1 au) the interpolation adds less than a metre.
 * Sun-centred ICRF axes (m); time is TT seconds since J2000.0.
 */
final class Track {

  /** Position and velocity at a time. */
  interface Source {
    double[] state(double tt);
  }

  private final double begin;
  private final double step;
  private final double[][] states;

  private Track(double begin, double step, double[][] states) {
    this.begin = begin;
    this.step = step;
    this.states = states;
  }

  /** Samples a source so that [begin, end] can be asked. */
  static Track sample(Source source, double begin, double end, double step) {
    int count = (int) Math.ceil((end - begin) / step) + 1;
    double exact = (end - begin) / (count - 1);
    double[][] states = new double[count][];
    for (int i = 0; i < count; i++) {
      states[i] = source.state(i == count - 1 ? end : begin + i * exact);
    }
    return new Track(begin, exact, states);
  }

  double begin() {
    return begin;
  }

  double end() {
    return begin + step * (states.length - 1);
  }

  /** Position (m) into the first three places of {@code out}. */
  void position(double tt, double[] out) {
    double x = (tt - begin) / step;
    int i = (int) Math.floor(x);
    if (i < 0 || i >= states.length - 1) {
      if (x < -1e-6 || x > states.length - 1 + 1e-6) {
        throw new IllegalArgumentException(
            "outside the trajectory: " + tt + " is not in [" + begin + ", " + end() + "]");
      }
      i = i < 0 ? 0 : states.length - 2;
    }
    double s = x - i;
    double s2 = s * s;
    double s3 = s2 * s;
    double h00 = 2 * s3 - 3 * s2 + 1;
    double h10 = (s3 - 2 * s2 + s) * step;
    double h01 = 3 * s2 - 2 * s3;
    double h11 = (s3 - s2) * step;
    double[] a = states[i];
    double[] b = states[i + 1];
    for (int k = 0; k < 3; k++) {
      out[k] = h00 * a[k] + h10 * a[k + 3] + h01 * b[k] + h11 * b[k + 3];
    }
  }
}
