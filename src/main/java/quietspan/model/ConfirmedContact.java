package quietspan.model;

import quietspan.time.GroundInstant;
import quietspan.time.Interval;

/** A contact the station has confirmed: a plan keeps station, craft and at least this interval. */
public record ConfirmedContact(
    String id,
    String station,
    String antenna,
    String craft,
    Interval<GroundInstant> during,
    String label) {}
