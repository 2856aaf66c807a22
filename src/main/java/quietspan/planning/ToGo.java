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

  /** Knows nothing: zero everywhere. */
  static ToGo nothing() {
    return new ToGo(Integer.MAX_VALUE / 4, 0, new long[2], new long[2]);
  }

  /** Least loss in the unit of the aim from an instant (s) on. */
  long from(int second, boolean growingPause, boolean youngSpan) {
    int cell = Math.min(fresh.length - 1, (second + cellLength - 1) / cellLength);
    long least = growingPause ? growing[cell] : fresh[cell];
    // The warm-up of a span that is younger than it may still be handed back.
    return youngSpan ? Math.max(0, least - warmUp) : least;
  }

  static ToGo of(Cells cells, Programme.Aim aim) {
    int n = cells.count();
    for (int c = 0; c < cells.craftCount(); c++) {
      if (!cells.monotone(c)) {
        return nothing();
      }
    }
    int h = cells.end(0);
    Programme programme =
        new Programme(cells, aim, false, nothing(), Long.MAX_VALUE / 4, Long.MAX_VALUE);
    int saving = (cells.longestRepoint() + h - 1) / h + 1;
    boolean losing = aim == Programme.Aim.LOSS;
    long[] fresh = new long[n + 2];
    for (int i = n - 1; i >= 0; i--) {
      int dead = programme.reach(i, saving);
      if (dead >= n) {
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
          if (option.merges()) {
            int after = Math.min(n, Math.max(j + 1, option.joinsUntil() / h + 1));
            least = Math.min(least, (losing ? option.extra() : 1) + fresh[after]);
          }
          // A pause that grows costs its length; what it renews is free from its last repoint on.
          for (int more = 0; j + more <= n && more <= 8 * saving; more++) {
            int renewed = Math.max(i + 1, j + more);
            if (renewed > n) {
              break;
            }
            long cost =
                losing ? Math.max(length, (long) Math.max(0, more - 1) * h) + cells.warmUp() : 1;
            if (option.merges() && losing) {
              cost -= cells.warmUp();
            }
            least = Math.min(least, cost + fresh[renewed]);
          }
        }
      }
      fresh[i] = Math.min(least, NEVER);
    }
    long[] growing = fresh.clone();
    for (int i = 0; i <= n; i++) {
      for (int more = 0; i + more <= n && more <= 8 * saving; more++) {
        growing[i] =
            Math.min(growing[i], fresh[i + more] + (losing ? (long) Math.max(0, more - 1) * h : 0));
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
