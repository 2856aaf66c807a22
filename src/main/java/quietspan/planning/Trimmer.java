package quietspan.planning;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Set;

/**
 * Takes contacts out of a roster that keeps the data rules, and shortens others, as long as it
 * still keeps them: the dearest data first.
 */
final class Trimmer {

  /** Ends move in steps of this (s). */
  private static final int STEP = 900;

  private final Tables tables;
  private final Roster roster;
  private final Set<Use> fixed;

  /** Breaches that the ledger sees already; trimming adds none. */
  private final long allowed;

  Trimmer(Roster roster, Set<Use> fixed) {
    this.tables = roster.tables;
    this.roster = roster;
    this.fixed = fixed;
    this.allowed = roster.shortfall().weight();
  }

  void trim() {
    List<Use> byPrice = new ArrayList<>(roster.uses());
    byPrice.sort(Comparator.comparingDouble((Use use) -> -price(use)).thenComparingInt(Use::begin));
    for (Use use : byPrice) {
      if (!fixed.contains(use)) {
        roster.remove(use);
        if (!still()) {
          roster.add(use);
        }
      }
    }
    for (Use use : List.copyOf(roster.uses())) {
      if (!fixed.contains(use)) {
        shorten(use);
      }
    }
  }

  private boolean still() {
    return allowed == 0 ? roster.firstBreach() == 0 : roster.shortfall().weight() <= allowed;
  }

  /** Station cost per bit. */
  private double price(Use use) {
    return tables.cost(use)
        / (double) Math.max(1, tables.effective[use.craft()][use.step()] * use.length());
  }

  private void shorten(Use whole) {
    Use use = whole;
    int shortest = tables.antennas.get(use.antenna()).shortest();
    boolean changed = true;
    while (changed) {
      changed = false;
      for (boolean atEnd : new boolean[] {true, false}) {
        int begin = use.begin() + (atEnd ? 0 : STEP);
        int end = use.end() - (atEnd ? STEP : 0);
        if (end - begin < shortest) {
          continue;
        }
        Use less = new Use(use.craft(), use.antenna(), begin, end, use.step());
        int step = tables.rateStep(roster.draft(), less);
        less = new Use(use.craft(), use.antenna(), begin, end, Math.max(step, use.step()));
        roster.remove(use);
        roster.add(less);
        if (still()) {
          use = less;
          changed = true;
        } else {
          roster.remove(less);
          roster.add(use);
        }
      }
    }
  }
}
