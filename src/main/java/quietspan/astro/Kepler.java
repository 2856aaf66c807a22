package quietspan.astro;

import org.hipparchus.util.FastMath;
import quietspan.model.Orbit;

/**
 * Heliocentric two-body motion. Without planets a one-au orbit drifts by some 7 000 km in 13 weeks
 * against a full propagation: good enough for early planning.
 */
final class Kepler implements Track.Source {

  private final double epochTdb;
  private final double a;
  private final double e;
  private final double meanAnomaly;
  private final double meanMotion;
  private final double[] p = new double[3];
  private final double[] q = new double[3];
  private final TimeScales scales;

  Kepler(Orbit.Elements elements, TimeScales scales) {
    this.scales = scales;
    this.epochTdb = TimeScales.sinceJ2000(elements.epochTdb());
    this.a = elements.semiMajorAxis().metres();
    this.e = elements.eccentricity();
    this.meanAnomaly = elements.meanAnomaly().radians();
    this.meanMotion = FastMath.sqrt(Constants.GM_SUN / a) / a;
    double node = elements.node().radians();
    double incl = elements.inclination().radians();
    double peri = elements.argumentOfPerihelion().radians();
    double cn = FastMath.cos(node);
    double sn = FastMath.sin(node);
    double ci = FastMath.cos(incl);
    double si = FastMath.sin(incl);
    double cp = FastMath.cos(peri);
    double sp = FastMath.sin(peri);
    double[] along = {cn * cp - sn * sp * ci, sn * cp + cn * sp * ci, sp * si};
    double[] ahead = {-cn * sp - sn * cp * ci, -sn * sp + cn * cp * ci, cp * si};
    for (int i = 0; i < 3; i++) {
      for (int k = 0; k < 3; k++) {
        p[i] += Constants.ECLIPTIC_TO_ICRF[i][k] * along[k];
        q[i] += Constants.ECLIPTIC_TO_ICRF[i][k] * ahead[k];
      }
    }
  }

  @Override
  public double[] state(double tt) {
    double m = meanAnomaly + meanMotion * (scales.tdb(tt) - epochTdb);
    m -= 2 * FastMath.PI * FastMath.rint(m / (2 * FastMath.PI));
    double anomaly = e < 0.8 ? m : FastMath.PI * FastMath.signum(m);
    for (int i = 0; i < 50; i++) {
      double step = (anomaly - e * FastMath.sin(anomaly) - m) / (1 - e * FastMath.cos(anomaly));
      anomaly -= step;
      if (FastMath.abs(step) < 1e-15) {
        break;
      }
    }
    double cos = FastMath.cos(anomaly);
    double sin = FastMath.sin(anomaly);
    double root = FastMath.sqrt(1 - e * e);
    double rate = meanMotion / (1 - e * cos);
    double[] state = new double[6];
    for (int i = 0; i < 3; i++) {
      state[i] = a * ((cos - e) * p[i] + root * sin * q[i]);
      state[i + 3] = a * rate * (-sin * p[i] + root * cos * q[i]);
    }
    return state;
  }
}
