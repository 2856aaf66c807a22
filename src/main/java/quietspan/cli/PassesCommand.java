package quietspan.cli;

import java.util.Optional;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import quietspan.run.GeometryRun;
import quietspan.run.GeometryRun.Answer;
import quietspan.run.GeometryRun.Question;

/** When each station sees each craft. */
@Command(
    name = "passes",
    description = "When each station sees each craft above its mask, in ground time.",
    footer = {
      "",
      "Examples:",
      "  quietspan passes stations-demo",
      "  quietspan passes stations-demo --station Vellmarch --craft Hask --format csv",
      "  quietspan passes stations-demo --from 2031-09-01 --to 2031-09-08 --json"
    })
final class PassesCommand extends TableCommand {
  @Option(names = "--station", paramLabel = "NAME", description = "Only this station.")
  private String station;

  @Override
  Answer answer(Question question) {
    return GeometryRun.passes(question);
  }

  @Override
  Optional<String> station() {
    return Optional.ofNullable(station);
  }
}
