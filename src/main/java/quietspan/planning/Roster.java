package quietspan.planning;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.TreeMap;
import java.util.TreeSet;
import quietspan.model.RuleId;
import quietspan.model.Waiver;

/**
 * The contacts of a plan in the making, kept together with the ledger of the stores. Contacts in it
 * keep every rule of the first table when they are put in through {@link #fits}; what the data
 * rules say is asked with {@link #shortfall}.
 */
final class Roster {

  private static final Comparator<Use> ORDER =
      Comparator.comparingInt(Use::begin)
          .thenComparingInt(Use::antenna)
          .thenComparingInt(Use::craft)
          .thenComparingInt(Use::end)
          .thenComparingInt(Use::step);

  final Tables tables;
  private final Ledger ledger;
  private final TreeSet<Use> uses = new TreeSet<>(ORDER);
  private final TreeMap<Use, Integer> pending = new TreeMap<>(ORDER);

  /** What the ledger was told last. */
  private TreeMap<Use, Integer> told = new TreeMap<>(ORDER);

  private final int gapLimit;
  private final int directLimit;
  private final List<Waiver> waivers;
  private final int lockUp;
  private final int switching;
  private final int atOnce;
  private Draft draft;

  /** How far a plan is from keeping the data rules; all zero when it does. */
  record Shortfall(Ledger.Score data, long gapSeconds) {
    boolean none() {
      return data.legal() && gapSeconds == 0;
    }

    /** Larger is worse. */
    long weight() {
      return data.weight() / 1000 + gapSeconds * 100;
    }
  }

  Roster(Tables tables, List<Waiver> waivers, Draft draft, int guard) {
    this.tables = tables;
    this.waivers = waivers;
    this.ledger = new Ledger(tables, waivers, guard);
    var rules = tables.scenario.rules();
    this.gapLimit = rules.data().gapLimit().map(limit -> (int) limit.toSeconds()).orElse(-1);
    this.directLimit = rules.data().directLimit().map(limit -> (int) limit.toSeconds()).orElse(-1);
    this.lockUp = (int) rules.contacts().lockUp().toSeconds();
    this.switching = (int) rules.contacts().craftSwitch().toSeconds();
    this.atOnce = rules.contacts().contactsAtOnce();
    draft(draft);
  }

  /** The same plan with a ledger that is stricter by another number of seconds. */
  Roster under(int guard) {
    Roster copy = new Roster(tables, waivers, draft, guard);
    uses.forEach(copy::add);
    return copy;
  }

  Draft draft() {
    return draft;
  }

  /** Takes other pauses; contacts stay as they are and may not fit any more. */
  void draft(Draft next) {
    draft = next;
    ledger.pauses(next.pauses);
    told.clear();
  }

  List<Use> uses() {
    return List.copyOf(uses);
  }

  void add(Use use) {
    if (uses.add(use)) {
      book(use, 1);
    }
  }

  void remove(Use use) {
    if (uses.remove(use)) {
      book(use, -1);
    }
  }

  /** What the ledger has not been told yet; what is put in and taken out again costs nothing. */
  private void book(Use use, int sign) {
    if (pending.merge(use, sign, Integer::sum) == 0) {
      pending.remove(use);
    }
  }

  private void tell(Use use, int sign) {
    int begin = tables.onboardCeil(use.craft(), use.begin());
    int end = tables.onboardFloor(use.craft(), use.end());
    ledger.contact(
        use.craft(), begin, end, begin + lockUp, tables.effective[use.craft()][use.step()], sign);
  }

