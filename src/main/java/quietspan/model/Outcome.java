package quietspan.model;

import java.util.List;

/**
 * What follows from a scenario and decisions: a pure function of them.
 *
 * @param scienceSeconds value of the quiet spans
 * @param findings every broken rule, by time
 */
public record Outcome(
    List<Pause> pauses,
    List<QuietSpan> quietSpans,
    long scienceSeconds,
    List<ContactOutcome> contacts,
    List<StoreTrace> stores,
    List<ClassOutcome> classes,
    double contactHours,
    double stationCostUnits,
    List<Finding> findings) {

  public Outcome {
    pauses = List.copyOf(pauses);
    quietSpans = List.copyOf(quietSpans);
    contacts = List.copyOf(contacts);
    stores = List.copyOf(stores);
    classes = List.copyOf(classes);
    findings = List.copyOf(findings);
  }

  /** Pauses that hold a repoint. */
  public long repointPauses() {
    return pauses.stream().filter(pause -> !pause.repoints().isEmpty()).count();
  }

  public long lostBits() {
    return stores.stream().mapToLong(StoreTrace::lostBits).sum();
  }
}
