package quietspan.export;

import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Collectors;
import quietspan.export.Table.Kind;
import quietspan.model.Finding;
import quietspan.model.RuleId;

/**
 * A way to plan and what came of it.
 *
 * @param sentence what the way is
 * @param findings of the check
 */
public record Strategy(String name, String sentence, Summary summary, List<Finding> findings) {

  public Strategy {
    findings = List.copyOf(findings);
  }

  /** One row for each way. */
  public static Table table(List<Strategy> strategies) {
    Table table =
        Table.of("strategy")
            .and(Kind.NUMBER, "science_h", "below_bound_h", "pauses", "contact_h", "findings")
            .and(Kind.TEXT, "rules_broken");
    for (Strategy each : strategies) {
      table.row(
          each.name(),
          Decimal.fixed(each.summary().scienceSeconds() / 3600.0, 2),
          each.summary().gapSeconds().map(gap -> Decimal.fixed(gap / 3600.0, 2)).orElse(""),
          each.summary().pauses(),
          Decimal.fixed(each.summary().contactHours(), 1),
          each.findings().size(),
          each.broken());
    }
    return table;
  }

  /** Broken rules with how often, the most frequent first. */
  private String broken() {
    Map<RuleId, Long> counts =
        findings.stream()
            .collect(Collectors.groupingBy(Finding::rule, TreeMap::new, Collectors.counting()));
    return counts.entrySet().stream()
        .sorted(Comparator.comparing((Map.Entry<RuleId, Long> entry) -> -entry.getValue()))
        .map(entry -> entry.getKey() + " " + entry.getValue())
        .collect(Collectors.joining(", "));
  }
}
