package quietspan.planning;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.atomic.AtomicBoolean;
import quietspan.model.Aim;
import quietspan.model.Decisions;
import quietspan.model.Geometry;
import quietspan.model.Scenario;
import quietspan.model.Waiver;

/**
 * The simple ways to place repoints, for comparison. Each has one freedom, how much before the end
 * of the present coverage it begins, and takes the best of {@value #OFFSETS}; contacts are filled
 * in as for any plan. None looks at protected intervals, interruptions or data, so each may break
 * rules.
 */
public final class Strategies {

  private static final int OFFSETS = 8;

  private static final int DAY = 86_400;

  /** No beam holds the Earth longer. */
  private static final int LONGEST = 60 * DAY;

  private final Planner planner;
  private final Tables tables;
  private final Seed seed;

  private Strategies(Planner planner) {
    this.planner = planner;
    this.tables = planner.tables();
    this.seed = planner.seed();
  }

  /** A way to plan and what it decides. */
  public record Strategy(String name, String sentence, Decisions decisions) {}

  /** Places repoints when the first of them comes so many seconds before it must. */
  private interface Pattern {
    List<Move> moves(int early);
  }

  /** An aim that serves from a second on board until another one. */
  private record Service(Aim aim, int until) {}

  /** All of them. */
  public static List<Strategy> of(
      Scenario scenario, Geometry geometry, List<Waiver> waivers, Planner.Progress progress) {
    Planner planner =
        Planner.of(
            scenario, geometry, waivers, Planner.Options.DEFAULT, progress, new AtomicBoolean());
    Strategies all = new Strategies(planner);
    List<Strategy> found = new ArrayList<>();
    progress.stage("strategy: each on its own");
    found.add(
        all.best(
            "each on its own",
            "Each craft repoints whenever its own coverage ends.",
            all::eachOnItsOwn));
    progress.stage("strategy: all together");
    found.add(
        all.best(
            "all together",
            "All craft repoint together whenever the first coverage ends.",
            all::allTogether));
    progress.stage("strategy: one in turn");
    found.add(
        all.best(
            "one in turn",
            "One craft repoints in each pause, in turn, and serves until the next.",
            all::oneInTurn));
    progress.stage("strategy: staggered");
    found.add(
        all.best(
            "staggered",
            "All craft repoint together, aimed to serve one after the other.",
            all::staggered));
    return found;
  }

  private Strategy best(String name, String sentence, Pattern pattern) {
    Roster best = null;
    int first = Integer.MAX_VALUE;
    for (int c = 0; c < tables.craftCount; c++) {
      first = Math.min(first, service(c, 0).until());
    }
    for (int k = 0; k < OFFSETS; k++) {
      int early = (int) ((long) first * k / OFFSETS);
      Roster roster = seed.refilled(new Draft(tables, pattern.moves(early)), Seed.FIRST_GUARD);
      if (best == null || isBetter(roster, best)) {
        best = roster;
      }
    }
    return new Strategy(name, sentence, planner.withContacts(seed, best).decisions());
  }

  /** Rules of repoints first, then of data, then science. */
  private static boolean isBetter(Roster one, Roster other) {
    int byBreaches = Long.compare(one.draft().breaches(), other.draft().breaches());
    if (byBreaches != 0) {
      return byBreaches < 0;
    }
    int byData = Long.compare(one.shortfall().weight(), other.shortfall().weight());
    return byData != 0 ? byData < 0 : one.draft().science() > other.draft().science();
  }

  private List<Move> eachOnItsOwn(int early) {
    List<Move> moves = new ArrayList<>();
    for (int c = 0; c < tables.craftCount; c++) {
      int at = firstPause(coverageAtStart(c), early, c);
      while (fits(at, c)) {
        Service service = service(c, at + tables.repoint[c]);
        moves.add(new Move(c, at, service.aim()));
        at = Math.max(service.until(), at + least(c));
      }
    }
    return moves;
  }

