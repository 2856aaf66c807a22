package quietspan.model;

import java.util.List;

/**
 * The geometry of a scenario over its period.
 *
 * @param sightLines to be sampled
 * @param passes every pass of every station and craft, by rise, then station, then craft
 * @param guardSeconds by how much windows offered to the planner shrink at each end beyond rounding
 *     to whole seconds: 0 with Earth orientation data, 1 without
 * @param sources which leap seconds, Earth orientation and ephemerides served, one line each
 */
public record Geometry(
    SightLines sightLines, List<Pass> passes, int guardSeconds, List<String> sources) {

  public Geometry {
    passes = List.copyOf(passes);
    sources = List.copyOf(sources);
  }
}
