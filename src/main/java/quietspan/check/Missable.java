package quietspan.check;

import java.util.List;
import java.util.Locale;

/**
 * The largest breach that sampling can miss: one that begins and ends between two neighbouring
 * samples. Its depth is at most half of the largest change seen between neighbouring samples.
 *
 * @param seconds longest time between two samples (s)
 * @param offPointingDegrees of the usable cone (deg)
 * @param elevationDegrees of mask, elevation limits and dead zones (deg)
 * @param sepDegrees of the Sun-Earth-probe angle (deg)
 * @param linkDecibels of the link margin (dB)
 */
public record Missable(
    double seconds,
    double offPointingDegrees,
    double elevationDegrees,
    double sepDegrees,
    double linkDecibels) {

  static Missable of(List<Watch> watches) {
    double cone = 0;
    double elevation = 0;
    double sep = 0;
    double link = 0;
    for (Watch watch : watches) {
      cone = Math.max(cone, watch.insideCone().largestStep());
      elevation = Math.max(elevation, watch.aboveMask().largestStep());
      elevation = Math.max(elevation, watch.insideLimits().largestStep());
      sep = Math.max(sep, watch.sep().largestStep());
      link = Math.max(link, watch.link().largestStep());
    }
    return new Missable(
        Sweep.STEP_SECONDS,
        Math.toDegrees(cone) / 2,
        Math.toDegrees(elevation) / 2,
        Math.toDegrees(sep) / 2,
        link / 2);
  }

  /** One sentence for people. */
  public String sentence() {
    return String.format(
        Locale.ROOT,
        "Sampled at least every %.0f s and at every edge; a breach shorter than that can be missed:"
            + " at most %.4f deg of off-pointing, %.4f deg of elevation, %.4f deg of the Sun angle,"
            + " %.4f dB of link margin.",
        seconds,
        offPointingDegrees,
        elevationDegrees,
        sepDegrees,
        linkDecibels);
  }
}
