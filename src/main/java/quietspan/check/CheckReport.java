package quietspan.check;

import java.util.List;
import quietspan.model.Finding;
import quietspan.model.Outcome;
import quietspan.model.RuleId;

/**
 * The verdict on decisions.
 *
 * @param findings every broken rule, by time, then in the order of {@link RuleId}
 * @param warnings what somebody should know though no rule is broken
 * @param assumptions what was taken for granted
 * @param margins how near the plan comes to its limits
 * @param missable what sampling cannot see
 * @param recount everything that follows from the decisions, counted anew; its findings are these
 */
public record CheckReport(
    List<Finding> findings,
    List<String> warnings,
    List<String> assumptions,
    CheckMargins margins,
    Missable missable,
    Outcome recount) {

  public CheckReport {
    findings = List.copyOf(findings);
    warnings = List.copyOf(warnings);
    assumptions = List.copyOf(assumptions);
  }

  /** No rule is broken, with limits relaxed by the waivers in force. */
  public boolean legal() {
    return findings.isEmpty();
  }

  /** A rule is broken that no written plan may break. */
  public boolean breaksAuthority() {
    return findings.stream().anyMatch(each -> each.rule().kind() == RuleId.Kind.AUTHORITY);
  }
}
