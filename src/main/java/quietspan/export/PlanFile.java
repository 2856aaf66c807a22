package quietspan.export;

import java.time.Instant;
import quietspan.model.Decisions;
import quietspan.model.Provenance;

/**
 * What counts in a {@code plan.json}: the decisions and where they come from. All else in the file
 * can be computed again.
 *
 * @param issued time stamp with which the plan was written
 */
public record PlanFile(
    String mission, Instant issued, Decisions decisions, Provenance provenance) {}
