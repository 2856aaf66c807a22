package quietspan.model;

import java.util.List;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;

/**
 * Everything a planner gives: one checked, immutable reading of a scenario folder.
 *
 * @param period planning period on board; begin and end are whole seconds
 * @param craft in the order of the mission file, which is also the order of ties
 * @param stations in the order of the station file
 */
public record Scenario(
    Identity identity,
    Interval<OnboardInstant> period,
    List<Craft> craft,
    List<Station> stations,
    Rules rules,
    Calendars calendars,
    StartState start) {

  public Scenario {
    craft = List.copyOf(craft);
    stations = List.copyOf(stations);
  }

  public Craft craft(String name) {
    return craft.stream()
        .filter(candidate -> candidate.name().equals(name))
        .findFirst()
        .orElseThrow(() -> new IllegalArgumentException("no craft " + name));
  }

  public Station station(String name) {
    return stations.stream()
        .filter(candidate -> candidate.name().equals(name))
        .findFirst()
        .orElseThrow(() -> new IllegalArgumentException("no station " + name));
  }

  /** Rated half-cone less the cone allowance and the pointing allowance. */
  public Angle usableHalfCone(Craft craft) {
    return craft
        .antenna()
        .ratedHalfCone()
        .minus(rules.margins().coneAllowance())
        .minus(rules.margins().pointingAllowance());
  }
}
