package quietspan.planning.simulation;

import java.time.Instant;
import java.util.List;
import java.util.Locale;
import quietspan.model.Finding;
import quietspan.model.RuleId;
import quietspan.time.OnboardInstant;

/** Watches one store for fill above the planned limit and for overflow. */
final class FillWatch {

  private final String craft;
  private final long planned;
  private final OnboardInstant origin;
  private final List<Finding> findings;

  private long overBegin;
  private long overEnd;
  private long overBitSeconds;
  private long peak;

  private long lossBegin;
  private long lossEnd;
  private long lossBits;

  private long highest;

  FillWatch(String craft, long planned, long start, OnboardInstant origin, List<Finding> findings) {
    this.craft = craft;
    this.planned = planned;
    this.origin = origin;
    this.findings = findings;
    this.highest = start;
  }

  /**
   * Seconds that are alike.
   *
   * @param fill at the begin of the first one
   * @param change in each
   * @param lost in each
   */
  void pass(long second, long seconds, long fill, long change, long lost) {
    long last = fill + change * seconds;
    highest = Math.max(highest, Math.max(fill + change, last));
    watchFill(second, seconds, fill, change);
    if (lost > 0) {
      if (lossBits == 0) {
        lossBegin = second;
      }
      lossBits += lost * seconds;
      lossEnd = second + seconds;
    } else {
      endLoss();
    }
  }

  private void watchFill(long second, long seconds, long fill, long change) {
    // Second j of these, counted from 0, ends with fill + (j + 1) change.
    long from = 0;
    long to = seconds;
    long room = planned - fill;
    if (change > 0) {
      from = Math.max(0, Math.min(seconds, Math.floorDiv(room, change)));
    } else if (change < 0) {
      to = Math.max(0, Math.min(seconds, -Math.floorDiv(room, -change) - 1));
    } else if (room >= 0) {
      to = 0;
    }
    if (from >= to) {
      endOver();
      return;
    }
    if (overBitSeconds == 0) {
      overBegin = second + from;
      peak = 0;
    }
    long first = fill + (from + 1) * change - planned;
    long ending = fill + to * change - planned;
    overBitSeconds += sum(first, ending, to - from);
    peak = Math.max(peak, Math.max(first, ending));
    overEnd = second + to;
    if (to < seconds) {
      endOver();
    }
  }

  /** Sum of evenly spaced whole numbers. */
  private static long sum(long first, long last, long count) {
    long ends = first + last;
    return count % 2 == 0 ? count / 2 * ends : ends / 2 * count;
  }

  private void endOver() {
    if (overBitSeconds > 0) {
      findings.add(
          finding(
              RuleId.FILL,
              overBegin,
              (double) overBitSeconds,
              String.format(
                  Locale.ROOT,
                  "%d bit above the planned fill of %d bit at most, over %d s",
                  peak,
                  planned,
                  overEnd - overBegin)));
      overBitSeconds = 0;
    }
  }

  private void endLoss() {
    if (lossBits > 0) {
      findings.add(
          finding(
              RuleId.OVERFLOW,
              lossBegin,
              (double) lossBits,
              String.format(Locale.ROOT, "%d bit lost in %d s", lossBits, lossEnd - lossBegin)));
      lossBits = 0;
    }
  }

  private Finding finding(RuleId rule, long second, double amount, String detail) {
    Instant at = origin.plusSeconds(second).utc();
    return new Finding(rule, at, craft, "", "", amount, detail);
  }

  /** The period is over; returns the highest fill at the begin or the end of a second. */
  long finish() {
    endOver();
    endLoss();
    return highest;
  }
}