  private List<Move> allTogether(int early) {
    List<Move> moves = new ArrayList<>();
    int present = Integer.MAX_VALUE;
    int at = 0;
    for (int c = 0; c < tables.craftCount; c++) {
      present = Math.min(present, coverageAtStart(c));
    }
    for (int c = 0; c < tables.craftCount; c++) {
      at = Math.max(at, firstPause(present, early, c));
    }
    while (allFit(at)) {
      int next = Integer.MAX_VALUE;
      for (int c = 0; c < tables.craftCount; c++) {
        Service service = service(c, at + tables.repoint[c]);
        moves.add(new Move(c, at, service.aim()));
        next = Math.min(next, service.until());
      }
      at = Math.max(next, at + leastOfAll());
    }
    return moves;
  }

  private List<Move> oneInTurn(int early) {
    List<Move> moves = new ArrayList<>();
    int c = 0;
    int at = firstPause(lastCoverageAtStart(), early, c);
    while (fits(at, c)) {
      Service service = service(c, at + tables.repoint[c]);
      moves.add(new Move(c, at, service.aim()));
      c = (c + 1) % tables.craftCount;
      at = Math.max(service.until(), at + (tables.craftCount == 1 ? least(c) : tables.repoint[c]));
    }
    return moves;
  }

  private List<Move> staggered(int early) {
    List<Move> moves = new ArrayList<>();
    int at = 0;
    for (int c = 0; c < tables.craftCount; c++) {
      at = Math.max(at, firstPause(lastCoverageAtStart(), early, c));
    }
    while (allFit(at)) {
      int from = at;
      for (int c = 0; c < tables.craftCount; c++) {
        Service service = service(c, Math.max(from, at + tables.repoint[c]));
        moves.add(new Move(c, at, service.aim()));
        from = service.until();
      }
      at = Math.max(from, at + leastOfAll());
    }
    return moves;
  }

  private int lastCoverageAtStart() {
    int last = 0;
    for (int c = 0; c < tables.craftCount; c++) {
      last = Math.max(last, coverageAtStart(c));
    }
    return last;
  }

  private boolean allFit(int at) {
    boolean fit = true;
    for (int c = 0; c < tables.craftCount; c++) {
      fit &= fits(at, c);
    }
    return fit;
  }

  private boolean fits(int at, int craft) {
    return at + tables.repoint[craft] <= tables.length;
  }

  private int least(int craft) {
    return Math.max(tables.spacing[craft], tables.repoint[craft]);
  }

  private int leastOfAll() {
    int least = 0;
    for (int c = 0; c < tables.craftCount; c++) {
      least = Math.max(least, least(c));
    }
    return least;
  }

  private int firstPause(int coverageEnd, int early, int craft) {
    int allowed =
        tables.lastRepoint[craft] == Integer.MIN_VALUE
            ? 0
            : tables.lastRepoint[craft] + least(craft);
    return Math.max(Math.max(0, allowed), coverageEnd - early);
  }

  /** When the aim held at the begin of the period first loses the Earth, 0 if it has done so. */
  private int coverageAtStart(int craft) {
    Aim aim = tables.scenario.start().of(tables.scenario.craft().get(craft).name()).aim();
    return until(craft, aim, 0);
  }

  private int until(int craft, Aim aim, int from) {
    int to = Math.min(tables.length, from + LONGEST);
    if (from >= to) {
      return tables.length;
    }
    List<int[]> covered = new Hold(tables, craft, aim, from, to).covered;
    return covered.isEmpty() || covered.get(0)[0] > from + Tables.STEP ? from : covered.get(0)[1];
  }

  /**
   * The aim that serves longest from a second on board: the one that has the Earth at its centre as
   * late as possible and still in its beam at the begin. Where no aim reaches the Earth, a day is
   * let pass.
   */
  private Service service(int craft, int from) {
    Aim best = Aiming.at(tables, craft, from);
    int until = until(craft, best, from);
    if (until <= from) {
      return new Service(best, from + DAY);
    }
    int inside = 0;
    int outside = LONGEST;
    while (outside - inside > Tables.STEP) {
      int middle = (inside + outside) / 2;
      Aim aim = Aiming.at(tables, craft, from + middle);
      int end = until(craft, aim, from);
      if (end > from) {
        inside = middle;
        if (end > until) {
          best = aim;
          until = end;
        }
      } else {
        outside = middle;
      }
    }
    return new Service(best, until);
  }
}
