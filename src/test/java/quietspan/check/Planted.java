package quietspan.check;

import java.util.function.Consumer;
import quietspan.model.RuleId;

/**
 * A breach planted in a legal world, and the same world just inside the limit.
 *
 * @param amount by how much the rule is broken, in its unit
 * @param tolerance of the amount: what the geometry of the world is known to
 */
record Planted(
    RuleId rule, String name, double amount, double tolerance, World breach, World justInside) {

  static Planted of(
      RuleId rule,
      String name,
      double amount,
      double tolerance,
      Consumer<World> breach,
      Consumer<World> justInside) {
    return new Planted(rule, name, amount, tolerance, World.three(breach), World.three(justInside));
  }

  @Override
  public String toString() {
    return rule + ": " + name;
  }
}
