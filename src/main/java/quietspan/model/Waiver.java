package quietspan.model;

import java.time.Duration;
import java.time.Instant;

/**
 * A limit that no plan could keep, relaxed by just as much as geometry and outages force. A
 * function of the scenario alone. The stretch lies on the ground clock for GAP and DIRECT, on the
 * on-board clock (generation) for LATENCY.
 *
 * @param craft empty for the formation
 * @param dataClass empty unless the rule is LATENCY
 * @param relaxedLimit the limit that holds inside the stretch, whole seconds
 */
public record Waiver(
    RuleId rule,
    String craft,
    String dataClass,
    Instant begin,
    Instant end,
    Duration relaxedLimit,
    String reason) {}
