package quietspan.check;

import java.util.List;
import java.util.Optional;
import java.util.function.ToDoubleFunction;
import quietspan.time.GroundInstant;

/**
 * What sampling a margin over some stretch showed. The margin is at least zero where the rule is
 * kept; infinite where it does not apply.
 *
 * @param least the smallest margin seen; infinite when it applied nowhere
 * @param leastAt where that was
 * @param brokenFrom first instant below zero, to {@link #REFINED_SECONDS}
 * @param brokenSeconds time spent below zero
 * @param largestStep largest change between neighbouring samples: between two samples the margin
 *     can dip below both by half of it
 */
record Survey(
    double least,
    Optional<GroundInstant> leastAt,
    Optional<GroundInstant> brokenFrom,
    double brokenSeconds,
    double largestStep) {

  /** A change of sign is bisected to this. */
  static final double REFINED_SECONDS = 0.01;

  static final Survey NOTHING =
      new Survey(Double.POSITIVE_INFINITY, Optional.empty(), Optional.empty(), 0, 0);

  boolean broken() {
    return brokenFrom.isPresent();
  }

  /** Samples a margin at instants in time order; the first and the last are the closed ends. */
  static Survey of(List<GroundInstant> instants, ToDoubleFunction<GroundInstant> margin) {
    Survey all = NOTHING;
    GroundInstant before = instants.get(0);
    double valueBefore = margin.applyAsDouble(before);
    all = all.with(before, valueBefore);
    for (GroundInstant now : instants.subList(1, instants.size())) {
      double value = margin.applyAsDouble(now);
      all = all.with(now, value).withStep(Math.abs(value - valueBefore));
      if (valueBefore < 0 && value < 0) {
        all = all.withBreach(before, now);
      } else if (valueBefore < 0) {
        all = all.withBreach(before, crossing(before, now, margin));
      } else if (value < 0) {
        all = all.withBreach(crossing(before, now, margin), now);
      }
      before = now;
      valueBefore = value;
    }
    return all;
  }

  /** Both together; this one is the earlier. */
  Survey and(Survey later) {
    return new Survey(
        Math.min(least, later.least),
        later.least < least ? later.leastAt : leastAt,
        brokenFrom.or(() -> later.brokenFrom),
        brokenSeconds + later.brokenSeconds,
        Math.max(largestStep, later.largestStep));
  }

  /** This one with a stretch that could not be sampled and counts as broken. */
  Survey withBreach(GroundInstant from, GroundInstant to) {
    return new Survey(
        least,
        leastAt,
        brokenFrom.isPresent() && !from.isBefore(brokenFrom.get()) ? brokenFrom : Optional.of(from),
        brokenSeconds + to.secondsSince(from),
        largestStep);
  }

  private Survey with(GroundInstant at, double value) {
    return value < least
        ? new Survey(value, Optional.of(at), brokenFrom, brokenSeconds, largestStep)
        : this;
  }

  private Survey withStep(double step) {
    return step > largestStep && Double.isFinite(step)
        ? new Survey(least, leastAt, brokenFrom, brokenSeconds, step)
        : this;
  }

  private static GroundInstant crossing(
      GroundInstant from, GroundInstant to, ToDoubleFunction<GroundInstant> margin) {
    boolean brokenAtFrom = margin.applyAsDouble(from) < 0;
    GroundInstant low = from;
    GroundInstant high = to;
    while (high.secondsSince(low) > REFINED_SECONDS) {
      GroundInstant middle = low.plusSeconds(high.secondsSince(low) / 2);
      if (margin.applyAsDouble(middle) < 0 == brokenAtFrom) {
        low = middle;
      } else {
        high = middle;
      }
    }
    // On the broken side, so that no breach is without length.
    return brokenAtFrom ? high : low;
  }
}
