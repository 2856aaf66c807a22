package quietspan.planning.simulation;

import java.util.Arrays;

/**
 * The bits of one class in one store by the second in which they were generated, as segments over
 * generation seconds. Segments may overlap; neighbours that go on alike are joined.
 *
 * <p>The first m seconds of a segment hold base m + floor((extra m + offset) / over) bits: an even
 * spread without fractions of bits. A constant density has extra 0 and over 1.
 */
final class Ages {

  private static final int CROWDED = 32;

  private int size;
  private long bits;
  private int crowded = CROWDED;
  private long[] begin = new long[8];
  private long[] length = new long[8];
  private long[] base = new long[8];
  private long[] extra = new long[8];
  private long[] over = new long[8];
  private long[] offset = new long[8];

  long bits() {
    return bits;
  }

  /** The same number of bits generated in each of the seconds from {@code second} on. */
  void add(long second, long seconds, long bitsPerSecond) {
    add(second, seconds, bitsPerSecond, 0, 1, 0);
  }

  /**
   * A volume spread over the seconds before the period so that the first j of n seconds hold
   * floor(j volume / n) bits.
   */
  void addSpread(long volume, long seconds) {
    add(-seconds, seconds, volume / seconds, volume % seconds, seconds, 0);
  }

  /** Moves everything of the other store here. */
  void addAll(Ages other) {
    for (int i = 0; i < other.size; i++) {
      add(
          other.begin[i],
          other.length[i],
          other.base[i],
          other.extra[i],
          other.over[i],
          other.offset[i]);
    }
    other.clear();
  }

  void clear() {
    size = 0;
    bits = 0;
  }

  private void add(
      long newBegin, long newLength, long newBase, long newExtra, long newOver, long newOffset) {
    long volume = volume(newBase, newExtra, newOver, newOffset, newLength);
    if (volume == 0) {
      return;
    }
    bits += volume;
    if (newLength == 1) {
      addSecond(newBegin, volume);
      return;
    }
    for (int i = 0; i < size; i++) {
      boolean alike = base[i] == newBase && extra[i] == newExtra && over[i] == newOver;
      if (!alike) {
        continue;
      }
      if (begin[i] + length[i] == newBegin
          && newOffset == (extra[i] * length[i] + offset[i]) % over[i]) {
        length[i] += newLength;
        return;
      }
      if (newExtra == 0 && newBegin + newLength == begin[i]) {
        begin[i] = newBegin;
        length[i] += newLength;
        return;
      }
    }
    append(newBegin, newLength, newBase, newExtra, newOver, newOffset);
    if (size > crowded) {
      untangle();
    }
  }

  /** One second's bits: added to what is held of that second, then joined to what it goes on. */
  private void addSecond(long second, long volume) {
    long sum = volume;
    for (int i = 0; i < size; i++) {
      if (length[i] == 1 && begin[i] == second) {
        sum += base[i];
        remove(i);
        break;
      }
    }
    for (int i = 0; i < size; i++) {
      if (begin[i] + length[i] == second
          && volume(i, length[i] + 1) - volume(i, length[i]) == sum) {
        length[i]++;
        return;
      }
      if (extra[i] == 0 && second + 1 == begin[i] && base[i] == sum) {
        begin[i]--;
        length[i]++;
        return;
      }
    }
    append(second, 1, sum, 0, 1, 0);
  }

  private void append(
      long newBegin, long newLength, long newBase, long newExtra, long newOver, long newOffset) {
    if (size == begin.length) {
      grow();
    }
    begin[size] = newBegin;
    length[size] = newLength;
    base[size] = newBase;
    extra[size] = newExtra;
    over[size] = newOver;
    offset[size] = newOffset;
    size++;
  }

  private void grow() {
    begin = Arrays.copyOf(begin, 2 * size);
    length = Arrays.copyOf(length, 2 * size);
    base = Arrays.copyOf(base, 2 * size);
    extra = Arrays.copyOf(extra, 2 * size);
    over = Arrays.copyOf(over, 2 * size);
    offset = Arrays.copyOf(offset, 2 * size);
  }

  private void remove(int i) {
    move(--size, i);
  }

  private void move(int from, int to) {
    begin[to] = begin[from];
    length[to] = length[from];
    base[to] = base[from];
    extra[to] = extra[from];
    over[to] = over[from];
    offset[to] = offset[from];
  }

  private static long volume(long base, long extra, long over, long offset, long seconds) {
    return base * seconds + (extra == 0 ? 0 : (extra * seconds + offset) / over);
  }

  private long volume(int i, long seconds) {
    return volume(base[i], extra[i], over[i], offset[i], seconds);
  }

  /** Bits generated before a second. */
  long before(long second) {
    long sum = 0;
    for (int i = 0; i < size; i++) {
      if (begin[i] < second) {
        sum += volume(i, Math.min(length[i], second - begin[i]));
      }
    }
    return sum;
  }

  /** The second in which the oldest bit was generated; there must be one. */
  long oldest() {
    long oldest = Long.MAX_VALUE;
    for (int i = 0; i < size; i++) {
      long first = begin[i];
      if (base[i] == 0) {
        first += -Math.floorDiv(offset[i] - over[i], extra[i]) - 1;
      }
      oldest = Math.min(oldest, first);
    }
    return oldest;
  }

