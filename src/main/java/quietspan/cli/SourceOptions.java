package quietspan.cli;

import java.nio.file.Path;
import java.time.Instant;
import java.util.Optional;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import quietspan.run.Source;

/** Which scenario, and with what. */
final class SourceOptions {
  @Parameters(
      paramLabel = "SCENARIO",
      description = "Scenario folder with mission.yaml, stations.yaml and state.yaml.")
  private Path scenario;

  @Option(
      names = "--issued",
      paramLabel = "UTC",
      converter = InstantConverter.class,
      description = "Time stamp of what is written, in place of the scenario's own.")
  private Instant issued;

  @Option(
      names = "--orekit-data",
      paramLabel = "DIR|ZIP",
      description = "Orekit data to use before what is built in.")
  private Path orekitData;

  Source source() {
    return new Source(scenario, Optional.ofNullable(issued), Optional.ofNullable(orekitData));
  }
}
