package quietspan.model;

import java.time.Instant;

/**
 * A rule that is broken, once per place where it is.
 *
 * @param at first instant of the breach, on the clock of the rule
 * @param craft empty when it concerns the formation
 * @param station empty when it concerns no station
 * @param subject id of the contact or repoint, name of the data class, or empty
 * @param amount by how much, in the unit of the rule, above zero
 * @param detail one sentence with numbers
 */
public record Finding(
    RuleId rule,
    Instant at,
    String craft,
    String station,
    String subject,
    double amount,
    String detail) {}
