package quietspan.export;

import quietspan.export.Table.Kind;
import quietspan.model.RuleId;

/** The rule reference, made from the list that everything else enumerates. */
public final class RuleTable {

  private RuleTable() {}

  /** One row for each rule. */
  public static Table table() {
    Table table = Table.of("rule", "kind", "clock", "unit").and(Kind.TEXT, "sentence");
    for (RuleId rule : RuleId.values()) {
      table.row(
          rule,
          rule.kind() == RuleId.Kind.AUTHORITY ? "never broken" : "data",
          rule.clock() == RuleId.Clock.GROUND ? "ground" : "on board",
          rule.unit().symbol(),
          rule.sentence());
    }
    return table;
  }
}
