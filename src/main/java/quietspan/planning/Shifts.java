package quietspan.planning;

import java.util.ArrayList;
import java.util.Iterator;
import java.util.List;
import java.util.Objects;
import java.util.Random;
import org.optaplanner.core.api.score.director.ScoreDirector;
import org.optaplanner.core.impl.heuristic.selector.move.factory.MoveIteratorFactory;

/**
 * Makes the changes that the joint polish tries: nine times in ten something about contacts, else
 * about pauses and aims, with the contacts around them mended. Contacts are only ever proposed
 * where a beam, a pass and a free antenna carry them. Public because the solver asks for it.
 */
public final class Shifts implements MoveIteratorFactory<Polishing, Shift> {

  /** Nothing came out of so many attempts: there is nothing to do. */
  private static final int ATTEMPTS = 200;

  /** Of the repoints at the last step, kept until they change. */
  private Draft draft;

  private List<Move> draftMoves = List.of();

  /** For the solver. */
  public Shifts() {}

  @Override
  public long getSize(ScoreDirector<Polishing> director) {
    Polishing plan = director.getWorkingSolution();
    return 100L * (plan.contacts().size() + plan.repoints().size());
  }

  @Override
  public Iterator<Shift> createOriginalMoveIterator(ScoreDirector<Polishing> director) {
    throw new UnsupportedOperationException("changes are drawn at random");
  }

  @Override
  public Iterator<Shift> createRandomMoveIterator(
      ScoreDirector<Polishing> director, Random random) {
    Polishing plan = director.getWorkingSolution();
    List<Move> moves = plan.moves();
    if (draft == null || !moves.equals(draftMoves)) {
      draft = new Draft(plan.frame().tables(), moves);
      draftMoves = moves;
    }
    ContactShifts contacts = new ContactShifts(plan, draft, random);
    PauseShifts pauses = new PauseShifts(plan, draft, random);
    return new Iterator<>() {
      @Override
      public boolean hasNext() {
        return true;
      }

      @Override
      public Shift next() {
        for (int i = 0; i < ATTEMPTS; i++) {
          boolean contact = !plan.frame().legal() || random.nextInt(10) > 0;
          Shift shift = contact ? contacts.next() : pauses.next();
          if (shift != null) {
            return shift;
          }
        }
        return new Shift(List.of(), List.of());
      }
    };
  }

  /** Whether a contact goes beside others: antenna, craft, number at once, switching. */
  static boolean fits(Tables tables, Use use, Iterable<Use> others) {
    var rules = tables.scenario.rules().contacts();
    int switching = (int) rules.craftSwitch().toSeconds();
    int overlapping = 0;
    for (Use other : others) {
      boolean overlaps = other.begin() < use.end() && use.begin() < other.end();
      if (overlaps) {
        overlapping++;
        if (other.craft() == use.craft()) {
          return false;
        }
      }
      int apart = overlaps || other.craft() == use.craft() ? 0 : switching;
      if (other.antenna() == use.antenna()) {
        Tables.Antenna antenna = tables.antennas.get(use.antenna());
        int own = antenna.busyBefore() + antenna.busyAfter();
        apart =
            Math.max(
                apart, other.craft() == use.craft() ? own : Math.min(antenna.changeover(), own));
      }
      if (apart > 0 && other.begin() < use.end() + apart && use.begin() < other.end() + apart) {
        return false;
      }
    }
    return overlapping < rules.contactsAtOnce();
  }

  /** The uses of the plan but for some slots. */
  static List<Use> usesBut(Polishing plan, List<ContactSlot> left) {
    List<Use> uses = new ArrayList<>(plan.frame().fixed());
    for (ContactSlot slot : plan.contacts()) {
      if (slot.use() != null && !left.contains(slot)) {
        uses.add(slot.use());
      }
    }
    return uses;
  }

  /** The same contact at the highest rate that closes, or null when its hold does not carry it. */
  static Use rated(Tables tables, Draft draft, int craft, int antenna, int begin, int end) {
    Tables.Antenna dish = tables.antennas.get(antenna);
    if (end - begin < dish.shortest() || end - begin > dish.longest()) {
      return null;
    }
    Use use = new Use(craft, antenna, begin, end, 0);
    int step = tables.rateStep(draft, use);
    return step < 0 ? null : new Use(craft, antenna, begin, end, step);
  }

  /** The best contact in a slot between two instants, whichever craft; null for none. */
  static Use best(Tables tables, Draft draft, ContactSlot slot, int begin, int end) {
    Use best = null;
    for (Links.Window window : slot.windows()) {
      if (window.begin() <= begin && end <= window.end()) {
        Use use = rated(tables, draft, window.craft(), window.antenna(), begin, end);
        if (use != null
            && (best == null
                || tables.effective[use.craft()][use.step()]
                    > tables.effective[best.craft()][best.step()])) {
          best = use;
        }
      }
    }
    return best;
  }

  /** The slots that are used. */
  static List<ContactSlot> used(Polishing plan) {
    return plan.contacts().stream().filter(slot -> Objects.nonNull(slot.use())).toList();
  }
}
