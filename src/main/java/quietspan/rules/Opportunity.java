package quietspan.rules;

import quietspan.model.Pass;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;

/**
 * A stretch in which an antenna could hear a craft, as far as the scenario alone decides: beam
 * centred, antenna not shared with another of our craft. A contact may fill all of it.
 *
 * @param during ground receive time, whole seconds, rounded inward
 * @param pass the one it lies in
 */
public record Opportunity(
    String station, String antenna, String craft, Interval<GroundInstant> during, Pass pass) {}
