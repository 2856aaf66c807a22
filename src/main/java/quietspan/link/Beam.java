package quietspan.link;

import quietspan.model.Craft;
import quietspan.model.Scenario;

/**
 * A craft's beam.
 *
 * @param usableHalfCone largest off-pointing with a link, the allowance not counted (rad)
 * @param allowance pointing allowance, added to every off-pointing (rad)
 * @param halfPowerWidth full width between half-power points (rad)
 */
record Beam(double usableHalfCone, double allowance, double halfPowerWidth) {

  static Beam of(Scenario scenario, Craft craft) {
    return new Beam(
        scenario.usableHalfCone(craft).radians(),
        scenario.rules().margins().pointingAllowance().radians(),
        craft.antenna().halfPowerWidth().radians());
  }

  boolean holds(double offPointing) {
    return offPointing <= usableHalfCone;
  }

  double offAxis(double offPointing) {
    return offPointing + allowance;
  }
}
