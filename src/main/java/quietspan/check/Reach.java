package quietspan.check;

import java.time.Duration;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import quietspan.model.BodyDirection;
import quietspan.model.Contact;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.Finding;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.Waiver;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/** Rules on how long nobody can be reached. */
final class Reach {

  private Reach() {}

  /** The formation must be heard now and then. Ground time. */
  static List<Finding> gap(Evidence evidence) {
    Scenario scenario = evidence.scenario();
    Optional<Duration> limit = scenario.rules().data().gapLimit();
    if (limit.isEmpty()) {
      return List.of();
    }
    String first = scenario.craft().get(0).name();
    GroundInstant begin =
        scenario
            .start()
            .lastContactEnd()
            .or(
                () ->
                    scenario.start().craft().stream()
                        .map(CraftState::lastContactEnd)
                        .flatMap(Optional::stream)
                        .max(Comparator.naturalOrder()))
            .orElseGet(() -> evidence.sight().ground(first, scenario.period().begin()));
    return silences(evidence, RuleId.GAP, "", evidence.contacts(), begin, first, limit.get());
  }

  /** Each craft must be heard itself now and then. Ground time. */
  static List<Finding> direct(Evidence evidence) {
    Scenario scenario = evidence.scenario();
    Optional<Duration> limit = scenario.rules().data().directLimit();
    if (limit.isEmpty()) {
      return List.of();
    }
    List<Finding> findings = new ArrayList<>();
    for (Craft craft : scenario.craft()) {
      String name = craft.name();
      GroundInstant begin =
          scenario
              .start()
              .of(name)
              .lastContactEnd()
              .orElseGet(() -> evidence.sight().ground(name, scenario.period().begin()));
      List<Contact> own =
          evidence.contacts().stream().filter(each -> each.craft().equals(name)).toList();
      findings.addAll(silences(evidence, RuleId.DIRECT, name, own, begin, name, limit.get()));
    }
    return findings;
  }

  private static List<Finding> silences(
      Evidence evidence,
      RuleId rule,
      String craft,
      List<Contact> contacts,
      GroundInstant begin,
      String clockCraft,
      Duration limit) {
    GroundInstant end = evidence.sight().ground(clockCraft, evidence.scenario().period().end());
    List<Finding> findings = new ArrayList<>();
    GroundInstant heardUntil = begin;
    for (Contact contact : contacts) {
      addSilence(findings, evidence, rule, craft, limit, heardUntil, contact.during().begin());
      if (contact.during().end().isAfter(heardUntil)) {
        heardUntil = contact.during().end();
      }
    }
    addSilence(findings, evidence, rule, craft, limit, heardUntil, end);
    return findings;
  }

  private static void addSilence(
      List<Finding> findings,
      Evidence evidence,
      RuleId rule,
      String craft,
      Duration limit,
      GroundInstant from,
      GroundInstant to) {
    if (!from.isBefore(to)) {
      return;
    }
    Interval<GroundInstant> silence = Interval.of(from, to);
    Duration allowed = relaxed(evidence.waivers(), rule, craft, limit, silence);
    double over = silence.seconds() - Seconds.of(allowed);
    if (over > 0) {
      String who = craft.isEmpty() ? "The formation" : craft;
      String detail =
          who
              + " has no contact from "
              + from
              + " for "
              + Findings.seconds(silence.seconds())
              + ", longer than "
              + Findings.seconds(Seconds.of(allowed))
              + ".";
      findings.add(new Finding(rule, from.plus(allowed).utc(), craft, "", craft, over, detail));
    }
  }

  private static Duration relaxed(
      List<Waiver> waivers,
      RuleId rule,
      String craft,
      Duration limit,
      Interval<GroundInstant> silence) {
    Duration allowed = limit;
    for (Waiver waiver : waivers) {
      boolean holds =
          waiver.rule() == rule
              && waiver.craft().equals(craft)
              && waiver.begin().isBefore(silence.end().utc())
              && waiver.end().isAfter(silence.begin().utc());
      if (holds && waiver.relaxedLimit().compareTo(allowed) > 0) {
        allowed = waiver.relaxedLimit();
      }
    }
    return allowed;
  }

  /** The next period begins with the aims that this one leaves. On-board time. */
  static List<Finding> endCoverage(Evidence evidence) {
    Scenario scenario = evidence.scenario();
    Optional<Duration> asked = scenario.rules().data().endCoverage();
    if (asked.isEmpty()) {
      return List.of();
    }
    List<Finding> findings = new ArrayList<>();
    for (Craft craft : scenario.craft()) {
      OnboardInstant end = scenario.period().end();
      double covered = coveredSeconds(evidence, craft, asked.get());
      double missing = Seconds.of(asked.get()) - covered;
      if (missing > 0) {
        String detail =
            "After the period the aim of "
                + craft.name()
                + " holds the Earth for "
                + Findings.seconds(covered)
                + ", "
                + Findings.seconds(missing)
                + " less than asked.";
        OnboardInstant lost = end.plusSeconds(covered);
        findings.add(
            new Finding(RuleId.END_COVERAGE, lost.utc(), craft.name(), "", "", missing, detail));
      }
    }
    return findings;
  }

  /** How long from the period's end on the aim then held keeps the Earth in the usable cone. */
  private static double coveredSeconds(Evidence evidence, Craft craft, Duration asked) {
    Scenario scenario = evidence.scenario();
    Sight sight = evidence.sight();
    OnboardInstant end = scenario.period().end();
    BodyDirection aim = Aims.held(scenario, evidence.decisions(), craft.name(), end).direction();
    double cone = scenario.usableHalfCone(craft).radians();
    Interval<GroundInstant> after =
        Interval.of(sight.ground(craft.name(), end), sight.ground(craft.name(), end.plus(asked)));
    // What nobody knows is not covered.
    Optional<Interval<GroundInstant>> known = sight.sampled(craft.name(), after);
    if (known.isEmpty() || known.get().begin().isAfter(after.begin())) {
      return 0;
    }
    List<GroundInstant> instants = new ArrayList<>();
    for (GroundInstant t = known.get().begin();
        t.isBefore(known.get().end());
        t = t.plusSeconds(Sweep.STEP_SECONDS)) {
      instants.add(t);
    }
    instants.add(known.get().end());
    Survey survey = Survey.of(instants, t -> cone - aim.separation(sight.earth(craft.name(), t)));
    GroundInstant until = survey.brokenFrom().orElse(known.get().end());
    return until.equals(after.end())
        ? Seconds.of(asked)
        : Math.max(0, sight.onboard(craft.name(), until).secondsSince(end));
  }
}
