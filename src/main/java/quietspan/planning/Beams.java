package quietspan.planning;

import java.util.Set;
import quietspan.model.BodyDirection;
import quietspan.model.Craft;
import quietspan.model.Steering;

/**
 * Which cells one aim can serve together. An aim that serves at two instants is within the usable
 * cone of the Earth at both; for two axes that means the two Earth directions are at most two
 * half-cones apart, for a fixed elevation that the azimuths which hold the Earth at either instant
 * overlap. That pairwise test with the opening cell is all that is asked in the optimistic sense,
 * so it holds for paths that bend or return, too. In the planning sense the whole arc between must
 * fit into one cone.
 */
final class Beams {

  /** Pointing level by {@code [craft][opened][cell - opened]}, -1 where the aim cannot serve. */
  final byte[][][] level;

  final int[][] exit;

  /** Whether an aim opened later is never worse, so that labels of different openings compare. */
  final boolean[] monotone;

  final byte[][] startLevel;
  final int[] startLast;

  private final Tables tables;
  private final boolean optimistic;
  private final boolean bestRate;
  private final int cellLength;
  private final int count;
  private final int cellsOnPath;
  private final int levels;
  private final double guard;

  private final double[][] mid;
  private final double[][] spread;
  private final double[][] lowest;
  private final double[][] highest;
  private final boolean[][] reachable;

  Beams(
      Tables tables,
      Set<Relaxation> relaxed,
      int cellLength,
      int count,
      int levels,
      double angleGuard) {
    this.tables = tables;
    this.optimistic = relaxed.contains(Relaxation.BEAM_CELLS);
    this.bestRate = relaxed.contains(Relaxation.BEST_RATE);
    this.cellLength = cellLength;
    this.count = count;
    this.levels = levels;
    this.guard = angleGuard;
    int craftCount = tables.craftCount;
    this.cellsOnPath = (tables.samples - 1) * Tables.STEP / cellLength;
    this.level = new byte[craftCount][count][];
    this.exit = new int[craftCount][count];
    this.monotone = new boolean[craftCount];
    this.startLevel = new byte[craftCount][count];
    this.startLast = new int[craftCount];
    int cells = known();
    this.mid = new double[craftCount][3 * cells];
    this.spread = new double[craftCount][cells];
    this.lowest = new double[craftCount][cells];
    this.highest = new double[craftCount][cells];
    this.reachable = new boolean[craftCount][cells];
    for (int c = 0; c < craftCount; c++) {
      Craft craft = tables.scenario.craft().get(c);
      for (int cell = 0; cell < cells; cell++) {
        summarise(c, craft.antenna().steering(), cell);
      }
      for (int opened = 0; opened < count; opened++) {
        open(c, craft.antenna().steering(), opened, cells);
      }
      monotone[c] = isMonotone(c);
      start(c, craft, cells);
    }
  }

  /** Cells for which it is known whether an aim serves: those of the period and some after it. */
  int known() {
    return Math.max(count, cellsOnPath);
  }

  boolean reachable(int craft, int cell) {
    return reachable[craft][cell];
  }

  private int firstSample(int cell) {
    return Math.min(tables.samples - 1, cell * cellLength / Tables.STEP);
  }

  private int lastSample(int cell) {
    return Math.min(tables.samples - 1, ((cell + 1) * cellLength + Tables.STEP - 1) / Tables.STEP);
  }

