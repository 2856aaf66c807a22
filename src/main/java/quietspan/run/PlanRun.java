package quietspan.run;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.CancellationException;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.function.Consumer;
import quietspan.export.EndState;
import quietspan.export.PlanFiles;
import quietspan.export.PlanFolder;
import quietspan.input.ScenarioReading;
import quietspan.model.Geometry;
import quietspan.model.Plan;
import quietspan.model.Provenance;
import quietspan.model.Scenario;
import quietspan.model.Waiver;
import quietspan.planning.Planner;
import quietspan.problem.InputException;
import quietspan.problem.Problem;
import quietspan.rules.Waivers;

/** From a scenario folder to a plan folder. */
public final class PlanRun {

  private PlanRun() {}

  /**
   * What is asked.
   *
   * @param out the plan folder, replaced as a whole
   * @param version of the program, for the plan's provenance
   */
  public record Request(Source source, Path out, long seed, long effort, String version) {}

  /**
   * What was planned and written.
   *
   * @param warnings remarks upon the scenario and the plan
   * @param assumptions what was taken for granted
   */
  public record Answer(
      Scenario scenario,
      Plan plan,
      List<EndState> ends,
      List<String> warnings,
      List<String> assumptions) {}

  /** Steps of the search when nothing else is asked. */
  public static long defaultEffort() {
    return Planner.Options.DEFAULT.effort();
  }

  /**
   * Reads, plans, checks and writes.
   *
   * @param progress told what is going on
   * @param stop set from outside, ends the search with the best plan so far
   * @throws CancellationException when stopped before there was a plan; nothing is written
   * @throws InputException with every complaint about the input
   */
  public static Answer plan(Request request, Consumer<String> progress, AtomicBoolean stop) {
    PlanFolder.refuseUnlessReplaceable(request.out());
    progress.accept("reading " + request.source().folder());
    ScenarioReading reading = request.source().read();
    Scenario scenario = reading.scenario();
    progress.accept("geometry");
    Geometry geometry = request.source().geometry(scenario);
    List<Problem> unknown = Source.unknownStretches(scenario, geometry.sightLines());
    if (!unknown.isEmpty()) {
      throw new InputException(unknown);
    }
    List<Waiver> waivers = Waivers.of(scenario, geometry);
    if (stop.get()) {
      throw new CancellationException("stopped before planning");
    }
    Planner.Options options =
        new Planner.Options(request.seed(), request.effort(), Planner.Options.DEFAULT.boundWork());
    Planner.Result result =
        Planner.plan(scenario, geometry, waivers, options, progress::accept, stop);
    progress.accept("checking");
    Judgement judgement =
        Judgement.of(scenario, geometry, result.decisions(), result.outcome(), waivers);
    if (judgement.report().breaksAuthority()) {
      throw new IllegalStateException(
          "the planner broke a rule that no written plan may break: "
              + judgement.report().findings());
    }
    Plan plan =
        new Plan(
            scenario.identity().mission(),
            result.decisions(),
            judgement.outcome(),
            Optional.of(result.bound()),
            new Provenance(
                request.version(),
                scenario.identity().inputs(),
                geometry.sources(),
                request.seed(),
                request.effort(),
                result.stepsDone(),
                result.interrupted(),
                waivers));
    progress.accept("writing " + request.out());
    PlanFolder.replace(request.out(), PlanFiles.of(scenario, geometry.sightLines(), plan));
    List<String> warnings = new ArrayList<>();
    reading.warnings().forEach(warning -> warnings.add(warning.toString()));
    warnings.addAll(judgement.report().warnings());
    warnings.addAll(judgement.disagreements());
    return new Answer(
        scenario,
        plan,
        EndState.of(scenario, geometry.sightLines(), plan),
        warnings,
        judgement.report().assumptions());
  }
}
