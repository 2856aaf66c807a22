package quietspan.time;

import java.time.Instant;

/** An instant on the on-board clock: the wave is at the craft. Written as UTC. */
public record OnboardInstant(Instant utc) implements ClockInstant<OnboardInstant> {

  public OnboardInstant {
    java.util.Objects.requireNonNull(utc, "utc");
  }

  public static OnboardInstant ofEpochSecond(long seconds) {
    return new OnboardInstant(Instant.ofEpochSecond(seconds));
  }

  /** Reads {@code 2031-09-01T00:00:00Z}; refuses anything without the {@code Z}. */
  public static OnboardInstant parse(String text) {
    return new OnboardInstant(Instant.parse(text));
  }

  @Override
  public OnboardInstant at(Instant other) {
    return new OnboardInstant(other);
  }

  @Override
  public String toString() {
    return utc.toString();
  }
}
