/**
 * Quantities that cross package borders carry their unit in their type. Each converts at the edge,
 * once, in its factory. Parsing of texts such as {@code 2.5 deg} lives in {@code input}.
 */
package quietspan.units;
