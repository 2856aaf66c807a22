package quietspan.check;

import java.time.Duration;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.TreeSet;
import quietspan.model.Contact;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.Decisions;
import quietspan.model.Dish;
import quietspan.model.Finding;
import quietspan.model.Frozen;
import quietspan.model.Guarded;
import quietspan.model.Interruption;
import quietspan.model.Outcome;
import quietspan.model.Repoint;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Waiver;

/**
 * Judges decisions by every {@link RuleId}, and counts anew what follows from them.
 *
 * <p>Geometry is sampled at least every 30 s and at every edge of what is judged, unguarded and
 * unrounded; a change of verdict between two samples is bisected to a hundredth of a second. Stores
 * run second by second. Decisions whose verdict hangs on less than 2 s, 0.002 deg or 1 kbit may be
 * judged differently by whoever plans; all others may not.
 */
public final class Check {

  private Check() {}

  /** Judges decisions of which nothing is frozen. */
  public static CheckReport check(
      Scenario scenario, SightLines sight, Decisions decisions, List<Waiver> waiversInForce) {
    return check(scenario, sight, decisions, waiversInForce, Optional.empty());
  }

  /**
   * Judges decisions.
   *
   * @param waiversInForce the limits that the scenario itself relaxes
   * @param frozen what of an earlier plan must have stayed
   * @throws IllegalArgumentException when {@link #unknownNames} finds any
   */
  public static CheckReport check(
      Scenario scenario,
      SightLines sight,
      Decisions decisions,
      List<Waiver> waiversInForce,
      Optional<Frozen> frozen) {
    List<String> unknown = unknownNames(scenario, decisions);
    if (!unknown.isEmpty()) {
      throw new IllegalArgumentException("unknown in this scenario: " + unknown);
    }
    Evidence evidence = Evidence.gather(scenario, sight, decisions, waiversInForce, frozen);
    List<Finding> findings = findings(evidence);
    return new CheckReport(
        findings,
        warnings(evidence),
        assumptions(scenario),
        Closest.margins(evidence),
        Missable.of(evidence.watches()),
        recount(evidence, findings));
  }

  /**
   * Craft, stations and antennas that decisions name and the scenario does not hold, such as after
   * a station was lost: {@code station Ostrand}. Decisions that name any cannot be judged.
   */
  public static List<String> unknownNames(Scenario scenario, Decisions decisions) {
    TreeSet<String> craft = new TreeSet<>();
    scenario.craft().forEach(each -> craft.add(each.name()));
    TreeSet<String> unknown = new TreeSet<>();
    for (Repoint repoint : decisions.repoints()) {
      if (!craft.contains(repoint.craft())) {
        unknown.add("craft " + repoint.craft());
      }
    }
    for (Contact contact : decisions.contacts()) {
      if (contact.status() == Contact.Status.CANCELLED) {
        continue;
      }
      if (!craft.contains(contact.craft())) {
        unknown.add("craft " + contact.craft());
      }
      scenario.stations().stream()
          .filter(each -> each.name().equals(contact.station()))
          .findFirst()
          .ifPresentOrElse(
              station -> {
                if (station.dish(contact.antenna()).isEmpty()) {
                  unknown.add("antenna " + contact.antenna() + " of station " + station.name());
                }
              },
              () -> unknown.add("station " + contact.station()));
    }
    return List.copyOf(unknown);
  }

  private static List<Finding> findings(Evidence evidence) {
    List<Finding> findings = new ArrayList<>();
    for (RuleId rule : RuleId.values()) {
      findings.addAll(Judges.of(rule).findings(evidence));
    }
    findings.sort(
        Comparator.comparing(Finding::at)
            .thenComparing(Finding::rule)
            .thenComparing(Finding::craft)
            .thenComparing(Finding::station)
            .thenComparing(Finding::subject));
    return findings;
  }

  private static List<String> warnings(Evidence evidence) {
    List<String> warnings = new ArrayList<>(Promises.cancellations(evidence));
    for (Interruption interruption : evidence.scenario().calendars().interruptions()) {
      for (Guarded guarded : evidence.scenario().calendars().guarded()) {
        if (interruption.during().overlaps(guarded.during())) {
          warnings.add(
              "Interruption "
                  + interruption.label()
                  + " from "
                  + interruption.during().begin()
                  + " lies inside the protected interval "
                  + guarded.label()
                  + ".");
        }
      }
    }
    return warnings;
  }

  private static List<String> assumptions(Scenario scenario) {
    List<String> assumptions = new ArrayList<>();
    assumptions.add("Light time is that to the Earth's centre; a station's place adds 21 ms.");
    boolean linked =
        scenario.craft().stream().anyMatch(each -> each.crossLink().bitsPerSecond() > 0);
    if (linked && scenario.craft().size() > 1) {
      assumptions.add("Light time between craft is neglected.");
    }
    for (Craft craft : scenario.craft()) {
      for (CraftState.Fill fill : scenario.start().of(craft.name()).fill()) {
        if (fill.oldest().isEmpty() && fill.volume().bits() > 0) {
          assumptions.add(
              "What "
                  + craft.name()
                  + " holds of "
                  + fill.dataClass()
                  + " at the start counts as made at that instant.");
        }
      }
    }
    return assumptions;
  }

  private static Outcome recount(Evidence evidence, List<Finding> findings) {
    double hours = 0;
    double cost = 0;
    for (Contact contact : evidence.contacts()) {
      Dish dish = evidence.dish(contact);
      double length = contact.during().seconds() / Duration.ofHours(1).toSeconds();
      hours += length;
      cost += dish.costPerContact() + length * dish.costPerHour();
    }
    return new Outcome(
        evidence.science().pauses(),
        evidence.science().spans(),
        evidence.science().seconds(),
        evidence.stores().contacts(),
        evidence.stores().traces(),
        evidence.stores().classes(),
        hours,
        cost,
        findings);
  }
}