  /** Whether a contact goes beside those already there: antenna, number at once, switching. */
  boolean fits(Use use) {
    int before = tables.antennas.get(use.antenna()).busyBefore();
    int after = tables.antennas.get(use.antenna()).busyAfter();
    int change = tables.antennas.get(use.antenna()).changeover();
    int overlapping = 0;
    int horizon = Math.max(Math.max(switching, before + after), change);
    for (Use other : uses) {
      if (other.end() + horizon < use.begin()) {
        continue;
      }
      if (other.begin() > use.end() + horizon) {
        break;
      }
      boolean overlaps = other.begin() < use.end() && use.begin() < other.end();
      if (overlaps) {
        overlapping++;
        if (other.craft() == use.craft()) {
          return false;
        }
      }
      if (other.antenna() == use.antenna()) {
        int apart =
            other.craft() == use.craft() ? before + after : Math.min(change, before + after);
        if (other.begin() < use.end() + apart && use.begin() < other.end() + apart) {
          return false;
        }
      }
      if (other.craft() != use.craft() && !overlaps) {
        if (other.begin() < use.end() + switching && use.begin() < other.end() + switching) {
          return false;
        }
      }
    }
    return overlapping < atOnce;
  }

  Shortfall shortfall() {
    tell();
    return new Shortfall(ledger.score(), gaps());
  }

  /**
   * Zero when the data rules are met; else a number that says how far from it the plan is, found
   * with as little work as can be: larger for what breaks a rule worse, but not comparable with
   * {@link #shortfall}.
   */
  long firstBreach() {
    long gap = gaps();
    if (gap > 0) {
      return gap * 100;
    }
    tell();
    return ledger.firstBreach() / 1000 + Math.min(1, ledger.firstBreach());
  }

  /** Brings the ledger up to date; a change that was just taken back is forgotten cheaply. */
  private void tell() {
    boolean back = !told.isEmpty();
    for (var one : told.entrySet()) {
      back &= pending.getOrDefault(one.getKey(), 0) == -one.getValue();
    }
    if (back) {
      told.forEach((use, sign) -> tell(use, -sign));
      told.keySet().forEach(pending::remove);
      ledger.rollback();
    }
    ledger.mark();
    pending.forEach(this::tell);
    told = new TreeMap<>(pending);
    pending.clear();
  }

  private long gaps() {
    long over = 0;
    if (gapLimit >= 0) {
      over += gaps(-1, gapLimit, tables.lastContactEnd, RuleId.GAP);
    }
    if (directLimit >= 0) {
      for (int c = 0; c < tables.craftCount; c++) {
        over += gaps(c, directLimit, tables.lastContactEndOf[c], RuleId.DIRECT);
      }
    }
    return over;
  }

  private long gaps(int craft, int limit, int since, RuleId rule) {
    long over = 0;
    int last = since;
    for (Use use : uses) {
      if (craft >= 0 && use.craft() != craft) {
        continue;
      }
      over += over(last, use.begin(), limit, rule, craft);
      last = Math.max(last, use.end());
    }
    int reference = Math.max(0, craft);
    return over + over(last, tables.groundCeil(reference, tables.length), limit, rule, craft);
  }

  private long over(int from, int to, int limit, RuleId rule, int craft) {
    if (to - from <= limit) {
      return 0;
    }
    int allowed = limit;
    for (Waiver waiver : waivers) {
      boolean mine = craft < 0 || waiver.craft().equals(tables.scenario.craft().get(craft).name());
      if (waiver.rule() == rule
          && mine
          && waiver.begin().getEpochSecond() - tables.epoch < to
          && waiver.end().getEpochSecond() - tables.epoch > from) {
        allowed = Math.max(allowed, (int) waiver.relaxedLimit().toSeconds());
      }
    }
    return Math.max(0, to - from - allowed);
  }

  /** Station cost in thousandths of a unit. */
  long cost() {
    long cost = 0;
    for (Use use : uses) {
      cost += tables.cost(use);
    }
    return cost;
  }

  /** Contacts that the present holds do not carry any more. */
  List<Use> broken() {
    List<Use> list = new ArrayList<>();
    for (Use use : uses) {
      if (tables.rateStep(draft, use) < use.step()) {
        list.add(use);
      }
    }
    return list;
  }
}
