/**
 * Where a complaint points to. Readers gather {@link quietspan.problem.Problem}s in a {@link
 * quietspan.problem.Problems} and throw one {@link quietspan.problem.InputException} with all of
 * them, before anything is computed or written.
 */
package quietspan.problem;
