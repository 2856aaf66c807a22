package quietspan.model;

import java.util.List;
import java.util.Optional;

/**
 * How good any legal plan can be at most.
 *
 * @param scienceSeconds no legal plan has more; absent: proved that no legal plan exists
 * @param pauses no legal plan has fewer pauses that hold a repoint; absent as above
 * @param relaxations what was given up to compute it, in the order of the chain
 * @param method one line: grid, labels, whether it was refined
 */
public record Bound(
    Optional<Long> scienceSeconds,
    Optional<Integer> pauses,
    List<Relaxation> relaxations,
    String method) {

  /**
   * One step of the chain.
   *
   * @param name short name
   * @param sentence which rule it drops or widens and why the bound stays valid
   * @param costSeconds science by which it raises the bound when it alone is tightened; absent: not
   *     measured
   */
  public record Relaxation(String name, String sentence, Optional<Long> costSeconds) {}

  public Bound {
    relaxations = List.copyOf(relaxations);
  }
}