  /** Moves the oldest bits into another store; there must be that many. */
  void moveOldest(long volume, Ages into) {
    if (volume == bits) {
      into.addAll(this);
      return;
    }
    if (volume == 0) {
      return;
    }
    long cut = cut(volume);
    long rest = volume - before(cut);
    long left = 0;
    bits -= volume;
    int segments = size;
    size = 0;
    for (int i = 0; i < segments; i++) {
      long whole = Math.max(0, Math.min(length[i], cut - begin[i]));
      if (whole > 0) {
        into.add(begin[i], whole, base[i], extra[i], over[i], offset[i]);
        drop(i, whole);
      }
      if (rest > 0 && length[i] > 0 && begin[i] == cut) {
        long here = volume(i, 1);
        long part = Math.min(rest, here);
        into.add(cut, 1, part);
        rest -= part;
        left += here - part;
        drop(i, 1);
      }
      if (length[i] > 0 && volume(i, length[i]) > 0) {
        move(i, size++);
      }
    }
    if (left > 0) {
      addSecond(cut, left);
    }
  }

  /** Writes the oldest bits, at most that many, in order into a lane. */
  void copyOldest(long volume, Lane lane) {
    lane.clear();
    if (volume == 0 || bits == 0) {
      return;
    }
    long cut = volume >= bits ? Long.MAX_VALUE : cut(volume);
    long[] edges = new long[2 * size];
    int count = 0;
    for (int i = 0; i < size; i++) {
      if (begin[i] < cut) {
        edges[count++] = begin[i];
        edges[count++] = Math.min(cut, begin[i] + length[i]);
      }
    }
    Arrays.sort(edges, 0, count);
    for (int e = 0; e + 1 < count; e++) {
      if (edges[e] < edges[e + 1]) {
        copy(edges[e], edges[e + 1], lane);
      }
    }
    if (volume < bits && volume > before(cut)) {
      lane.append(cut, cut + 1, volume - before(cut));
    }
  }

  /** Writes a stretch in which no segment begins or ends. */
  private void copy(long from, long to, Lane lane) {
    long density = 0;
    boolean even = true;
    for (int i = 0; i < size; i++) {
      if (begin[i] <= from && from < begin[i] + length[i]) {
        density += base[i];
        even &= extra[i] == 0;
      }
    }
    if (even && density > 0) {
      lane.append(from, to, density);
    }
    for (long second = from; !even && second < to; second++) {
      long held = before(second + 1) - before(second);
      if (held > 0) {
        lane.append(second, second + 1, held);
      }
    }
  }

  /** Removes the newest bits; there must be that many. */
  void removeNewest(long volume) {
    Ages kept = new Ages();
    moveOldest(bits - volume, kept);
    clear();
    addAll(kept);
  }

  /** The second in which the bit lies that follows so many older ones; there must be one. */
  private long cut(long volume) {
    long low = Long.MAX_VALUE;
    long high = Long.MIN_VALUE;
    for (int i = 0; i < size; i++) {
      low = Math.min(low, begin[i]);
      high = Math.max(high, begin[i] + length[i]);
    }
    while (high - low > 1) {
      long middle = low + (high - low) / 2;
      if (before(middle) <= volume) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return low;
  }

  /** Takes the first seconds off a segment. */
  private void drop(int i, long seconds) {
    offset[i] = (extra[i] * seconds + offset[i]) % over[i];
    begin[i] += seconds;
    length[i] -= seconds;
    if (length[i] == 1) {
      base[i] = volume(i, 1);
      extra[i] = 0;
      over[i] = 1;
      offset[i] = 0;
    }
  }

  /** Joins all constant densities into segments that do not overlap. */
  private void untangle() {
    long[] edges = new long[2 * size];
    int count = 0;
    Ages spread = new Ages();
    for (int i = 0; i < size; i++) {
      if (extra[i] == 0) {
        edges[count++] = begin[i];
        edges[count++] = begin[i] + length[i];
      } else {
        spread.append(begin[i], length[i], base[i], extra[i], over[i], offset[i]);
      }
    }
    Arrays.sort(edges, 0, count);
    for (int e = 0; e + 1 < count; e++) {
      long density = 0;
      for (int i = 0; i < size; i++) {
        if (extra[i] == 0 && begin[i] <= edges[e] && edges[e] < begin[i] + length[i]) {
          density += base[i];
        }
      }
      if (density > 0 && edges[e] < edges[e + 1]) {
        spread.appendConstant(edges[e], edges[e + 1] - edges[e], density);
      }
    }
    size = 0;
    for (int i = 0; i < spread.size; i++) {
      append(
          spread.begin[i],
          spread.length[i],
          spread.base[i],
          spread.extra[i],
          spread.over[i],
          spread.offset[i]);
    }
    crowded = Math.max(CROWDED, 2 * size);
  }

  private void appendConstant(long second, long seconds, long density) {
    int last = size - 1;
    if (last >= 0
        && extra[last] == 0
        && base[last] == density
        && begin[last] + length[last] == second) {
      length[last] += seconds;
    } else {
      append(second, seconds, density, 0, 1, 0);
    }
  }
}
