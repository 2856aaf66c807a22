package quietspan.model;

import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * Unbroken science between pauses.
 *
 * @param lengthSeconds its length; of the first span from when it really began
 * @param valueSeconds what it counts
 * @param openBefore it began at or before the start of the period
 * @param openAfter it goes on after the end of the period
 */
public record QuietSpan(
    Interval<OnboardInstant> during,
    long lengthSeconds,
    long valueSeconds,
    boolean openBefore,
    boolean openAfter) {}
