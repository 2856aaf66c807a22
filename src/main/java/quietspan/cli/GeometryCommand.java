package quietspan.cli;

import java.time.Duration;
import java.util.Optional;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import quietspan.run.GeometryRun;
import quietspan.run.GeometryRun.Answer;
import quietspan.run.GeometryRun.Question;

/** Range, light time and angles through time. */
@Command(
    name = "geometry",
    description = "Range, light time, Sun angles and the Earth's direction, in ground time.",
    footer = {
      "",
      "Examples:",
      "  quietspan geometry stations-demo --step 1d",
      "  quietspan geometry stations-demo --station Ostrand --craft Tovin --step 10min \\",
      "      --from 2031-09-01T12:00:00Z --to 2031-09-02 --format csv"
    })
final class GeometryCommand extends TableCommand {
  @Option(
      names = "--step",
      paramLabel = "TIME",
      defaultValue = "6h",
      converter = DurationConverter.class,
      description = "Time between rows, such as 10min. Default: ${DEFAULT-VALUE}.")
  private Duration step;

  @Option(
      names = "--station",
      paramLabel = "NAME",
      description = {
        "Range and light time to this station, with its azimuth and elevation.",
        "Default: to the Earth's centre."
      })
  private String station;

  @Override
  Answer answer(Question question) {
    return GeometryRun.geometry(question, step);
  }

  @Override
  Optional<String> station() {
    return Optional.ofNullable(station);
  }
}
