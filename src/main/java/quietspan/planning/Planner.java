package quietspan.planning;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.atomic.AtomicBoolean;
import quietspan.model.Bound;
import quietspan.model.ConfirmedContact;
import quietspan.model.Contact;
import quietspan.model.Decisions;
import quietspan.model.Geometry;
import quietspan.model.Outcome;
import quietspan.model.RateStep;
import quietspan.model.Repoint;
import quietspan.model.Scenario;
import quietspan.model.Waiver;
import quietspan.planning.simulation.Simulation;
import quietspan.rules.Opportunities;
import quietspan.rules.Opportunity;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.DataRate;

/**
 * Plans a scenario: a skeleton of pauses and beams by dynamic programming, a legal seed of contacts
 * in it, a joint polish, and a bound that says how far any plan can be from this one. A pure
 * function of its arguments, however many processors there are.
 */
public final class Planner {

  /**
   * How hard to try.
   *
   * @param seed of the polish
   * @param effort steps of the polish; 0 for none
   * @param boundWork labels the bound may use
   */
  public record Options(long seed, long effort, long boundWork) {
    public static final Options DEFAULT = new Options(1, 1_000, 300_000);
  }

  /** Told what is going on; never changes what comes out. */
  public interface Progress {
    void stage(String what);
  }

  /**
   * What came out.
   *
   * @param stepsDone steps of the polish that led to these decisions
   * @param interrupted the polish was stopped from outside
   */
  public record Result(
      Decisions decisions, Outcome outcome, Bound bound, long stepsDone, boolean interrupted) {}

  private static final int TRIES = 4;

  /** Seconds by which the ledger grows stricter when the exact simulation does not agree. */
  private static final int MORE_GUARD = 900;

  /** Steps of the polish between two looks by the exact simulation. */
  private static final long ROUND = 250;

  private final Scenario scenario;
  private final Geometry geometry;
  private final List<Waiver> waivers;
  private final Options options;
  private final Progress progress;
  private final AtomicBoolean stop;
  private final Tables tables;
  private final Links links;

  private Planner(
      Scenario scenario,
      Geometry geometry,
      List<Waiver> waivers,
      List<Opportunity> opportunities,
      Options options,
      Progress progress,
      AtomicBoolean stop) {
    this.scenario = scenario;
    this.geometry = geometry;
    this.waivers = waivers;
    this.options = options;
    this.progress = progress;
    this.stop = stop;
    this.tables = Tables.of(scenario, geometry);
    this.links = Links.of(tables, opportunities);
  }

  /**
   * Plans a scenario.
   *
   * @param stop set from outside, ends the polish with what it has
   */
  public static Result plan(
      Scenario scenario,
      Geometry geometry,
      List<Waiver> waivers,
      Options options,
      Progress progress,
      AtomicBoolean stop) {
    return of(scenario, geometry, waivers, options, progress, stop).run();
  }

  static Planner of(
      Scenario scenario,
      Geometry geometry,
      List<Waiver> waivers,
      Options options,
      Progress progress,
      AtomicBoolean stop) {
    List<Opportunity> opportunities = Opportunities.of(scenario, geometry);
    return new Planner(scenario, geometry, waivers, opportunities, options, progress, stop);
  }

  Tables tables() {
    return tables;
  }

  Links links() {
    return links;
  }

  Seed seed() {
    return new Seed(tables, links, waivers, progress);
  }

  private Result run() {
    progress.stage("bound and skeleton");
    BoundSearch search =
        new BoundSearch(tables, links, waivers, Relaxation.all(), options.boundWork());
    CompletableFuture<Bound> bound =
        CompletableFuture.supplyAsync(
            () -> search.bound(Long.MAX_VALUE / 16, Long.MAX_VALUE / 16), Planner::daemon);
    Seed seed = seed();
    Roster roster = seed.roster();
    progress.stage("contacts");
    Filled filled = withContacts(seed, roster);
    progress.stage("polish");
    Polished polished = polished(seed, filled);
    progress.stage("bound");
    return new Result(
        polished.filled().decisions(),
        polished.filled().outcome(),
        bound.join(),
        polished.steps(),
        stop.get());
  }

  /**
   * Decisions with what follows from them, and the roster they were made from.
   *
   * @param guard seconds by which the ledger of the roster is stricter than the rules
   */
  record Filled(Decisions decisions, Outcome outcome, Roster roster, int guard) {
    boolean better(Filled other) {
      int findings = Integer.compare(outcome.findings().size(), other.outcome.findings().size());
      if (findings != 0) {
        return findings < 0;
      }
      return outcome.scienceSeconds() != other.outcome.scienceSeconds()
          ? outcome.scienceSeconds() > other.outcome.scienceSeconds()
          : outcome.stationCostUnits() < other.outcome.stationCostUnits();
    }
  }

  private record Polished(Filled filled, long steps) {}

