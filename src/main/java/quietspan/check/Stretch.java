package quietspan.check;

import java.util.Arrays;

/**
 * Whole on-board seconds {@code [from, to)} of the period within which nothing changes that rules
 * the stores. Arrays go by craft, then by data class.
 */
final class Stretch {

  final long from;
  final long to;

  /** What is made (bit/s). */
  final long[][] generation;

  /** The contact in which a craft sends, or null. */
  final Image[] sending;

  /** What it sends there (bit/s). */
  final long[] rate;

  /** For each craft the craft to which it sends over a cross-link, or -1. */
  final int[] sink;

  /** For each craft that is a sink: the second up to which it keeps room for what it will make. */
  final long[] sinkUntil;

  Stretch(long from, long to, int craftCount) {
    this.from = from;
    this.to = to;
    this.generation = new long[craftCount][];
    this.sending = new Image[craftCount];
    this.rate = new long[craftCount];
    this.sink = new int[craftCount];
    Arrays.fill(sink, -1);
    this.sinkUntil = new long[craftCount];
  }
}
