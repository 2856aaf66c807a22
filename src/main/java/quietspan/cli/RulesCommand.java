package quietspan.cli;

import java.io.PrintWriter;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Spec;
import quietspan.export.RuleTable;
import quietspan.model.RuleId;

/** The rule reference. */
@Command(
    name = "rules",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    description = "Every rule that a plan can break, with its clock and the unit of its amount.",
    footer = {"", "Examples:", "  quietspan rules", "  quietspan rules --json"})
final class RulesCommand implements Callable<Integer> {
  private static final int WIDTH = 80;
  private static final int INDENT = 4;

  @Spec private CommandSpec spec;
  @Mixin private FormatOption format;

  @Override
  public Integer call() {
    PrintWriter results = spec.commandLine().getOut();
    if (format.isTable()) {
      for (RuleId.Kind kind : RuleId.Kind.values()) {
        results.println(
            kind == RuleId.Kind.AUTHORITY
                ? "Rules that a written plan never breaks"
                : "Rules on data: a plan that breaks one is a shortfall");
        for (RuleId rule : RuleId.values()) {
          if (rule.kind() == kind) {
            results.print(entry(rule));
          }
        }
      }
      results.flush();
    } else {
      format.print(RuleTable.table(), results);
    }
    return Exit.DONE;
  }

  private static String entry(RuleId rule) {
    StringBuilder text = new StringBuilder("  " + rule.name() + " (");
    text.append(rule.clock() == RuleId.Clock.GROUND ? "ground" : "on board");
    text.append(rule.unit().symbol().isEmpty() ? "" : ", " + rule.unit().symbol()).append(")\n");
    StringBuilder line = new StringBuilder();
    for (String word : rule.sentence().split(" ")) {
      if (line.length() + word.length() + INDENT + 1 > WIDTH) {
        text.append(" ".repeat(INDENT)).append(line).append('\n');
        line.setLength(0);
      }
      line.append(line.isEmpty() ? "" : " ").append(word);
    }
    return text.append(" ".repeat(INDENT)).append(line).append('\n').toString();
  }
}
