package quietspan.planning;

import java.util.ArrayList;
import java.util.List;
import quietspan.model.Aim;
import quietspan.model.BodyDirection;

/**
 * The time between two repoints of a craft, with the stretches in which its aim has the Earth in
 * the usable cone. Seconds on board since the begin of the period.
 */
final class Hold {

  /** Kept away from the rim of the cone, for rounding and interpolation (rad): 0.0006 deg. */
  private static final double RIM = 1e-5;

  final int craft;
  final Aim aim;
  final int from;
  final int until;
  final List<int[]> covered;

  private final Tables tables;
  private final BodyDirection direction;
  private final double x;
  private final double y;
  private final double z;

  Hold(Tables tables, int craft, Aim aim, int from, int until) {
    this.tables = tables;
    this.craft = craft;
    this.aim = aim;
    this.from = from;
    this.until = until;
    this.direction = aim.direction();
    double cos = StrictMath.cos(direction.elevationRadians());
    this.x = cos * StrictMath.cos(direction.azimuthRadians());
    this.y = cos * StrictMath.sin(direction.azimuthRadians());
    this.z = StrictMath.sin(direction.elevationRadians());
    this.covered = coverage();
  }

  /** Off-pointing at a sample (rad). */
  double off(int sample) {
    double[] unit = tables.unit[craft];
    double dx = unit[3 * sample] - x;
    double dy = unit[3 * sample + 1] - y;
    double dz = unit[3 * sample + 2] - z;
    // asin(s) = s + s^3/6 + ...: good to 1e-7 rad for the few degrees of a beam; far away any value
    // does.
    double half = Math.sqrt(dx * dx + dy * dy + dz * dz) / 2;
    return half > 0.1 ? 2 * half : 2 * (half + half * half * half / 6);
  }

  /** Second on board in or after the hold at which the Earth is nearest to the aim. */
  int nearest() {
    int first = Math.max(0, from) / Tables.STEP;
    int last = Math.min(tables.samples - 1, (Math.max(until, from) + 30 * 86_400) / Tables.STEP);
    int best = first;
    double least = Double.POSITIVE_INFINITY;
    for (int i = first; i <= last; i += 12) {
      double off = off(i);
      if (off < least) {
        least = off;
        best = i;
      }
    }
    return best * Tables.STEP;
  }

  private List<int[]> coverage() {
    List<int[]> found = new ArrayList<>();
    double limit = tables.usable[craft] - RIM;
    int first = Math.max(0, from) / Tables.STEP;
    int last = Math.min(tables.samples - 2, (until - 1) / Tables.STEP);
    int begin = -1;
    for (int i = first; i <= last; i++) {
      double here = off(i) - limit;
      double next = off(i + 1) - limit;
      int start = i * Tables.STEP;
      if (here <= 0 && begin < 0) {
        begin = start;
      }
      if (here > 0 && next <= 0) {
        begin = start + (int) Math.ceil(Tables.STEP * here / (here - next)) + 1;
      } else if (here <= 0 && next > 0) {
        int end = start + (int) Math.floor(Tables.STEP * here / (here - next)) - 1;
        add(found, begin, end);
        begin = -1;
      }
    }
    if (begin >= 0) {
      add(found, begin, (last + 1) * Tables.STEP);
    }
    return found;
  }

  private void add(List<int[]> found, int begin, int end) {
    int b = Math.max(begin, Math.max(0, from));
    int e = Math.min(end, until);
    if (b < e) {
      found.add(new int[] {b, e});
    }
  }
}
