package quietspan.model;

import java.util.List;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * Science stopped: repoints with settling, and interruptions, that overlap or touch.
 *
 * @param repoints ids; empty when the pause holds only interruptions
 * @param interruptions labels
 */
public record Pause(
    Interval<OnboardInstant> during, List<String> repoints, List<String> interruptions) {

  public Pause {
    repoints = List.copyOf(repoints);
    interruptions = List.copyOf(interruptions);
  }
}
