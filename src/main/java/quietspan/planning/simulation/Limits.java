package quietspan.planning.simulation;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.Waiver;

/**
 * The latency limit of one class by generation second: the rule's own, and a longer one over the
 * stretches in which it is waived. Overlapping waivers: the longest counts.
 */
final class Limits {

  private static final long SECOND = 1_000_000_000;

  private record Relaxed(long begin, long end, long nanos) {}

  private final long nanos;
  private final List<Relaxed> relaxed;

  private Limits(long nanos, List<Relaxed> relaxed) {
    this.nanos = nanos;
    this.relaxed = List.copyOf(relaxed);
  }

  static Limits of(Scenario scenario, String dataClass, List<Waiver> waivers) {
    Instant origin = scenario.period().begin().utc();
    long nanos = scenario.rules().dataClass(dataClass).latencyLimit().toNanos();
    List<Relaxed> raw = new ArrayList<>();
    TreeSet<Long> edges = new TreeSet<>();
    for (Waiver waiver : waivers) {
      long begin = firstSecond(origin, waiver.begin());
      long end = firstSecond(origin, waiver.end());
      if (waiver.rule() == RuleId.LATENCY
          && waiver.dataClass().equals(dataClass)
          && waiver.relaxedLimit().toNanos() > nanos
          && begin < end) {
        raw.add(new Relaxed(begin, end, waiver.relaxedLimit().toNanos()));
        edges.add(begin);
        edges.add(end);
      }
    }
    List<Relaxed> pieces = new ArrayList<>();
    for (Long begin : edges) {
      Long end = edges.higher(begin);
      long longest =
          raw.stream()
              .filter(one -> one.begin() <= begin && begin < one.end())
              .mapToLong(Relaxed::nanos)
              .max()
              .orElse(0);
      if (end != null && longest > 0) {
        pieces.add(new Relaxed(begin, end, longest));
      }
    }
    return new Limits(nanos, pieces);
  }

  /** The first second of generation at or after an instant. */
  private static long firstSecond(Instant origin, Instant instant) {
    Duration since = Duration.between(origin, instant);
    return since.getSeconds() + (since.getNano() > 0 ? 1 : 0);
  }

  /** The limit outside waivers: the shortest there is. */
  long shortestNanos() {
    return nanos;
  }

  /** Whether a bit generated in that second exceeds its limit when delivered at that instant. */
  boolean isLate(long generation, long deliveredNanos) {
    long age = deliveredNanos - generation * SECOND;
    return age > nanos && (relaxed.isEmpty() || age > limitNanos(generation));
  }

  private long limitNanos(long generation) {
    for (Relaxed piece : relaxed) {
      if (piece.begin() <= generation && generation < piece.end()) {
        return piece.nanos();
      }
    }
    return nanos;
  }

  /** How many of the bits exceed their limit when all are delivered at that instant. */
  long late(Ages ages, long deliveredNanos) {
    long late = ages.before(firstInTime(deliveredNanos, nanos));
    for (Relaxed piece : relaxed) {
      late -= within(ages, piece, firstInTime(deliveredNanos, nanos));
      late += within(ages, piece, firstInTime(deliveredNanos, piece.nanos()));
    }
    return late;
  }

  /** Bits generated in the piece and before a second. */
  private static long within(Ages ages, Relaxed piece, long before) {
    return before <= piece.begin()
        ? 0
        : ages.before(Math.min(before, piece.end())) - ages.before(piece.begin());
  }

  /** The oldest generation second that is not late. */
  private static long firstInTime(long deliveredNanos, long limitNanos) {
    return -Math.floorDiv(limitNanos - deliveredNanos, SECOND);
  }
}
