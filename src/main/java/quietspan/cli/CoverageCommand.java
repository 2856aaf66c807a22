package quietspan.cli;

import java.time.Duration;
import java.util.Optional;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import quietspan.run.GeometryRun;
import quietspan.run.GeometryRun.Answer;
import quietspan.run.GeometryRun.Question;

/** How long one aim can serve. */
@Command(
    name = "coverage",
    description = {
      "The longest that one aim of each craft can serve from an instant on, in on-board time.",
      "Instants at which no aim reaches the Earth have no row."
    },
    footer = {
      "",
      "Examples:",
      "  quietspan coverage stations-demo",
      "  quietspan coverage stations-demo --craft Tovin --step 12h --format csv"
    })
final class CoverageCommand extends TableCommand {
  @Option(
      names = "--step",
      paramLabel = "TIME",
      defaultValue = "1d",
      converter = DurationConverter.class,
      description = "Time between instants, such as 6h. Default: ${DEFAULT-VALUE}.")
  private Duration step;

  @Override
  Answer answer(Question question) {
    return GeometryRun.coverage(question, step);
  }

  @Override
  Optional<String> station() {
    return Optional.empty();
  }
}
