/**
 * What follows from decisions: pauses, quiet spans and their value, what every contact carries,
 * what every store holds, and which data rules break. A pure function of scenario, geometry,
 * decisions and waivers; knows neither the search nor the rules of contacts and repoints. Open
 * {@link quietspan.planning.simulation.Simulation} first; {@link
 * quietspan.planning.simulation.Spans} is the part that needs no stores.
 */
package quietspan.planning.simulation;
