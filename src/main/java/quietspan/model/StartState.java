package quietspan.model;

import java.util.List;
import java.util.Optional;
import quietspan.time.GroundInstant;
import quietspan.time.OnboardInstant;

/**
 * The formation at the start of the period.
 *
 * @param quietSince when the present quiet span began; absent: at the start of the period
 * @param lastContactEnd end of the formation's last contact; absent: the latest of its craft's,
 *     else the start of the period plus light time
 */
public record StartState(
    Optional<OnboardInstant> quietSince,
    Optional<GroundInstant> lastContactEnd,
    List<CraftState> craft) {

  public StartState {
    craft = List.copyOf(craft);
  }

  public CraftState of(String name) {
    return craft.stream()
        .filter(state -> state.craft().equals(name))
        .findFirst()
        .orElseThrow(() -> new IllegalArgumentException("no start state for " + name));
  }
}
