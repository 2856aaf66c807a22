package quietspan.cli;

import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import quietspan.run.PlanRun;

/** How to search. */
final class SearchOptions {
  @Option(
      names = "--seed",
      defaultValue = "1",
      paramLabel = "N",
      description = "Seed of the search. Default: ${DEFAULT-VALUE}.")
  private long seed;

  @Option(
      names = "--effort",
      paramLabel = "STEPS",
      description = {
        "Steps of the search; the same number gives the same plan on every machine.",
        "Default: as many as the demo needs."
      })
  private Long effort;

  long seed() {
    return seed;
  }

  long effort(CommandSpec spec) {
    if (effort != null && effort < 0) {
      throw new ParameterException(spec.commandLine(), "--effort is zero or more: " + effort);
    }
    return effort == null ? PlanRun.defaultEffort() : effort;
  }
}
