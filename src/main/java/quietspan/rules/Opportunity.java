package quietspan.rules;

import quietspan.model.Pass;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;

/**
 * A stretch in which an antenna could hear a craft, as far as the scenario alone decides: beams
 * centred, the antenna not shared with others of our craft.
 *
 * @param during ground receive time, whole seconds, rounded inward
 */
public record Opportunity(
    String station, String antenna, String craft, Interval<GroundInstant> during, Pass pass) {}
