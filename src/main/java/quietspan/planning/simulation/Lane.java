package quietspan.planning.simulation;

import java.util.Arrays;

/**
 * Bits of one class in the order in which they leave a store: by generation second, with a cursor.
 * Not more than {@link #available} of them may be taken yet.
 */
final class Lane {

  private int size;
  private long[] begin = new long[16];
  private long[] end = new long[16];
  private long[] density = new long[16];

  private int piece;
  private long generation;
  private long leftOfSecond;
  private long available;

  void clear() {
    size = 0;
  }

  /** Goes on with seconds that hold the same number of bits each, above zero. */
  void append(long from, long to, long bitsPerSecond) {
    if (size == begin.length) {
      begin = Arrays.copyOf(begin, 2 * size);
      end = Arrays.copyOf(end, 2 * size);
      density = Arrays.copyOf(density, 2 * size);
    }
    begin[size] = from;
    end[size] = to;
    density[size] = bitsPerSecond;
    size++;
  }

  /** Puts the cursor on the first bit. */
  void rewind() {
    piece = -1;
    available = 0;
    nextPiece();
  }

  private void nextPiece() {
    piece++;
    if (piece < size) {
      generation = begin[piece];
      leftOfSecond = density[piece];
    } else {
      generation = Long.MAX_VALUE;
      leftOfSecond = 0;
    }
  }

  void offer(long bits) {
    available += bits;
  }

  /** Generation second of the next bit; later than any when none may be taken. */
  long head() {
    return available > 0 ? generation : Long.MAX_VALUE;
  }

  /** Takes bits of the second at the head, at most as many as asked for; returns how many. */
  long take(long atMost) {
    long bits = Math.min(atMost, Math.min(leftOfSecond, available));
    available -= bits;
    leftOfSecond -= bits;
    if (leftOfSecond == 0) {
      generation++;
      if (generation == end[piece]) {
        nextPiece();
      } else {
        leftOfSecond = density[piece];
      }
    }
    return bits;
  }
}
