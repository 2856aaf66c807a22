package quietspan.check;

import java.util.ArrayList;
import java.util.List;

/**
 * Successive seconds in which a store has too much.
 *
 * @param craft index in the mission file
 * @param from first second, from the begin of the period
 * @param seconds how many
 * @param total sum over them
 * @param peak largest in one
 */
record Excess(int craft, long from, long seconds, long total, long peak) {

  /** Gathers excess second by second. */
  static final class Book {

    private final Excess[] open;
    private final List<Excess> closed = new ArrayList<>();

    Book(int craftCount) {
      this.open = new Excess[craftCount];
    }

    void note(int craft, long second, long amount) {
      Excess before = open[craft];
      if (amount <= 0) {
        if (before != null) {
          closed.add(before);
          open[craft] = null;
        }
      } else if (before == null) {
        open[craft] = new Excess(craft, second, 1, amount, amount);
      } else {
        open[craft] =
            new Excess(
                craft,
                before.from,
                before.seconds + 1,
                before.total + amount,
                Math.max(before.peak, amount));
      }
    }

    /** All of them, those still open included. */
    List<Excess> closed() {
      List<Excess> all = new ArrayList<>(closed);
      for (Excess each : open) {
        if (each != null) {
          all.add(each);
        }
      }
      return all;
    }
  }
}
