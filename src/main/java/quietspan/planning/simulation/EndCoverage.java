package quietspan.planning.simulation;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import quietspan.model.Aim;
import quietspan.model.BodyDirection;
import quietspan.model.Craft;
import quietspan.model.Finding;
import quietspan.model.Repoint;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * How long the aims held at the end of the period keep the Earth, to the second: found by halving
 * between looks an hour apart, for the Earth does not leave a beam and come back in an hour.
 */
final class EndCoverage {

  private static final long STEP = 1;
  private static final long COARSE = 3_600;

  private EndCoverage() {}

  static List<Finding> findings(Scenario scenario, SightLines sightLines, List<Repoint> repoints) {
    List<Finding> findings = new ArrayList<>();
    scenario
        .rules()
        .data()
        .endCoverage()
        .ifPresent(
            asked -> {
              for (Craft craft : scenario.craft()) {
                judge(scenario, sightLines, repoints, craft, asked, findings);
              }
            });
    return findings;
  }

  private static void judge(
      Scenario scenario,
      SightLines sightLines,
      List<Repoint> repoints,
      Craft craft,
      Duration asked,
      List<Finding> findings) {
    Aim aim = scenario.start().of(craft.name()).aim();
    for (Repoint repoint : repoints) {
      boolean own = repoint.craft().equals(craft.name());
      if (own && repoint.start().isBefore(scenario.period().end())) {
        aim = repoint.aim();
      }
    }
    Cone cone =
        new Cone(
            sightLines,
            craft.name(),
            scenario.period().end(),
            aim.direction(),
            scenario.usableHalfCone(craft).radians());
    long steps = asked.toSeconds() / STEP;
    long held = cone.stepsHeld(steps);
    if (held > steps) {
      return;
    }
    double missing = asked.toSeconds() - held * (double) STEP;
    if (missing > 0) {
      findings.add(
          new Finding(
              RuleId.END_COVERAGE,
              scenario.period().end().plusSeconds(held * STEP).utc(),
              craft.name(),
              "",
              "",
              missing,
              String.format(
                  Locale.ROOT,
                  "the aim at the end holds the Earth for %.2f days of %.2f",
                  held * STEP / 86_400.0,
                  asked.toSeconds() / 86_400.0)));
    }
  }

  /** The usable cone of an aim that is held from an instant on. */
  private record Cone(
      SightLines sightLines,
      String craft,
      OnboardInstant from,
      BodyDirection aim,
      double halfCone) {

    boolean holds(long step) {
      GroundInstant receive = sightLines.ground(craft, from.plusSeconds(step * STEP));
      Interval<GroundInstant> known = sightLines.known(craft);
      return known.contains(receive)
          && sightLines.earth(craft, receive).separation(aim) <= halfCone;
    }

    /** The first step up to {@code last} at which the Earth is outside, or one more than that. */
    long stepsHeld(long last) {
      long inside = -1;
      long outside = last + 1;
      for (long step = 0; step <= last; step = Math.min(step + COARSE, Math.max(step + 1, last))) {
        if (!holds(step)) {
          outside = step;
          break;
        }
        inside = step;
      }
      while (outside - inside > 1) {
        long middle = inside + (outside - inside) / 2;
        if (holds(middle)) {
          inside = middle;
        } else {
          outside = middle;
        }
      }
      return outside;
    }
  }
}
