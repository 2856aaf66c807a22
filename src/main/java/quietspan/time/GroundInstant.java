package quietspan.time;

import java.time.Instant;

/**
 * An instant on the ground clock: the wave is at the station (or at the Earth's centre). Written as
 * UTC.
 */
public record GroundInstant(Instant utc) implements ClockInstant<GroundInstant> {

  public GroundInstant {
    java.util.Objects.requireNonNull(utc, "utc");
  }

  public static GroundInstant ofEpochSecond(long seconds) {
    return new GroundInstant(Instant.ofEpochSecond(seconds));
  }

  /** Reads {@code 2031-09-01T00:00:00Z}; refuses anything without the {@code Z}. */
  public static GroundInstant parse(String text) {
    return new GroundInstant(Instant.parse(text));
  }

  @Override
  public GroundInstant at(Instant other) {
    return new GroundInstant(other);
  }

  @Override
  public String toString() {
    return utc.toString();
  }
}
