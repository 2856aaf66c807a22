package quietspan.model;

import java.util.List;
import quietspan.time.OnboardInstant;
import quietspan.units.DataRate;

/**
 * A data rate that is constant between given on-board instants. The first step also holds before
 * its instant, the last one for ever.
 */
public record Profile(List<Step> steps) {

  /** From this on-board instant on, at this rate. */
  public record Step(OnboardInstant from, DataRate rate) {}

  public Profile {
    steps = List.copyOf(steps);
    if (steps.isEmpty()) {
      throw new IllegalArgumentException("a profile needs at least one step");
    }
    for (int i = 1; i < steps.size(); i++) {
      if (!steps.get(i - 1).from().isBefore(steps.get(i).from())) {
        throw new IllegalArgumentException("steps of a profile are in time order");
      }
    }
  }

  public DataRate at(OnboardInstant instant) {
    DataRate rate = steps.get(0).rate();
    for (Step step : steps) {
      if (step.from().isAfter(instant)) {
        break;
      }
      rate = step.rate();
    }
    return rate;
  }
}
