package quietspan.planning;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.DataClass;
import quietspan.model.Generation;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.Waiver;

/**
 * The stores in steps of ten minutes, for the search: amounts are whole bits, ages are read on the
 * safe side by up to two steps. The ledger remembers the state at the begin of every day, so that
 * after a change only the days from the change until the stores are as before are gone through
 * again. What it finds legal is handed to the exact simulation before it is believed.
 */
final class Ledger {

  /** Seconds of a step. */
  static final int DT = 600;

  private static final int STEPS_A_DAY = 86_400 / DT;

  /**
   * What the data rules say of a plan; all zero when they are met.
   *
   * @param lost bits lost to full stores
   * @param late bits delivered late or late aboard at the end
   * @param fill bits above the planned fill, summed over steps
   * @param end bits above the limits at the end
   */
  record Score(long lost, long late, long fill, long end) {
    boolean legal() {
      return lost == 0 && late == 0 && fill == 0 && end == 0;
    }

    /** One number to compare breaches of the same kind of plan. */
    long weight() {
      return lost * 4 + late + fill / 8 + end;
    }
  }

  /** The stores at the begin of a day, and what broke in the course of it. Never changed. */
  private static final class Day {
    final long[][] total;
    final int[][] head;
    final long[][][] bins;
    final long lost;
    final long late;
    final long fill;

    Day(long[][] total, int[][] head, long[][][] bins, long lost, long late, long fill) {
      this.total = total;
      this.head = head;
      this.bins = bins;
      this.lost = lost;
      this.late = late;
      this.fill = fill;
    }

    Day with(long newLost, long newLate, long newFill) {
      return new Day(total, head, bins, newLost, newLate, newFill);
    }

    boolean broken() {
      return lost > 0 || late > 0 || fill > 0;
    }

    long weight() {
      return new Score(lost, late, fill, 0).weight();
    }
  }

  /** What stood in a place of the days before it was overwritten. */
  private record Before(int place, Day day) {}

  private final Tables tables;
  private final int guard;
  private final int craftCount;
  private final int classCount;
  private final int steps;
  private final int older;
  private final long[] capacity;
  private final long[] planned;
  private final long[] endLimit;
  private final long[] crossLink;
  private final int ahead;
  private final boolean crossInPauses;

  /** Longest age in steps by class and generation step (waivers applied). */
  private final int[][] ageLimit;

  private final long[][][] rate;
  private final long[][][] pausedRate;
  private final long[][] startTotal;
  private final long[][][] startBins;

  // what the plan says, by step
  private final long[][] sendable;
  private final int[][] contactSeconds;
  private final int[] pausedSeconds;

  // working state
  private final long[][] total;
  private final int[][] head;
  private final long[][][] bins;

  /** One more than there are days: the last is the end of the period. */
  private final Day[] days;

  /** Days whose contacts or pauses changed since they were gone through. */
  private final boolean[] changed;

  /** What undoes everything since the last {@link #mark}. */
  private final List<Before> before = new ArrayList<>();

  private boolean[] changedBefore;
  private boolean begun;

  /** Bits made until the begin of a step outside pauses, by craft. */
  private final long[][] madeBefore;

  /** First step after the present one at which a craft's being in contact changes, if known. */
  private final int[] runEnd;

  private final long[] held;
  private final int[] anyContact;
  private long lost;
  private long late;
  private long fill;

