package quietspan.planning;

import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.Scenario;
import quietspan.units.DataRate;

/** Limits of stores in bits, as the rules derive them from a scenario. */
final class Limits {

  private Limits() {}

  /** Fill up to which plans may go. */
  static long plannedFillBits(Scenario scenario, Craft craft) {
    return share(craft.store().bits(), scenario.rules().margins().plannedFillShare());
  }

  /**
   * Fill allowed at the end of the period: the share given, else the larger of start fill and 25 %.
   */
  static long endFillBits(Scenario scenario, Craft craft) {
    return scenario
        .rules()
        .data()
        .endFillShare()
        .map(share -> share(craft.store().bits(), share))
        .orElseGet(
            () ->
                Math.max(startFillBits(scenario, craft.name()), share(craft.store().bits(), 0.25)));
  }

  static long startFillBits(Scenario scenario, String craft) {
    return scenario.start().of(craft).fill().stream()
        .mapToLong((CraftState.Fill fill) -> fill.volume().bits())
        .sum();
  }

  private static long share(long bits, double share) {
    return new DataRate(bits).share(share).bitsPerSecond();
  }
}
