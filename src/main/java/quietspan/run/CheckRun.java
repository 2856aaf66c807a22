package quietspan.run;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import quietspan.check.CheckReport;
import quietspan.check.Stale;
import quietspan.export.PlanFile;
import quietspan.export.PlanFiles;
import quietspan.export.PlanFolder;
import quietspan.export.PlanJson;
import quietspan.export.PlanReader;
import quietspan.export.Staleness;
import quietspan.export.Summary;
import quietspan.input.ScenarioReading;
import quietspan.model.Geometry;
import quietspan.model.Outcome;
import quietspan.model.Plan;
import quietspan.model.Scenario;
import quietspan.model.Waiver;
import quietspan.planning.simulation.Simulation;
import quietspan.problem.InputException;
import quietspan.problem.Place;
import quietspan.problem.Problem;
import quietspan.rules.Waivers;

/** Judges a plan folder, as it was written or after an edit by hand. */
public final class CheckRun {

  private CheckRun() {}

  /**
   * What is asked.
   *
   * @param plan a plan folder, or the {@code plan.json} in one
   * @param workingFolder where to look for the scenario besides the folders above the plan
   * @param scenario where it is, instead of looking for it
   */
  public record Request(
      Path plan, Path workingFolder, Optional<Path> scenario, Optional<Path> orekitData) {}

  /**
   * The verdict.
   *
   * @param folder the scenario that the plan was held against
   * @param summary of the plan as it follows from its decisions today
   * @param altered inputs and waivers that are not those of the scenario
   * @param stale derived values that do not follow from the decisions
   * @param disagreements where simulation and check count differently: a fault of the program
   */
  public record Answer(
      Path folder,
      Summary summary,
      CheckReport report,
      List<String> altered,
      List<String> stale,
      List<String> disagreements,
      List<Problem> warnings) {

    /** Every rule is met, and by the scenario that the plan was made for. */
    public boolean passed() {
      return report.legal() && altered.isEmpty();
    }

    /** The verdict in one word. */
    public String word() {
      if (!report.legal()) {
        return report.breaksAuthority() ? "BROKEN" : "SHORTFALL";
      }
      return altered.isEmpty() ? "LEGAL" : "ALTERED";
    }
  }

  /**
   * Judges.
   *
   * @throws InputException with every complaint when the plan or its scenario cannot be read
   */
  public static Answer check(Request request) {
    Path file = planFile(request.plan());
    byte[] bytes = bytes(file);
    String name = file.toString().replace('\\', '/');
    PlanFile found = PlanReader.read(name, bytes, Optional.empty());
    Path folder = request.scenario().orElseGet(() -> scenario(request, file, found));
    Source source = new Source(folder, Optional.of(found.issued()), request.orekitData());
    ScenarioReading reading = source.read();
    Scenario scenario = reading.scenario();
    PlanFile plan = PlanReader.read(name, bytes, Optional.of(scenario));
    Geometry geometry = source.geometry(scenario);
    List<Problem> unknown = Source.unknownStretches(scenario, geometry.sightLines());
    if (!unknown.isEmpty()) {
      throw new InputException(unknown);
    }
    List<Waiver> waivers = Waivers.of(scenario, geometry);
    Outcome simulated =
        Simulation.simulate(scenario, geometry.sightLines(), plan.decisions(), waivers);
    Judgement judgement = Judgement.of(scenario, geometry, plan.decisions(), simulated, waivers);
    Plan now =
        new Plan(
            plan.mission(),
            plan.decisions(),
            judgement.outcome(),
            Optional.empty(),
            plan.provenance());
    List<String> altered = new ArrayList<>();
    for (Stale.Difference difference :
        Stale.compare(now, judgement.outcome(), scenario.identity().inputs(), waivers)
            .differences()) {
      if (difference.kind() != Stale.Kind.DERIVED) {
        altered.add(difference.toString());
      }
    }
    return new Answer(
        folder,
        Summary.of(scenario, now),
        judgement.report(),
        altered,
        Staleness.between(bytes, PlanJson.write(scenario, geometry.sightLines(), now)),
        judgement.disagreements(),
        reading.warnings());
  }

  private static Path planFile(Path plan) {
    boolean isFile = Files.isRegularFile(plan);
    PlanFolder.recover(isFile ? plan.toAbsolutePath().getParent() : plan);
    Path file = isFile ? plan : plan.resolve(PlanFiles.PLAN);
    if (!Files.isRegularFile(file)) {
      throw new InputException(
          Problem.error(
              Place.wholeFile(plan.toString()),
              "",
              Files.exists(plan) ? "holds no " + PlanFiles.PLAN : "there is no such folder",
              "a plan folder"));
    }
    return file;
  }

  private static byte[] bytes(Path file) {
    try {
      return Files.readAllBytes(file);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static Path scenario(Request request, Path file, PlanFile plan) {
    return ScenarioSearch.find(
            file.toAbsolutePath().getParent(), request.workingFolder(), plan.provenance().inputs())
        .orElseThrow(
            () ->
                new InputException(
                    Problem.error(
                        Place.wholeFile(request.plan().toString()),
                        "--scenario",
                        "no folder above the plan or here holds the scenario of \""
                            + plan.mission()
                            + "\"",
                        "--scenario DIR")));
  }
}