  /**
   * @param guard seconds by which data must be younger than their limit
   */
  Ledger(Tables tables, List<Waiver> waivers, int guard) {
    this.tables = tables;
    this.guard = guard;
    Scenario scenario = tables.scenario;
    this.craftCount = tables.craftCount;
    List<DataClass> classes = scenario.rules().classes();
    this.classCount = classes.size();
    this.steps = (tables.length + DT - 1) / DT;
    this.older = olderSteps(scenario);
    this.capacity = new long[craftCount];
    this.planned = new long[craftCount];
    this.endLimit = new long[craftCount];
    this.crossLink = new long[craftCount];
    this.ahead = (int) scenario.rules().data().forwardAhead().toSeconds();
    this.crossInPauses = scenario.rules().data().crossLinksInPauses();
    this.ageLimit = new int[classCount][steps + older + 1];
    this.rate = new long[craftCount][classCount][steps];
    this.pausedRate = new long[craftCount][classCount][steps];
    this.startTotal = new long[craftCount][classCount];
    this.startBins = new long[craftCount][classCount][older + 1];
    for (int k = 0; k < classCount; k++) {
      fillAgeLimits(classes.get(k), k, waivers);
    }
    for (int c = 0; c < craftCount; c++) {
      Craft craft = scenario.craft().get(c);
      capacity[c] = craft.store().bits();
      planned[c] = Limits.plannedFillBits(scenario, craft);
      endLimit[c] = Limits.endFillBits(scenario, craft);
      crossLink[c] = craft.crossLink().bitsPerSecond();
      for (int k = 0; k < classCount; k++) {
        fillRates(craft, classes.get(k), c, k);
        fillStart(scenario.start().of(craft.name()), classes.get(k), c, k);
      }
    }
    this.sendable = new long[craftCount][steps + 1];
    this.contactSeconds = new int[craftCount][steps + 1];
    this.pausedSeconds = new int[steps];
    this.total = new long[craftCount][classCount];
    this.head = new int[craftCount][classCount];
    this.bins = new long[craftCount][classCount][steps + older + 1];
    this.days = new Day[(steps - 1) / STEPS_A_DAY + 2];
    this.changed = new boolean[days.length];
    this.changedBefore = changed.clone();
    this.held = new long[craftCount];
    this.runEnd = new int[craftCount];
    this.anyContact = new int[steps + 1];
    this.madeBefore = new long[craftCount][steps + 1];
    for (int c = 0; c < craftCount; c++) {
      for (int s = 0; s < steps; s++) {
        long made = 0;
        for (int k = 0; k < classCount; k++) {
          made += rate[c][k][s] * DT;
        }
        madeBefore[c][s + 1] = madeBefore[c][s] + made;
      }
    }
  }

  private int olderSteps(Scenario scenario) {
    long oldest = 0;
    for (CraftState state : scenario.start().craft()) {
      for (CraftState.Fill one : state.fill()) {
        long since = one.oldest().map(at -> tables.epoch - at.epochSecond()).orElse(0L);
        oldest = Math.max(oldest, since);
      }
    }
    return (int) ((oldest + DT - 1) / DT);
  }

  private void fillAgeLimits(DataClass dataClass, int k, List<Waiver> waivers) {
    long delivery =
        tables.scenario.stations().stream()
            .mapToLong(station -> station.deliveryDelay().toSeconds())
            .max()
            .orElse(0);
    for (int bin = 0; bin < ageLimit[k].length; bin++) {
      long made = (long) (bin - older) * DT;
      long allowed = dataClass.latencyLimit().toSeconds();
      for (Waiver waiver : waivers) {
        if (waiver.rule() == RuleId.LATENCY
            && waiver.dataClass().equals(dataClass.name())
            && waiver.begin().getEpochSecond() - tables.epoch <= made
            && made < waiver.end().getEpochSecond() - tables.epoch) {
          allowed = Math.max(allowed, waiver.relaxedLimit().toSeconds());
        }
      }
      int sample = (int) Math.max(0, Math.min(tables.samples - 1, made / Tables.STEP));
      double light = 0;
      for (int c = 0; c < craftCount; c++) {
        light = Math.max(light, tables.lightTime[c][sample]);
      }
      ageLimit[k][bin] = (int) ((allowed - delivery - (long) Math.ceil(light) - 2 - guard) / DT);
    }
  }

  private void fillRates(Craft craft, DataClass dataClass, int c, int k) {
    for (Generation generation : craft.generation()) {
      if (generation.dataClass().equals(dataClass.name())) {
        for (int s = 0; s < steps; s++) {
          var at =
              generation
                  .profile()
                  .at(quietspan.time.OnboardInstant.ofEpochSecond(tables.epoch + (long) s * DT));
          rate[c][k][s] += at.bitsPerSecond();
          pausedRate[c][k][s] += at.share(generation.shareInPauses()).bitsPerSecond();
        }
      }
    }
  }

