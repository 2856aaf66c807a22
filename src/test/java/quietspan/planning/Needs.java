package quietspan.planning;

import java.util.Arrays;
import java.util.List;
import quietspan.model.DataClass;
import quietspan.model.Generation;
import quietspan.model.RuleId;
import quietspan.model.Waiver;

/**
 * What contacts must bring down at least, counted over all craft together, for pauses that are
 * given: a quick way to leave candidates that no choice of contacts makes legal. Sums only, and
 * generous by an hour.
 */
final class Needs {

  private static final int HOUR = 3600;

  private final Tables tables;

  /** Bits made before the begin of each hour, start fill included. */
  private final long[] made;

  private final long start;
  private final long room;
  private final long endRoom;
  private final int patience;
  private final int gap;

  Needs(TinyWorld world, Tables tables, List<int[]> pauses) {
    this.tables = tables;
    int hours = tables.length / HOUR;
    boolean[] paused = new boolean[tables.length + 1];
    for (int[] pause : pauses) {
      Arrays.fill(paused, pause[0], Math.min(tables.length, pause[1]), true);
    }
    this.made = new long[hours + 1];
    this.start =
        world.scenario().start().craft().stream()
            .flatMap(state -> state.fill().stream())
            .mapToLong(fill -> fill.volume().bits())
            .sum();
    made[0] = start;
    for (int h = 0; h < hours; h++) {
      int still = 0;
      for (int s = h * HOUR; s < (h + 1) * HOUR; s++) {
        still += paused[s] ? 1 : 0;
      }
      long bits = 0;
      for (var craft : world.scenario().craft()) {
        for (Generation one : craft.generation()) {
          var at = world.scenario().period().begin().plusSeconds((long) h * HOUR);
          var until = at.plusSeconds(HOUR - 1L);
          long rate =
              Math.min(
                  one.profile().at(at).bitsPerSecond(), one.profile().at(until).bitsPerSecond());
          bits += rate * (HOUR - still) + ((long) (rate * one.shareInPauses())) * still;
        }
      }
      made[h + 1] = made[h] + bits - bits / 1000 - 1;
    }
    long planned = 0;
    long atEnd = 0;
    for (var craft : world.scenario().craft()) {
      planned += Limits.plannedFillBits(world.scenario(), craft);
      atEnd += Limits.endFillBits(world.scenario(), craft);
    }
    this.room = planned;
    this.endRoom = atEnd;
    long longest = 0;
    for (DataClass one : world.scenario().rules().classes()) {
      longest = Math.max(longest, one.latencyLimit().toSeconds());
    }
    long widest =
        world.scenario().rules().data().gapLimit().map(limit -> limit.toSeconds()).orElse(0L);
    for (Waiver waiver : world.waivers()) {
      if (waiver.rule() == RuleId.LATENCY) {
        longest = Math.max(longest, waiver.relaxedLimit().toSeconds());
      } else if (waiver.rule() == RuleId.GAP) {
        widest = Math.max(widest, waiver.relaxedLimit().toSeconds());
      }
    }
    this.patience = (int) longest;
    this.gap = widest == 0 ? Integer.MAX_VALUE / 2 : (int) widest;
  }

  boolean couldBeMet(List<Use> pieces) {
    for (int h = 1; h < made.length; h++) {
      int second = h * HOUR;
      long down = 0;
      int last = 0;
      for (Use use : pieces) {
        int length = Math.min(use.end(), second + HOUR) - use.begin();
        if (length > 0) {
          down += tables.effective[use.craft()][use.step()] * length;
          last = Math.max(last, Math.min(use.end(), second));
        }
      }
      int old = (second - patience) / HOUR - 1;
      // Start fills age too, but how old they are only the simulation knows.
      boolean late = old >= 0 && made[old] > down + (old == 0 ? start : 0);
      boolean full = made[h] - down > (h == made.length - 1 ? endRoom : room);
      if (late || full || second - last > gap + HOUR) {
        return false;
      }
    }
    return true;
  }
}
