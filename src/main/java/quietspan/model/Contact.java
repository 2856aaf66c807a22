package quietspan.model;

import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;

/**
 * A booked use of a pass, in ground receive time, whole seconds.
 *
 * @param id never changes; calendar UIDs are made from it
 * @param steps rates in time order; the first begins with the contact
 */
public record Contact(
    String id,
    String station,
    String antenna,
    String craft,
    Interval<GroundInstant> during,
    List<RateStep> steps,
    Set<Service> services,
    Status status) {

  /** What the contact carries. */
  public enum Service {
    TELEMETRY,
    COMMAND,
    RANGING
  }

  /** The words of RFC 5545, 3.8.1.11. */
  public enum Status {
    TENTATIVE,
    CONFIRMED,
    CANCELLED
  }

  public Contact {
    steps = List.copyOf(steps);
    services = java.util.Collections.unmodifiableSortedSet(new TreeSet<>(services));
    if (steps.isEmpty() || !steps.get(0).from().equals(during.begin())) {
      throw new IllegalArgumentException("the first rate of a contact begins with it: " + id);
    }
  }
}
