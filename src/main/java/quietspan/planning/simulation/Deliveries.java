package quietspan.planning.simulation;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;

/**
 * Which bits move: the ages behind the {@link Flow}, class by class, oldest first.
 *
 * <p>While the flow repeats, the bits that leave a store over several seconds are just the oldest
 * of all that was there or came in: arrivals of bits older than any given age only thin out, since
 * every sender gives its oldest first, so that no bit is overtaken by a newer one and stays behind.
 * Whole repeats are therefore moved at once, except where a bit could be late or set a record of
 * latency: there, second by second.
 */
final class Deliveries {

  private static final long SECOND = 1_000_000_000;

  /** A latency below any, far enough from the end of the range to add instants to it. */
  private static final long NONE = Long.MIN_VALUE / 2;

  /** Seconds that surely need no look are moved at once only when there are this many. */
  private static final long WORTHWHILE = 64;

  /** Seconds that are looked at one by one together. */
  private static final long WATCHED = 600;

  /** A stretch of seconds of one contact in each of which bits of a class are delivered late. */
  record LateRun(int dataClass, int image, long firstSecond, long bits) {}

  /** Per image: ground delay from reception to delivery. */
  private final long[] delayNanos;

  private final LightTable light;
  private final Limits[] limits;
  private final int craft;
  private final int classes;
  private final Ages[] ages;
  private final Ages gone = new Ages();
  private final Lane[] lanes;

  private final long[] longestNanos;
  private final long[] lateBits;

  private final List<LateRun> runs = new ArrayList<>();
  private final int[] runImage;
  private final long[] runBegin;
  private final long[] runEnd;
  private final long[] runBits;

  Deliveries(
      Stores stores, LightTable light, Limits[] limits, long[] delayNanos, Ages[] startAges) {
    this.light = light;
    this.limits = limits;
    this.delayNanos = delayNanos;
    this.craft = stores.craft();
    this.classes = stores.classes();
    this.ages = startAges;
    this.lanes = new Lane[craft];
    for (int c = 0; c < craft; c++) {
      lanes[c] = new Lane();
    }
    this.longestNanos = new long[classes];
    this.lateBits = new long[classes];
    Arrays.fill(longestNanos, NONE);
    this.runImage = new int[startAges.length];
    this.runBegin = new long[startAges.length];
    this.runEnd = new long[startAges.length];
    this.runBits = new long[startAges.length];
  }

  /** Moves bits as the flow was settled at {@code second}, for that many seconds. */
  void advance(Stretch stretch, Flow flow, long second, long seconds) {
    for (int k = 0; k < classes; k++) {
      long at = second;
      long end = second + seconds;
      while (at < end) {
        long calm = calmSeconds(stretch, flow, k, at, end - at);
        long step = calm < WORTHWHILE ? Math.min(end - at, WATCHED) : calm;
        generate(stretch, flow, k, at, step);
        if (step > calm) {
          watch(stretch, flow, k, at, step);
        }
        move(stretch, flow, k, step);
        at += step;
      }
    }
  }

  /**
   * For how many seconds surely no bit of a class is late or older at delivery than any before;
   * judged by the oldest bit that could be delivered.
   */
  private long calmSeconds(Stretch stretch, Flow flow, int k, long second, long seconds) {
    boolean delivers = false;
    for (int c = 0; c < craft; c++) {
      delivers |= flow.down[c * classes + k] > 0;
    }
    if (!delivers) {
      return seconds;
    }
    long oldest = second;
    for (int i = k; i < ages.length; i += classes) {
      if ((flow.down[i] > 0 || flow.sent[i] > 0) && ages[i].bits() > 0) {
        oldest = Math.min(oldest, ages[i].oldest());
      }
    }
    long bearable = Math.min(limits[k].shortestNanos(), longestNanos[k]) + oldest * SECOND;
    long slack = bearable - lastDelivered(stretch, flow, k, second);
    if (slack < 0) {
      return 0;
    }
    long calm = seconds;
    while (calm > 1 && lastDelivered(stretch, flow, k, second + calm - 1) > bearable) {
      calm = Math.min(calm - 1, Math.max(1, slack / SECOND));
    }
    return calm;
  }

  /** The latest delivery of bits sent in that second, over the craft that send. */
  private long lastDelivered(Stretch stretch, Flow flow, int k, long second) {
    long last = Long.MIN_VALUE;
    for (int c = 0; c < craft; c++) {
      if (flow.down[c * classes + k] > 0) {
        last = Math.max(last, delivered(c, stretch.image[c], second));
      }
    }
    return last;
  }

