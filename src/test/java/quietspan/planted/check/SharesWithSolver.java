package quietspan.planted.check;

import quietspan.planted.planning.AsksCheck;

/** A check that leans on the solver. */
public final class SharesWithSolver {
  public boolean legal(AsksCheck solver) {
    return solver.isDone();
  }
}
