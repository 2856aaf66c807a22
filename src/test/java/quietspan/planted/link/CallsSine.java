package quietspan.planted.link;

/** Calls an inexact function. */
public final class CallsSine {
  public double sine(double angle) {
    return Math.sin(angle);
  }
}
