package quietspan.planning;

import java.util.Arrays;

/**
 * A lower bound on what is still to come, whatever the label: it takes all aims as free and all
 * stores as empty, and every pause as the shortest one that renews everything. Computed on a coarse
 * optimistic grid; it lets {@link Programme} drop labels that cannot end below a given loss any
 * more.
 */
final class ToGo {

  /** As large as no loss is: there is no way on. */
  static final long NEVER = Long.MAX_VALUE / 8;

  private final int cellLength;
  private final int warmUp;

  /** Least future loss from a coarse cell on; one entry more than there are cells. */
  private final long[] fresh;

  /** As {@link #fresh}, for a pause that still runs and may grow. */
  private final long[] growing;

  private ToGo(int cellLength, int warmUp, long[] fresh, long[] growing) {
    this.cellLength = cellLength;
    this.warmUp = warmUp;
    this.fresh = fresh;
    this.growing = growing;
  }

  /**
   * Knows nothing: zero everywhere, of which a young span may hand back no more than its warm-up.
   */
  static ToGo nothing(int warmUp) {
    return new ToGo(Integer.MAX_VALUE / 4, warmUp, new long[2], new long[2]);
  }

  /**
   * Least loss still to be booked from an instant (s) on, in the unit of the aim; below zero where
   * more may be handed back than there is to come: the warm-up of a span that is younger than it,
   * and repoints in a span that turns out to be lost.
   */
  long from(int second, boolean growingPause, boolean youngSpan, long refund) {
    int cell = Math.min(fresh.length - 1, (second + cellLength - 1) / cellLength);
    long least = growingPause ? growing[cell] : fresh[cell];
    return least >= NEVER ? least : least - refund - (youngSpan ? warmUp : 0);
  }

  static ToGo of(Cells cells, Programme.Aim aim) {
    int n = cells.count();
    boolean losing = aim == Programme.Aim.LOSS;
    ToGo nothing = nothing(losing ? cells.warmUp() : 0);
    for (int c = 0; c < cells.craftCount(); c++) {
      if (!cells.monotone(c)) {
        return nothing;
      }
    }
    int h = cells.end(0);
    Programme programme =
        new Programme(cells, aim, false, nothing, Long.MAX_VALUE / 4, Long.MAX_VALUE);
    int saving = (cells.longestRepoint() + h - 1) / h + 1;
    long[] fresh = new long[n + 2];
    long given = 0;
    for (int i = n - 1; i >= 0; i--) {
      // Interruptions cost their length and a warm-up, whatever is planned around them.
      long here = losing ? cells.stopsLoss(i) : 0;
      given += here;
      int dead = programme.reach(i, saving);
      if (dead >= n) {
        fresh[i] = given;
        continue;
      }
      long least = NEVER;
      for (int j = i; j <= dead; j++) {
        for (int level = 0; level < cells.levels(); level++) {
          Cells.PauseOption option = cells.pause(j, level);
          if (option == null) {
            continue;
          }
          int length = cells.levelLength(level);
          // A pause that grows costs its length; what it renews is free from its last repoint on.
          // Time of
          // interruptions inside it is counted with them already.
          for (int more = 0; j + more <= n && more <= 8 * saving; more++) {
            int renewed = Math.max(i + 1, j + more);
            if (renewed > n) {
              break;
            }
            long cost = 1;
            if (losing && option.merges()) {
              cost = Math.max(option.extra(), (long) renewed * h - option.joinsUntil());
            } else if (losing && option.crowded()) {
              cost = option.extra();
            } else if (losing) {
              long grown = (long) Math.max(0, more - 1) * h - cells.stopsWithin(j, j + more + 1);
              cost = Math.max(length, grown) + cells.warmUpAfter(option.latestEnd());
            }
            long passed = given - cells.stopsFromOn(renewed, losing);
            least = Math.min(least, cost + passed + fresh[renewed]);
          }
        }
      }
      fresh[i] = Math.min(least, NEVER);
    }
    long[] growing = fresh.clone();
    for (int i = 0; i <= n; i++) {
      for (int more = 0; i + more <= n && more <= 8 * saving; more++) {
        // Interruptions on the way may lie inside the pause: only what comes after counts.
        growing[i] =
            Math.min(
                growing[i],
                fresh[i + more]
                    + (losing
                        ? Math.max(
                            0,
                            (long) Math.max(0, more - 1) * h - cells.stopsWithin(i, i + more + 1))
                        : 0));
      }
    }
    Arrays.fill(fresh, n, n + 2, 0);
    return new ToGo(h, losing ? cells.warmUp() : 0, fresh, growing);
  }

  /** Least loss over the whole period. */
  long whole() {
    return fresh[0];
  }
}
