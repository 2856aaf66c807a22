package quietspan.planted.check;

import quietspan.planted.astro.Sky;

/** A check that leans on the solver's geometry. */
public final class SharesWithSky {
  public double angle(Sky sky) {
    return sky.angle();
  }
}
