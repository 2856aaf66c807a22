package quietspan.check;

import java.util.ArrayList;
import java.util.List;
import quietspan.model.Contact;
import quietspan.model.Finding;
import quietspan.model.RateLadder;
import quietspan.model.RateStep;
import quietspan.model.RuleId;
import quietspan.time.GroundInstant;
import quietspan.units.DataRate;

/** Rules on the length and the rates of a contact by itself. Ground time. */
final class ContactForm {

  private ContactForm() {}

  /** A station does not sell less. */
  static List<Finding> minLength(Evidence evidence) {
    List<Finding> findings = new ArrayList<>();
    for (Contact contact : evidence.contacts()) {
      double least = Seconds.of(evidence.dish(contact).minimumContact());
      double length = contact.during().seconds();
      if (length < least) {
        String detail =
            Findings.name(contact)
                + " lasts "
                + Findings.seconds(length)
                + ", less than "
                + Findings.seconds(least)
                + ".";
        findings.add(
            Findings.of(
                RuleId.MIN_LENGTH,
                contact,
                contact.during().begin().utc(),
                least - length,
                detail));
      }
    }
    return findings;
  }

  /** A station does not sell more at a time. */
  static List<Finding> maxLength(Evidence evidence) {
    List<Finding> findings = new ArrayList<>();
    for (Contact contact : evidence.contacts()) {
      double most = Seconds.of(evidence.dish(contact).maximumContact());
      double length = contact.during().seconds();
      if (length > most) {
        String detail =
            Findings.name(contact)
                + " lasts "
                + Findings.seconds(length)
                + ", more than "
                + Findings.seconds(most)
                + ".";
        GroundInstant at = contact.during().begin().plus(evidence.dish(contact).maximumContact());
        findings.add(Findings.of(RuleId.MAX_LENGTH, contact, at.utc(), length - most, detail));
      }
    }
    return findings;
  }

  /** The transmitter has only these rates, and changes of rate are limited. */
  static List<Finding> rateSteps(Evidence evidence) {
    int most = evidence.scenario().rules().contacts().rateSteps();
    List<Finding> findings = new ArrayList<>();
    for (Contact contact : evidence.contacts()) {
      List<DataRate> ladder = ladder(evidence.scenario().craft(contact.craft()).rates());
      int tooMany = Math.max(0, contact.steps().size() - most);
      List<DataRate> strange =
          contact.steps().stream().map(RateStep::rate).filter(r -> !ladder.contains(r)).toList();
      if (tooMany + strange.size() > 0) {
        String detail =
            Findings.name(contact)
                + " has "
                + contact.steps().size()
                + " rates where "
                + most
                + " are allowed, and "
                + strange.size()
                + " that are not on the ladder of "
                + contact.craft()
                + ".";
        findings.add(
            Findings.of(
                RuleId.RATE_STEPS,
                contact,
                contact.during().begin().utc(),
                tooMany + strange.size(),
                detail));
      }
    }
    return findings;
  }

  private static List<DataRate> ladder(RateLadder rates) {
    if (rates instanceof RateLadder.ByBudget budget) {
      return budget.rates();
    }
    return ((RateLadder.ByOffPointing) rates)
        .rows().stream().map(RateLadder.ByOffPointing.Row::rate).toList();
  }

  /** A rate that ends while its lock is still being made carries nothing. */
  static List<Finding> relock(Evidence evidence) {
    var rules = evidence.scenario().rules().contacts();
    List<Finding> findings = new ArrayList<>();
    for (Contact contact : evidence.contacts()) {
      List<RateStep> steps = contact.steps();
      double worst = 0;
      GroundInstant at = null;
      for (int i = 0; i < steps.size(); i++) {
        GroundInstant until =
            i + 1 < steps.size() ? steps.get(i + 1).from() : contact.during().end();
        long lock = Seconds.roundedUp(i == 0 ? rules.lockUp() : rules.relock());
        // Longer than the lock means at least one second of data.
        double missing = lock + 1 - until.secondsSince(steps.get(i).from());
        if (missing > 0) {
          at = at == null ? steps.get(i).from() : at;
          worst = Math.max(worst, missing);
        }
      }
      if (at != null) {
        String detail =
            Findings.name(contact)
                + " holds a rate from "
                + at
                + " on that leaves no second of data after its lock; "
                + Findings.seconds(worst)
                + " are missing.";
        findings.add(Findings.of(RuleId.RELOCK, contact, at.utc(), worst, detail));
      }
    }
    return findings;
  }
}
