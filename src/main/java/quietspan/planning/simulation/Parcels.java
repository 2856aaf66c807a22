package quietspan.planning.simulation;

import java.util.Arrays;

/**
 * Bits of one data class in one store, by the second in which they were made. Kept as stretches of
 * seconds that hold equally many bits each, oldest first; neighbours that hold the same are one
 * stretch.
 */
final class Parcels {

  /** Takes what is removed: seconds [from, to), each with this many bits. */
  interface Taker {
    void take(long from, long to, long bits);
  }

  private long[] from = new long[16];
  private long[] to = new long[16];
  private long[] bits = new long[16];
  private int first;
  private int count;
  private long total;

  long total() {
    return total;
  }

  /** Adds bits to every second of [begin, end). */
  void add(long begin, long end, long each) {
    if (each == 0 || begin >= end) {
      return;
    }
    compact();
    total += each * (end - begin);
    int last = first + count - 1;
    if (count == 0 || begin >= to[last]) {
      if (count > 0 && begin == to[last] && bits[last] == each) {
        to[last] = end;
      } else {
        insert(first + count, begin, end, each);
      }
      return;
    }
    long at = begin;
    int i = find(begin);
    while (at < end) {
      if (i >= first + count || from[i] >= end) {
        insert(i, at, end, each);
        i = merge(i);
        return;
      }
      if (at < from[i]) {
        insert(i, at, from[i], each);
        at = from[i + 1];
        i = merge(i) + 1;
        continue;
      }
      if (from[i] < at) {
        split(i, at);
        i++;
      }
      if (to[i] > end) {
        split(i, end);
      }
      bits[i] += each;
      at = to[i];
      i = merge(i) + 1;
    }
    if (i < first + count) {
      merge(i);
    }
  }

  /** Index of the first stretch that ends after a second. */
  private int find(long second) {
    int low = first;
    int high = first + count;
    while (low < high) {
      int middle = (low + high) / 2;
      if (to[middle] > second) {
        high = middle;
      } else {
        low = middle + 1;
      }
    }
    return low;
  }

  private void split(int i, long at) {
    insert(i + 1, at, to[i], bits[i]);
    to[i] = at;
  }

  /** Joins a stretch with the one before where they touch and hold the same; gives its index. */
  private int merge(int i) {
    if (i > first && i < first + count && to[i - 1] == from[i] && bits[i - 1] == bits[i]) {
      to[i - 1] = to[i];
      remove(i);
      return i - 1;
    }
    return i;
  }

  /** Moves what is left to the front; never in the middle of a change, when indices are held. */
  private void compact() {
    if (first > 1000 && first > count) {
      System.arraycopy(from, first, from, 0, count);
      System.arraycopy(to, first, to, 0, count);
      System.arraycopy(bits, first, bits, 0, count);
      first = 0;
    }
  }

  private void insert(int at, long begin, long end, long each) {
    if (first + count == from.length) {
      from = Arrays.copyOf(from, from.length * 2);
      to = Arrays.copyOf(to, to.length * 2);
      bits = Arrays.copyOf(bits, bits.length * 2);
    }
    int tail = first + count - at;
    System.arraycopy(from, at, from, at + 1, tail);
    System.arraycopy(to, at, to, at + 1, tail);
    System.arraycopy(bits, at, bits, at + 1, tail);
    from[at] = begin;
    to[at] = end;
    bits[at] = each;
    count++;
  }

  private void remove(int at) {
    int tail = first + count - at - 1;
    System.arraycopy(from, at + 1, from, at, tail);
    System.arraycopy(to, at + 1, to, at, tail);
    System.arraycopy(bits, at + 1, bits, at, tail);
    count--;
  }

  /** Removes up to so many bits, oldest first; gives how many. */
  long takeOldest(long wanted, Taker taker) {
    long left = Math.min(wanted, total);
    long taken = left;
    total -= taken;
    while (left > 0) {
      long seconds = Math.min(to[first] - from[first], left / bits[first]);
      if (seconds > 0) {
        taker.take(from[first], from[first] + seconds, bits[first]);
        left -= seconds * bits[first];
        from[first] += seconds;
      } else {
        // Part of one second.
        if (to[first] - from[first] > 1) {
          split(first, from[first] + 1);
        }
        taker.take(from[first], to[first], left);
        bits[first] -= left;
        left = 0;
      }
      if (from[first] == to[first]) {
        first++;
        count--;
      }
    }
    if (count == 0) {
      first = 0;
    }
    return taken;
  }

  /** Removes up to so many bits, newest first; gives how many. */
  long dropNewest(long wanted) {
    long left = Math.min(wanted, total);
    long dropped = left;
    total -= dropped;
    while (left > 0) {
      int last = first + count - 1;
      long seconds = Math.min(to[last] - from[last], left / bits[last]);
      if (seconds > 0) {
        left -= seconds * bits[last];
        to[last] -= seconds;
      } else {
        if (to[last] - from[last] > 1) {
          split(last, to[last] - 1);
          last++;
        }
        bits[last] -= left;
        left = 0;
      }
      if (from[last] == to[last]) {
        count--;
      }
    }
    if (count == 0) {
      first = 0;
    }
    return dropped;
  }

  /** Second of the oldest bit; only when there is one. */
  long oldest() {
    return from[first];
  }

  /** Shows all that is there. */
  void all(Taker taker) {
    for (int i = first; i < first + count; i++) {
      taker.take(from[i], to[i], bits[i]);
    }
  }
}
