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
import quietspan.run.PlanRun;

/** Plans a scenario. */
@Command(
    name = "plan",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    description = {
      "Places repoints and contacts, proves how good the plan can be, checks it by every rule, and",
      "writes the plan folder. Ends with 0 for a legal plan and 3 for a shortfall.",
      "A planning aid, not an authorisation: stations, flight director and licences decide."
    },
    footer = {
      "",
      "Ctrl-C ends the search and delivers the best plan so far; a second one aborts.",
      "",
      "Examples:",
      "  quietspan plan stations-demo --out plans/sallow-triad",
      "  quietspan plan stations-demo --out /tmp/quick --effort 0 --json"
    })
final class PlanCommand implements Callable<Integer> {
  @Spec private CommandSpec spec;
  @Mixin private SourceOptions source;
  @Mixin private SearchOptions search;

  @Option(
      names = "--out",
      required = true,
      paramLabel = "DIR",
      description = "Folder of the plan; a plan that is there is replaced as a whole.")
  private Path out;

  @Option(names = "--json", description = "Print the summary as JSON.")
  private boolean json;

  @Override
  public Integer call() {
    PrintWriter remarks = spec.commandLine().getErr();
    PlanRun.Answer answer;
    AtomicBoolean stop = Interrupts.listen();
    try (ProgressLine progress = new ProgressLine(remarks, Terminal.present())) {
      answer =
          PlanRun.plan(
              new PlanRun.Request(
                  source.source(), out, search.seed(), search.effort(spec), Version.number()),
              progress::show,
              stop);
    }
    Summary summary = Summary.of(answer.scenario(), answer.plan());
    PrintWriter results = spec.commandLine().getOut();
    results.print(
        json
            ? PlanJson.report(out.toString(), summary, answer.warnings())
            : Verdict.coloured(
                spec,
                PlanScreen.of(
                    answer.scenario(),
                    answer.plan(),
                    answer.ends(),
                    answer.warnings(),
                    answer.assumptions(),
                    Optional.of(out.toString())),
                !summary.shortfall(),
                summary.status().name()));
    results.flush();
    return summary.shortfall() ? Exit.SHORTFALL : Exit.DONE;
  }
}
