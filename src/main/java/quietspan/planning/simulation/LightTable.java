package quietspan.planning.simulation;

import java.time.Duration;
import java.util.List;
import quietspan.model.Craft;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.time.OnboardInstant;

/**
 * When a wave that leaves a craft reaches the ground, for every second of the period: sampled each
 * hour and linear between. The range of a craft on an orbit like the Earth's accelerates by less
 * than 2e-5 km/s², so the line is wrong by less than a² / 8 times that over c: 0.11 ms.
 */
final class LightTable {

  private static final long STEP = 3_600;

  private final long periodSeconds;
  private final long[][] nanos;

  private LightTable(long periodSeconds, long[][] nanos) {
    this.periodSeconds = periodSeconds;
    this.nanos = nanos;
  }

  static LightTable of(Scenario scenario, SightLines sightLines) {
    OnboardInstant begin = scenario.period().begin();
    long seconds = scenario.period().length().toSeconds();
    int nodes = Math.toIntExact((seconds + STEP - 1) / STEP + 1);
    List<Craft> craft = scenario.craft();
    long[][] nanos = new long[craft.size()][nodes];
    for (int c = 0; c < nanos.length; c++) {
      for (int node = 0; node < nodes; node++) {
        OnboardInstant sent = begin.plusSeconds(Math.min(node * STEP, seconds));
        nanos[c][node] =
            Duration.between(sent.utc(), sightLines.ground(craft.get(c).name(), sent).utc())
                .toNanos();
      }
    }
    return new LightTable(seconds, nanos);
  }

  /**
   * Nanoseconds from the begin of the period, on board, to the ground instant of reception of a
   * wave sent at the given second of the period (0 to its length).
   */
  long receivedNanos(int craft, long sentSecond) {
    int node = (int) (sentSecond / STEP);
    long sent = sentSecond * 1_000_000_000;
    long before = nanos[craft][node];
    long into = sentSecond - node * STEP;
    if (into == 0) {
      return sent + before;
    }
    long step = Math.min(STEP, periodSeconds - node * STEP);
    return sent + before + (nanos[craft][node + 1] - before) * into / step;
  }
}
