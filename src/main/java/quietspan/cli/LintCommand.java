package quietspan.cli;

import java.io.PrintWriter;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;
import quietspan.export.ProblemTable;
import quietspan.model.Scenario;
import quietspan.problem.InputException;
import quietspan.problem.Problem;
import quietspan.run.LintRun;

/** Reads a scenario and reports. */
@Command(
    name = "lint",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    description = {
      "Reads a scenario and says what is wrong with it, and what will hurt; plans nothing.",
      "Ends with 0 also when there are warnings."
    },
    footer = {
      "",
      "Examples:",
      "  quietspan lint stations-demo",
      "  quietspan lint my-mission --json"
    })
final class LintCommand implements Callable<Integer> {
  @Spec private CommandSpec spec;
  @Mixin private SourceOptions source;

  @Option(names = "--json", description = "Print what is found as JSON.")
  private boolean json;

  @Override
  public Integer call() {
    PrintWriter results = spec.commandLine().getOut();
    LintRun.Answer answer;
    try {
      answer = LintRun.lint(source.source());
    } catch (InputException wrong) {
      if (!json) {
        throw wrong;
      }
      results.print(ProblemTable.of(wrong.problems()).json());
      results.flush();
      return Exit.INPUT;
    }
    List<Problem> warnings = answer.warnings();
    if (json) {
      results.print(ProblemTable.of(warnings).json());
    } else {
      warnings.forEach(results::println);
      Scenario scenario = answer.scenario();
      results.println(
          scenario.identity().mission()
              + ": "
              + scenario.craft().size()
              + " craft, "
              + scenario.stations().size()
              + " stations, "
              + scenario.period().length().toDays()
              + " days: no errors, "
              + (warnings.isEmpty() ? "no" : warnings.size())
              + (warnings.size() == 1 ? " warning" : " warnings"));
    }
    results.flush();
    PrintWriter remarks = spec.commandLine().getErr();
    answer.sources().forEach(each -> remarks.println("# " + each));
    remarks.flush();
    return Exit.DONE;
  }
}