  /** When bits that a craft sends in a second are delivered, from the begin of the period. */
  private long delivered(int c, int image, long second) {
    return light.receivedNanos(c, second + 1) + delayNanos[image];
  }

  /** Adds what is generated and survives overflow. */
  private void generate(Stretch stretch, Flow flow, int k, long second, long seconds) {
    for (int i = k; i < ages.length; i += classes) {
      long kept = stretch.generated[i] - flow.lost[i];
      if (kept > 0) {
        ages[i].add(second, seconds, kept);
      } else if (kept < 0) {
        ages[i].removeNewest(-kept * seconds);
      }
    }
  }

  /** Cross-links, then downlinks. */
  private void move(Stretch stretch, Flow flow, int k, long seconds) {
    for (int i = k; i < ages.length; i += classes) {
      if (flow.sent[i] > 0) {
        ages[i].moveOldest(flow.sent[i] * seconds, ages[stretch.receiver * classes + k]);
      }
    }
    for (int i = k; i < ages.length; i += classes) {
      if (flow.down[i] > 0) {
        ages[i].moveOldest(flow.down[i] * seconds, gone);
        gone.clear();
      }
    }
  }

  private void watch(Stretch stretch, Flow flow, int k, long second, long seconds) {
    for (int c = 0; c < craft; c++) {
      int i = c * classes + k;
      if (flow.down[i] == 0) {
        continue;
      }
      for (int other = 0; other < craft; other++) {
        int from = other * classes + k;
        boolean gives = other != c && stretch.receiver == c && flow.sent[from] > 0;
        ages[from].copyOldest(gives ? flow.sent[from] * seconds : 0, lanes[other]);
      }
      ages[i].copyOldest(flow.down[i] * seconds, lanes[c]);
      for (Lane lane : lanes) {
        lane.rewind();
      }
      lanes[c].offer(Long.MAX_VALUE);
      for (long at = second; at < second + seconds; at++) {
        for (int other = 0; other < craft; other++) {
          if (other != c) {
            lanes[other].offer(flow.sent[other * classes + k]);
          }
        }
        watchSecond(i, stretch.image[c], at, flow.down[i]);
      }
    }
  }

  private void watchSecond(int store, int image, long second, long bits) {
    int k = store % classes;
    long delivered = delivered(store / classes, image, second);
    long oldest = Long.MAX_VALUE;
    long late = 0;
    long left = bits;
    while (left > 0) {
      Lane first = lanes[0];
      for (int lane = 1; lane < lanes.length; lane++) {
        first = lanes[lane].head() < first.head() ? lanes[lane] : first;
      }
      long generation = first.head();
      long taken = first.take(left);
      oldest = Math.min(oldest, generation);
      if (limits[k].isLate(generation, delivered)) {
        late += taken;
      }
      left -= taken;
    }
    longestNanos[k] = Math.max(longestNanos[k], delivered - oldest * SECOND);
    if (late > 0) {
      late(store, image, second, late);
    }
  }

  private void late(int store, int image, long second, long bits) {
    lateBits[store % classes] += bits;
    if (runBits[store] > 0 && (runImage[store] != image || runEnd[store] != second)) {
      endRun(store);
    }
    if (runBits[store] == 0) {
      runBegin[store] = second;
      runImage[store] = image;
    }
    runBits[store] += bits;
    runEnd[store] = second + 1;
  }

  private void endRun(int store) {
    if (runBits[store] > 0) {
      runs.add(new LateRun(store % classes, runImage[store], runBegin[store], runBits[store]));
      runBits[store] = 0;
    }
  }

  /** Every run of late deliveries so far. */
  List<LateRun> lateRuns() {
    for (int store = 0; store < ages.length; store++) {
      endRun(store);
    }
    return List.copyOf(runs);
  }

  /** Bits of a class that have been delivered late. */
  long lateBits(int k) {
    return lateBits[k];
  }

  /** Bits of a class aboard, in all stores, that would be late if delivered at that second. */
  long lateAboard(int k, long second) {
    long late = 0;
    for (int i = k; i < ages.length; i += classes) {
      late += limits[k].late(ages[i], second * SECOND);
    }
    return late;
  }

  /** The longest latency of a class in seconds, bits still aboard taken as delivered then. */
  OptionalDouble longestLatency(int k, long second) {
    long longest = longestNanos[k];
    for (int i = k; i < ages.length; i += classes) {
      if (ages[i].bits() > 0) {
        longest = Math.max(longest, (second - ages[i].oldest()) * SECOND);
      }
    }
    return longest == NONE ? OptionalDouble.empty() : OptionalDouble.of(longest / 1e9);
  }
}