  /** Trims the contacts of a roster as far as the exact simulation still finds every rule kept. */
  Filled withContacts(Seed seed, Roster first) {
    int guard = Seed.FIRST_GUARD;
    Filled best = filled(first, guard);
    Roster roster = first;
    for (int i = 0; i < TRIES && !stop.get(); i++) {
      new Trimmer(roster, seed.fixed()).trim();
      Filled tried = filled(roster, guard);
      if (tried.outcome().findings().size() <= best.outcome().findings().size()) {
        best = tried;
      }
      if (tried.outcome().findings().isEmpty()) {
        break;
      }
      // The ledger's ten minutes were too coarse somewhere: again with more room.
      guard += MORE_GUARD;
      roster = seed.refilled(roster.draft(), guard);
    }
    return best;
  }

  /**
   * Polishes in rounds, each from the best plan that the exact simulation has approved of. The
   * rounds depend on the steps alone, so that so many steps lead to the same plan whether asked for
   * or interrupted at.
   */
  private Polished polished(Seed seed, Filled first) {
    Polish polish = new Polish(tables, links, waivers, seed.fixed());
    Filled best = first;
    int guard = first.guard();
    long done = 0;
    // Without a single contact no beam is on the Earth, and there is nothing to begin with.
    boolean hopeless = best.roster().uses().isEmpty();
    while (!hopeless && done < options.effort() && !stop.get()) {
      Roster start = best.roster().under(guard);
      if (best.roster().shortfall().none() && !start.shortfall().none()) {
        // Legal, but not with so much to spare.
        break;
      }
      Polish.Result result =
          polish.polish(
              start, guard, options.seed() + done, Math.min(ROUND, options.effort() - done), stop);
      done += result.steps();
      Filled tried = filled(result.roster(), guard);
      if (tried.better(best)) {
        best = tried;
      } else if (tried.outcome().findings().size() > best.outcome().findings().size()) {
        guard += MORE_GUARD;
      }
    }
    return new Polished(best, done);
  }

  private Filled filled(Roster roster, int guard) {
    Decisions decisions = decisions(roster);
    Outcome outcome = Simulation.simulate(scenario, geometry.sightLines(), decisions, waivers);
    return new Filled(decisions, outcome, roster.under(guard), guard);
  }

  private static void daemon(Runnable task) {
    Thread thread = new Thread(task, "bound");
    thread.setDaemon(true);
    thread.start();
  }

  // ---------------------------------------------------------------- out of the planner's numbers

  private Decisions decisions(Roster roster) {
    List<Repoint> repoints = new ArrayList<>();
    Map<String, Integer> counts = new HashMap<>();
    for (Move move : roster.draft().moves) {
      String name = scenario.craft().get(move.craft()).name();
      int number = counts.merge(name, 1, Integer::sum);
      repoints.add(
          new Repoint(
              "R-" + name.replace(' ', '-') + "-" + number,
              name,
              OnboardInstant.ofEpochSecond(tables.epoch + move.start()),
              move.aim()));
    }
    List<Contact> contacts = new ArrayList<>();
    for (Use use : roster.uses()) {
      Tables.Antenna antenna = tables.antennas.get(use.antenna());
      String name = scenario.craft().get(use.craft()).name();
      GroundInstant begin = GroundInstant.ofEpochSecond(tables.epoch + use.begin());
      GroundInstant end = GroundInstant.ofEpochSecond(tables.epoch + use.end());
      Optional<ConfirmedContact> confirmed = confirmed(antenna, name, Interval.of(begin, end));
      contacts.add(
          new Contact(
              confirmed
                  .map(ConfirmedContact::id)
                  .orElse("C-" + String.format(java.util.Locale.ROOT, "%04d", contacts.size() + 1)),
              antenna.station().name(),
              antenna.dish().name(),
              name,
              Interval.of(begin, end),
              List.of(new RateStep(begin, new DataRate(tables.ladder[use.craft()][use.step()]))),
              Set.of(Contact.Service.TELEMETRY),
              confirmed.isPresent() ? Contact.Status.CONFIRMED : Contact.Status.TENTATIVE));
    }
    return new Decisions(repoints, contacts);
  }

  private Optional<ConfirmedContact> confirmed(
      Tables.Antenna antenna, String craft, Interval<GroundInstant> during) {
    return scenario.calendars().confirmed().stream()
        .filter(
            one ->
                one.station().equals(antenna.station().name())
                    && one.antenna().equals(antenna.dish().name())
                    && one.craft().equals(craft)
                    && during.contains(one.during()))
        .findFirst();
  }

  /** What skeletons are built with: close to real contacts, but free to place them in a cell. */
  static Set<Relaxation> forSkeletons() {
    EnumSet<Relaxation> left = EnumSet.copyOf(Relaxation.unavoidable());
    left.add(Relaxation.WHOLE_CELLS);
    return left;
  }
}
