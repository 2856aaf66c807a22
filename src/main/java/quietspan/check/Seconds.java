package quietspan.check;

import java.time.Duration;

/** Durations as seconds. */
final class Seconds {

  private Seconds() {}

  static double of(Duration duration) {
    return duration.toSeconds() + duration.getNano() / 1e9;
  }

  static long roundedDown(Duration duration) {
    return duration.toSeconds();
  }

  static long roundedUp(Duration duration) {
    return duration.toSeconds() + (duration.getNano() > 0 ? 1 : 0);
  }
}
