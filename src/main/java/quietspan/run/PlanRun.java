package quietspan.run;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
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

/** Reads a scenario, plans it and writes the plan folder. */
public final class PlanRun {

  private PlanRun() {}

  /**
   * What was planned.
   *
   * @param ends each craft at the end of the period
   * @param warnings remarks upon the scenario
   */
  public record Answer(Scenario scenario, Plan plan, List<EndState> ends, List<String> warnings) {}

  /**
   * Plans a scenario and replaces the plan folder.
   *
   * @param version of the program, for the provenance
   * @param progress told each stage
   * @param stop set from outside, ends the search with what it has
   * @throws InputException when the scenario or the folder is refused; nothing is written then
   */
  public static Answer plan(
      Source source,
      Path folder,
      Planner.Options options,
      String version,
      Consumer<String> progress,
      AtomicBoolean stop) {
    PlanFolder.refuseUnlessReplaceable(folder);
    ScenarioReading reading = source.read();
    Scenario scenario = reading.scenario();
    progress.accept("geometry");
    Geometry geometry = source.geometry(scenario);
    List<Problem> unknown = Source.unknownStretches(scenario, geometry.sightLines());
    if (!unknown.isEmpty()) {
      throw new InputException(unknown);
    }
    List<Waiver> waivers = Waivers.of(scenario, geometry);
    Planner.Result result =
        Planner.plan(scenario, geometry, waivers, options, progress::accept, stop);
    Plan plan =
        new Plan(
            scenario.identity().mission(),
            result.decisions(),
            result.outcome(),
            Optional.of(result.bound()),
            new Provenance(
                version,
                scenario.identity().inputs(),
                geometry.sources(),
                options.seed(),
                options.effort(),
                result.stepsDone(),
                result.interrupted(),
                waivers));
    List<String> warnings = new ArrayList<>();
    reading.warnings().forEach(warning -> warnings.add(warning.toString()));
    PlanFolder.replace(folder, PlanFiles.of(scenario, geometry.sightLines(), plan));
    return new Answer(scenario, plan, EndState.of(scenario, geometry.sightLines(), plan), warnings);
  }
}
