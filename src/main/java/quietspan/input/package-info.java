/**
 * Reads a scenario folder: YAML files with units, calendars by RFC 5545, profiles as CSV. Knows the
 * files and how to complain about them with file, line and column; computes no geometry and plans
 * nothing (ephemeris files are only looked for and hashed here). Each YAML file is described by one
 * table of fields, from which the reader, the JSON Schema, the hints and the reference page are all
 * made. Open {@link quietspan.input.ScenarioReader} first, then {@code MissionFields}.
 */
package quietspan.input;