  private void summarise(int c, Steering steering, int cell) {
    int from = firstSample(cell);
    int to = lastSample(cell);
    int middle = (from + to) / 2;
    System.arraycopy(tables.unit[c], 3 * middle, mid[c], 3 * cell, 3);
    double usable = tables.usable[c] + (optimistic ? guard : 0);
    double low = optimistic ? Double.POSITIVE_INFINITY : Double.NEGATIVE_INFINITY;
    double high = optimistic ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY;
    boolean any = false;
    boolean all = true;
    for (int i = from; i <= to; i++) {
      double away = separation(mid[c], 3 * cell, tables.unit[c], 3 * i);
      spread[c][cell] = Math.max(spread[c][cell], away);
      if (steering instanceof Steering.AzimuthOnly fixed) {
        double half = halfWidth(fixed.elevation().radians(), tables.elevation[c][i], usable);
        if (half < 0) {
          all = false;
          continue;
        }
        any = true;
        double l = tables.azimuth[c][i] - half;
        double h = tables.azimuth[c][i] + half;
        low = optimistic ? Math.min(low, l) : Math.max(low, l);
        high = optimistic ? Math.max(high, h) : Math.min(high, h);
      } else {
        boolean near = withinTravel(steering, tables.azimuth[c][i], tables.elevation[c][i], usable);
        any |= near;
        all &= near;
      }
    }
    lowest[c][cell] = low;
    highest[c][cell] = high;
    reachable[c][cell] = optimistic ? any : all;
  }

  /**
   * Half the width of the azimuths that hold a direction from a fixed elevation; negative for none.
   */
  private static double halfWidth(double aimElevation, double elevation, double usable) {
    double cos =
        (StrictMath.cos(usable) - StrictMath.sin(aimElevation) * StrictMath.sin(elevation))
            / (StrictMath.cos(aimElevation) * StrictMath.cos(elevation));
    if (cos > 1) {
      return -1;
    }
    return cos <= -1 ? Math.PI : StrictMath.acos(cos);
  }

  /** Whether some aim inside the travel is within the usable cone of a direction, generously. */
  private boolean withinTravel(Steering steering, double azimuth, double elevation, double usable) {
    if (!(steering instanceof Steering.TwoAxes axes)) {
      return true;
    }
    double from = axes.elevationFrom().radians();
    double to = axes.elevationTo().radians();
    double slack = optimistic ? usable + guard : 0;
    if (elevation < from - slack || elevation > to + slack) {
      return false;
    }
    double first = axes.azimuthFrom().radians();
    double width = axes.azimuthTo().radians() - first;
    width -= 2 * Math.PI * Math.floor(width / (2 * Math.PI));
    if (width < 1e-9) {
      return true;
    }
    double into = azimuth - first;
    into -= 2 * Math.PI * Math.floor(into / (2 * Math.PI));
    double wide = optimistic ? azimuthReach(usable, elevation) : 0;
    return into <= width + wide || into >= 2 * Math.PI - wide;
  }

  /** How far in azimuth an aim may lie from a direction and still hold it. */
  private double azimuthReach(double usable, double elevation) {
    double sine = StrictMath.sin(usable + guard) / StrictMath.cos(elevation);
    return sine >= 1 ? Math.PI : StrictMath.asin(sine) + guard;
  }

