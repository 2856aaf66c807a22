package quietspan.astro;

import org.hipparchus.geometry.euclidean.threed.Rotation;
import org.hipparchus.util.FastMath;
import org.hipparchus.util.SinCos;
import org.orekit.frames.Frame;
import org.orekit.frames.FramesFactory;
import org.orekit.time.AbsoluteDate;
import org.orekit.utils.IERSConventions;

/**
 * GCRF to ITRF, fast: Orekit's rotation with the Earth rotation angle taken out is sampled every
 * twelve hours and interpolated linearly, then the angle is put back. What bends most meanwhile is
 * the fortnightly nutation, by 7e-9 rad; agrees with Orekit to 1e-8 rad.
 */
final class EarthRotation {

  private static final double STEP = 12 * 3600;

  private final double begin;
  private final double[][] slow;
  private final double utMinusTt;

  EarthRotation(OrekitData data, TimeScales scales, double begin, double end) {
    this.begin = begin;
    this.utMinusTt = -scales.ttMinusUtc();
    Frame gcrf = data.context().getFrames().getGCRF();
    Frame itrf = data.context().getFrames().getITRF(IERSConventions.IERS_2010, true);
    AbsoluteDate j2000 = data.j2000();
    int count = (int) FastMath.ceil((end - begin) / STEP) + 2;
    slow = new double[count][];
    for (int i = 0; i < count; i++) {
      double tt = begin + i * STEP;
      // Orekit's own interpolation would compute eight samples for each of ours.
      Rotation rotation =
          FramesFactory.getNonInterpolatingTransform(gcrf, itrf, j2000.shiftedBy(tt)).getRotation();
      double[][] m = rotation.getMatrix();
      SinCos angle = FastMath.sinCos(angle(tt));
      double[] s = new double[9];
      for (int k = 0; k < 3; k++) {
        s[k] = angle.cos() * m[0][k] - angle.sin() * m[1][k];
        s[3 + k] = angle.sin() * m[0][k] + angle.cos() * m[1][k];
        s[6 + k] = m[2][k];
      }
      slow[i] = s;
    }
  }

  /** Earth rotation angle for UT1 = UTC (rad): IERS Conventions (2010), eq. 5.15. */
  private double angle(double tt) {
    double days = (tt + utMinusTt) / 86_400;
    double turns = 0.7790572732640 + 0.00273781191135448 * days + (days - FastMath.floor(days));
    return 2 * FastMath.PI * (turns - FastMath.floor(turns));
  }

  /** Rotation matrix from GCRF to ITRF axes, by rows, into {@code out}. */
  void matrix(double tt, double[] out) {
    double x = (tt - begin) / STEP;
    int i = (int) FastMath.floor(x);
    if (i < 0 || i > slow.length - 2) {
      throw new IllegalArgumentException("outside the Earth rotation table: " + tt);
    }
    double part = x - i;
    SinCos angle = FastMath.sinCos(angle(tt));
    double[] a = slow[i];
    double[] b = slow[i + 1];
    for (int k = 0; k < 3; k++) {
      double first = a[k] + part * (b[k] - a[k]);
      double second = a[3 + k] + part * (b[3 + k] - a[3 + k]);
      out[k] = angle.cos() * first + angle.sin() * second;
      out[3 + k] = -angle.sin() * first + angle.cos() * second;
      out[6 + k] = a[6 + k] + part * (b[6 + k] - a[6 + k]);
    }
  }
}
