package quietspan.check;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import quietspan.model.Blocked;
import quietspan.model.ConfirmedContact;
import quietspan.model.Contact;
import quietspan.model.Dish;
import quietspan.model.Finding;
import quietspan.model.Frozen;
import quietspan.model.Repoint;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/** Rules on what was promised to stations and published to everybody. */
final class Promises {

  private Promises() {}

  /** A station that confirmed a contact counts on it. Ground time. */
  static List<Finding> confirmed(Evidence evidence) {
    List<Finding> findings = new ArrayList<>();
    for (ConfirmedContact promise : evidence.scenario().calendars().confirmed()) {
      if (cancelledBy(evidence.scenario(), promise).isPresent() || !ours(evidence, promise)) {
        continue;
      }
      double kept = 0;
      for (Contact contact : evidence.contacts()) {
        if (contact.station().equals(promise.station())
            && contact.antenna().equals(promise.antenna())
            && contact.craft().equals(promise.craft())) {
          double both =
              contact.during().intersection(promise.during()).map(Interval::seconds).orElse(0.0);
          kept = Math.max(kept, both);
        }
      }
      double missing = promise.during().seconds() - kept;
      if (missing > 0) {
        String detail =
            name(promise)
                + " is not kept: no contact of the plan holds "
                + Findings.seconds(missing)
                + " of its "
                + Findings.seconds(promise.during().seconds())
                + ".";
        findings.add(
            new Finding(
                RuleId.CONFIRMED,
                promise.during().begin().utc(),
                promise.craft(),
                promise.station(),
                promise.id(),
                missing,
                detail));
      }
    }
    return findings;
  }

  /** Confirmed contacts that nobody can keep count as cancelled, and somebody must know. */
  static List<String> cancellations(Evidence evidence) {
    List<String> warnings = new ArrayList<>();
    for (ConfirmedContact promise : evidence.scenario().calendars().confirmed()) {
      Optional<String> cause = cancelledBy(evidence.scenario(), promise);
      if (cause.isPresent()) {
        warnings.add(name(promise) + " counts as cancelled: " + cause.get() + ".");
      } else if (!ours(evidence, promise)) {
        warnings.add(name(promise) + " is not judged: it lies, on board, outside the period.");
      }
    }
    evidence.frozen().ifPresent(frozen -> warnings.addAll(cancellations(evidence, frozen)));
    return warnings;
  }

  private static List<String> cancellations(Evidence evidence, Frozen frozen) {
    List<String> warnings = new ArrayList<>();
    for (Contact contact : begun(frozen)) {
      if (!keeps(evidence, contact)) {
        cancelledBy(evidence.scenario(), contact)
            .ifPresent(
                cause ->
                    warnings.add(
                        "Published "
                            + Findings.name(contact)
                            + " counts as cancelled: "
                            + cause
                            + "."));
      }
    }
    return warnings;
  }

  private static String name(ConfirmedContact promise) {
    return "Confirmed contact "
        + promise.id()
        + " of "
        + promise.craft()
        + " at "
        + promise.station()
        + " "
        + promise.antenna()
        + " from "
        + promise.during().begin();
  }

  private static boolean ours(Evidence evidence, ConfirmedContact promise) {
    Interval<OnboardInstant> onboard = evidence.sight().onboard(promise.craft(), promise.during());
    return evidence.scenario().period().contains(onboard);
  }

  private static Optional<String> cancelledBy(Scenario scenario, ConfirmedContact promise) {
    return cancelledBy(
        scenario, promise.station(), promise.antenna(), promise.craft(), promise.during());
  }

  private static Optional<String> cancelledBy(Scenario scenario, Contact contact) {
    return cancelledBy(
        scenario, contact.station(), contact.antenna(), contact.craft(), contact.during());
  }

