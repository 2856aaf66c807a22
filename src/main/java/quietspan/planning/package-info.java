/**
 * Finds plans and proves how good they can be. {@link quietspan.planning.Planner} is the door:
 * waivers, geometry and scenario in, decisions and bound out. Inside, time is whole seconds since
 * the begin of the period on board, craft and antennas are numbers; {@code Tables} holds the
 * sampled geometry in that form. Never sees {@code check}, {@code astro} or any file.
 */
package quietspan.planning;