  private void fillStart(CraftState state, DataClass dataClass, int c, int k) {
    for (CraftState.Fill one : state.fill()) {
      if (!one.dataClass().equals(dataClass.name())) {
        continue;
      }
      long volume = one.volume().bits();
      startTotal[c][k] += volume;
      long since = one.oldest().map(at -> tables.epoch - at.epochSecond()).orElse(0L);
      int span = (int) ((since + DT - 1) / DT);
      if (span == 0) {
        startBins[c][k][older] += volume;
      } else {
        for (int i = 0; i < span; i++) {
          startBins[c][k][older - span + i] += volume * (i + 1) / span - volume * i / span;
        }
      }
    }
  }

  // ---------------------------------------------------------------- the plan

  /** Takes the pauses of a plan, as sorted disjoint seconds [begin, end). */
  void pauses(List<int[]> pauses) {
    int[] fresh = new int[steps];
    for (int[] pause : pauses) {
      for (int s = Math.max(0, pause[0]); s < Math.min(tables.length, pause[1]); ) {
        int step = s / DT;
        int until = Math.min(Math.min(tables.length, pause[1]), (step + 1) * DT);
        fresh[step] += until - s;
        s = until;
      }
    }
    for (int step = 0; step < steps; step++) {
      if (fresh[step] != pausedSeconds[step]) {
        touch(step, step + 1);
      }
    }
    System.arraycopy(fresh, 0, pausedSeconds, 0, steps);
  }

  /** Adds ({@code sign} 1) or takes away (-1) a contact, given on board. */
  void contact(int craft, int begin, int end, int dataFrom, long bitsPerSecond, int sign) {
    int from = Math.max(0, begin);
    int to = Math.min(tables.length, end);
    for (int s = from; s < to; ) {
      int step = s / DT;
      int until = Math.min(to, (step + 1) * DT);
      contactSeconds[craft][step] += sign * (until - s);
      anyContact[step] += sign;
      sendable[craft][step] += sign * bitsPerSecond * Math.max(0, until - Math.max(s, dataFrom));
      s = until;
    }
    if (from < to) {
      // What may be sent to a craft depends on when its contacts end, so those that lead up to this
      // one are touched, too.
      int first = from / DT;
      while (first > 0 && contactSeconds[craft][first - 1] > 0) {
        first--;
      }
      touch(Math.max(0, first - ahead / DT - 1), (to - 1) / DT + 1);
    }
  }

  private void touch(int fromStep, int untilStep) {
    int last = Math.min(steps - 1, untilStep - 1) / STEPS_A_DAY;
    for (int day = fromStep / STEPS_A_DAY; day <= last; day++) {
      changed[day] = true;
    }
  }

  // ---------------------------------------------------------------- running

  /** What every data rule says. */
  Score score() {
    run(false);
    long sumLost = 0;
    long sumLate = 0;
    long sumFill = 0;
    for (Day day : days) {
      sumLost += day.lost;
      sumLate += day.late;
      sumFill += day.fill;
    }
    Score end = end();
    return new Score(sumLost, sumLate + end.late, sumFill, end.end);
  }

  /**
   * Zero when the data rules are met; else by how much they are broken on the first day that breaks
   * one, without a look at later days.
   */
  long firstBreach() {
    int day = run(true);
    return day < days.length - 1 ? days[day].weight() : end().weight();
  }

  /** From here on {@link #rollback} leads back to the present state. */
  void mark() {
    before.clear();
    changedBefore = changed.clone();
  }

  /** Forgets everything gone through since the mark; the contacts must be as they were then. */
  void rollback() {
    for (int i = before.size() - 1; i >= 0; i--) {
      days[before.get(i).place()] = before.get(i).day();
    }
    System.arraycopy(changedBefore, 0, changed, 0, changed.length);
    before.clear();
  }

  private void put(int place, Day day) {
    before.add(new Before(place, days[place]));
    days[place] = day;
  }

  private Score end() {
    Day end = days[days.length - 1];
    long over = 0;
    long aboard = 0;
    for (int c = 0; c < craftCount; c++) {
      long sum = 0;
      for (int k = 0; k < classCount; k++) {
        sum += end.total[c][k];
        for (int i = 0; i < end.bins[c][k].length; i++) {
          int bin = end.head[c][k] + i;
          if (steps + older - bin <= ageLimit[k][bin]) {
            break;
          }
          aboard += end.bins[c][k][i];
        }
      }
      over += Math.max(0, sum - endLimit[c]);
    }
    return new Score(0, aboard, 0, over);
  }