  private void open(int c, Steering steering, int opened, int cells) {
    if (!reachable[c][opened]) {
      level[c][opened] = new byte[0];
      exit[c][opened] = -1;
      return;
    }
    byte[] found = new byte[cells - opened];
    int last = -1;
    double low = lowest[c][opened];
    double high = highest[c][opened];
    boolean fits = true;
    for (int cell = opened; cell < cells; cell++) {
      double off;
      if (steering instanceof Steering.AzimuthOnly fixed) {
        if (!reachable[c][cell]) {
          off = -1;
        } else if (optimistic) {
          off = -1;
          // The Earth may come round to the same azimuths after a year.
          for (double turn : new double[] {0, 2 * Math.PI, -2 * Math.PI}) {
            if (lowest[c][cell] <= high + turn && highest[c][cell] >= low + turn) {
              double nearest = offFixed(c, fixed, low + turn, high + turn, cell);
              off = Math.max(0, nearest - spread[c][cell] - guard);
            }
          }
        } else {
          low = Math.max(low, lowest[c][cell]);
          high = Math.min(high, highest[c][cell]);
          off = low <= high ? offFixed(c, fixed, (low + high) / 2, (low + high) / 2, cell) : -1;
        }
      } else {
        double apart = separation(mid[c], 3 * opened, mid[c], 3 * cell);
        double width = spread[c][opened] + spread[c][cell];
        if (cell == opened) {
          apart = 0;
          width = optimistic ? width : spread[c][opened];
        }
        double usable = tables.usable[c];
        if (optimistic) {
          double nearest = Math.max(0, apart - width - guard);
          off = reachable[c][cell] && nearest <= 2 * usable ? Math.max(0, nearest - usable) : -1;
          if (off >= 0 && !bestRate) {
            off = Math.abs(apart - usable);
          }
        } else {
          double furthest = apart + width;
          off =
              reachable[c][cell] && furthest <= 2 * usable - Math.toRadians(0.03)
                  ? Math.abs(apart - usable)
                  : -1;
        }
      }
      if (!optimistic && off < 0) {
        fits = false;
      }
      if (off < 0 || !fits) {
        found[cell - opened] = -1;
      } else {
        last = cell;
        found[cell - opened] = (byte) levelOf(c, off);
      }
      if (!optimistic && !fits) {
        break;
      }
    }
    exit[c][opened] = last;
    level[c][opened] = java.util.Arrays.copyOf(found, last < 0 ? 0 : last - opened + 1);
  }

  /** Level whose representative off-pointing is not above (optimistic) or not below this one. */
  private int levelOf(int c, double off) {
    double usable = tables.usable[c];
    return bestRate
        ? (int) Math.min(levels, Math.floor(off / usable * (levels + 1)))
        : (int) Math.min(levels, Math.ceil(off / usable * levels));
  }

  private double offFixed(int c, Steering.AzimuthOnly fixed, double low, double high, int cell) {
    int middle = (firstSample(cell) + lastSample(cell)) / 2;
    double azimuth = Math.max(low, Math.min(high, tables.azimuth[c][middle]));
    return new BodyDirection(azimuth, fixed.elevation().radians())
        .separation(new BodyDirection(tables.azimuth[c][middle], tables.elevation[c][middle]));
  }

  private boolean isMonotone(int c) {
    for (int opened = 1; opened < count; opened++) {
      byte[] earlier = level[c][opened - 1];
      byte[] later = level[c][opened];
      if (later.length + 1 < earlier.length) {
        return false;
      }
      for (int k = 1; k < earlier.length; k++) {
        if (earlier[k] >= 0 && (later[k - 1] < 0 || later[k - 1] > earlier[k])) {
          return false;
        }
      }
    }
    return true;
  }

  private void start(int c, Craft craft, int cells) {
    BodyDirection aim = tables.scenario.start().of(craft.name()).aim().direction();
    startLast[c] = -1;
    for (int cell = 0; cell < cells; cell++) {
      double nearest = Double.MAX_VALUE;
      double furthest = 0;
      for (int i = firstSample(cell); i <= lastSample(cell); i++) {
        double off =
            aim.separation(new BodyDirection(tables.azimuth[c][i], tables.elevation[c][i]));
        nearest = Math.min(nearest, off);
        furthest = Math.max(furthest, off);
      }
      double off = optimistic ? Math.max(0, nearest - guard) : furthest;
      boolean serves = off <= tables.usable[c];
      if (serves) {
        startLast[c] = cell;
      }
      if (cell < count) {
        startLevel[c][cell] = serves ? (byte) levelOf(c, off) : -1;
      }
    }
  }

  private static double separation(double[] a, int i, double[] b, int j) {
    double x = a[i] - b[j];
    double y = a[i + 1] - b[j + 1];
    double z = a[i + 2] - b[j + 2];
    return 2 * StrictMath.asin(Math.min(1, Math.sqrt(x * x + y * y + z * z) / 2));
  }
}
