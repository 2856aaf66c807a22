package quietspan.model;

import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/** A protected interval: no pause that holds a repoint may overlap it. */
public record Guarded(Interval<OnboardInstant> during, String label) {}