  /**
   * Goes through the changed days, and on from each until the stores are as they were.
   *
   * @param toFirstBreach stops after the first day that breaks a rule; later ones stay changed
   * @return the day stopped at, or the number of days
   */
  private int run(boolean toFirstBreach) {
    if (!begun) {
      start();
      put(0, snapshot(0));
      Arrays.fill(changed, 0, days.length - 1, true);
      begun = true;
    }
    boolean here = false;
    for (int d = 0; d < days.length - 1; d++) {
      if (changed[d]) {
        if (!here) {
          restore(days[d], d * STEPS_A_DAY);
        }
        here = day(d);
      }
      if (toFirstBreach && days[d].broken()) {
        return d;
      }
    }
    return days.length - 1;
  }

  /** Goes through one day; says whether the stores then differ from what was known. */
  private boolean day(int d) {
    lost = 0;
    late = 0;
    fill = 0;
    Arrays.fill(runEnd, -1);
    int until = Math.min(steps, (d + 1) * STEPS_A_DAY);
    for (int step = d * STEPS_A_DAY; step < until; step++) {
      step(step);
    }
    put(d, days[d].with(lost, late, fill));
    changed[d] = false;
    boolean differs = days[d + 1] == null || !sameAs(days[d + 1], until);
    if (differs) {
      Day known = days[d + 1];
      Day fresh = snapshot(until);
      put(d + 1, known == null ? fresh : fresh.with(known.lost, known.late, known.fill));
      changed[d + 1] = d + 1 < days.length - 1;
    }
    return differs;
  }

  private void start() {
    for (int c = 0; c < craftCount; c++) {
      for (int k = 0; k < classCount; k++) {
        Arrays.fill(bins[c][k], 0);
        System.arraycopy(startBins[c][k], 0, bins[c][k], 0, older + 1);
        total[c][k] = startTotal[c][k];
        held[c] += startTotal[c][k];
        head[c][k] = 0;
        while (head[c][k] < older && bins[c][k][head[c][k]] == 0) {
          head[c][k]++;
        }
      }
    }
  }

  private Day snapshot(int step) {
    long[][] totals = new long[craftCount][];
    int[][] heads = new int[craftCount][classCount];
    long[][][] copies = new long[craftCount][classCount][];
    for (int c = 0; c < craftCount; c++) {
      totals[c] = total[c].clone();
      for (int k = 0; k < classCount; k++) {
        heads[c][k] = Math.min(head[c][k], step + older + 1);
        copies[c][k] =
            Arrays.copyOfRange(
                bins[c][k], heads[c][k], Math.min(bins[c][k].length, step + older + 1));
      }
    }
    return new Day(totals, heads, copies, 0, 0, 0);
  }

  private void restore(Day day, int step) {
    for (int c = 0; c < craftCount; c++) {
      held[c] = 0;
      for (int k = 0; k < classCount; k++) {
        held[c] += day.total[c][k];
        total[c][k] = day.total[c][k];
        // Below its head a store is empty, and must be so again.
        Arrays.fill(bins[c][k], Math.min(head[c][k], day.head[c][k]), day.head[c][k], 0);
        head[c][k] = day.head[c][k];
        System.arraycopy(day.bins[c][k], 0, bins[c][k], day.head[c][k], day.bins[c][k].length);
        Arrays.fill(
            bins[c][k], Math.min(bins[c][k].length, step + older + 1), bins[c][k].length, 0);
      }
    }
  }

  private boolean sameAs(Day day, int step) {
    for (int c = 0; c < craftCount; c++) {
      if (!Arrays.equals(total[c], day.total[c])) {
        return false;
      }
    }
    for (int c = 0; c < craftCount; c++) {
      for (int k = 0; k < classCount; k++) {
        int from = Math.min(head[c][k], day.head[c][k]);
        int to = Math.min(bins[c][k].length, step + older + 1);
        for (int bin = from; bin < to; bin++) {
          long there = bin < day.head[c][k] ? 0 : day.bins[c][k][bin - day.head[c][k]];
          long here = bin < head[c][k] ? 0 : bins[c][k][bin];
          if (here != there) {
            return false;
          }
        }
      }
    }
    return true;
  }

