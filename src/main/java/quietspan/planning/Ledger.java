package quietspan.planning;

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

  private static final class Day {
    long[][] total;
    int[][] head;
    long[][][] bins;
    long lost;
    long late;
    long fill;
  }

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
  private final int[][] contactsIn;

  // working state
  private final long[][] total;
  private final int[][] head;
  private final long[][][] bins;

  private final Day[] days;
  private int validDays;
  private int dirtyFrom;
  private int dirtyUntil;
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
    this.contactsIn = new int[craftCount][steps + 1];
    this.pausedSeconds = new int[steps];
    this.total = new long[craftCount][classCount];
    this.head = new int[craftCount][classCount];
    this.bins = new long[craftCount][classCount][steps + older + 1];
    this.days = new Day[steps / STEPS_A_DAY + 2];
    this.validDays = 0;
    this.dirtyFrom = 0;
    this.dirtyUntil = steps;
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
      contactsIn[craft][step] += sign;
      sendable[craft][step] += sign * bitsPerSecond * Math.max(0, until - Math.max(s, dataFrom));
      s = until;
    }
    if (from < to) {
      touch(Math.max(0, (from - ahead) / DT - 1), (to - 1) / DT + 1);
    }
  }

  private void touch(int fromStep, int untilStep) {
    dirtyFrom = Math.min(dirtyFrom, fromStep);
    dirtyUntil = Math.max(dirtyUntil, untilStep);
  }

  // ---------------------------------------------------------------- running

  Score score() {
    if (dirtyFrom < dirtyUntil || validDays == 0) {
      run();
    }
    long over = 0;
    for (int c = 0; c < craftCount; c++) {
      over += Math.max(0, fillOf(c) - endLimit[c]);
    }
    long aboard = 0;
    for (int c = 0; c < craftCount; c++) {
      for (int k = 0; k < classCount; k++) {
        for (int bin = head[c][k]; bin < steps + older; bin++) {
          if (steps + older - bin > ageLimit[k][bin]) {
            aboard += bins[c][k][bin];
          } else {
            break;
          }
        }
      }
    }
    return new Score(lost, late + aboard, fill, over);
  }

  private long fillOf(int c) {
    long sum = 0;
    for (int k = 0; k < classCount; k++) {
      sum += total[c][k];
    }
    return sum;
  }

  private void run() {
    int day = Math.min(dirtyFrom / STEPS_A_DAY, Math.max(0, validDays - 1));
    if (validDays == 0) {
      day = 0;
      start();
      days[0] = snapshot(null, 0);
      validDays = 1;
    } else {
      restore(days[day], day * STEPS_A_DAY);
    }
    int lastDay = (steps - 1) / STEPS_A_DAY;
    int known = validDays;
    for (int d = day; d <= lastDay; d++) {
      int until = Math.min(steps, (d + 1) * STEPS_A_DAY);
      for (int step = d * STEPS_A_DAY; step < until; step++) {
        step(step);
      }
      int next = d + 1;
      boolean same =
          next < known && until >= dirtyUntil && sameAs(days[next], until) && known == lastDay + 2;
      if (same) {
        long moreLost = days[lastDay + 1].lost - days[next].lost;
        long moreLate = days[lastDay + 1].late - days[next].late;
        long moreFill = days[lastDay + 1].fill - days[next].fill;
        long byLost = lost - days[next].lost;
        long byLate = late - days[next].late;
        long byFill = fill - days[next].fill;
        for (int later = next; later <= lastDay + 1; later++) {
          days[later].lost += byLost;
          days[later].late += byLate;
          days[later].fill += byFill;
        }
        restore(days[lastDay + 1], steps);
        assert lost - moreLost >= 0 && late - moreLate >= 0 && fill - moreFill >= 0;
        break;
      }
      days[next] = snapshot(days[next], until);
      validDays = Math.max(validDays, next + 1);
    }
    dirtyFrom = Integer.MAX_VALUE;
    dirtyUntil = 0;
  }

  private void start() {
    for (int c = 0; c < craftCount; c++) {
      for (int k = 0; k < classCount; k++) {
        Arrays.fill(bins[c][k], 0);
        System.arraycopy(startBins[c][k], 0, bins[c][k], 0, older + 1);
        total[c][k] = startTotal[c][k];
        head[c][k] = 0;
        while (head[c][k] < older && bins[c][k][head[c][k]] == 0) {
          head[c][k]++;
        }
      }
    }
    lost = 0;
    late = 0;
    fill = 0;
  }

  private Day snapshot(Day reuse, int step) {
    Day day = reuse == null ? new Day() : reuse;
    if (reuse == null) {
      day.total = new long[craftCount][classCount];
      day.head = new int[craftCount][classCount];
      day.bins = new long[craftCount][classCount][];
    }
    for (int c = 0; c < craftCount; c++) {
      for (int k = 0; k < classCount; k++) {
        day.total[c][k] = total[c][k];
        day.head[c][k] = Math.min(head[c][k], step + older + 1);
        day.bins[c][k] =
            Arrays.copyOfRange(
                bins[c][k], day.head[c][k], Math.min(bins[c][k].length, step + older + 1));
      }
    }
    day.lost = lost;
    day.late = late;
    day.fill = fill;
    return day;
  }

  private void restore(Day day, int step) {
    for (int c = 0; c < craftCount; c++) {
      for (int k = 0; k < classCount; k++) {
        total[c][k] = day.total[c][k];
        head[c][k] = day.head[c][k];
        System.arraycopy(day.bins[c][k], 0, bins[c][k], day.head[c][k], day.bins[c][k].length);
        Arrays.fill(
            bins[c][k], Math.min(bins[c][k].length, step + older + 1), bins[c][k].length, 0);
      }
    }
    lost = day.lost;
    late = day.late;
    fill = day.fill;
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
      }
    }
    int linked = crossInPauses ? seconds : seconds - paused;
    int sink = -1;
    int linkSeconds = 0;
    for (int c = 0; c < craftCount && sink < 0; c++) {
      if (contactSeconds[c][step] > 0) {
        sink = c;
        linkSeconds = Math.min(linked, contactSeconds[c][step]);
      }
    }
    if (sink < 0 && ahead > 0) {
      int last = Math.min(steps - 1, step + ahead / DT);
      for (int next = step + 1; next <= last && sink < 0; next++) {
        for (int c = 0; c < craftCount && sink < 0; c++) {
          if (contactSeconds[c][next] > 0) {
            sink = c;
            linkSeconds = linked;
          }
        }
      }
    }
    if (sink >= 0 && linkSeconds > 0) {
      long room = allowance(sink, step) - fillOf(sink);
      for (int c = 0; c < craftCount && room > 0; c++) {
        if (c == sink || contactSeconds[c][step] > 0 || crossLink[c] == 0) {
          continue;
        }
        long quota = Math.min(room, crossLink[c] * linkSeconds);
        room -= forward(c, sink, quota, bin);
      }
    }
    for (int c = 0; c < craftCount; c++) {
      if (sendable[c][step] > 0) {
        transmit(c, sendable[c][step], bin);
      }
      long held = fillOf(c);
      if (held > planned[c]) {
        fill += held - planned[c];
      }
      if (held > capacity[c]) {
        overflow(c, held - capacity[c], bin);
      }
    }
  }

  /** Planned fill of the sink less what it will make itself until its contact ends (or begins). */
  private long allowance(int sink, int step) {
    int next = step + 1;
    boolean inContact = contactSeconds[sink][step] > 0;
    long own = 0;
    while (next < steps && next - step < 4 * STEPS_A_DAY) {
      boolean contact = contactSeconds[sink][next] > 0;
      if (inContact != contact) {
        break;
      }
      for (int k = 0; k < classCount; k++) {
        own += rate[sink][k][next] * DT;
      }
      next++;
    }
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
      }
    }
  }
}
