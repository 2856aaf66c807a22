package quietspan.planning;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import quietspan.model.Waiver;

/**
 * A first plan: the skeleton of the programme on planning cells, every contact that fits in it, and
 * the data rules asked of the ledger. Where they break, the cells are shaded (less capacity, less
 * time before data are late, less room) and the skeleton is built anew; the first plan that keeps
 * the rules is taken, else the least bad one.
 */
final class Seed {

  private static final List<Cells.Shade> SHADES =
      List.of(
          new Cells.Shade(0.92, 1200, 0.95, 0.98),
          new Cells.Shade(0.85, 3600, 0.9, 0.95),
          new Cells.Shade(0.8, 2 * 3600, 0.8, 0.9),
          new Cells.Shade(0.7, 4 * 3600, 0.65, 0.8));

  /**
   * Where no skeleton keeps the data rules these pretend that more can be sent, stored and waited
   * for, so that the least bad plan still has beams on the Earth.
   */
  private static final List<Cells.Shade> PRETENCES =
      List.of(
          new Cells.Shade(1.5, -6 * 3600, 1.5, 1.5),
          new Cells.Shade(4, -24 * 3600, 4, 3),
          new Cells.Shade(50, -10 * 86_400, 50, 20));

  private static final int WIDTH = 120;

  /** Seconds by which the ledger is stricter than the rules, to begin with. */
  static final int FIRST_GUARD = 600;

  private final Tables tables;
  private final Links links;
  private final List<Waiver> waivers;
  private final Planner.Progress progress;
  private final List<Use> fixed = new ArrayList<>();

  Seed(Tables tables, Links links, List<Waiver> waivers, Planner.Progress progress) {
    this.tables = tables;
    this.links = links;
    this.waivers = waivers;
    this.progress = progress;
  }

  /** Contacts that must stay. */
  Set<Use> fixed() {
    TreeSet<Use> set =
        new TreeSet<>(
            java.util.Comparator.comparingInt(Use::begin)
                .thenComparingInt(Use::antenna)
                .thenComparingInt(Use::end)
                .thenComparingInt(Use::step)
                .thenComparingInt(Use::craft));
    set.addAll(fixed);
    return set;
  }

  /** The same pauses with every contact that fits, under a stricter ledger. */
  Roster refilled(Draft draft, int guard) {
    return fill(draft, guard);
  }

  Roster roster() {
    Roster best = null;
    List<Use> bestFixed = List.of();
    int coarse = BoundSearch.coarseGrid(tables);
    ToGo toGo =
        ToGo.of(
            new Cells(tables, links, waivers, Relaxation.all(), Cells.Shade.NONE, coarse),
            Programme.Aim.LOSS);
    for (Cells.Shade shade : SHADES) {
      for (int grid : grids(coarse)) {
        Optional<Draft> draft = draft(shade, grid, toGo);
        if (draft.isEmpty()) {
          continue;
        }
        Roster roster = fill(draft.get(), FIRST_GUARD);
        boolean better =
            best == null
                || rank(roster) < rank(best)
                || (rank(roster) == rank(best)
                    && roster.draft().science() > best.draft().science());
        if (better) {
          best = roster;
          bestFixed = List.copyOf(fixed);
        }
      }
      if (best != null && best.shortfall().none()) {
        break;
      }
    }
    for (int i = 0; i < PRETENCES.size() && best == null; i++) {
      for (int grid : grids(coarse)) {
        Optional<Draft> draft = draft(PRETENCES.get(i), grid, ToGo.nothing(tables.warmUp));
        if (draft.isPresent()) {
          best = fill(draft.get(), FIRST_GUARD);
          bestFixed = List.copyOf(fixed);
        }
      }
    }
    if (best == null) {
      best = fill(new Draft(tables, List.of()), FIRST_GUARD);
      bestFixed = List.copyOf(fixed);
    }
    fixed.clear();
    fixed.addAll(bestFixed);
    return best;
  }

  private static long rank(Roster roster) {
    return roster.shortfall().weight();
  }

  private List<Integer> grids(int coarse) {
    List<Integer> grids = new ArrayList<>();
    for (int grid : new int[] {3 * 3600}) {
      if (grid < coarse) {
        grids.add(grid);
      }
    }
    if (grids.isEmpty()) {
      grids.add(Math.max(Tables.STEP, coarse / 2 / Tables.STEP * Tables.STEP));
    }
    return grids;
  }

  private Optional<Draft> draft(Cells.Shade shade, int grid, ToGo toGo) {
    Cells cells = new Cells(tables, links, waivers, Planner.forSkeletons(), shade, grid);
    Optional<Programme.Solution> solution =
        new Programme(
                cells, Programme.Aim.LOSS, true, toGo, Long.MAX_VALUE / 4, Long.MAX_VALUE, WIDTH)
            .solve();
    solution.ifPresent(
        found ->
            progress.stage(
                "skeleton on cells of "
                    + grid / 60
                    + " min: "
                    + Math.floor((tables.length - found.loss()) / 360.0) / 10
                    + " h"));
    return solution.map(found -> new Draft(tables, new Skeleton(tables, cells).moves(found)));
  }

  private Roster fill(Draft draft, int guard) {
    Roster roster = new Roster(tables, waivers, draft, guard);
    fixed.clear();
    for (Links.Window window : links.confirmed) {
      Use use = new Use(window.craft(), window.antenna(), window.begin(), window.end(), 0);
      int step = tables.rateStep(draft, use);
      if (step >= 0) {
        fixed.add(new Use(window.craft(), window.antenna(), window.begin(), window.end(), step));
      }
    }
    for (Use use : new FullSchedule(tables, links, fixed).best(draft)) {
      roster.add(use);
    }
    return roster;
  }
}
