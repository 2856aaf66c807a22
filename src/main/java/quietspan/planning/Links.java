package quietspan.planning;

import java.util.Comparator;
import java.util.List;
import quietspan.model.Geometry;
import quietspan.rules.Opportunities;
import quietspan.rules.Opportunity;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;

/**
 * How many bits each craft can bring down in each sample interval: opportunities and link together.
 * Intervals are those between two samples of {@link Tables}.
 */
final class Links {

  /**
   * A stretch in which an antenna could hear a craft.
   *
   * @param begin ground receive time, seconds since the instant that the period's begin reads on
   *     board
   * @param end as begin, exclusive
   */
  record Window(int craft, int antenna, int begin, int end) {}

  /** Samples are finite: optimistic links are better by this (dB). */
  private static final double LINK_GUARD_DB = 0.03;

  private final Tables tables;
  private final int atOnce;

  /** Seconds of opportunity by {@code [craft][antenna][sample]}. */
  private final short[][][] seconds;

  /** Confirmed contacts that can be kept. */
  final List<Window> confirmed;

  /** All windows by begin, then craft and antenna. */
  final List<Window> windows;

  Links(Tables tables, List<Window> windows, List<Window> confirmed) {
    this.confirmed = List.copyOf(confirmed);
    this.tables = tables;
    this.atOnce = tables.scenario.rules().contacts().contactsAtOnce();
    this.seconds = new short[tables.craftCount][tables.antennas.size()][tables.samples];
    this.windows =
        windows.stream()
            .sorted(
                Comparator.comparingInt(Window::begin)
                    .thenComparingInt(Window::craft)
                    .thenComparingInt(Window::antenna))
            .toList();
    for (Window window : windows) {
      short[] row = seconds[window.craft()][window.antenna()];
      // Widened by a second, since light time is not whole.
      int from = Math.max(0, tables.onboardFloor(window.craft(), window.begin()));
      int end = Math.min(tables.length, tables.onboardCeil(window.craft(), window.end()));
      for (int s = from; s < end; ) {
        int sample = s / Tables.STEP;
        int until = Math.min(end, (sample + 1) * Tables.STEP);
        if (sample < row.length) {
          row[sample] = (short) Math.min(Tables.STEP, row[sample] + until - s);
        }
        s = until;
      }
    }
  }

  /** Links over the opportunities of a scenario, with the confirmed contacts that they allow. */
  static Links of(Tables tables, List<Opportunity> opportunities) {
    List<Window> windows =
        opportunities.stream()
            .map(one -> window(tables, one.craft(), one.station(), one.antenna(), one.during()))
            .toList();
    List<Window> confirmed =
        tables.scenario.calendars().confirmed().stream()
            .map(one -> window(tables, one.craft(), one.station(), one.antenna(), one.during()))
            .filter(
                window ->
                    windows.stream()
                        .anyMatch(
                            other ->
                                other.craft() == window.craft()
                                    && other.antenna() == window.antenna()
                                    && other.begin() <= window.begin()
                                    && window.end() <= other.end()))
            .toList();
    return new Links(tables, windows, confirmed);
  }

  private static Window window(
      Tables tables, String craft, String station, String antenna, Interval<GroundInstant> during) {
    return new Window(
        tables.craft(craft),
        tables.antenna(station, antenna),
        tables.second(during.begin().epochSecond()),
        tables.second(during.end().epochSecond()));
  }

  /**
   * The same with every second that a legal contact may use: what the planner is offered keeps away
   * from the edges of passes, and leaves out passes that are just long enough.
   */
  Links unguarded() {
    if (tables.geometry.guardSeconds() == 0) {
      return this;
    }
    Geometry exact =
        new Geometry(
            tables.geometry.sightLines(), tables.geometry.passes(), 0, tables.geometry.sources());
    Links all = of(tables, Opportunities.of(tables.scenario, exact));
    return new Links(tables, all.windows, confirmed);
  }

  int seconds(int craft, int antenna, int sample) {
    return seconds[craft][antenna][sample];
  }

  private long rate(int craft, int antenna, int sample, double off, boolean optimistic) {
    float[] row = tables.centre[craft][antenna];
    int next = Math.min(sample + 1, tables.samples - 1);
    double centre =
        optimistic
            ? Math.max(row[sample], row[next]) + LINK_GUARD_DB
            : Math.min(row[sample], row[next]);
    return tables.effectiveRate(craft, centre, off);
  }

  /** Bits of one craft in one interval over its best antennas (bit). */
  long alone(int craft, int sample, double off, boolean optimistic) {
    long best = 0;
    long fastest = 0;
    long sum = 0;
    for (int a = 0; a < tables.antennas.size(); a++) {
      int available = seconds[craft][a][sample];
      if (available == 0) {
        continue;
      }
      long rate = rate(craft, a, sample, off, optimistic);
      best = Math.max(best, rate * available);
      fastest = Math.max(fastest, rate);
      sum += rate * available;
    }
    return optimistic ? Math.min(sum, fastest * Tables.STEP) : best;
  }

  /**
   * Most bits that a set of craft can bring down in one interval with as many links as are allowed.
   */
  long together(int mask, int sample, boolean optimistic) {
    if (Integer.bitCount(mask) == 1) {
      return alone(Integer.numberOfTrailingZeros(mask), sample, 0, optimistic);
    }
    if (atOnce == 1) {
      return one(mask, sample, optimistic);
    }
    return matching(mask, sample, atOnce, 0, optimistic);
  }

  private long one(int mask, int sample, boolean optimistic) {
    long best = 0;
    long fastest = 0;
    long sum = 0;
    for (int c = 0; c < tables.craftCount; c++) {
      if ((mask >> c & 1) == 0) {
        continue;
      }
      for (int a = 0; a < tables.antennas.size(); a++) {
        int available = seconds[c][a][sample];
        if (available > 0) {
          long rate = rate(c, a, sample, 0, optimistic);
          best = Math.max(best, rate * available);
          fastest = Math.max(fastest, rate);
          sum += rate * available;
        }
      }
    }
    return optimistic ? Math.min(sum, fastest * Tables.STEP) : best;
  }

  /** Best assignment of at most {@code left} craft of the mask to different antennas. */
  private long matching(int mask, int sample, int left, int antennasUsed, boolean optimistic) {
    if (left == 0 || mask == 0) {
      return 0;
    }
    int c = Integer.numberOfTrailingZeros(mask);
    int rest = mask & mask - 1;
    long best = matching(rest, sample, left, antennasUsed, optimistic);
    for (int a = 0; a < tables.antennas.size(); a++) {
      int available = seconds[c][a][sample];
      if (available > 0 && (antennasUsed >> a & 1) == 0) {
        long bits = rate(c, a, sample, 0, optimistic) * (optimistic ? Tables.STEP : available);
        best =
            Math.max(
                best, bits + matching(rest, sample, left - 1, antennasUsed | 1 << a, optimistic));
      }
    }
    return best;
  }
}
