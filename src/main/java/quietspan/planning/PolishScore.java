package quietspan.planning;

import org.optaplanner.core.api.score.buildin.bendablelong.BendableLongScore;
import org.optaplanner.core.api.score.calculator.IncrementalScoreCalculator;

/**
 * Keeps a roster in step with the slots of a {@link Polishing}, so that a change costs only the
 * days it touches. Public because the solver asks for it.
 */
public final class PolishScore implements IncrementalScoreCalculator<Polishing, BendableLongScore> {

  /** A contact that its hold does not carry weighs as much as a repoint an hour out of place. */
  private static final long BROKEN = 3600;

  private Polishing plan;
  private Roster roster;
  private boolean repointsChanged;
  private long breaches;

  /** For the solver. */
  public PolishScore() {}

  @Override
  public void resetWorkingSolution(Polishing solution) {
    plan = solution;
    Polishing.Frame frame = plan.frame();
    Draft draft = new Draft(frame.tables(), plan.moves());
    roster = new Roster(frame.tables(), frame.waivers(), draft, frame.guard());
    plan.uses().forEach(roster::add);
    breaches = draft.breaches() + BROKEN * roster.broken().size();
    repointsChanged = false;
  }

  @Override
  public void beforeVariableChanged(Object entity, String variable) {
    if (entity instanceof ContactSlot slot && slot.use() != null) {
      roster.remove(slot.use());
    }
  }

  @Override
  public void afterVariableChanged(Object entity, String variable) {
    if (entity instanceof ContactSlot slot) {
      if (slot.use() != null) {
        roster.add(slot.use());
      }
    } else {
      repointsChanged = true;
    }
  }

  @Override
  public BendableLongScore calculateScore() {
    if (repointsChanged) {
      Draft draft = roster.draft().with(plan.moves());
      roster.draft(draft);
      breaches = draft.breaches() + BROKEN * roster.broken().size();
      repointsChanged = false;
    }
    Draft draft = roster.draft();
    return BendableLongScore.of(
        new long[] {-breaches, -shortfall()},
        new long[] {draft.science(), -roster.cost(), draft.shortestSpan()});
  }

  /** A plan that keeps the data rules need not know how badly a change would break them. */
  private long shortfall() {
    return plan.frame().legal() ? roster.firstBreach() : roster.shortfall().weight();
  }

  @Override
  public void beforeEntityAdded(Object entity) {
    throw new UnsupportedOperationException("slots are never added");
  }

  @Override
  public void afterEntityAdded(Object entity) {
    throw new UnsupportedOperationException("slots are never added");
  }

  @Override
  public void beforeEntityRemoved(Object entity) {
    throw new UnsupportedOperationException("slots are never removed");
  }

  @Override
  public void afterEntityRemoved(Object entity) {
    throw new UnsupportedOperationException("slots are never removed");
  }
}
