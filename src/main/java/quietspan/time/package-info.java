/**
 * Two clocks that must never be mixed up: the ground clock (the wave is at a station or at the
 * Earth) and the on-board clock (the wave is at the craft). Both are written as UTC; only light
 * time converts one into the other, and that conversion lives in {@code model.SightLines}. Open
 * {@link quietspan.time.Interval} first.
 */
package quietspan.time;
