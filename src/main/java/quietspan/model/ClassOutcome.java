package quietspan.model;

import java.util.OptionalDouble;

/**
 * What becomes of a data class.
 *
 * @param longestLatencySeconds of the bits delivered or still aboard at the end; absent when there
 *     are none
 */
public record ClassOutcome(
    String dataClass,
    long deliveredBits,
    long lateBits,
    long lostBits,
    OptionalDouble longestLatencySeconds) {}
