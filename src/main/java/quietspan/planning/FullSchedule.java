package quietspan.planning;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;

/**
 * The contacts that bring down most data under given holds, one at a time, by a dynamic programme
 * over a grid of ground time. It is the richest roster to start trimming from.
 */
final class FullSchedule {

  /** Contacts begin and end on multiples of this (s). */
  static final int GRID = 300;

  private final Tables tables;
  private final Links links;
  private final List<Use> fixed;
  private final int count;
  private final int antennas;
  private final int lockUp;
  private final int switching;

  /**
   * Best value with everything ended by a grid instant, by antenna of the last contact (last:
   * none).
   */
  private final long[][] best;

  private final Use[][] chosen;
  private final int[][] fromInstant;
  private final int[][] fromAntenna;

  FullSchedule(Tables tables, Links links, List<Use> fixed) {
    this.tables = tables;
    this.links = links;
    this.fixed = fixed;
    int latest = tables.length;
    for (int c = 0; c < tables.craftCount; c++) {
      latest = Math.max(latest, tables.groundCeil(c, tables.length));
    }
    this.count = latest / GRID + 2;
    this.antennas = tables.antennas.size();
    this.lockUp = (int) tables.scenario.rules().contacts().lockUp().toSeconds();
    this.switching = (int) tables.scenario.rules().contacts().craftSwitch().toSeconds();
    this.best = new long[count + 1][antennas + 1];
    this.chosen = new Use[count + 1][antennas + 1];
    this.fromInstant = new int[count + 1][antennas + 1];
    this.fromAntenna = new int[count + 1][antennas + 1];
  }

  /** A stretch of grid cells in which one antenna can hear one craft through one hold. */
  private record Run(Hold hold, int antenna, int from, int to) {}

  List<Use> best(Draft draft) {
    List<List<Run>> byStart = new ArrayList<>();
    for (int i = 0; i <= count; i++) {
      byStart.add(new ArrayList<>());
    }
    for (Links.Window window : links.windows) {
      for (Hold hold : draft.holds.get(window.craft())) {
        for (int[] part : hold.covered) {
          int begin = Math.max(window.begin(), tables.groundCeil(window.craft(), part[0]) + 1);
          int end = Math.min(window.end(), tables.groundFloor(window.craft(), part[1]) - 1);
          int from = Math.floorDiv(begin + GRID - 1, GRID);
          int to = Math.floorDiv(end, GRID);
          if (from < to && from >= 0) {
            byStart.get(from).add(new Run(hold, window.antenna(), from, to));
          }
        }
      }
    }
    boolean[] closed = closed();
    for (long[] row : best) {
      Arrays.fill(row, Long.MIN_VALUE / 4);
    }
    best[0][antennas] = 0;
    List<Run> open = new ArrayList<>();
    for (int i = 0; i <= count; i++) {
      if (i > 0) {
        for (int a = 0; a <= antennas; a++) {
          if (best[i - 1][a] > best[i][a]) {
            best[i][a] = best[i - 1][a];
            chosen[i][a] = null;
            fromInstant[i][a] = i - 1;
            fromAntenna[i][a] = a;
          }
        }
      }
      open.addAll(byStart.get(i));
      int now = i;
      open.removeIf(run -> run.to <= now);
      for (Run run : open) {
        start(run, i, closed);
      }
    }
    List<Use> uses = new ArrayList<>(fixed);
    int a = 0;
    for (int other = 0; other <= antennas; other++) {
      if (best[count][other] > best[count][a]) {
        a = other;
      }
    }
    for (int i = count; i > 0; ) {
      if (chosen[i][a] != null) {
        uses.add(chosen[i][a]);
      }
      int previous = fromInstant[i][a];
      a = fromAntenna[i][a];
      i = previous;
    }
    Collections.sort(uses, java.util.Comparator.comparingInt(Use::begin));
    return uses;
  }

  /**
   * Grid cells that confirmed contacts, with switching and setup around them, keep for themselves.
   */
  private boolean[] closed() {
    boolean[] cells = new boolean[count + 1];
    for (Use use : fixed) {
      int apart =
          Math.max(
              switching,
              tables.antennas.get(use.antenna()).busyBefore()
                  + tables.antennas.get(use.antenna()).busyAfter());
      int from = Math.max(0, Math.floorDiv(use.begin() - apart, GRID));
      int to = Math.min(count, (use.end() + apart) / GRID + 1);
      Arrays.fill(cells, from, to, true);
    }
    return cells;
  }

  /** Tries every contact of a run that begins at a grid instant. */
  private void start(Run run, int i, boolean[] closed) {
    var antenna = tables.antennas.get(run.antenna());
    int base = -1;
    long value = Long.MIN_VALUE / 4;
    int at = -1;
    for (int a = 0; a <= antennas; a++) {
      int wait =
          a == antennas
              ? 0
              : a == run.antenna() ? antenna.busyBefore() + antenna.busyAfter() : switching;
      int ready = i - (wait + GRID - 1) / GRID;
      if (ready >= 0 && best[ready][a] > value) {
        value = best[ready][a];
        base = a;
        at = ready;
      }
    }
    if (base < 0 || value < 0) {
      return;
    }
    int shortest = (int) antenna.dish().minimumContact().toSeconds();
    int longest = (int) antenna.dish().maximumContact().toSeconds();
    int craft = run.hold().craft;
    int step = Integer.MAX_VALUE;
    for (int j = i + 1; j <= run.to() && (j - i) * GRID <= longest; j++) {
      if (closed[j - 1]) {
        break;
      }
      int begin = tables.onboardFloor(craft, (j - 1) * GRID);
      int end = tables.onboardCeil(craft, j * GRID);
      step = Math.min(step, tables.rateStep(run.hold(), run.antenna(), begin, end));
      if (step < 0) {
        break;
      }
      if ((j - i) * GRID < shortest) {
        continue;
      }
      long bits = tables.effective[craft][step] * Math.max(0, (j - i) * GRID - lockUp - 2);
      if (value + bits > best[j][run.antenna()]) {
        best[j][run.antenna()] = value + bits;
        chosen[j][run.antenna()] = new Use(craft, run.antenna(), i * GRID, j * GRID, step);
        fromInstant[j][run.antenna()] = at;
        fromAntenna[j][run.antenna()] = base;
      }
    }
  }
}
