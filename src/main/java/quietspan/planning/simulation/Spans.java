package quietspan.planning.simulation;

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
 * Pauses and quiet spans of a plan, and what the spans are worth.
 *
 * @param pauses repoints and interruptions inside the period that overlap or touch, merged, in time
 *     order
 * @param quiet what remains of the period
 * @param scienceSeconds the sum of the spans' values
 */
public record Spans(List<Pause> pauses, List<QuietSpan> quiet, long scienceSeconds) {

  private record Part(Interval<OnboardInstant> during, String repoint, String interruption) {}

  public static Spans of(Scenario scenario, List<Repoint> repoints) {
    List<Part> parts = new ArrayList<>();
    for (Repoint repoint : repoints) {
      var length = scenario.craft(repoint.craft()).antenna().repointLength();
      Interval.of(repoint.start(), length)
          .intersection(scenario.period())
          .ifPresent(inside -> parts.add(new Part(inside, repoint.id(), "")));
    }
    for (Interruption interruption : scenario.calendars().interruptions()) {
      interruption
          .during()
          .intersection(scenario.period())
          .ifPresent(inside -> parts.add(new Part(inside, "", interruption.label())));
    }
    parts.sort(Comparator.comparing(part -> part.during().begin()));
    List<Pause> pauses = merged(parts);
    List<QuietSpan> quiet = quiet(scenario, pauses);
    return new Spans(pauses, quiet, quiet.stream().mapToLong(QuietSpan::valueSeconds).sum());
  }

  private static List<Pause> merged(List<Part> parts) {
    List<Pause> pauses = new ArrayList<>();
    int i = 0;
    while (i < parts.size()) {
      Interval<OnboardInstant> whole = parts.get(i).during();
      List<String> repoints = new ArrayList<>();
      List<String> interruptions = new ArrayList<>();
      int j = i;
      while (j < parts.size() && parts.get(j).during().overlapsOrTouches(whole)) {
        whole = whole.hull(parts.get(j).during());
        if (parts.get(j).repoint().isEmpty()) {
          interruptions.add(parts.get(j).interruption());
        } else {
          repoints.add(parts.get(j).repoint());
        }
        j++;
      }
      pauses.add(new Pause(whole, repoints, interruptions));
      i = j;
    }
    return pauses;
  }

  private static List<QuietSpan> quiet(Scenario scenario, List<Pause> pauses) {
    List<QuietSpan> spans = new ArrayList<>();
    OnboardInstant begin = scenario.period().begin();
    for (int i = 0; i <= pauses.size(); i++) {
      boolean first = i == 0;
      boolean last = i == pauses.size();
      OnboardInstant end = last ? scenario.period().end() : pauses.get(i).during().begin();
      if (begin.isBefore(end)) {
        spans.add(span(scenario, begin, end, first, last));
      }
      if (!last) {
        begin = pauses.get(i).during().end();
      }
    }
    return spans;
  }

  private static QuietSpan span(
      Scenario scenario, OnboardInstant begin, OnboardInstant end, boolean first, boolean last) {
    Optional<OnboardInstant> since = scenario.start().quietSince();
    OnboardInstant really = first && since.isPresent() ? since.get() : begin;
    long length = end.epochSecond() - really.epochSecond();
    long inside = end.epochSecond() - begin.epochSecond();
    long warmUp = scenario.rules().science().warmUp().toSeconds();
    long left = Math.max(0, warmUp - (begin.epochSecond() - really.epochSecond()));
    boolean counts = last || length >= scenario.rules().science().minimumSpan().toSeconds();
    return new QuietSpan(
        Interval.of(begin, end), length, counts ? Math.max(0, inside - left) : 0, first, last);
  }
}
