package quietspan.model;

import quietspan.time.GroundInstant;
import quietspan.time.OnboardInstant;

/**
 * What of a published plan has begun, or is about to, and therefore stays.
 *
 * @param published the decisions as they were published
 * @param contactsBefore contacts that begin before this ground instant stay as published, and none
 *     is added before it
 * @param repointsBefore repoints that start before this on-board instant stay as published, and
 *     none is added before it
 */
public record Frozen(
    Decisions published, GroundInstant contactsBefore, OnboardInstant repointsBefore) {}
