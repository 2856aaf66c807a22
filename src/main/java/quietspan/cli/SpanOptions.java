package quietspan.cli;

import java.time.Instant;
import java.util.Optional;
import picocli.CommandLine.Option;

/** From when to when. */
final class SpanOptions {
  @Option(
      names = "--from",
      paramLabel = "UTC",
      converter = InstantConverter.class,
      description = "Begin, on the clock of the table. Default: that of the period.")
  private Instant from;

  @Option(
      names = "--to",
      paramLabel = "UTC",
      converter = InstantConverter.class,
      description = "End, exclusive, on the clock of the table. Default: that of the period.")
  private Instant to;

  Optional<Instant> from() {
    return Optional.ofNullable(from);
  }

  Optional<Instant> to() {
    return Optional.ofNullable(to);
  }
}