  private void step(int step) {
    int bin = step + older;
    int seconds = Math.min(DT, tables.length - step * DT);
    int paused = pausedSeconds[step];
    for (int c = 0; c < craftCount; c++) {
      for (int k = 0; k < classCount; k++) {
        long made = rate[c][k][step] * (seconds - paused) + pausedRate[c][k][step] * paused;
        bins[c][k][bin] += made;
        total[c][k] += made;
        held[c] += made;
      }
    }
    int sink = sink(step);
    if (sink >= 0) {
      int linked = crossInPauses ? seconds : seconds - paused;
      if (contactSeconds[sink][step] > 0) {
        linked = Math.min(linked, contactSeconds[sink][step]);
      }
      long room = linked > 0 ? allowance(sink, step) - held[sink] : 0;
      for (int c = 0; c < craftCount && room > 0; c++) {
        if (c == sink || contactSeconds[c][step] > 0 || crossLink[c] == 0) {
          continue;
        }
        room -= forward(c, sink, Math.min(room, crossLink[c] * linked), bin);
      }
    }
    for (int c = 0; c < craftCount; c++) {
      if (sendable[c][step] > 0) {
        transmit(c, sendable[c][step], bin);
      }
      if (held[c] > planned[c]) {
        fill += held[c] - planned[c];
      }
      if (held[c] > capacity[c]) {
        overflow(c, held[c] - capacity[c], bin);
      }
    }
  }

  /** The craft that others send to: in contact, or next to be so soon enough; -1 for none. */
  private int sink(int step) {
    int last = Math.min(steps - 1, step + ahead / DT);
    for (int next = step; next <= last; next++) {
      if (anyContact[next] > 0) {
        for (int c = 0; c < craftCount; c++) {
          if (contactSeconds[c][next] > 0) {
            return c;
          }
        }
      }
    }
    return -1;
  }

  /** Planned fill of the sink less what it will make itself until its contact ends (or begins). */
  private long allowance(int sink, int step) {
    if (runEnd[sink] <= step) {
      boolean inContact = contactSeconds[sink][step] > 0;
      int next = step + 1;
      while (next < steps && contactSeconds[sink][next] > 0 == inContact) {
        next++;
      }
      runEnd[sink] = next;
    }
    long own = madeBefore[sink][runEnd[sink]] - madeBefore[sink][Math.min(step + 1, steps)];
    return Math.max(0, planned[sink] - own);
  }

  private long forward(int from, int to, long quota, int bin) {
    long moved = 0;
    for (int k = 0; k < classCount && moved < quota; k++) {
      int at = head[from][k];
      while (moved < quota && total[from][k] > 0 && at <= bin) {
        long take = Math.min(quota - moved, bins[from][k][at]);
        if (take > 0) {
          bins[from][k][at] -= take;
          bins[to][k][at] += take;
          head[to][k] = Math.min(head[to][k], at);
          total[from][k] -= take;
          total[to][k] += take;
          moved += take;
        }
        if (bins[from][k][at] == 0) {
          at++;
        }
      }
      head[from][k] = total[from][k] == 0 ? bin + 1 : at;
    }
    held[from] -= moved;
    held[to] += moved;
    return moved;
  }

  private void transmit(int c, long quota, int bin) {
    long left = quota;
    for (int k = 0; k < classCount && left > 0; k++) {
      int at = head[c][k];
      while (left > 0 && total[c][k] > 0 && at <= bin) {
        long take = Math.min(left, bins[c][k][at]);
        if (take > 0) {
          bins[c][k][at] -= take;
          total[c][k] -= take;
          left -= take;
          if (bin + 1 - at > ageLimit[k][at]) {
            late += take;
          }
        }
        if (bins[c][k][at] == 0) {
          at++;
        }
      }
      head[c][k] = total[c][k] == 0 ? bin + 1 : at;
    }
    held[c] -= quota - left;
  }

  private void overflow(int c, long excess, int bin) {
    long left = excess;
    for (int k = classCount - 1; k >= 0 && left > 0; k--) {
      for (int at = bin; at >= head[c][k] && left > 0; at--) {
        long take = Math.min(left, bins[c][k][at]);
        bins[c][k][at] -= take;
        total[c][k] -= take;
        left -= take;
        lost += take;
        held[c] -= take;
      }
    }
  }
}
