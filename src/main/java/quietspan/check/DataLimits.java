package quietspan.check;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.Finding;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.time.OnboardInstant;

/** Rules on stores and ages, judged on what the store loops saw. */
final class DataLimits {

  private static final double DEFAULT_END_SHARE = 0.25;

  private DataLimits() {}

  /** What does not fit is lost. On-board time. */
  static List<Finding> overflow(Evidence evidence) {
    List<Finding> findings = new ArrayList<>();
    for (Excess excess : evidence.stores().overflows()) {
      Craft craft = evidence.scenario().craft().get(excess.craft());
      String detail =
          "The full store of "
              + craft.name()
              + " loses "
              + excess.total()
              + " bit within "
              + excess.seconds()
              + " s.";
      findings.add(ofStore(evidence, RuleId.OVERFLOW, excess, detail));
    }
    return findings;
  }

  /** Room is kept for the contact that fails. On-board time. */
  static List<Finding> fill(Evidence evidence) {
    List<Finding> findings = new ArrayList<>();
    for (Excess excess : evidence.stores().overfills()) {
      Craft craft = evidence.scenario().craft().get(excess.craft());
      String detail =
          "The store of "
              + craft.name()
              + " is above its planned fill for "
              + excess.seconds()
              + " s, by up to "
              + excess.peak()
              + " bit.";
      findings.add(ofStore(evidence, RuleId.FILL, excess, detail));
    }
    return findings;
  }

  private static Finding ofStore(Evidence evidence, RuleId rule, Excess excess, String detail) {
    OnboardInstant at = evidence.scenario().period().begin().plusSeconds(excess.from());
    String craft = evidence.scenario().craft().get(excess.craft()).name();
    return new Finding(rule, at.utc(), craft, "", "", excess.total(), detail);
  }

  /** Data that come too late are worth less. Ground time. */
  static List<Finding> latency(Evidence evidence) {
    List<Finding> findings = new ArrayList<>();
    for (LateBook.Run run : evidence.stores().late()) {
      String detail =
          Findings.name(run.contact())
              + " delivers "
              + run.bits()
              + " bit of "
              + run.dataClass().name()
              + " up to "
              + Findings.seconds(run.worstSeconds())
              + " too late.";
      findings.add(
          new Finding(
              RuleId.LATENCY,
              run.from().utc(),
              run.contact().craft(),
              run.contact().station(),
              run.dataClass().name(),
              run.bits(),
              detail));
    }
    Scenario scenario = evidence.scenario();
    Instant end =
        evidence.sight().ground(scenario.craft().get(0).name(), scenario.period().end()).utc();
    for (int i = 0; i < scenario.rules().classes().size(); i++) {
      long bits = evidence.stores().lateAboard().get(i);
      if (bits > 0) {
        String name = scenario.rules().classes().get(i).name();
        String detail =
            "At the end of the period "
                + bits
                + " bit of "
                + name
                + " are aboard and older than their limit.";
        findings.add(new Finding(RuleId.LATENCY, end, "", "", name, bits, detail));
      }
    }
    return findings;
  }

  /** The next period must not inherit full stores. On-board time. */
  static List<Finding> endFill(Evidence evidence) {
    Scenario scenario = evidence.scenario();
    List<Finding> findings = new ArrayList<>();
    for (int i = 0; i < scenario.craft().size(); i++) {
      Craft craft = scenario.craft().get(i);
      long limit = endLimit(scenario, craft);
      long over = evidence.stores().traces().get(i).endBits() - limit;
      if (over > 0) {
        String detail =
            "The store of "
                + craft.name()
                + " ends the period "
                + over
                + " bit above its limit of "
                + limit
                + " bit.";
        Instant end = scenario.period().end().utc();
        findings.add(new Finding(RuleId.END_FILL, end, craft.name(), "", "", over, detail));
      }
    }
    return findings;
  }

  private static long endLimit(Scenario scenario, Craft craft) {
    if (scenario.rules().data().endFillShare().isPresent()) {
      return StoreLoops.share(scenario.rules().data().endFillShare().get(), craft.store());
    }
    long start = 0;
    for (CraftState.Fill fill : scenario.start().of(craft.name()).fill()) {
      start += fill.volume().bits();
    }
    return Math.max(start, StoreLoops.share(DEFAULT_END_SHARE, craft.store()));
  }
}
