package quietspan.planted.link;

import java.util.function.DoubleUnaryOperator;

/** Calls an inexact function from a lambda. */
public final class HidesSineInLambda {
  public DoubleUnaryOperator twice() {
    return angle -> 2 * Math.cos(angle);
  }
}
