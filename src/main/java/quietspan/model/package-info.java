/**
 * The vocabulary as records: what a scenario is, what a plan decides, what follows from it. Knows
 * no file format, no library, no algorithm. Open {@link quietspan.model.Scenario} for the input
 * side, {@link quietspan.model.Decisions} and {@link quietspan.model.Outcome} for the result side,
 * {@link quietspan.model.RuleId} for the rules, {@link quietspan.model.SightLines} for the
 * geometry.
 */
package quietspan.model;
