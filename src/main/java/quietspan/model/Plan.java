package quietspan.model;

import java.util.Optional;

/**
 * A plan with all that belongs to it.
 *
 * @param bound absent when it was not computed
 */
public record Plan(
    String mission,
    Decisions decisions,
    Outcome outcome,
    Optional<Bound> bound,
    Provenance provenance) {}
