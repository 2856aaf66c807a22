/**
 * One writer per kind of file: {@code plan.json}, CSV tables, calendars, and the replacement of a
 * plan folder as a whole. Knows how things are written, nothing of how they came about. Open {@link
 * quietspan.export.PlanFiles} first; {@link quietspan.export.PlanJson} also reads a plan that was
 * edited by hand.
 */
package quietspan.export;
