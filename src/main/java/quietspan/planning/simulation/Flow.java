package quietspan.planning.simulation;

import java.util.Arrays;

/**
 * How many bits of each class every store holds, and how many move in one second. Ages do not
 * matter here: within a class they decide which bits move, never how many.
 *
 * <p>{@link #settle} computes the moves of one second and for how many seconds they repeat
 * unchanged: each is the least of a few quantities, and as long as the moves stay the same, those
 * quantities change by the same amount each second.
 */
final class Flow {

  private static final long UNLIMITED = Long.MAX_VALUE;

  private final Stores stores;
  private final int craft;
  private final int classes;

  /** Bits held, by craft and class, before the second that was settled last. */
  final long[] held;

  /** Bits moved each second, by craft and class: sent to and received from other craft. */
  final long[] sent;

  final long[] received;

  /** Bits sent to the ground each second. */
  final long[] down;

  /** Bits lost to overflow each second. */
  final long[] lost;

  /** Change of what is held each second. */
  final long[] change;

  /** By how much each quantity grows from one second to the next: zero, then the change. */
  private long[] slope;

  private final long[] zero;
  private final long[] available;
  private long repeats;

  Flow(Stores stores, long[] held) {
    this.stores = stores;
    this.craft = stores.craft();
    this.classes = stores.classes();
    this.held = held.clone();
    this.sent = new long[held.length];
    this.received = new long[held.length];
    this.down = new long[held.length];
    this.lost = new long[held.length];
    this.change = new long[held.length];
    this.zero = new long[held.length];
    this.available = new long[held.length];
  }

  long heldBy(int c) {
    return sum(held, c);
  }

  long changeOf(int c) {
    return sum(change, c);
  }

  long sum(long[] byClass, int c) {
    long sum = 0;
    for (int i = c * classes; i < (c + 1) * classes; i++) {
      sum += byClass[i];
    }
    return sum;
  }

  /** Computes the moves of a second of the stretch; returns for how many seconds they repeat. */
  long settle(Stretch stretch, long second) {
    slope = zero;
    walk(stretch, second);
    for (int i = 0; i < change.length; i++) {
      change[i] = stretch.generated[i] + received[i] - sent[i] - down[i] - lost[i];
    }
    repeats = stretch.end - second;
    if (repeats > 1) {
      slope = change;
      walk(stretch, second);
    }
    return repeats;
  }

  /** The settled moves happen in that many seconds. */
  void advance(long seconds) {
    for (int i = 0; i < held.length; i++) {
      held[i] += change[i] * seconds;
    }
  }

  private void walk(Stretch stretch, long second) {
    Arrays.fill(sent, 0);
    Arrays.fill(received, 0);
    Arrays.fill(down, 0);
    Arrays.fill(lost, 0);
    for (int i = 0; i < held.length; i++) {
      available[i] = held[i] + stretch.generated[i];
    }
    if (stretch.receiver != Stretch.NOBODY) {
      crossLink(stretch, second);
    }
    for (int c = 0; c < craft; c++) {
      if (stretch.rate[c] > 0) {
        transmit(c, stretch.rate[c]);
      }
      overflow(c);
    }
  }

  private void crossLink(Stretch stretch, long second) {
    int receiver = stretch.receiver;
    long own = stretch.generatedByCraft[receiver];
    long room = stretch.allowance + (second - stretch.begin) * own - sum(available, receiver);
    long roomSlope = own - sum(slope, receiver);
    if (room <= 0) {
      if (roomSlope > 0) {
        repeatAtMost(-room / roomSlope + 1);
      }
      return;
    }
    for (int c = 0; c < craft; c++) {
      if (stretch.sink[c]) {
        continue;
      }
      long budget = stores.crossLink(c);
      for (int k = 0; k < classes; k++) {
        int from = c * classes + k;
        long bits = least(available[from], slope[from], budget, room, roomSlope);
        sent[from] = bits;
        received[receiver * classes + k] += bits;
        available[from] -= bits;
        budget -= bits;
        room -= bits;
      }
    }
    for (int k = 0; k < classes; k++) {
      available[receiver * classes + k] += received[receiver * classes + k];
    }
  }

  private void transmit(int c, long rate) {
    long budget = rate;
    for (int i = c * classes; i < (c + 1) * classes; i++) {
      long bits = least(available[i], slope[i], budget, UNLIMITED, 0);
      down[i] = bits;
      available[i] -= bits;
      budget -= bits;
    }
  }

  private void overflow(int c) {
    long excess = sum(available, c) - stores.capacity(c);
    long excessSlope = sum(slope, c);
    if (excess <= 0) {
      if (excessSlope > 0) {
        repeatAtMost(-excess / excessSlope + 1);
      }
      return;
    }
    if (excessSlope != 0) {
      repeatAtMost(1);
    }
    for (int i = (c + 1) * classes - 1; i >= c * classes; i--) {
      long bits = least(available[i], slope[i], excess, UNLIMITED, 0);
      lost[i] = bits;
      available[i] -= bits;
      excess -= bits;
    }
  }

  /**
   * The least of three quantities, of which the second stays as it is while the others grow by
   * their slopes; limits the repeats to the seconds in which the result stays the same.
   */
  private long least(long a, long aSlope, long fixed, long b, long bSlope) {
    long least = Math.min(a, Math.min(fixed, b));
    boolean steady = fixed == least || (a == least && aSlope == 0) || (b == least && bSlope == 0);
    if (!steady) {
      repeatAtMost(1);
    }
    if (aSlope < 0) {
      repeatAtMost((a - least) / -aSlope + 1);
    }
    if (bSlope < 0) {
      repeatAtMost((b - least) / -bSlope + 1);
    }
    return least;
  }

  private void repeatAtMost(long seconds) {
    repeats = Math.min(repeats, seconds);
  }
}
