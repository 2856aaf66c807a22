/**
 * The judge of a plan: every rule again, in plain loops over sampled geometry. Knows the scenario,
 * the decisions and {@link quietspan.model.SightLines}; refuses to know how a plan was made: no
 * planner, no computed passes, no rate choice, no simulation of the planner's. Open {@link
 * quietspan.check.Check} first, then {@code Judges} for the list of rules.
 */
package quietspan.check;
