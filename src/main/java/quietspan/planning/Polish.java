package quietspan.planning;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicLong;
import org.optaplanner.core.api.solver.Solver;
import org.optaplanner.core.api.solver.SolverFactory;
import org.optaplanner.core.config.heuristic.selector.move.factory.MoveIteratorFactoryConfig;
import org.optaplanner.core.config.localsearch.LocalSearchPhaseConfig;
import org.optaplanner.core.config.localsearch.decider.acceptor.LocalSearchAcceptorConfig;
import org.optaplanner.core.config.localsearch.decider.forager.LocalSearchForagerConfig;
import org.optaplanner.core.config.score.director.ScoreDirectorFactoryConfig;
import org.optaplanner.core.config.solver.EnvironmentMode;
import org.optaplanner.core.config.solver.SolverConfig;
import org.optaplanner.core.config.solver.termination.TerminationConfig;
import org.optaplanner.core.impl.phase.event.PhaseLifecycleListenerAdapter;
import org.optaplanner.core.impl.phase.scope.AbstractStepScope;
import org.optaplanner.core.impl.solver.AbstractSolver;
import quietspan.model.Waiver;

/**
 * The joint polish of contacts, pauses and aims by late acceptance. Ends after a given number of
 * steps, never by the clock, so that the same seed and effort give the same plan on any machine.
 */
final class Polish {

  /** Scores so many steps ago are what a step must reach; short lists do better here. */
  private static final int LATE = 50;

  /** Changes tried in one step before the best of them is taken, better or not. */
  private static final long DRAWS_PER_STEP = 400;

  /** What came out: a roster with its draft, and the steps that led to it. */
  record Result(Roster roster, long steps) {}

  private final Tables tables;
  private final List<Waiver> waivers;
  private final List<List<Links.Window>> passes;
  private final Collection<Use> fixed;
  private final EnvironmentMode mode;

  Polish(Tables tables, Links links, List<Waiver> waivers, Collection<Use> fixed) {
    this(tables, links, waivers, fixed, EnvironmentMode.REPRODUCIBLE);
  }

  /**
   * As above, for tests.
   *
   * @param mode how closely the solver looks after itself
   */
  Polish(
      Tables tables,
      Links links,
      List<Waiver> waivers,
      Collection<Use> fixed,
      EnvironmentMode mode) {
    this.tables = tables;
    this.waivers = waivers;
    this.fixed = List.copyOf(fixed);
    this.mode = mode;
    this.passes = passes(links);
  }

  /** Windows of one antenna that touch belong to one pass of the formation. */
  private List<List<Links.Window>> passes(Links links) {
    Map<Integer, List<Links.Window>> byAntenna = new TreeMap<>();
    for (Links.Window window : links.windows) {
      byAntenna.computeIfAbsent(window.antenna(), one -> new ArrayList<>()).add(window);
    }
    List<List<Links.Window>> found = new ArrayList<>();
    for (List<Links.Window> windows : byAntenna.values()) {
      windows.sort(Comparator.comparingInt(Links.Window::begin));
      List<Links.Window> pass = new ArrayList<>();
      int until = Integer.MIN_VALUE;
      for (Links.Window window : windows) {
        if (!pass.isEmpty() && window.begin() >= until) {
          found.add(pass);
          pass = new ArrayList<>();
        }
        pass.add(window);
        until = Math.max(until, window.end());
      }
      if (!pass.isEmpty()) {
        found.add(pass);
      }
    }
    found.sort(
        Comparator.comparingInt((List<Links.Window> pass) -> pass.get(0).begin())
            .thenComparingInt(pass -> pass.get(0).antenna()));
    return found;
  }

  /**
   * Polishes a plan.
   *
   * @param seed of the draws
   * @param guard seconds by which the ledger is stricter than the rules
   * @param stop set from outside, ends with the best so far
   */
  Result polish(Roster roster, int guard, long seed, long steps, AtomicBoolean stop) {
    Polishing start = start(roster, guard);
    AtomicLong done = new AtomicLong();
    SolverConfig config = config(seed, steps);
    Solver<Polishing> solver = SolverFactory.<Polishing>create(config).buildSolver();
    ((AbstractSolver<Polishing>) solver)
        .addPhaseLifecycleListener(
            new PhaseLifecycleListenerAdapter<Polishing>() {
              @Override
              public void stepEnded(AbstractStepScope<Polishing> step) {
                done.incrementAndGet();
                if (stop.get()) {
                  solver.terminateEarly();
                }
              }
            });
    Polishing best = solver.solve(start);
    Roster polished = new Roster(tables, waivers, new Draft(tables, best.moves()), guard);
    best.uses().forEach(polished::add);
    return new Result(polished, done.get());
  }

  private Polishing start(Roster roster, int guard) {
    List<ContactSlot> slots = new ArrayList<>();
    List<Use> left = new ArrayList<>(roster.uses());
    left.removeAll(fixed);
    for (List<Links.Window> pass : passes) {
      List<Use> mine = left.stream().filter(use -> inside(pass, use)).toList();
      left.removeAll(mine);
      for (Use use : mine) {
        slots.add(new ContactSlot(slots.size(), pass, use));
      }
      slots.add(new ContactSlot(slots.size(), pass, null));
    }
    if (!left.isEmpty()) {
      throw new IllegalStateException("contacts outside every pass: " + left);
    }
    List<RepointSlot> turns = new ArrayList<>();
    for (Move move : roster.draft().moves) {
      turns.add(new RepointSlot(turns.size(), move.craft(), move));
    }
    for (int c = 0; c < tables.craftCount; c++) {
      turns.add(new RepointSlot(turns.size(), c, null));
    }
    boolean legal = roster.shortfall().none();
    return new Polishing(new Polishing.Frame(tables, waivers, fixed, guard, legal), slots, turns);
  }

  private static boolean inside(List<Links.Window> pass, Use use) {
    return pass.stream()
        .anyMatch(
            window ->
                window.antenna() == use.antenna()
                    && window.craft() == use.craft()
                    && window.begin() <= use.begin()
                    && use.end() <= window.end());
  }

  private SolverConfig config(long seed, long steps) {
    LocalSearchPhaseConfig search = new LocalSearchPhaseConfig();
    search.setMoveSelectorConfig(
        new MoveIteratorFactoryConfig()
            .withMoveIteratorFactoryClass(Shifts.class)
            .withSelectedCountLimit(DRAWS_PER_STEP));
    LocalSearchAcceptorConfig acceptor = new LocalSearchAcceptorConfig();
    acceptor.setLateAcceptanceSize(LATE);
    search.setAcceptorConfig(acceptor);
    LocalSearchForagerConfig forager = new LocalSearchForagerConfig();
    forager.setAcceptedCountLimit(1);
    search.setForagerConfig(forager);
    search.setTerminationConfig(
        new TerminationConfig().withStepCountLimit((int) Math.min(Integer.MAX_VALUE, steps)));
    return new SolverConfig()
        .withSolutionClass(Polishing.class)
        .withEntityClasses(ContactSlot.class, RepointSlot.class)
        .withScoreDirectorFactory(
            new ScoreDirectorFactoryConfig().withIncrementalScoreCalculatorClass(PolishScore.class))
        .withEnvironmentMode(mode)
        .withRandomSeed(seed)
        .withPhaseList(new ArrayList<>(List.of(search)));
  }
}
