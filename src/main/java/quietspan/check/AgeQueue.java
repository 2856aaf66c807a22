package quietspan.check;

/**
 * The bits of one data class aboard one craft, counted by the second in which they were generated,
 * so that the oldest and the newest are at hand whatever their origin.
 *
 * <p>A ring of counts covers the seconds from the oldest to the newest bit aboard. Bitmaps say
 * which of them hold anything, which words of that bitmap do, and so on: data received from another
 * craft may be days older than what is made here, and a full store has a hole of weeks below its
 * newest.
 */
final class AgeQueue {

  /** Told about bits that leave. */
  interface Taker {
    void take(long generated, long bits);
  }

  private static final int LEVELS = 3;

  /** Three days; the top bitmap then has one whole word. */
  private static final int SMALLEST = 1 << (6 * LEVELS);

  private static final int LARGEST = 1 << 29;

  private long[] bitsOfSecond = new long[SMALLEST];
  private long[][] present = bitmaps(SMALLEST);
  private long oldest;
  private long newest;
  private long total;

  long total() {
    return total;
  }

  /** Generation second of the oldest bit; asked only while there are bits. */
  long oldest() {
    return oldest;
  }

  void add(long generated, long bits) {
    if (bits == 0) {
      return;
    }
    if (total == 0) {
      oldest = generated;
      newest = generated;
    } else {
      long first = Math.min(oldest, generated);
      long last = Math.max(newest, generated);
      if (last - first >= bitsOfSecond.length) {
        widen(last - first + 1);
      }
      oldest = first;
      newest = last;
    }
    put(generated, bits);
    total += bits;
  }

  /** Takes bits away, oldest first; at most {@code bits}. */
  void takeOldest(long bits, Taker taker) {
    long left = Math.min(bits, total);
    while (left > 0) {
      int slot = slot(oldest);
      long taken = Math.min(left, bitsOfSecond[slot]);
      long generated = oldest;
      bitsOfSecond[slot] -= taken;
      total -= taken;
      left -= taken;
      if (bitsOfSecond[slot] == 0) {
        clear(slot);
        if (total > 0) {
          oldest = next(0, oldest + 1);
        }
      }
      taker.take(generated, taken);
    }
  }

  /** Takes bits away, newest first; at most {@code bits}; returns how many. */
  long dropNewest(long bits) {
    long dropped = Math.min(bits, total);
    long left = dropped;
    while (left > 0) {
      int slot = slot(newest);
      long taken = Math.min(left, bitsOfSecond[slot]);
      bitsOfSecond[slot] -= taken;
      total -= taken;
      left -= taken;
      if (bitsOfSecond[slot] == 0) {
        clear(slot);
        if (total > 0) {
          newest = previous(0, newest - 1);
        }
      }
    }
    return dropped;
  }

  /** Shows every bit aboard, oldest first, and leaves it there. */
  void forEach(Taker taker) {
    if (total == 0) {
      return;
    }
    for (long second = oldest; ; second = next(0, second + 1)) {
      taker.take(second, bitsOfSecond[slot(second)]);
      if (second == newest) {
        return;
      }
    }
  }

  private static long[][] bitmaps(int size) {
    long[][] bitmaps = new long[LEVELS][];
    for (int level = 0; level < LEVELS; level++) {
      bitmaps[level] = new long[size >> (6 * (level + 1))];
    }
    return bitmaps;
  }

  private int slot(long second) {
    return (int) (second & (bitsOfSecond.length - 1));
  }

  private void put(long second, long bits) {
    int slot = slot(second);
    bitsOfSecond[slot] += bits;
    for (long[] level : present) {
      level[slot >> 6] |= 1L << (slot & 63);
      slot >>= 6;
    }
  }

  private void clear(int emptied) {
    int slot = emptied;
    for (long[] level : present) {
      level[slot >> 6] &= ~(1L << (slot & 63));
      if (level[slot >> 6] != 0) {
        return;
      }
      slot >>= 6;
    }
  }

  private long word(int level, long place) {
    return present[level][(int) (place >> 6) & (present[level].length - 1)];
  }

  /** The first place of a level from {@code from} on that is not empty; there is one. */
  private long next(int level, long from) {
    long rest = word(level, from) >>> (from & 63);
    if (rest != 0) {
      return from + Long.numberOfTrailingZeros(rest);
    }
    long word = (from >> 6) + 1;
    if (level + 1 < LEVELS) {
      word = next(level + 1, word);
    } else {
      while (word(level, word << 6) == 0) {
        word++;
      }
    }
    return (word << 6) + Long.numberOfTrailingZeros(word(level, word << 6));
  }

  /** The last place of a level up to {@code from} that is not empty; there is one. */
  private long previous(int level, long from) {
    long rest = word(level, from) << (63 - (from & 63));
    if (rest != 0) {
      return from - Long.numberOfLeadingZeros(rest);
    }
    long word = (from >> 6) - 1;
    if (level + 1 < LEVELS) {
      word = previous(level + 1, word);
    } else {
      while (word(level, word << 6) == 0) {
        word--;
      }
    }
    return (word << 6) + 63 - Long.numberOfLeadingZeros(word(level, word << 6));
  }

  private void widen(long seconds) {
    if (seconds > LARGEST) {
      throw new IllegalStateException("data aboard span more than 17 years: " + seconds + " s");
    }
    long[] before = bitsOfSecond;
    int size = Math.max(SMALLEST, Integer.highestOneBit((int) seconds - 1) << 1);
    bitsOfSecond = new long[size];
    present = bitmaps(size);
    for (long second = oldest; second <= newest; second++) {
      long bits = before[(int) (second & (before.length - 1))];
      if (bits > 0) {
        put(second, bits);
      }
    }
  }
}
