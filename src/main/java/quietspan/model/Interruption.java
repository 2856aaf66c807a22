package quietspan.model;

import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/** A planned stop of science that is not a repoint, such as a calibration. */
public record Interruption(Interval<OnboardInstant> during, String label) {}
