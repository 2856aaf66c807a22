package quietspan.planning;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import quietspan.model.Bound;
import quietspan.model.Waiver;

/**
 * Proves how much science any legal plan loses at least, and how many pauses it needs at least. The
 * grid is refined step by step; on each grid the programme is asked whether a plan can lose less
 * than a rising cutoff, so that the answer "no" to any of them is already a bound, whenever the
 * work allowed is used up. The work is counted in labels, never in seconds, so that the same
 * scenario gives the same bound.
 */
class BoundSearch {

  private static final int COARSE = 6 * 3600;
  private static final int[] GRIDS = {4 * 3600, 2 * 3600, 3600, 1800};
  private static final long STEP = 3600;

  private final Tables tables;
  private final Links links;
  private final List<Waiver> waivers;
  private final Set<Relaxation> relaxed;

  /** Work allowed, in labels. */
  private final long work;

  private long used;
  private String method = "";

  BoundSearch(
      Tables tables, Links links, List<Waiver> waivers, Set<Relaxation> relaxed, long work) {
    this.tables = tables;
    this.links = links.unguarded();
    this.waivers = waivers;
    this.relaxed = relaxed;
    this.work = work;
  }

  /**
   * Least loss that is proved (s); empty when no legal plan exists.
   *
   * @param known loss of a plan in hand, or a large number: beyond it there is nothing to prove
   */
  Optional<Long> leastLoss(long known) {
    return least(Programme.Aim.LOSS, known, STEP);
  }

  /** Fewest pauses that are proved; empty when no legal plan exists. */
  Optional<Long> fewestPauses(long known) {
    return least(Programme.Aim.PAUSES, known, 1);
  }

  /** One line on how the last answer was found. */
  String method() {
    return method;
  }

  static int coarseGrid(Tables tables) {
    return Math.max(Tables.STEP, Math.min(COARSE, tables.length / 24 / Tables.STEP * Tables.STEP));
  }

  private Optional<Long> least(Programme.Aim aim, long known, long rise) {
    used = 0;
    int coarse = coarseGrid(tables);
    Cells cells = cells(coarse);
    ToGo toGo = ToGo.of(cells, aim);
    long proved = toGo.whole();
    if (proved >= ToGo.NEVER) {
      return Optional.empty();
    }
    // Where even the coarse grid holds no solution at all, no legal plan exists.
    long top = Math.min(known, aim == Programme.Aim.LOSS ? 2L * tables.length : 100_000);
    int grid = coarse;
    List<Integer> grids = new ArrayList<>(List.of(coarse));
    for (int finer : GRIDS) {
      if (finer < coarse) {
        grids.add(finer);
      }
    }
    for (int finer : grids) {
      Cells fine = finer == coarse ? cells : cells(finer);
      boolean found = false;
      while (!found && proved < top) {
        long cutoff = Math.min(top, proved + rise);
        Programme programme = new Programme(fine, aim, false, toGo, cutoff, work - used);
        Optional<Programme.Solution> solution = programme.solve();
        used += programme.labelsKept();
        if (programme.gaveUp()) {
          method = describe(grid, false);
          return Optional.of(proved);
        }
        if (solution.isPresent()) {
          proved = Math.max(proved, solution.orElseThrow().loss());
          found = true;
        } else {
          proved = cutoff;
          if (!programme.cut() || (cutoff >= top && known > top)) {
            return Optional.empty();
          }
        }
      }
      grid = finer;
      if (proved >= top) {
        break;
      }
    }
    method = describe(grid, proved >= known);
    return Optional.of(proved);
  }

  /** What the programme is told on a grid. */
  Cells cells(int cellLength) {
    return new Cells(tables, links, waivers, relaxed, Cells.Shade.NONE, cellLength);
  }

  Links links() {
    return links;
  }

  private String describe(int grid, boolean optimal) {
    return "cells of "
        + grid / 60
        + " min, "
        + used
        + " labels"
        + (optimal ? ", proved optimal" : "");
  }

  /** The whole bound with its chain of relaxations. */
  Bound bound(long knownLoss, long knownPauses) {
    Optional<Long> loss = leastLoss(knownLoss);
    String how = method;
    Optional<Long> pauses = fewestPauses(knownPauses);
    List<Bound.Relaxation> chain = new ArrayList<>();
    for (Relaxation relaxation : Relaxation.values()) {
      chain.add(
          new Bound.Relaxation(relaxation.title(), relaxation.sentence(), Optional.<Long>empty()));
    }
    return new Bound(
        loss.map(seconds -> tables.length - seconds),
        loss.isEmpty() ? Optional.empty() : pauses.map(Long::intValue),
        chain,
        how);
  }
}
