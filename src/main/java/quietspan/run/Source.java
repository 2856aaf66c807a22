package quietspan.run;

import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import quietspan.astro.GeometryFactory;
import quietspan.input.ScenarioReader;
import quietspan.input.ScenarioReading;
import quietspan.model.Craft;
import quietspan.model.Geometry;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.problem.Place;
import quietspan.problem.Problem;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * What a command works on.
 *
 * @param folder the scenario folder
 * @param issued time stamp of everything that is written, in place of the scenario's own
 * @param orekitData a folder or zip with Orekit data, used before what is built in
 */
public record Source(Path folder, Optional<Instant> issued, Optional<Path> orekitData) {

  ScenarioReading read() {
    return ScenarioReader.read(folder, issued);
  }

  Geometry geometry(Scenario scenario) {
    return told(GeometryFactory.geometry(scenario, folder, orekitData));
  }

  /** With passes over another on-board interval than the period. */
  Geometry geometry(Scenario scenario, Interval<OnboardInstant> span) {
    return told(GeometryFactory.geometry(scenario, folder, orekitData, span));
  }

  /** With what is left out, beside what served. */
  private static Geometry told(Geometry geometry) {
    List<String> sources = new ArrayList<>(geometry.sources());
    sources.add("refraction and aberration: none; light time: applied");
    return new Geometry(geometry.sightLines(), geometry.passes(), geometry.guardSeconds(), sources);
  }

  /** Complaints about craft whose trajectory is not known over all of the period. */
  static List<Problem> unknownStretches(Scenario scenario, SightLines sightLines) {
    return scenario.craft().stream()
        .flatMap(craft -> unknown(scenario, sightLines, craft).stream())
        .toList();
  }

  private static Optional<Problem> unknown(Scenario scenario, SightLines sightLines, Craft craft) {
    Interval<GroundInstant> known = sightLines.known(craft.name());
    OnboardInstant from = sightLines.onboard(craft.name(), known.begin());
    OnboardInstant to = sightLines.onboard(craft.name(), known.end());
    if (!from.isAfter(scenario.period().begin()) && !to.isBefore(scenario.period().end())) {
      return Optional.empty();
    }
    return Optional.of(
        Problem.error(
            Place.wholeFile("mission.yaml"),
            "craft " + craft.name(),
            "has a trajectory from " + from + " to " + to + " on board",
            "one over all of the period, from "
                + scenario.period().begin()
                + " to "
                + scenario.period().end()));
  }
}
