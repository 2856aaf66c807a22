package quietspan.planning;

import org.optaplanner.core.api.domain.entity.PlanningEntity;
import org.optaplanner.core.api.domain.lookup.PlanningId;
import org.optaplanner.core.api.domain.variable.PlanningVariable;

/**
 * A repoint of one craft that a plan makes or does without. Public because the solver asks for it.
 */
@PlanningEntity
public final class RepointSlot {

  @PlanningId private int id;

  private int craft;

  @PlanningVariable(valueRangeProviderRefs = Polishing.MOVES, nullable = true)
  private Move move;

  /** For the solver's own clones. */
  public RepointSlot() {}

  RepointSlot(int id, int craft, Move move) {
    this.id = id;
    this.craft = craft;
    this.move = move;
  }

  int id() {
    return id;
  }

  int craft() {
    return craft;
  }

  /** The repoint; null for none. */
  Move move() {
    return move;
  }

  void move(Move next) {
    move = next;
  }
}
