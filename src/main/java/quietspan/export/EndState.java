package quietspan.export;

import java.util.List;
import quietspan.model.Aim;
import quietspan.model.Craft;
import quietspan.model.Plan;
import quietspan.model.Repoint;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.StoreTrace;
import quietspan.time.GroundInstant;
import quietspan.time.OnboardInstant;

/**
 * A craft at the end of the period.
 *
 * @param aim where its antenna is held
 * @param fillBits what its store holds
 * @param fillShare the same as a fraction of its capacity
 * @param earthHeldUntil first on-board instant at or after the end of the period at which the Earth
 *     is outside the usable cone of the aim, to the second; the last known one when that is earlier
 */
public record EndState(
    String craft, Aim aim, long fillBits, double fillShare, OnboardInstant earthHeldUntil) {

  private static final long STEP_SECONDS = 1_800;

  /** One for each craft, in the scenario's order. */
  public static List<EndState> of(Scenario scenario, SightLines sightLines, Plan plan) {
    return scenario.craft().stream().map(craft -> of(scenario, sightLines, plan, craft)).toList();
  }

  private static EndState of(Scenario scenario, SightLines sightLines, Plan plan, Craft craft) {
    Aim aim =
        plan.decisions().repoints().stream()
            .filter(repoint -> repoint.craft().equals(craft.name()))
            .reduce((first, second) -> second)
            .map(Repoint::aim)
            .orElseGet(() -> scenario.start().of(craft.name()).aim());
    long fill =
        plan.outcome().stores().stream()
            .filter(trace -> trace.craft().equals(craft.name()))
            .mapToLong(StoreTrace::endBits)
            .sum();
    return new EndState(
        craft.name(),
        aim,
        fill,
        (double) fill / craft.store().bits(),
        heldUntil(scenario, sightLines, craft, aim));
  }

  private static OnboardInstant heldUntil(
      Scenario scenario, SightLines sightLines, Craft craft, Aim aim) {
    double cone = scenario.usableHalfCone(craft).radians();
    GroundInstant last = sightLines.known(craft.name()).end();
    GroundInstant inside = sightLines.ground(craft.name(), scenario.period().end());
    GroundInstant outside = inside;
    if (!within(sightLines, craft, aim, inside, cone)) {
      return scenario.period().end();
    }
    while (within(sightLines, craft, aim, outside, cone)) {
      inside = outside;
      outside = outside.plusSeconds(STEP_SECONDS);
      if (outside.isAfter(last)) {
        return sightLines.onboard(craft.name(), last).floorToSecond();
      }
    }
    while (outside.secondsSince(inside) > 0.5) {
      GroundInstant middle = inside.plusSeconds(outside.secondsSince(inside) / 2);
      if (within(sightLines, craft, aim, middle, cone)) {
        inside = middle;
      } else {
        outside = middle;
      }
    }
    return sightLines.onboard(craft.name(), outside).floorToSecond();
  }

  private static boolean within(
      SightLines sightLines, Craft craft, Aim aim, GroundInstant at, double cone) {
    return aim.direction().separation(sightLines.earth(craft.name(), at)) <= cone;
  }
}