  private static Optional<String> cancelledBy(
      Scenario scenario,
      String station,
      String antenna,
      String craft,
      Interval<GroundInstant> during) {
    if (scenario.craft().stream().noneMatch(each -> each.name().equals(craft))) {
      return Optional.of("craft " + craft + " is no longer in the scenario");
    }
    Optional<Dish> dish =
        scenario.stations().stream()
            .filter(each -> each.name().equals(station))
            .findFirst()
            .flatMap(each -> each.dish(antenna));
    if (dish.isEmpty()) {
      return Optional.of(
          "antenna " + antenna + " of station " + station + " is no longer in the scenario");
    }
    Interval<GroundInstant> busy = during.widened(dish.get().setup(), dish.get().teardown());
    return scenario.calendars().blocked().stream()
        .filter(each -> each.concerns(station, antenna) && each.during().overlaps(busy))
        .findFirst()
        .map(Promises::name);
  }

  private static String name(Blocked blocked) {
    String kind = blocked.why() == Blocked.Why.OUTAGE ? "outage " : "lent slot ";
    return kind + blocked.label() + " from " + blocked.during().begin();
  }

  /** What has begun cannot be called back. Ground time for contacts, on-board for repoints. */
  static List<Finding> frozen(Evidence evidence) {
    if (evidence.frozen().isEmpty()) {
      return List.of();
    }
    Frozen frozen = evidence.frozen().get();
    List<Finding> findings = new ArrayList<>();
    for (Contact contact : begun(frozen)) {
      if (!keeps(evidence, contact) && cancelledBy(evidence.scenario(), contact).isEmpty()) {
        String detail = "Published " + Findings.name(contact) + " has changed after the freeze.";
        findings.add(frozenContact(contact, detail));
      }
    }
    Set<String> contactsBegun = begun(frozen).stream().map(Contact::id).collect(Collectors.toSet());
    for (Contact contact : evidence.contacts()) {
      if (contact.during().begin().isBefore(frozen.contactsBefore())
          && !contactsBegun.contains(contact.id())) {
        String detail =
            Findings.name(contact)
                + " begins before the freeze at "
                + frozen.contactsBefore()
                + " and was not published so.";
        findings.add(frozenContact(contact, detail));
      }
    }
    findings.addAll(frozenRepoints(evidence, frozen));
    return findings;
  }

  private static Finding frozenContact(Contact contact, String detail) {
    return Findings.of(RuleId.FROZEN, contact, contact.during().begin().utc(), 1, detail);
  }

  private static List<Contact> begun(Frozen frozen) {
    return frozen.published().contacts().stream()
        .filter(contact -> contact.status() != Contact.Status.CANCELLED)
        .filter(contact -> contact.during().begin().isBefore(frozen.contactsBefore()))
        .toList();
  }

  /** A station may confirm what was tentative; nothing else may change. */
  private static boolean keeps(Evidence evidence, Contact published) {
    return evidence.contacts().stream()
        .anyMatch(
            now ->
                now.id().equals(published.id())
                    && now.station().equals(published.station())
                    && now.antenna().equals(published.antenna())
                    && now.craft().equals(published.craft())
                    && now.during().equals(published.during())
                    && now.steps().equals(published.steps())
                    && now.services().equals(published.services()));
  }

  private static List<Finding> frozenRepoints(Evidence evidence, Frozen frozen) {
    List<Repoint> begun =
        frozen.published().repoints().stream()
            .filter(repoint -> repoint.start().isBefore(frozen.repointsBefore()))
            .toList();
    List<Repoint> now = evidence.decisions().repoints();
    List<Finding> findings = new ArrayList<>();
    for (Repoint repoint : begun) {
      if (!now.contains(repoint)) {
        String detail = "Published " + Findings.name(repoint) + " has changed after the freeze.";
        findings.add(Findings.of(RuleId.FROZEN, repoint, repoint.start().utc(), 1, detail));
      }
    }
    for (Repoint repoint : now) {
      boolean known = begun.stream().anyMatch(each -> each.id().equals(repoint.id()));
      if (repoint.start().isBefore(frozen.repointsBefore()) && !known) {
        String detail =
            Findings.name(repoint)
                + " starts before the freeze at "
                + frozen.repointsBefore()
                + " and was not published so.";
        findings.add(Findings.of(RuleId.FROZEN, repoint, repoint.start().utc(), 1, detail));
      }
    }
    return findings;
  }
}
