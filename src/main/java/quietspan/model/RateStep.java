package quietspan.model;

import quietspan.time.GroundInstant;
import quietspan.units.DataRate;

/** From this ground receive instant on, at this rate. */
public record RateStep(GroundInstant from, DataRate rate) {}
