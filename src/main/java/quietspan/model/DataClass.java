package quietspan.model;

import java.time.Duration;

/**
 * A class of data.
 *
 * @param priority 1 is sent first
 * @param latencyLimit longest time from generation on board to delivery on the ground
 */
public record DataClass(String name, int priority, Duration latencyLimit) {}
