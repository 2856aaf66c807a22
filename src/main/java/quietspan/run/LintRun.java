package quietspan.run;

import java.util.ArrayList;
import java.util.List;
import quietspan.export.Words;
import quietspan.input.ScenarioReading;
import quietspan.model.Aim;
import quietspan.model.BodyDirection;
import quietspan.model.Craft;
import quietspan.model.Geometry;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Steering;
import quietspan.model.Waiver;
import quietspan.problem.Place;
import quietspan.problem.Problem;
import quietspan.problem.Problems;
import quietspan.rules.Waivers;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.units.Angle;

/** Reads a scenario and says what will hurt, without planning. */
public final class LintRun {

  /** The Earth direction moves by a quarter of a degree in this time. */
  private static final long STEP_SECONDS = 6 * 3_600;

  /** A shorter stretch without coverage is lived through between contacts. */
  private static final double SHORTEST_SECONDS = 86_400;

  private LintRun() {}

  /**
   * What was read.
   *
   * @param warnings remarks, by file and line
   * @param sources which leap seconds, Earth orientation and ephemerides served
   */
  public record Answer(Scenario scenario, List<Problem> warnings, List<String> sources) {}

  /**
   * Reads and looks.
   *
   * @throws quietspan.problem.InputException with every complaint when the scenario is wrong
   */
  public static Answer lint(Source source) {
    ScenarioReading reading = source.read();
    Scenario scenario = reading.scenario();
    Geometry geometry = source.geometry(scenario);
    Problems problems = new Problems();
    reading.warnings().forEach(problems::add);
    for (Problem unknown : Source.unknownStretches(scenario, geometry.sightLines())) {
      problems.warning(unknown.place(), unknown.field(), unknown.what(), unknown.right());
    }
    for (Craft craft : scenario.craft()) {
      for (Interval<GroundInstant> lost : outOfReach(scenario, geometry.sightLines(), craft)) {
        problems.warning(
            Place.wholeFile("mission.yaml"),
            "craft " + craft.name() + ": antenna",
            "cannot be aimed at the Earth from " + lost.begin() + " to " + lost.end(),
            "wider travel limits, another fixed elevation, or a wider beam");
      }
    }
    for (Waiver waiver : Waivers.of(scenario, geometry)) {
      problems.warning(
          Place.wholeFile("mission.yaml"),
          "data",
          "asks for what no plan can do; waived: " + Words.sentence(waiver),
          "a station that can listen then, or a longer limit");
    }
    return new Answer(scenario, problems.warnings(), geometry.sources());
  }

  /** Stretches in which no aim has the Earth in its usable cone, to the sampling step. */
  static List<Interval<GroundInstant>> outOfReach(
      Scenario scenario, SightLines sightLines, Craft craft) {
    Interval<GroundInstant> known = sightLines.known(craft.name());
    Interval<GroundInstant> span =
        Interval.of(
                new GroundInstant(scenario.period().begin().utc()),
                new GroundInstant(scenario.period().end().utc()))
            .intersection(known)
            .orElse(known);
    double cone = scenario.usableHalfCone(craft).radians();
    List<Interval<GroundInstant>> stretches = new ArrayList<>();
    GroundInstant since = null;
    for (GroundInstant at = span.begin();
        !at.isAfter(span.end());
        at = at.plusSeconds(STEP_SECONDS)) {
      boolean lost =
          nearestAim(craft.antenna().steering(), sightLines.earth(craft.name(), at)) > cone;
      if (lost && since == null) {
        since = at;
      } else if (!lost && since != null) {
        add(stretches, since, at);
        since = null;
      }
    }
    if (since != null) {
      add(stretches, since, span.end());
    }
    return stretches;
  }

  private static void add(
      List<Interval<GroundInstant>> stretches, GroundInstant from, GroundInstant to) {
    if (to.secondsSince(from) >= SHORTEST_SECONDS) {
      stretches.add(Interval.of(from, to));
    }
  }

  /** Angle from the Earth to the nearest direction inside the travel limits (rad). */
  private static double nearestAim(Steering steering, BodyDirection earth) {
    double elevation = earth.elevationRadians();
    if (steering instanceof Steering.TwoAxes axes) {
      elevation =
          Math.max(
              axes.elevationFrom().radians(), Math.min(axes.elevationTo().radians(), elevation));
    } else if (steering instanceof Steering.AzimuthOnly axis) {
      elevation = axis.elevation().radians();
    }
    Aim from = Aim.nearest(steering.azimuthFrom(), Angle.ofRadians(elevation));
    Aim to = Aim.nearest(steering.azimuthTo(), Angle.ofRadians(elevation));
    Aim here = Aim.nearest(Angle.ofRadians(earth.azimuthRadians()), Angle.ofRadians(elevation));
    int travel = eastwards(from, to);
    if (travel == 0 || eastwards(from, here) <= travel) {
      return new BodyDirection(earth.azimuthRadians(), elevation).separation(earth);
    }
    return Math.min(from.direction().separation(earth), to.direction().separation(earth));
  }

  /** Hundredths of a degree from one azimuth to another, increasing. */
  private static int eastwards(Aim from, Aim to) {
    return Math.floorMod(to.azimuthCentidegrees() - from.azimuthCentidegrees(), 36_000);
  }
}
