/**
 * The command line: options, console text, exit codes, and the only place that reads the machine's
 * clock. It knows nothing of geometry or planning beyond what {@code run} offers. Open {@link
 * quietspan.cli.QuietspanCommand} first.
 */
package quietspan.cli;
