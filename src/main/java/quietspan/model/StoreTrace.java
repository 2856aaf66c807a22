package quietspan.model;

import java.util.List;

/** A store through the period, linear between points, with the totals that conservation binds. */
public record StoreTrace(
    String craft,
    List<StorePoint> points,
    long startBits,
    long generatedBits,
    long receivedBits,
    long forwardedBits,
    long downlinkedBits,
    long lostBits,
    long endBits,
    long highestBits) {

  public StoreTrace {
    points = List.copyOf(points);
    if (startBits + generatedBits + receivedBits
        != forwardedBits + downlinkedBits + lostBits + endBits) {
      throw new IllegalStateException("bits are not conserved in the store of " + craft);
    }
  }
}
