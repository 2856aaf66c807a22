package quietspan.run;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.function.Consumer;
import quietspan.export.Strategy;
import quietspan.export.Summary;
import quietspan.input.ScenarioReading;
import quietspan.model.Bound;
import quietspan.model.Decisions;
import quietspan.model.Geometry;
import quietspan.model.Outcome;
import quietspan.model.Plan;
import quietspan.model.Provenance;
import quietspan.model.Scenario;
import quietspan.model.Waiver;
import quietspan.planning.Planner;
import quietspan.planning.Strategies;
import quietspan.planning.simulation.Simulation;
import quietspan.problem.InputException;
import quietspan.problem.Problem;
import quietspan.rules.Waivers;

/** The plan beside the simple strategies, all judged by the check. */
public final class StrategiesRun {

  private final Scenario scenario;
  private final Geometry geometry;
  private final List<Waiver> waivers;

  private StrategiesRun(Scenario scenario, Geometry geometry) {
    this.scenario = scenario;
    this.geometry = geometry;
    this.waivers = Waivers.of(scenario, geometry);
  }

  /**
   * Plans in every way.
   *
   * @param progress told what is going on
   */
  public static List<Strategy> compare(
      Source source, long seed, long effort, Consumer<String> progress) {
    ScenarioReading reading = source.read();
    Scenario scenario = reading.scenario();
    Geometry geometry = source.geometry(scenario);
    List<Problem> unknown = Source.unknownStretches(scenario, geometry.sightLines());
    if (!unknown.isEmpty()) {
      throw new InputException(unknown);
    }
    StrategiesRun run = new StrategiesRun(scenario, geometry);
    List<Strategy> rows = new ArrayList<>();
    Planner.Options options =
        new Planner.Options(seed, effort, Planner.Options.DEFAULT.boundWork());
    Planner.Result planned =
        Planner.plan(
            scenario, geometry, run.waivers, options, progress::accept, new AtomicBoolean());
    Optional<Bound> bound = Optional.of(planned.bound());
    rows.add(
        run.judged(
            "this program",
            "Pauses, aims and contacts as quietspan plan finds them.",
            planned.decisions(),
            bound));
    for (Strategies.Strategy simple :
        Strategies.of(scenario, geometry, run.waivers, progress::accept)) {
      rows.add(run.judged(simple.name(), simple.sentence(), simple.decisions(), bound));
    }
    return rows;
  }

  private Strategy judged(
      String name, String sentence, Decisions decisions, Optional<Bound> bound) {
    Outcome simulated = Simulation.simulate(scenario, geometry.sightLines(), decisions, waivers);
    Judgement judgement = Judgement.of(scenario, geometry, decisions, simulated, waivers);
    Provenance none =
        new Provenance("", scenario.identity().inputs(), List.of(), 0, 0, 0, false, waivers);
    Plan plan =
        new Plan(scenario.identity().mission(), decisions, judgement.outcome(), bound, none);
    return new Strategy(name, sentence, Summary.of(scenario, plan), judgement.report().findings());
  }
}
