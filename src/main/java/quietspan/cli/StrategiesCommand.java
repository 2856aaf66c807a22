package quietspan.cli;

import java.io.PrintWriter;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Spec;
import quietspan.export.Strategy;
import quietspan.run.StrategiesRun;

/** Compares with simple ways to plan. */
@Command(
    name = "strategies",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    description = {
      "Plans a scenario and, beside it, by simple strategies: each with its own best start, with",
      "contacts filled in the same way, and judged by the same check. Writes nothing."
    },
    footer = {
      "",
      "Examples:",
      "  quietspan strategies stations-demo",
      "  quietspan strategies stations-demo --format csv"
    })
final class StrategiesCommand implements Callable<Integer> {
  @Spec private CommandSpec spec;
  @Mixin private SourceOptions source;
  @Mixin private SearchOptions search;
  @Mixin private FormatOption format;

  @Override
  public Integer call() {
    List<Strategy> strategies;
    try (ProgressLine progress =
        new ProgressLine(spec.commandLine().getErr(), Terminal.present())) {
      strategies =
          StrategiesRun.compare(
              source.source(), search.seed(), search.effort(spec), progress::show);
    }
    PrintWriter results = spec.commandLine().getOut();
    format.print(Strategy.table(strategies), results);
    if (format.isTable()) {
      results.println();
      Lines lines = new Lines();
      strategies.forEach(each -> lines.wrapped(each.name() + ": " + each.sentence(), 0));
      results.print(lines);
      results.flush();
    }
    return Exit.DONE;
  }
}
