package quietspan.time;

import java.time.Duration;
import java.time.Instant;

/**
 * An instant on one of the two clocks of this job, written as UTC.
 *
 * <p>Arithmetic is that of {@link Instant}: every day has 86 400 s. No leap second is announced
 * after 2017, so a difference of two instants of one period is the elapsed time.
 *
 * @param <T> the clock
 */
public sealed interface ClockInstant<T extends ClockInstant<T>> extends Comparable<T>
    permits GroundInstant, OnboardInstant {

  /** The instant as UTC on this clock. */
  Instant utc();

  /** The same clock at another reading. */
  T at(Instant utc);

  default T plus(Duration duration) {
    return at(utc().plus(duration));
  }

  default T minus(Duration duration) {
    return at(utc().minus(duration));
  }

  default T plusSeconds(long seconds) {
    return at(utc().plusSeconds(seconds));
  }

  /** This instant moved by a fractional number of seconds, rounded to the nanosecond. */
  default T plusSeconds(double seconds) {
    double whole = Math.floor(seconds);
    return at(utc().plusSeconds((long) whole).plusNanos(Math.round((seconds - whole) * 1e9)));
  }

  /** Whole seconds since 1970-01-01T00:00:00Z, rounded towards the past. */
  default long epochSecond() {
    return utc().getEpochSecond();
  }

  /** Elapsed seconds from the other instant to this one; negative when this one is earlier. */
  default double secondsSince(T other) {
    return (utc().getEpochSecond() - other.utc().getEpochSecond())
        + (utc().getNano() - other.utc().getNano()) / 1e9;
  }

  default Duration since(T other) {
    return Duration.between(other.utc(), utc());
  }

  default boolean isBefore(T other) {
    return utc().isBefore(other.utc());
  }

  default boolean isAfter(T other) {
    return utc().isAfter(other.utc());
  }

  /** The latest whole second that is not after this instant. */
  default T floorToSecond() {
    return at(Instant.ofEpochSecond(utc().getEpochSecond()));
  }

  /** The earliest whole second that is not before this instant. */
  default T ceilToSecond() {
    return at(Instant.ofEpochSecond(utc().getEpochSecond() + (utc().getNano() > 0 ? 1 : 0)));
  }

  @Override
  default int compareTo(T other) {
    return utc().compareTo(other.utc());
  }
}
