package quietspan.planning;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import quietspan.model.Aim;

/**
 * Draws changes of pauses and aims, and mends the contacts that do not fit any more: another rate,
 * another craft in the same pass, a shorter contact, or none.
 */
final class PauseShifts {

  private static final int GRID = FullSchedule.GRID;

  /** Pauses and aims move by at most so many grid steps. */
  private static final int FURTHEST = 12 * 3600 / GRID;

  private final Polishing plan;
  private final Tables tables;
  private final Draft draft;
  private final Random random;
  private final List<RepointSlot> made;

  PauseShifts(Polishing plan, Draft draft, Random random) {
    this.plan = plan;
    this.tables = plan.frame().tables();
    this.draft = draft;
    this.random = random;
    this.made = plan.repoints().stream().filter(slot -> slot.move() != null).toList();
  }

  /** A change, or null when this draw made none. */
  Shift next() {
    if (made.isEmpty()) {
      return null;
    }
    RepointSlot slot = made.get(random.nextInt(made.size()));
    List<Shift.Turn> turns =
        switch (random.nextInt(7)) {
          case 0 -> slide(pause(slot), step(), false);
          case 1 -> slide(pause(slot), step(), true);
          case 2 -> snap(pause(slot));
          case 3 -> exchange(slot);
          case 4 -> leave(slot);
          case 5 -> join(slot);
          default -> List.of(aimed(slot, slot.move().start(), step()));
        };
    return turns.isEmpty() ? null : mended(turns);
  }

  private int step() {
    int far = random.nextInt(3) == 0 ? FURTHEST : FURTHEST / 12;
    int steps = 1 + random.nextInt(far);
    return random.nextBoolean() ? steps * GRID : -steps * GRID;
  }

  /** Repoints of the same pause. */
  private List<RepointSlot> pause(RepointSlot slot) {
    for (int[] pause : draft.pauses) {
      if (pause[0] <= slot.move().start() && slot.move().start() < pause[1]) {
        return made.stream()
            .filter(one -> pause[0] <= one.move().start() && one.move().start() < pause[1])
            .toList();
      }
    }
    return List.of(slot);
  }

  private List<Shift.Turn> slide(List<RepointSlot> pause, int by, boolean withAims) {
    List<Shift.Turn> turns = new ArrayList<>();
    for (RepointSlot slot : pause) {
      turns.add(aimed(slot, slot.move().start() + by, withAims ? by : 0));
    }
    return turns;
  }

  /** Begins with the begin of an interruption near by, or ends with its end. */
  private List<Shift.Turn> snap(List<RepointSlot> pause) {
    if (tables.stops.isEmpty()) {
      return List.of();
    }
    int[] stop = tables.stops.get(random.nextInt(tables.stops.size()));
    boolean atEnd = random.nextBoolean();
    List<Shift.Turn> turns = new ArrayList<>();
    for (RepointSlot slot : pause) {
      int start = atEnd ? stop[1] - tables.repoint[slot.craft()] : stop[0];
      if (Math.abs(start - slot.move().start()) > 5 * 86_400 || start == slot.move().start()) {
        return List.of();
      }
      turns.add(new Shift.Turn(slot, new Move(slot.craft(), start, slot.move().aim())));
    }
    return turns;
  }

  /** Two craft of a pause exchange when the Earth is in the middle of their beams. */
  private List<Shift.Turn> exchange(RepointSlot slot) {
    List<RepointSlot> others = new ArrayList<>(pause(slot));
    others.remove(slot);
    if (others.isEmpty()) {
      return List.of();
    }
    RepointSlot other = others.get(random.nextInt(others.size()));
    int mine = centre(slot.move());
    int theirs = centre(other.move());
    return List.of(
        new Shift.Turn(slot, new Move(slot.craft(), slot.move().start(), at(slot.craft(), theirs))),
        new Shift.Turn(
            other, new Move(other.craft(), other.move().start(), at(other.craft(), mine))));
  }

  /** The craft keeps its aim. */
  private List<Shift.Turn> leave(RepointSlot slot) {
    return List.of(new Shift.Turn(slot, null));
  }

  /** Another craft moves in the same pause. */
  private List<Shift.Turn> join(RepointSlot slot) {
    List<RepointSlot> spare = plan.repoints().stream().filter(one -> one.move() == null).toList();
    if (spare.isEmpty()) {
      return List.of();
    }
    RepointSlot joining = spare.get(random.nextInt(spare.size()));
    boolean moves = pause(slot).stream().anyMatch(one -> one.craft() == joining.craft());
    if (moves) {
      return List.of();
    }
    int start = slot.move().start();
    int ahead = start + random.nextInt(14 * 86_400);
    return List.of(
        new Shift.Turn(joining, new Move(joining.craft(), start, at(joining.craft(), ahead))));
  }

  private Shift.Turn aimed(RepointSlot slot, int start, int by) {
    Move move = slot.move();
    Aim aim = by == 0 ? move.aim() : at(move.craft(), centre(move) + by);
    return new Shift.Turn(slot, new Move(move.craft(), start, aim));
  }

  private Aim at(int craft, int second) {
    return Aiming.at(tables, craft, second);
  }

  /** When the Earth is nearest to the middle of the beam in the hold that a repoint begins. */
  private int centre(Move move) {
    for (Hold hold : draft.holds.get(move.craft())) {
      if (hold.from == move.start() + tables.repoint[move.craft()]) {
        return hold.nearest();
      }
    }
    return move.start();
  }

  private Shift mended(List<Shift.Turn> turns) {
    List<Move> moves = new ArrayList<>();
    for (RepointSlot slot : plan.repoints()) {
      Move move = slot.move();
      for (Shift.Turn turn : turns) {
        if (turn.slot() == slot) {
          move = turn.move();
        }
      }
      if (move != null) {
        moves.add(move);
      }
    }
    Draft next = draft.with(moves);
    if (next.breaches() > 0) {
      return null;
    }
    for (Use fixed : plan.frame().fixed()) {
      if (tables.rateStep(next, fixed) < fixed.step()) {
        return null;
      }
    }
    List<Shift.Contact> contacts = new ArrayList<>();
    List<ContactSlot> broken = new ArrayList<>();
    for (ContactSlot slot : plan.contacts()) {
      if (slot.use() != null && tables.rateStep(next, slot.use()) < slot.use().step()) {
        broken.add(slot);
      }
    }
    List<Use> kept = Shifts.usesBut(plan, broken);
    for (ContactSlot slot : broken) {
      Use use = mended(next, slot);
      if (use != null && Shifts.fits(tables, use, kept)) {
        kept.add(use);
      } else {
        use = null;
      }
      contacts.add(new Shift.Contact(slot, use));
    }
    return new Shift(turns, contacts);
  }

  private Use mended(Draft next, ContactSlot slot) {
    Use use = slot.use();
    Use whole = Shifts.best(tables, next, slot, use.begin(), use.end());
    if (whole != null) {
      return whole;
    }
    for (int cut = 2 * GRID; cut < use.length(); cut += 2 * GRID) {
      Use early = Shifts.best(tables, next, slot, use.begin(), use.end() - cut);
      Use late = Shifts.best(tables, next, slot, use.begin() + cut, use.end());
      if (early != null || late != null) {
        return early != null ? early : late;
      }
    }
    return null;
  }
}
