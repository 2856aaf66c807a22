package quietspan.planning;

import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Objects;
import org.optaplanner.core.api.domain.solution.PlanningEntityCollectionProperty;
import org.optaplanner.core.api.domain.solution.PlanningScore;
import org.optaplanner.core.api.domain.solution.PlanningSolution;
import org.optaplanner.core.api.domain.valuerange.ValueRangeProvider;
import org.optaplanner.core.api.score.buildin.bendablelong.BendableLongScore;
import quietspan.model.Waiver;

/**
 * A plan as the joint polish sees it: slots for contacts and for repoints. Levels of the score, the
 * first weighing most: rules that no written plan may break; data rules; science; station cost; the
 * shortest span. Public because the solver asks for it.
 */
@PlanningSolution
public final class Polishing {

  /** Uses that the solver itself may choose from: none, all come from {@link Shifts}. */
  static final String USES = "uses";

  /** Repoints that the solver itself may choose from: none, as for uses. */
  static final String MOVES = "moves";

  static final int HARD = 2;
  static final int SOFT = 3;

  /** What does not change while polishing. */
  record Frame(
      Tables tables, List<Waiver> waivers, Collection<Use> fixed, int guard, boolean legal) {}

  private Frame frame;

  @PlanningEntityCollectionProperty private List<ContactSlot> contacts;
  @PlanningEntityCollectionProperty private List<RepointSlot> repoints;

  @SuppressWarnings("unused") // read by the solver
  @ValueRangeProvider(id = USES)
  private List<Use> offeredUses = List.of();

  @SuppressWarnings("unused") // read by the solver
  @ValueRangeProvider(id = MOVES)
  private List<Move> offeredMoves = List.of();

  @PlanningScore(bendableHardLevelsSize = HARD, bendableSoftLevelsSize = SOFT)
  private BendableLongScore score;

  /** For the solver's own clones. */
  public Polishing() {}

  Polishing(Frame frame, List<ContactSlot> contacts, List<RepointSlot> repoints) {
    this.frame = frame;
    this.contacts = new ArrayList<>(contacts);
    this.repoints = new ArrayList<>(repoints);
  }

  Frame frame() {
    return frame;
  }

  List<ContactSlot> contacts() {
    return contacts;
  }

  List<RepointSlot> repoints() {
    return repoints;
  }

  BendableLongScore score() {
    return score;
  }

  /** The repoints that are made. */
  List<Move> moves() {
    return repoints.stream().map(RepointSlot::move).filter(Objects::nonNull).toList();
  }

  /** The contacts that are made, the fixed ones included. */
  List<Use> uses() {
    List<Use> uses = new ArrayList<>(frame.fixed());
    contacts.stream().map(ContactSlot::use).filter(Objects::nonNull).forEach(uses::add);
    return uses;
  }
}
