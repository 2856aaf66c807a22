/**
 * Wires a command: reading, geometry, planning, check, writing. Prints nothing and knows no
 * options; {@code cli} asks it and shows what comes back. Open {@link quietspan.run.Source} first.
 */
package quietspan.run;
