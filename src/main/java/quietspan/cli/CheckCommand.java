package quietspan.cli;

import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;
import quietspan.export.PlanJson;
import quietspan.run.CheckRun;

/** Judges a plan. */
@Command(
    name = "check",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    description = {
      "Judges a plan, as it was written or after an edit of its decisions by hand, by every rule.",
      "Ends with 0 when it is legal, with 3 when a rule is broken or its scenario has changed."
    },
    footer = {
      "",
      "The scenario is looked for in the folders above the plan and in the working folder, by",
      "what is in its files.",
      "",
      "Examples:",
      "  quietspan check plans/sallow-triad",
      "  quietspan check /tmp/edited --scenario stations-demo --json"
    })
final class CheckCommand implements Callable<Integer> {
  @Spec private CommandSpec spec;

  @Parameters(paramLabel = "PLAN", description = "Plan folder, or the plan.json in one.")
  private Path plan;

  @Option(
      names = "--scenario",
      paramLabel = "DIR",
      description = "Scenario folder, instead of looking for it.")
  private Path scenario;

  @Option(
      names = "--orekit-data",
      paramLabel = "DIR|ZIP",
      description = "Orekit data to use before what is built in.")
  private Path orekitData;

  @Option(names = "--json", description = "Print the verdict as JSON.")
  private boolean json;

  @Override
  public Integer call() {
    PrintWriter results = spec.commandLine().getOut();
    CheckRun.Answer answer;
    try (ProgressLine progress =
        new ProgressLine(spec.commandLine().getErr(), Terminal.present())) {
      progress.show("checking " + plan);
      answer =
          CheckRun.check(
              new CheckRun.Request(
                  plan,
                  Path.of(""),
                  Optional.ofNullable(scenario),
                  Optional.ofNullable(orekitData)));
    }
    results.print(
        json
            ? PlanJson.verdict(
                plan.toString(),
                shown(answer.folder()),
                answer.summary(),
                answer.report(),
                answer.altered(),
                answer.stale())
            : Verdict.coloured(
                spec,
                CheckScreen.of(plan.toString(), shown(answer.folder()), answer),
                answer.passed(),
                answer.word()));
    results.flush();
    return answer.passed() ? Exit.DONE : Exit.SHORTFALL;
  }

  /** Relative where the folder lies in the working folder. */
  private static String shown(Path folder) {
    Path here = Path.of("").toAbsolutePath();
    return folder.startsWith(here) ? here.relativize(folder).toString() : folder.toString();
  }
}
