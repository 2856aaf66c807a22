package quietspan.cli;

import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.concurrent.atomic.AtomicBoolean;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;
import quietspan.export.PlanJson;
import quietspan.export.Summary;
import quietspan.planning.Planner;
import quietspan.run.PlanRun;

/** Plans a scenario. */
@Command(
    name = "plan",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    description = {
      "Places repoints and contacts, proves how good the plan can be, and writes the plan folder.",
      "A planning aid, not an authorisation: stations, flight director and licences decide."
    },
    footer = {
      "",
      "Examples:",
      "  quietspan plan stations-demo --out plans/sallow-triad",
      "  quietspan plan my-mission --out plans/my-mission --json",
      "",
      "Ends with 0 for a legal plan and 3 for a shortfall."
    })
final class PlanCommand implements Callable<Integer> {
  @Spec private CommandSpec spec;
  @Mixin private SourceOptions source;

  @Option(
      names = "--out",
      required = true,
      paramLabel = "DIR",
      description = "Plan folder to write; an earlier plan there is replaced.")
  private Path folder;

  @Option(names = "--json", description = "Print the summary as JSON.")
  private boolean json;

  @Override
  public Integer call() {
    PrintWriter results = spec.commandLine().getOut();
    PrintWriter remarks = spec.commandLine().getErr();
    AtomicBoolean stop = Interrupts.listen();
    PlanRun.Answer answer;
    try (ProgressLine line = new ProgressLine(remarks, Terminal.present())) {
      answer =
          PlanRun.plan(
              source.source(), folder, Planner.Options.DEFAULT, Version.number(), line::show, stop);
    }
    Summary summary = Summary.of(answer.scenario(), answer.plan());
    if (json) {
      results.print(PlanJson.report(folder.toString(), summary, answer.warnings()));
    } else {
      results.print(
          PlanScreen.of(
              answer.scenario(),
              answer.plan(),
              answer.ends(),
              answer.warnings(),
              Optional.of(folder.toString())));
    }
    results.flush();
    return summary.shortfall() ? Exit.SHORTFALL : Exit.DONE;
  }
}
