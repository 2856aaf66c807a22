package quietspan.time;

import java.time.Duration;
import java.util.Objects;
import java.util.Optional;

/**
 * A stretch of time on one clock: half-open {@code [begin, end)} and never empty. Touching
 * intervals do not overlap.
 *
 * @param <T> the clock
 */
public record Interval<T extends ClockInstant<T>>(T begin, T end) {

  public Interval {
    Objects.requireNonNull(begin, "begin");
    Objects.requireNonNull(end, "end");
    if (!begin.isBefore(end)) {
      throw new IllegalArgumentException(
          "an interval needs begin before end: " + begin + ", " + end);
    }
  }

  public static <T extends ClockInstant<T>> Interval<T> of(T begin, T end) {
    return new Interval<>(begin, end);
  }

  public static <T extends ClockInstant<T>> Interval<T> of(T begin, Duration length) {
    return new Interval<>(begin, begin.plus(length));
  }

  public Duration length() {
    return end.since(begin);
  }

  /** Length in seconds with its fraction. */
  public double seconds() {
    return end.secondsSince(begin);
  }

  public boolean contains(T instant) {
    return !instant.isBefore(begin) && instant.isBefore(end);
  }

  public boolean contains(Interval<T> other) {
    return !other.begin.isBefore(begin) && !other.end.isAfter(end);
  }

  public boolean overlaps(Interval<T> other) {
    return begin.isBefore(other.end) && other.begin.isBefore(end);
  }

  public boolean overlapsOrTouches(Interval<T> other) {
    return !begin.isAfter(other.end) && !other.begin.isAfter(end);
  }

  public Optional<Interval<T>> intersection(Interval<T> other) {
    T from = begin.isBefore(other.begin) ? other.begin : begin;
    T to = end.isBefore(other.end) ? end : other.end;
    return from.isBefore(to) ? Optional.of(new Interval<>(from, to)) : Optional.empty();
  }

  /** The smallest interval that holds both. */
  public Interval<T> hull(Interval<T> other) {
    return new Interval<>(
        begin.isBefore(other.begin) ? begin : other.begin,
        end.isAfter(other.end) ? end : other.end);
  }

  /** This interval made longer at both ends (before and after at least zero). */
  public Interval<T> widened(Duration before, Duration after) {
    return new Interval<>(begin.minus(before), end.plus(after));
  }

  @Override
  public String toString() {
    return "[" + begin + ", " + end + ")";
  }
}
