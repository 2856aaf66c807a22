package quietspan.planning;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import quietspan.model.Aim;

/**
 * A plan in the making: immutable repoints with the holds and pauses that follow from them.
 * Contacts are kept apart, since they change far more often.
 */
final class Draft {

  final Tables tables;
  final List<Move> moves;

  /** Holds of each craft in time order. */
  final List<List<Hold>> holds;

  /** Pauses (repoints and interruptions) as sorted disjoint seconds. */
  final List<int[]> pauses;

  Draft(Tables tables, List<Move> moves) {
    this(tables, moves, List.of());
  }

  private Draft(Draft known, List<Move> moves) {
    this(known.tables, moves, known.holds);
  }

  private Draft(Tables tables, List<Move> moves, List<List<Hold>> known) {
    this.tables = tables;
    this.moves =
        moves.stream()
            .sorted(Comparator.comparingInt(Move::start).thenComparingInt(Move::craft))
            .toList();
    this.holds = new ArrayList<>();
    for (int c = 0; c < tables.craftCount; c++) {
      holds.add(holdsOf(c, known.isEmpty() ? List.of() : known.get(c)));
    }
    this.pauses = pauses(this.moves);
  }

  /** Other repoints; holds that stay the same are taken over. */
  Draft with(List<Move> other) {
    return new Draft(this, other);
  }

  private List<Hold> holdsOf(int craft, List<Hold> known) {
    List<Hold> found = new ArrayList<>();
    int from = 0;
    var aim = tables.scenario.start().of(tables.scenario.craft().get(craft).name()).aim();
    for (Move move : moves) {
      if (move.craft() == craft) {
        if (from < move.start()) {
          found.add(hold(known, craft, aim, from, move.start()));
        }
        from = move.start() + tables.repoint[craft];
        aim = move.aim();
      }
    }
    if (from < tables.length) {
      found.add(hold(known, craft, aim, from, tables.length));
    }
    return List.copyOf(found);
  }

  private Hold hold(List<Hold> known, int craft, Aim aim, int from, int until) {
    for (Hold hold : known) {
      if (hold.from == from && hold.until == until && hold.aim.equals(aim)) {
        return hold;
      }
    }
    return new Hold(tables, craft, aim, from, until);
  }

  private List<int[]> pauses(List<Move> sorted) {
    List<int[]> parts = new ArrayList<>();
    for (Move move : sorted) {
      parts.add(new int[] {move.start(), move.start() + tables.repoint[move.craft()]});
    }
    for (int[] stop : tables.stops) {
      parts.add(stop);
    }
    parts.sort(Comparator.comparingInt(part -> part[0]));
    List<int[]> merged = new ArrayList<>();
    for (int[] part : parts) {
      int[] last = merged.isEmpty() ? null : merged.get(merged.size() - 1);
      if (last != null && part[0] <= last[1]) {
        last[1] = Math.max(last[1], part[1]);
      } else {
        merged.add(part.clone());
      }
    }
    return merged;
  }

  /** Seconds of science, by the rules of quiet spans. */
  long science() {
    long science = 0;
    int begin = tables.quietSince;
    for (int i = 0; i <= pauses.size(); i++) {
      boolean open = i == pauses.size();
      int end = open ? tables.length : pauses.get(i)[0];
      int inside = end - Math.max(0, begin);
      if (inside > 0 && (open || end - begin >= tables.minimumSpan)) {
        long warm = begin >= 0 ? tables.warmUp : Math.max(0, begin + tables.warmUp);
        science += Math.max(0, inside - warm);
      }
      if (!open) {
        begin = pauses.get(i)[1];
      }
    }
    return science;
  }

  /** Length of the shortest span between two pauses, or the period when there is none. */
  int shortestSpan() {
    int shortest = tables.length;
    for (int i = 1; i < pauses.size(); i++) {
      shortest = Math.min(shortest, pauses.get(i)[0] - pauses.get(i - 1)[1]);
    }
    return shortest;
  }

  /**
   * Seconds by which repoints break what a written plan must keep: the period, protected intervals,
   * and the spacing of repoints.
   */
  long breaches() {
    long seconds = 0;
    int[] last = new int[tables.craftCount];
    for (int c = 0; c < tables.craftCount; c++) {
      last[c] = tables.lastRepoint[c];
    }
    for (Move move : moves) {
      int length = tables.repoint[move.craft()];
      seconds += Math.max(0, -move.start());
      seconds += Math.max(0, move.start() + length - tables.length);
      int apart = Math.max(tables.spacing[move.craft()], length);
      if (last[move.craft()] != Integer.MIN_VALUE) {
        seconds += Math.max(0, last[move.craft()] + apart - move.start());
      }
      last[move.craft()] = move.start();
    }
    for (int[] guarded : tables.guarded) {
      for (int[] pause : pauses) {
        int overlap = Math.min(guarded[1], pause[1]) - Math.max(guarded[0], pause[0]);
        if (overlap > 0 && holdsRepoint(pause)) {
          seconds += overlap;
        }
      }
    }
    return seconds;
  }

  private boolean holdsRepoint(int[] pause) {
    return moves.stream().anyMatch(move -> pause[0] <= move.start() && move.start() < pause[1]);
  }

  /** Pauses that hold a repoint. */
  int repointPauses() {
    return (int) pauses.stream().filter(this::holdsRepoint).count();
  }

  /** The hold of a craft that is in force throughout [begin, end) on board, or null. */
  Hold holdDuring(int craft, int begin, int end) {
    for (Hold hold : holds.get(craft)) {
      if (hold.from <= begin && end <= hold.until) {
        return hold;
      }
    }
    return null;
  }
}
