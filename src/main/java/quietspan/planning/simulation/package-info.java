/**
 * What follows from decisions: a pure function, exact to the bit and the second. {@link
 * quietspan.planning.simulation.Simulation} is the door. Judges only the data rules; the rules that
 * a written plan never breaks are kept by construction and judged by {@code check}.
 */
package quietspan.planning.simulation;
