package quietspan.planted.link;

import java.util.function.DoubleBinaryOperator;

/** Hands an inexact function on without calling it. */
public final class RefersToPower {
  public DoubleBinaryOperator power() {
    return Math::pow;
  }
}
