package quietspan.planning;

import java.util.List;
import java.util.Random;

/** Draws changes of contacts: on or off, longer, shorter, later, earlier, to another pass. */
final class ContactShifts {

  /** Contacts are offered on multiples of this (s). */
  private static final int GRID = FullSchedule.GRID;

  /** Ends move by at most so many grid steps at a time. */
  private static final int FURTHEST = 12;

  /** Hours move to another pass within so many seconds. */
  private static final int NEAR = 36 * 3600;

  private final Polishing plan;
  private final Tables tables;
  private final Draft draft;
  private final Random random;
  private final List<ContactSlot> used;

  ContactShifts(Polishing plan, Draft draft, Random random) {
    this.plan = plan;
    this.tables = plan.frame().tables();
    this.draft = draft;
    this.random = random;
    this.used = Shifts.used(plan);
  }

  /** A change, or null when this draw made none. */
  Shift next() {
    if (plan.contacts().isEmpty()) {
      return null;
    }
    int kind = random.nextInt(10);
    if (used.isEmpty() || kind < 2) {
      return toggle();
    }
    ContactSlot slot = used.get(random.nextInt(used.size()));
    if (kind < 5) {
      return stretch(slot);
    }
    if (kind < 6) {
      return slide(slot);
    }
    if (kind < 8) {
      return trade(slot);
    }
    return toAnotherPass(slot);
  }

  private Shift toggle() {
    ContactSlot slot = plan.contacts().get(random.nextInt(plan.contacts().size()));
    if (slot.use() != null) {
      return new Shift(List.of(), List.of(new Shift.Contact(slot, null)));
    }
    return put(slot, drawn(slot), List.of(slot));
  }

  private Shift stretch(ContactSlot slot) {
    Use use = slot.use();
    int by = (random.nextInt(2 * FURTHEST) - FURTHEST) * GRID;
    boolean atEnd = random.nextBoolean();
    int begin = use.begin() + (atEnd ? 0 : by);
    int end = use.end() + (atEnd ? by : 0);
    return put(slot, Shifts.best(tables, draft, slot, begin, end), List.of(slot));
  }

  private Shift slide(ContactSlot slot) {
    Use use = slot.use();
    int by = (random.nextInt(2 * FURTHEST) - FURTHEST) * GRID;
    return put(
        slot, Shifts.best(tables, draft, slot, use.begin() + by, use.end() + by), List.of(slot));
  }

  /** What one contact loses at an end, another gains at one of its own. */
  private Shift trade(ContactSlot slot) {
    ContactSlot other = used.get(random.nextInt(used.size()));
    if (other == slot || Math.abs(other.use().begin() - slot.use().begin()) > NEAR) {
      return null;
    }
    int by = (1 + random.nextInt(FURTHEST)) * GRID;
    Use shorter = ending(slot, -by);
    Use longer = ending(other, by);
    if (shorter == null || longer == null) {
      return null;
    }
    List<Use> rest = Shifts.usesBut(plan, List.of(slot, other));
    if (!Shifts.fits(tables, longer, rest)) {
      return null;
    }
    rest.add(longer);
    return Shifts.fits(tables, shorter, rest)
        ? new Shift(
            List.of(), List.of(new Shift.Contact(slot, shorter), new Shift.Contact(other, longer)))
        : null;
  }

  private Use ending(ContactSlot slot, int by) {
    Use use = slot.use();
    boolean atEnd = random.nextBoolean();
    return Shifts.best(
        tables, draft, slot, use.begin() - (atEnd ? 0 : by), use.end() + (atEnd ? by : 0));
  }

  private Shift toAnotherPass(ContactSlot slot) {
    ContactSlot other = plan.contacts().get(random.nextInt(plan.contacts().size()));
    int away = other.windows().get(0).begin() - slot.use().begin();
    if (other.use() != null || Math.abs(away) > NEAR) {
      return null;
    }
    Use drawn = drawn(other);
    return drawn != null && Shifts.fits(tables, drawn, Shifts.usesBut(plan, List.of(slot, other)))
        ? new Shift(
            List.of(), List.of(new Shift.Contact(slot, null), new Shift.Contact(other, drawn)))
        : null;
  }

  private Shift put(ContactSlot slot, Use use, List<ContactSlot> without) {
    if (use == null
        || use.equals(slot.use())
        || !Shifts.fits(tables, use, Shifts.usesBut(plan, without))) {
      return null;
    }
    return new Shift(List.of(), List.of(new Shift.Contact(slot, use)));
  }

  /** A contact somewhere in the part of a pass that a beam covers; null when none does. */
  private Use drawn(ContactSlot slot) {
    Links.Window window = slot.windows().get(random.nextInt(slot.windows().size()));
    Tables.Antenna antenna = tables.antennas.get(window.antenna());
    for (Hold hold : draft.holds.get(window.craft())) {
      for (int[] part : hold.covered) {
        int from =
            Math.max(window.begin(), tables.groundCeil(window.craft(), part[0]) + 1) + GRID - 1;
        int to = Math.min(window.end(), tables.groundFloor(window.craft(), part[1]) - 1);
        int first = Math.floorDiv(from, GRID);
        int last = Math.floorDiv(to, GRID);
        int shortest = (antenna.shortest() + GRID - 1) / GRID;
        int longest = antenna.longest() / GRID;
        if (last - first >= shortest && longest >= shortest) {
          int length = shortest + random.nextInt(Math.min(last - first, longest) - shortest + 1);
          int begin = first + random.nextInt(last - first - length + 1);
          return Shifts.best(tables, draft, slot, begin * GRID, (begin + length) * GRID);
        }
      }
    }
    return null;
  }
}
