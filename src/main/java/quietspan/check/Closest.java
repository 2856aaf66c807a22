package quietspan.check;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import quietspan.check.CheckMargins.Extreme;
import quietspan.model.ClassOutcome;
import quietspan.model.Repoint;
import quietspan.model.StoreTrace;

/** Finds where a plan comes nearest to its limits. */
final class Closest {

  private Closest() {}

  static CheckMargins margins(Evidence evidence) {
    return new CheckMargins(
        least(evidence, Watch::insideCone)
            .map(each -> new Extreme(Math.toDegrees(each.value()), each.subject())),
        least(evidence, Watch::link),
        smallest(
            TurnRound.all(evidence).stream()
                .map(turn -> new Extreme(turn.spareSeconds(), turn.later().id()))
                .toList()),
        smallest(afterRepoints(evidence)),
        highestFill(evidence),
        longestLatencies(evidence));
  }

  private static Optional<Extreme> smallest(List<Extreme> all) {
    return all.stream().min(Comparator.comparingDouble(Extreme::value));
  }

  private static Optional<Extreme> least(Evidence evidence, Function<Watch, Survey> which) {
    return smallest(
        evidence.watches().stream()
            .map(watch -> new Extreme(which.apply(watch).least(), watch.contact().id()))
            .filter(each -> Double.isFinite(each.value()))
            .toList());
  }

  private static List<Extreme> afterRepoints(Evidence evidence) {
    List<Extreme> all = new ArrayList<>();
    for (Watch watch : evidence.watches()) {
      Repoint last = null;
      for (Repoint repoint : evidence.repoints(watch.contact().craft())) {
        if (!repoint.start().isAfter(watch.onboard().begin())) {
          last = repoint;
        }
      }
      if (last != null) {
        double seconds = watch.onboard().begin().secondsSince(evidence.during(last).end());
        all.add(new Extreme(seconds, watch.contact().id()));
      }
    }
    return all;
  }

  private static Optional<Extreme> highestFill(Evidence evidence) {
    List<Extreme> all = new ArrayList<>();
    for (StoreTrace trace : evidence.stores().traces()) {
      long capacity = evidence.scenario().craft(trace.craft()).store().bits();
      if (capacity > 0) {
        all.add(new Extreme(100.0 * trace.highestBits() / capacity, trace.craft()));
      }
    }
    return all.stream().max(Comparator.comparingDouble(Extreme::value));
  }

  private static List<Extreme> longestLatencies(Evidence evidence) {
    List<Extreme> all = new ArrayList<>();
    for (ClassOutcome each : evidence.stores().classes()) {
      each.longestLatencySeconds()
          .ifPresent(seconds -> all.add(new Extreme(seconds, each.dataClass())));
    }
    return all;
  }
}
