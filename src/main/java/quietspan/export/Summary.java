package quietspan.export;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import quietspan.model.Bound;
import quietspan.model.Outcome;
import quietspan.model.Plan;
import quietspan.model.QuietSpan;
import quietspan.model.Scenario;
import quietspan.model.StoreTrace;
import quietspan.model.Waiver;

/**
 * A plan in a handful of figures.
 *
 * @param scienceSeconds value of the quiet spans
 * @param periodSeconds length of the planning period
 * @param pauses pauses that hold a repoint
 * @param bound on legal plans; absent when it was not computed
 * @param longestQuietSpanSeconds open spans included; absent when there is no span at all
 * @param shortestQuietSpanSeconds open spans left out; absent when there is no inner span
 * @param highestFillShare of the store that is filled most, as a fraction of its capacity
 */
public record Summary(
    Status status,
    long scienceSeconds,
    long periodSeconds,
    long pauses,
    Optional<Bound> bound,
    OptionalLong longestQuietSpanSeconds,
    OptionalLong shortestQuietSpanSeconds,
    long lostBits,
    double highestFillShare,
    OptionalDouble longestLatencySeconds,
    double contactHours,
    double stationCostUnits,
    List<Waiver> waivers) {

  /** Whether every rule is met, limits relaxed by the waivers. */
  public enum Status {
    LEGAL,
    SHORTFALL
  }

  public static Summary of(Scenario scenario, Plan plan) {
    Outcome outcome = plan.outcome();
    return new Summary(
        outcome.findings().isEmpty() ? Status.LEGAL : Status.SHORTFALL,
        outcome.scienceSeconds(),
        scenario.period().length().toSeconds(),
        outcome.repointPauses(),
        plan.bound(),
        outcome.quietSpans().stream().mapToLong(QuietSpan::lengthSeconds).max(),
        outcome.quietSpans().stream()
            .filter(span -> !span.openBefore() && !span.openAfter())
            .mapToLong(QuietSpan::lengthSeconds)
            .min(),
        outcome.lostBits(),
        outcome.stores().stream().mapToDouble(trace -> fill(scenario, trace)).max().orElse(0),
        outcome.classes().stream()
            .flatMapToDouble(each -> each.longestLatencySeconds().stream())
            .max(),
        outcome.contactHours(),
        outcome.stationCostUnits(),
        plan.provenance().waivers());
  }

  private static double fill(Scenario scenario, StoreTrace trace) {
    return (double) trace.highestBits() / scenario.craft(trace.craft()).store().bits();
  }

  public boolean shortfall() {
    return status == Status.SHORTFALL;
  }

  /** Absent when no bound was computed, or when it proves that no legal plan exists. */
  public Optional<Long> boundScienceSeconds() {
    return bound.flatMap(Bound::scienceSeconds);
  }

  public Optional<Integer> boundPauses() {
    return bound.flatMap(Bound::pauses);
  }

  /** Science by which the bound exceeds the plan. */
  public Optional<Long> gapSeconds() {
    return boundScienceSeconds().map(seconds -> seconds - scienceSeconds);
  }
}
