package quietspan.model;

import java.time.Duration;
import java.util.Optional;

/**
 * Limits on data and contacts of the formation.
 *
 * @param gapLimit longest ground time without any contact of the formation; absent for none
 * @param directLimit longest ground time per craft without a contact of its own; absent for none
 * @param endFillShare limit of each store at the end of the period as a fraction of its capacity;
 *     absent: the larger of the start fill and 25 %
 * @param endCoverage how long each craft's aim at the end must still hold the Earth; absent: not
 *     asked
 * @param forwardAhead how long before a contact the other craft already send to its craft; zero:
 *     only during contacts
 * @param crossLinksInPauses whether craft exchange data during pauses
 */
public record DataRules(
    Optional<Duration> gapLimit,
    Optional<Duration> directLimit,
    Optional<Double> endFillShare,
    Optional<Duration> endCoverage,
    Duration forwardAhead,
    boolean crossLinksInPauses) {}
