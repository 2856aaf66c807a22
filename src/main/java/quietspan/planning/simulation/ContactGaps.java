package quietspan.planning.simulation;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;
import quietspan.model.Contact;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.DataRules;
import quietspan.model.Finding;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Waiver;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.IntervalSet;

/** The ground time without contact: of the formation (GAP) and of each craft (DIRECT). */
final class ContactGaps {

  private final Scenario scenario;
  private final SightLines sightLines;
  private final List<Contact> contacts;
  private final List<Waiver> waivers;

  private ContactGaps(
      Scenario scenario, SightLines sightLines, List<Contact> contacts, List<Waiver> waivers) {
    this.scenario = scenario;
    this.sightLines = sightLines;
    this.contacts = contacts;
    this.waivers = waivers;
  }

  static List<Finding> findings(
      Scenario scenario, SightLines sightLines, List<Contact> contacts, List<Waiver> waivers) {
    ContactGaps gaps = new ContactGaps(scenario, sightLines, contacts, waivers);
    return Stream.concat(gaps.ofTheFormation(), gaps.ofEachCraft()).toList();
  }

  private Stream<Finding> ofTheFormation() {
    DataRules rules = scenario.rules().data();
    if (rules.gapLimit().isEmpty()) {
      return Stream.empty();
    }
    String first = scenario.craft().get(0).name();
    GroundInstant begin =
        scenario
            .start()
            .lastContactEnd()
            .or(
                () ->
                    scenario.start().craft().stream()
                        .flatMap(state -> state.lastContactEnd().stream())
                        .max(GroundInstant::compareTo))
            .orElseGet(() -> sightLines.ground(first, scenario.period().begin()));
    return findings(RuleId.GAP, "", rules.gapLimit().get(), first, begin, contacts);
  }

  private Stream<Finding> ofEachCraft() {
    Optional<Duration> limit = scenario.rules().data().directLimit();
    if (limit.isEmpty()) {
      return Stream.empty();
    }
    return scenario.craft().stream()
        .map(Craft::name)
        .flatMap(
            craft -> {
              CraftState state = scenario.start().of(craft);
              GroundInstant begin =
                  state
                      .lastContactEnd()
                      .orElseGet(() -> sightLines.ground(craft, scenario.period().begin()));
              List<Contact> own =
                  contacts.stream().filter(contact -> contact.craft().equals(craft)).toList();
              return findings(RuleId.DIRECT, craft, limit.get(), craft, begin, own);
            });
  }

  /** The gaps that are too long, from {@code begin} to the end of the period on a craft's clock. */
  private Stream<Finding> findings(
      RuleId rule,
      String subject,
      Duration limit,
      String clock,
      GroundInstant begin,
      List<Contact> counted) {
    GroundInstant end = sightLines.ground(clock, scenario.period().end());
    List<Finding> findings = new ArrayList<>();
    GroundInstant from = begin;
    for (Interval<GroundInstant> contact :
        IntervalSet.of(counted.stream().map(Contact::during).toList()).parts()) {
      judge(rule, subject, limit, from, contact.begin()).ifPresent(findings::add);
      from = from.isBefore(contact.end()) ? contact.end() : from;
    }
    judge(rule, subject, limit, from, end).ifPresent(findings::add);
    return findings.stream();
  }

  private Optional<Finding> judge(
      RuleId rule, String subject, Duration limit, GroundInstant from, GroundInstant to) {
    Duration allowed = limit;
    for (Waiver waiver : waivers) {
      if (waiver.rule() == rule
          && waiver.craft().equals(subject)
          && waiver.begin().isBefore(to.utc())
          && from.utc().isBefore(waiver.end())
          && waiver.relaxedLimit().compareTo(allowed) > 0) {
        allowed = waiver.relaxedLimit();
      }
    }
    Duration over = to.since(from).minus(allowed);
    if (over.isNegative() || over.isZero()) {
      return Optional.empty();
    }
    return Optional.of(
        new Finding(
            rule,
            from.plus(allowed).utc(),
            subject,
            "",
            subject,
            over.toNanos() / 1e9,
            String.format(
                Locale.ROOT,
                "%.1f h without a contact, %.1f h allowed",
                to.secondsSince(from) / 3600,
                allowed.toSeconds() / 3600.0)));
  }
}
