package quietspan.export;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import quietspan.model.Contact;
import quietspan.model.ContactOutcome;
import quietspan.model.Craft;
import quietspan.model.Generation;
import quietspan.model.Pause;
import quietspan.model.Plan;
import quietspan.model.Profile;
import quietspan.model.Scenario;
import quietspan.model.StorePoint;
import quietspan.model.StoreTrace;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * Seven days of a plan, counted from the begin of its period; the last week may be shorter. A
 * contact belongs to the week in which its on-board image begins.
 *
 * @param number 1 for the first week
 * @param contactSeconds ground time of the contacts
 * @param generatedBits what all craft make in this week, pauses taken into account
 * @param highestFill of the store that is filled most, as a fraction of its capacity
 * @param longestLatencySeconds of the bits delivered by the contacts of the week; absent when
 *     nothing was delivered
 */
public record Week(
    int number,
    Interval<OnboardInstant> during,
    int contacts,
    long contactSeconds,
    long capacityBits,
    long deliveredBits,
    long generatedBits,
    double highestFill,
    OptionalDouble longestLatencySeconds) {

  private static final long SECONDS = 7 * 86_400L;

  public static List<Week> of(Scenario scenario, Plan plan) {
    Map<String, Contact> byId = new HashMap<>();
    for (Contact contact : plan.decisions().contacts()) {
      byId.put(contact.id(), contact);
    }
    List<Week> weeks = new ArrayList<>();
    OnboardInstant begin = scenario.period().begin();
    OnboardInstant stop = scenario.period().end();
    while (begin.isBefore(stop)) {
      OnboardInstant after = begin.plusSeconds(SECONDS);
      Interval<OnboardInstant> during = Interval.of(begin, after.isBefore(stop) ? after : stop);
      List<ContactOutcome> contacts =
          plan.outcome().contacts().stream()
              .filter(contact -> during.contains(contact.onboard().begin()))
              .toList();
      weeks.add(
          new Week(
              weeks.size() + 1,
              during,
              contacts.size(),
              contacts.stream()
                  .mapToLong(contact -> byId.get(contact.contact()).during().length().toSeconds())
                  .sum(),
              contacts.stream().mapToLong(contact -> contact.capacity().bits()).sum(),
              contacts.stream().mapToLong(contact -> contact.delivered().bits()).sum(),
              generated(scenario, plan.outcome().pauses(), during),
              plan.outcome().stores().stream()
                  .mapToDouble(trace -> highestFill(scenario, trace, during))
                  .max()
                  .orElse(0),
              contacts.stream()
                  .flatMapToDouble(contact -> contact.longestLatencySeconds().stream())
                  .max()));
      begin = after;
    }
    return weeks;
  }

  private static long generated(
      Scenario scenario, List<Pause> pauses, Interval<OnboardInstant> during) {
    long bits = 0;
    for (Craft craft : scenario.craft()) {
      for (Generation generation : craft.generation()) {
        bits += generated(generation, pauses, during);
      }
    }
    return bits;
  }

  private static long generated(
      Generation generation, List<Pause> pauses, Interval<OnboardInstant> during) {
    List<Profile.Step> steps = generation.profile().steps();
    long bits = 0;
    for (int i = 0; i < steps.size(); i++) {
      OnboardInstant from = i == 0 ? during.begin() : steps.get(i).from();
      OnboardInstant to = i + 1 < steps.size() ? steps.get(i + 1).from() : during.end();
      if (!from.isBefore(to)) {
        continue;
      }
      Interval<OnboardInstant> step = Interval.of(from, to);
      long paused = 0;
      for (Pause pause : pauses) {
        paused +=
            pause
                .during()
                .intersection(during)
                .flatMap(step::intersection)
                .map(part -> part.length().toSeconds())
                .orElse(0L);
      }
      long seconds = step.intersection(during).map(part -> part.length().toSeconds()).orElse(0L);
      bits +=
          (seconds - paused) * steps.get(i).rate().bitsPerSecond()
              + paused * steps.get(i).rate().share(generation.shareInPauses()).bitsPerSecond();
    }
    return bits;
  }

  /** The highest point of a trace in the week, its edges included. */
  private static double highestFill(
      Scenario scenario, StoreTrace trace, Interval<OnboardInstant> during) {
    double highest = 0;
    long from = during.begin().epochSecond();
    long to = during.end().epochSecond();
    StorePoint last = null;
    for (StorePoint point : trace.points()) {
      long at = point.onboardEpochSecond();
      if (at >= from && at <= to) {
        highest = Math.max(highest, (double) point.fillBits());
      }
      if (last != null) {
        highest = Math.max(highest, Math.max(between(last, point, from), between(last, point, to)));
      }
      last = point;
    }
    return highest / scenario.craft(trace.craft()).store().bits();
  }

  /** Fill at an instant strictly between two points; 0 when it is not between them. */
  private static double between(StorePoint a, StorePoint b, long at) {
    if (at <= a.onboardEpochSecond() || at >= b.onboardEpochSecond()) {
      return 0;
    }
    double share =
        (double) (at - a.onboardEpochSecond()) / (b.onboardEpochSecond() - a.onboardEpochSecond());
    return a.fillBits() + share * (b.fillBits() - a.fillBits());
  }
}
