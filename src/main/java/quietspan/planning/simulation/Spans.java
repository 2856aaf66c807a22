package quietspan.planning.simulation;

import java.time.Duration;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import quietspan.model.Interruption;
import quietspan.model.Pause;
import quietspan.model.QuietSpan;
import quietspan.model.Repoint;
import quietspan.model.Scenario;
import quietspan.model.ScienceRules;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * Pauses and quiet spans: what repoints and planned interruptions leave of the period.
 *
 * @param pauses in time order; intervals that overlap or touch are one pause
 * @param quietSpans what remains of the period, in time order
 * @param scienceSeconds sum of the values of the spans
 */
public record Spans(List<Pause> pauses, List<QuietSpan> quietSpans, long scienceSeconds) {

  public Spans {
    pauses = List.copyOf(pauses);
    quietSpans = List.copyOf(quietSpans);
  }

  /** Repoints and interruptions are clipped to the period; what lies outside it is ignored. */
  public static Spans of(Scenario scenario, List<Repoint> repoints) {
    List<Pause> pauses = pauses(scenario, repoints);
    List<QuietSpan> spans = quietSpans(scenario, pauses);
    return new Spans(pauses, spans, spans.stream().mapToLong(QuietSpan::valueSeconds).sum());
  }

  /** Something that stops science: a repoint by its id, or an interruption by its label. */
  private record Stop(
      Interval<OnboardInstant> during, Optional<String> repoint, Optional<String> interruption) {}

  private static List<Pause> pauses(Scenario scenario, List<Repoint> repoints) {
    List<Stop> stops = new ArrayList<>();
    for (Repoint repoint : repoints) {
      Duration length = scenario.craft(repoint.craft()).antenna().repointLength();
      clip(scenario, repoint.start(), repoint.start().plus(length))
          .ifPresent(
              during -> stops.add(new Stop(during, Optional.of(repoint.id()), Optional.empty())));
    }
    for (Interruption interruption : scenario.calendars().interruptions()) {
      clip(scenario, interruption.during().begin(), interruption.during().end())
          .ifPresent(
              during ->
                  stops.add(new Stop(during, Optional.empty(), Optional.of(interruption.label()))));
    }
    stops.sort(Comparator.comparing(stop -> stop.during().begin()));
    List<Pause> pauses = new ArrayList<>();
    int from = 0;
    while (from < stops.size()) {
      Interval<OnboardInstant> during = stops.get(from).during();
      int to = from + 1;
      while (to < stops.size() && stops.get(to).during().overlapsOrTouches(during)) {
        during = during.hull(stops.get(to).during());
        to++;
      }
      List<Stop> members = stops.subList(from, to);
      pauses.add(
          new Pause(
              during,
              members.stream().flatMap(stop -> stop.repoint().stream()).toList(),
              members.stream().flatMap(stop -> stop.interruption().stream()).toList()));
      from = to;
    }
    return pauses;
  }

  private static Optional<Interval<OnboardInstant>> clip(
      Scenario scenario, OnboardInstant begin, OnboardInstant end) {
    return begin.isBefore(end)
        ? Interval.of(begin, end).intersection(scenario.period())
        : Optional.empty();
  }

  private static List<QuietSpan> quietSpans(Scenario scenario, List<Pause> pauses) {
    OnboardInstant begin = scenario.period().begin();
    OnboardInstant end = scenario.period().end();
    OnboardInstant quietSince = scenario.start().quietSince().orElse(begin);
    List<QuietSpan> spans = new ArrayList<>();
    OnboardInstant from = quietSince.isAfter(begin) ? quietSince : begin;
    OnboardInstant since = quietSince;
    for (Pause pause : pauses) {
      if (from.isBefore(pause.during().begin())) {
        spans.add(span(scenario, since, Interval.of(from, pause.during().begin())));
      }
      if (from.isBefore(pause.during().end())) {
        from = pause.during().end();
        since = from;
      }
    }
    if (from.isBefore(end)) {
      spans.add(span(scenario, since, Interval.of(from, end)));
    }
    return spans;
  }

  /**
   * One span.
   *
   * @param since when quiet really began: length and warm-up count from there
   * @param during its part inside the period
   */
  private static QuietSpan span(
      Scenario scenario, OnboardInstant since, Interval<OnboardInstant> during) {
    boolean openBefore =
        during.begin().equals(scenario.period().begin()) && !since.isAfter(during.begin());
    boolean openAfter = during.end().equals(scenario.period().end());
    Duration length = during.end().since(since);
    ScienceRules rules = scenario.rules().science();
    boolean counts = openAfter || length.compareTo(rules.minimumSpan()) >= 0;
    OnboardInstant warm = since.plus(rules.warmUp());
    OnboardInstant useful = warm.isAfter(during.begin()) ? warm : during.begin();
    long value =
        counts && useful.isBefore(during.end()) ? during.end().since(useful).toSeconds() : 0;
    return new QuietSpan(during, length.toSeconds(), value, openBefore, openAfter);
  }
}
