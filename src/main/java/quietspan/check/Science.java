package quietspan.check;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import quietspan.model.Interruption;
import quietspan.model.Pause;
import quietspan.model.QuietSpan;
import quietspan.model.Repoint;
import quietspan.model.Scenario;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * Pauses and quiet spans, on board.
 *
 * @param pauses repoints with settling and interruptions that overlap or touch, inside the period
 * @param seconds value of all quiet spans
 */
record Science(List<Pause> pauses, List<QuietSpan> spans, long seconds) {

  private record Stop(Interval<OnboardInstant> during, Optional<String> repoint, String label) {}

  static Science of(Scenario scenario, List<Repoint> repoints) {
    List<Pause> pauses = pauses(scenario, repoints);
    List<QuietSpan> spans = spans(scenario, pauses);
    return new Science(pauses, spans, spans.stream().mapToLong(QuietSpan::valueSeconds).sum());
  }

  static Interval<OnboardInstant> during(Scenario scenario, Repoint repoint) {
    return Interval.of(repoint.start(), scenario.craft(repoint.craft()).antenna().repointLength());
  }

  private static List<Pause> pauses(Scenario scenario, List<Repoint> repoints) {
    List<Stop> stops = new ArrayList<>();
    for (Repoint repoint : repoints) {
      during(scenario, repoint)
          .intersection(scenario.period())
          .ifPresent(part -> stops.add(new Stop(part, Optional.of(repoint.id()), "")));
    }
    for (Interruption interruption : scenario.calendars().interruptions()) {
      interruption
          .during()
          .intersection(scenario.period())
          .ifPresent(part -> stops.add(new Stop(part, Optional.empty(), interruption.label())));
    }
    stops.sort(Comparator.comparing(stop -> stop.during.begin()));
    List<Pause> pauses = new ArrayList<>();
    List<Stop> together = new ArrayList<>();
    Interval<OnboardInstant> hull = null;
    for (Stop stop : stops) {
      if (hull != null && !hull.overlapsOrTouches(stop.during)) {
        pauses.add(pause(hull, together));
        together.clear();
        hull = null;
      }
      hull = hull == null ? stop.during : hull.hull(stop.during);
      together.add(stop);
    }
    if (hull != null) {
      pauses.add(pause(hull, together));
    }
    return pauses;
  }

  private static Pause pause(Interval<OnboardInstant> during, List<Stop> stops) {
    return new Pause(
        during,
        stops.stream().map(Stop::repoint).flatMap(Optional::stream).toList(),
        stops.stream().filter(stop -> stop.repoint.isEmpty()).map(Stop::label).toList());
  }

  private static List<QuietSpan> spans(Scenario scenario, List<Pause> pauses) {
    List<QuietSpan> spans = new ArrayList<>();
    OnboardInstant from = scenario.period().begin();
    for (Pause pause : pauses) {
      addSpan(spans, scenario, from, pause.during().begin());
      from = pause.during().end();
    }
    addSpan(spans, scenario, from, scenario.period().end());
    return spans;
  }

  private static void addSpan(
      List<QuietSpan> spans, Scenario scenario, OnboardInstant from, OnboardInstant to) {
    if (!from.isBefore(to)) {
      return;
    }
    boolean first = from.equals(scenario.period().begin());
    boolean last = to.equals(scenario.period().end());
    OnboardInstant quietSince = first ? scenario.start().quietSince().orElse(from) : from;
    long length = to.since(quietSince).toSeconds();
    spans.add(
        new QuietSpan(
            Interval.of(from, to),
            length,
            value(scenario, Interval.of(from, to), quietSince, last),
            first,
            last));
  }

  /** A span counts from its minimum length on, less its warm-up, inside the period. */
  private static long value(
      Scenario scenario, Interval<OnboardInstant> inside, OnboardInstant quietSince, boolean last) {
    var science = scenario.rules().science();
    boolean tooShort = inside.end().since(quietSince).compareTo(science.minimumSpan()) < 0;
    if (tooShort && !last) {
      return 0;
    }
    long warmUpLeft =
        Math.max(0, quietSince.plus(science.warmUp()).since(inside.begin()).toSeconds());
    return Math.max(0, inside.length().toSeconds() - warmUpLeft);
  }
}
