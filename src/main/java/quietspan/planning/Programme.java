package quietspan.planning;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * The dynamic programme over the whole period that places pauses and lets each craft's beam open
 * and close. Time runs in cells; a label says, for every craft, whether its aim is still free,
 * opened at some cell, or spent, how many bits the formation holds, how old the present quiet span
 * is, and how much science is lost so far. An aim is not chosen when the antenna moves but when the
 * beam is first used, so the order of the craft, gaps in coverage, aims kept over a pause and a
 * craft that serves twice between two pauses all come out of the same recursion.
 *
 * <p>What a cell may do is asked from a {@link Cells}: with optimistic cells the least loss is a
 * bound on every legal plan; with planning cells the best label is a skeleton to build a plan on.
 */
final class Programme {

  /** What is minimised. */
  enum Aim {
    /** Seconds of science lost. */
    LOSS,
    /** Pauses that hold a repoint. */
    PAUSES
  }

  /**
   * A repoint pause of a skeleton: seconds since the begin of the period, bit mask of moved craft.
   */
  record PauseStep(int cell, int start, int movedMask) {}

  /**
   * A beam opened at a cell; {@code closed} is the last cell it was able to serve in this solution.
   */
  record Opening(int craft, int cell) {}

  /**
   * The best way found.
   *
   * @param loss least loss in the unit of the aim
   * @param pauses in time order
   * @param openings in time order
   */
  record Solution(long loss, List<PauseStep> pauses, List<Opening> openings) {}

  private static final int COMPARISONS_PER_LABEL = 256;

  private static final int SPENT = -1;
  private static final int FREE = -2;
  private static final int START = -1_000_000;

  private final Cells cells;
  private final Aim aim;
  private final boolean keepParents;
  private final int craftCount;
  private final int prefixes;

  /** Labels with a loss at or above this are dropped. */
  private final long cutoff;

  /** Labels after which the search is given up. */
  private final long work;

  /** Labels kept at one instant for each number of pauses paid for; all of them for a bound. */
  private final int width;

  private long labelsKept;
  private long comparisons;
  private boolean gaveUp;
  private boolean cut;

  /** Least loss still to come, asked for every label. */
  private final ToGo toGo;

  Programme(Cells cells, Aim aim, boolean keepParents, ToGo toGo, long cutoff, long work) {
    this(cells, aim, keepParents, toGo, cutoff, work, Integer.MAX_VALUE);
  }

  Programme(
      Cells cells, Aim aim, boolean keepParents, ToGo toGo, long cutoff, long work, int width) {
    this.toGo = toGo;
    this.work = work;
    this.width = width;
    this.cells = cells;
    this.aim = aim;
    this.keepParents = keepParents;
    this.craftCount = cells.craftCount();
    this.prefixes = cells.prefixCount();
    this.cutoff = cutoff;
  }

  /** A state at the begin of a cell. */
  private static final class Label {
    long loss;
    int[] code;
    long[] backlog;
    int gapSince;
    int spanFrom;
    int spanFromLatest;
    int pauseUntil;

    /**
     * Repoint time in the present span that is paid for apart from it: handed back where all of the
     * span turns out to be lost.
     */
    long refund;

    /** Until when a repoint may belong to the present pause. */
    int joinUntil;

    /** When the present pause began at the latest. */
    int chainFrom;

    /** What its repoints have cost so far. */
    long chainPaid;

    /** Who moved in it. */
    int chain;

    Label parent;
    int cell;
    int pauseStart = -1;
    int movedMask;
    int openedMask;
    long total;

    /**
     * Grows with every craft that is better off; sorts labels so that none is beaten by a later
     * one.
     */
    long standing;
  }

  Optional<Solution> solve() {
    List<Label> labels = new ArrayList<>();
    labels.add(first());
    for (int cell = 0; cell < cells.count(); cell++) {
      List<Label> next = new ArrayList<>(labels.size() * 4);
      for (Label label : labels) {
        expand(label, cell, next);
      }
      labels = filter(next, cell + 1);
      if (labels.isEmpty()) {
        return Optional.empty();
      }
      labelsKept += labels.size();
      if (labelsKept() > work) {
        gaveUp = true;
        return Optional.empty();
      }
    }
    Label best = null;
    long bestLoss = Long.MAX_VALUE;
    for (Label label : labels) {
      if (!mayEnd(label)) {
        continue;
      }
      long loss = label.loss + (aim == Aim.LOSS ? lastSpanCost(label) : 0);
      if (loss < bestLoss) {
        bestLoss = loss;
        best = label;
      }
    }
    if (best == null || bestLoss >= cutoff) {
      cut |= best != null;
      return Optional.empty();
    }
    return Optional.of(solution(best, bestLoss));
  }

  /**
   * First cell that cannot be lived through without a pause in it or before, when all aims are free
   * and all stores are empty at the begin of a cell, and a pause that ends there still saves data;
   * the number of cells when there is none.
   */
  int reach(int from, int savingCells) {
    Label label = first();
    Arrays.fill(label.code, FREE);
    Arrays.fill(label.backlog, 0);
    label.gapSince = cells.begin(from);
    label.spanFrom = cells.longAgo();
    label.spanFromLatest = cells.longAgo();
    List<Label> labels = List.of(label);
    for (int cell = from; cell < cells.count(); cell++) {
      List<Label> next = new ArrayList<>(labels.size() * 4);
      int saving = cell < from + savingCells ? cells.end(cell) : 0;
      for (Label each : labels) {
        each.pauseUntil = saving;
        int[] masks = freeAndOpen(each, cell);
        for (int opened = masks[0]; ; opened = (opened - 1) & masks[0]) {
          step(each, cell, masks[1], opened, 0, 0, next);
          if (opened == 0) {
            break;
          }
        }
      }
      next.forEach(each -> each.pauseUntil = 0);
      labels = filter(next, cell + 1);
      if (labels.isEmpty()) {
        return cell;
      }
    }
    return cells.count();
  }

  private Solution solution(Label best, long loss) {
    List<PauseStep> pauses = new ArrayList<>();
    List<Opening> openings = new ArrayList<>();
    for (Label label = best; label != null; label = label.parent) {
      if (label.movedMask != 0) {
        pauses.add(0, new PauseStep(label.cell, label.pauseStart, label.movedMask));
      }
      for (int c = 0; c < craftCount; c++) {
        if ((label.openedMask >> c & 1) != 0) {
          openings.add(0, new Opening(c, label.cell));
        }
      }
    }
    return new Solution(loss, pauses, openings);
  }

  /** Labels kept, and what it took to compare them. */
  long labelsKept() {
    return labelsKept + comparisons / COMPARISONS_PER_LABEL;
  }

  /** Whether the last answer is empty because the work allowed was used up. */
  boolean gaveUp() {
    return gaveUp;
  }

  /** Whether some label was dropped for its loss alone: without any, no higher cutoff helps. */
  boolean cut() {
    return cut;
  }

  private Label first() {
    Label label = new Label();
    label.code = new int[craftCount];
    Arrays.fill(label.code, START);
    label.backlog = cells.startBacklog();
    label.gapSince = cells.startGapSince();
    label.spanFrom = aim == Aim.LOSS ? cells.quietSince() : cells.longAgo();
    label.spanFromLatest = label.spanFrom;
    label.loss = aim == Aim.LOSS ? cells.warmUpInside(cells.quietSince()) : 0;
    label.cell = -1;
    return label;
  }

  /**
   * Bit masks of the craft whose free beam could open in a cell, and of those whose open beam
   * serves.
   */
  private int[] freeAndOpen(Label label, int cell) {
    int free = 0;
    int open = 0;
    for (int c = 0; c < craftCount; c++) {
      int code = label.code[c];
      if (code <= FREE && code != START) {
        int from = FREE - code;
        if (from <= cell && cells.usable(c, cell)) {
          free |= 1 << c;
        }
      } else if (code != SPENT && serves(c, code, cell)) {
        open |= 1 << c;
      }
    }
    return new int[] {free, open};
  }

  private void expand(Label label, int cell, List<Label> out) {
    int[] masks = freeAndOpen(label, cell);
    int free = masks[0];
    int open = masks[1];
    int must = cells.mustServe(cell);
    // Every set of free beams may open here, the empty set included.
    for (int opened = free; ; opened = (opened - 1) & free) {
      if (((open | opened) & must) == must) {
        step(label, cell, open, opened, 0, 0, out);
      }
      pauses(label, cell, open, opened, out);
      if (opened == 0) {
        break;
      }
    }
  }

  private void pauses(Label label, int cell, int open, int opened, List<Label> out) {
    int all = (1 << craftCount) - 1;
    for (int moved = 1; moved <= all; moved++) {
      if (!worthMoving(label, moved, opened)
          || ((open | opened | renewed(moved, cell)) & cells.mustServe(cell))
              != cells.mustServe(cell)) {
        continue;
      }
      step(label, cell, open, opened, moved, cells.pauseLevel(moved), out);
    }
  }

  /** Craft that move in a pause from a cell and may serve in the rest of it. */
  private int renewed(int moved, int cell) {
    int renewed = 0;
    for (int c = 0; c < craftCount; c++) {
      if ((moved >> c & 1) != 0 && cells.usable(c, cell) && cells.availableInSameCell(c, cell)) {
        renewed |= 1 << c;
      }
    }
    return renewed;
  }

  /**
   * A craft whose aim is free already gains nothing by moving but the data that a pause saves: one
   * such craft is enough, and only where it makes the pause longer than the others do.
   */
  private boolean worthMoving(Label label, int moved, int opened) {
    int idle = 0;
    int longest = 0;
    for (int c = 0; c < craftCount; c++) {
      if ((moved >> c & 1) == 0) {
        continue;
      }
      if (label.code[c] <= FREE && label.code[c] != START && (opened >> c & 1) == 0) {
        idle |= 1 << c;
      } else {
        longest = Math.max(longest, cells.repointLength(c));
      }
    }
    return idle == 0
        || (!keepParents
            && cells.pausesSave()
            && Integer.bitCount(idle) == 1
            && cells.repointLength(Integer.numberOfTrailingZeros(idle)) > longest
            && !hasTwin(label, Integer.numberOfTrailingZeros(idle)));
  }

  /** Whether an earlier craft would do as well for a pause that moves nobody who needs it. */
  private boolean hasTwin(Label label, int craft) {
    boolean twin = false;
    for (int c = 0; c < craft && (label.chain == 0 || !cells.movesOncePerPause()); c++) {
      twin |=
          cells.repointLength(c) == cells.repointLength(craft)
              && label.code[c] <= FREE
              && label.code[c] != START;
    }
    return twin;
  }

  private boolean serves(int craft, int code, int cell) {
    return code == START ? cells.startServes(craft, cell) : cells.serves(craft, code, cell);
  }

  private void step(
      Label label, int cell, int open, int opened, int moved, int level, List<Label> out) {
    long loss = label.loss;
    int spanFrom = label.spanFrom;
    int spanFromLatest = label.spanFromLatest;
    int pauseUntil = label.pauseUntil;
    int joinUntil = label.joinUntil;
    int chainFrom = label.chainFrom;
    long chainPaid = label.chainPaid;
    int chain = label.chain;
    long refund = label.refund;
    int pauseStart = -1;
    int lastStopEnd = cells.longAgo();
    boolean lostAnyway = false;
    // Interruptions that begin inside this cell end the span.
    for (Cells.Stop stop : aim == Aim.LOSS ? cells.stopsFrom(cell) : List.<Cells.Stop>of()) {
      lostAnyway |= mayBeLost(stop.begin(), spanFrom, spanFromLatest, refund);
      loss +=
          stop.length()
              + spanCost(stop.begin(), spanFrom, stop.begin(), spanFromLatest, refund)
              + cells.warmUp();
      spanFrom = stop.end();
      spanFromLatest = stop.end();
      lastStopEnd = stop.end();
      // A repoint may stick out of the interruption.
      refund = chain != 0 && joinUntil > stop.end() ? refund : 0;
    }
    if (moved != 0) {
      Cells.PauseOption option = cells.pause(cell, level);
      if (option == null) {
        return;
      }
      int length = cells.levelLength(level);
      int latest = option.latestEnd();
      int until = option.earliestStart() + length;
      pauseStart = option.bestStart();
      boolean twice = cells.movesOncePerPause() && (chain & moved) != 0;
      boolean joins = chain != 0 && !twice && option.earliestStart() <= joinUntil;
      if (!joins) {
        chainFrom = option.latestStart();
        chainPaid = 0;
      }
      // A pause that grows costs what is not paid for yet; one of its own never less than this.
      long growth =
          Math.min(
              (long) length + cells.warmUp(),
              Math.max(0, cells.quietSeconds(chainFrom, until) - chainPaid));
      if (aim == Aim.PAUSES) {
        // A repoint that may touch the pause before, or the interruption that pause belongs to, is
        // no pause of its own.
        loss += joins ? 0 : 1;
        latest = Math.max(latest, option.joinsUntil());
      } else if (lostAnyway) {
        // It may lie in a span before an interruption of this cell that counts nothing, or less
        // than
        // its warm-up: that has been paid in full.
        chainFrom = Math.max(chainFrom, lastStopEnd);
      } else if (option.merges()) {
        long extra = joins ? Math.min(option.extra(), growth) : option.extra();
        loss += extra;
        refund += extra;
        chainPaid += extra;
      } else if (joins) {
        // The pause grows; what was paid for it so far counts.
        loss += growth;
        chainPaid += growth;
        spanFrom = Math.max(spanFrom, until);
        spanFromLatest = Math.max(spanFromLatest, latest);
      } else {
        loss +=
            spanCost(option.latestStart(), spanFrom, option.earliestStart(), spanFromLatest, refund)
                + length
                + cells.warmUp();
        // It may stand before an interruption of this cell or after it.
        spanFrom = lastStopEnd == cells.longAgo() ? until : Math.min(until, lastStopEnd);
        spanFromLatest = Math.max(latest, lastStopEnd);
        refund = 0;
        chainPaid = length;
      }
      joinUntil = joins ? Math.max(joinUntil, latest) : latest;
      chain = joins ? chain | moved : moved;
      pauseUntil = Math.max(pauseUntil, option.latestEnd());
    }
    boolean chained = chain != 0 && joinUntil >= cells.end(cell);
    boolean young = refund > 0 || spanFromLatest > cells.end(cell) - cells.warmUp();
    long still = toGo.from(cells.end(cell), chained, young, refund);
    if (loss + still >= cutoff) {
      cut |= still < ToGo.NEVER;
      return;
    }
    boolean reduced = moved != 0 || pauseUntil > cells.begin(cell);
    int renewed = renewed(moved, cell);
    int serving = open | opened | renewed;
    long capacity = 0;
    if (serving != 0) {
      long sum = 0;
      for (int c = 0; c < craftCount; c++) {
        if ((serving >> c & 1) != 0) {
          int code = ((opened | renewed) >> c & 1) != 0 ? cell : label.code[c];
          sum += code == START ? cells.startCapacity(c, cell) : cells.capacity(c, code, cell);
        }
      }
      capacity = Math.min(sum, cells.setCapacity(serving, cell));
      if (moved != 0) {
        capacity = cells.capacityBeforePause(capacity, cell, pauseStart);
      }
    }
    long[] backlog = new long[prefixes];
    for (int p = 0; p < prefixes; p++) {
      long b = label.backlog[p] + cells.generated(p, cell, reduced) - capacity;
      b = Math.max(0, b);
      if (b > cells.limit(p, cell)) {
        return;
      }
      backlog[p] = b;
    }
    int gapSince = label.gapSince;
    if (capacity > 0) {
      gapSince = cells.end(cell);
    } else if (cells.end(cell) - gapSince > cells.gapLimit(cell)) {
      return;
    }
    Label next = new Label();
    next.code = new int[craftCount];
    int after = cell + 1;
    for (int c = 0; c < craftCount; c++) {
      int code = (opened >> c & 1) != 0 ? cell : label.code[c];
      if ((moved >> c & 1) != 0) {
        code = FREE - cells.availableAfterMove(c, cell, pauseStart);
      }
      if (code <= FREE && code != START) {
        int from = FREE - code;
        code = from <= after ? FREE : code;
      } else if (code == START) {
        code = cells.startLast(c) >= after ? START : SPENT;
      } else if (code >= 0) {
        code = cells.exit(c, code) >= after ? code : SPENT;
      }
      next.code[c] = code;
    }
    next.loss = loss;
    next.backlog = backlog;
    next.gapSince = gapSince;
    long old = cells.end(cell) - cells.matureAge() - refund;
    boolean mature = spanFrom < old && spanFromLatest < old;
    next.spanFrom = mature ? cells.longAgo() : spanFrom;
    next.spanFromLatest = mature ? cells.longAgo() : spanFromLatest;
    next.pauseUntil = pauseUntil > cells.end(cell) ? pauseUntil : 0;
    next.refund = mature ? 0 : refund;
    next.joinUntil = chained ? joinUntil : 0;
    next.chain = chained ? chain : 0;
    next.chainFrom = chained ? chainFrom : 0;
    next.chainPaid = chained ? chainPaid : 0;
    next.cell = cell;
    if (keepParents) {
      // Cells without an event are skipped on the way back.
      next.parent =
          label.movedMask != 0 || label.openedMask != 0 || label.parent == null
              ? label
              : label.parent;
      next.pauseStart = pauseStart;
      next.movedMask = moved;
      next.openedMask = opened;
    }
    long total = 0;
    for (long b : backlog) {
      total += b;
    }
    next.total = total;
    for (int code : next.code) {
      next.standing += code == FREE ? cells.count() : code == START ? 0 : Math.max(-1, code);
    }
    out.add(next);
  }

  /**
   * What ending a span costs beyond the warm-up already charged at its begin: everything when even
   * its longest reading is too short to count, nothing otherwise; less what repoints inside it have
   * cost already.
   */
  private long spanCost(
      int latestEnd, int earliestBegin, int earliestEnd, int latestBegin, long refund) {
    if (earliestBegin == cells.longAgo()) {
      return 0;
    }
    long longest = (long) latestEnd - earliestBegin;
    long charged = cells.warmUpInside(earliestBegin);
    long inside = Math.max(0, inside(earliestBegin, earliestEnd, latestBegin) - refund);
    return longest < cells.minimumSpan() ? inside - charged : Math.min(0, inside - charged);
  }

  /** The part of the shortest reading of a span that lies inside the period. */
  private static long inside(int earliestBegin, int earliestEnd, int latestBegin) {
    long shortest = Math.max(0, (long) earliestEnd - latestBegin);
    return earliestBegin < 0 ? Math.min(shortest, Math.max(0, earliestEnd)) : shortest;
  }

  /** Whether a span may be so short that a repoint in it costs nothing more. */
  private boolean mayBeLost(int end, int earliestBegin, int latestBegin, long refund) {
    if (earliestBegin == cells.longAgo()) {
      return false;
    }
    return end - latestBegin < cells.minimumSpan()
        || inside(earliestBegin, end, latestBegin) - refund
            < cells.warmUpInside(earliestBegin) + cells.longestRepoint();
  }

  private long lastSpanCost(Label label) {
    if (label.spanFrom == cells.longAgo()) {
      return 0;
    }
    long inside = Math.max(0, cells.length() - Math.max(0, label.spanFromLatest) - label.refund);
    return Math.min(0, inside - cells.warmUpInside(label.spanFrom));
  }

  private boolean mayEnd(Label label) {
    for (int p = 0; p < prefixes; p++) {
      if (label.backlog[p] > cells.endLimit(p)) {
        return false;
      }
    }
    for (int c = 0; c < craftCount; c++) {
      if (!cells.coversAfterEnd(c, label.code[c], label.code[c] == START, label.code[c] <= FREE)) {
        return false;
      }
    }
    return cells.length() - label.gapSince <= cells.gapLimit(cells.count() - 1);
  }

  /** Keeps the labels that no other label beats. */
  private List<Label> filter(List<Label> labels, int cell) {
    labels.sort(
        Comparator.comparingLong((Label label) -> label.loss)
            .thenComparingLong(label -> label.total)
            .thenComparingLong(label -> -label.standing));
    int patterns = 1;
    for (int c = 0; c < craftCount; c++) {
      patterns *= 3;
    }
    List<List<Label>> kept = new ArrayList<>(patterns);
    for (int i = 0; i < patterns; i++) {
      kept.add(null);
    }
    List<Label> result = new ArrayList<>();
    int[] perPauses = new int[64];
    long onePause = aim == Aim.LOSS ? (long) cells.longestRepoint() + cells.warmUp() + 1 : 1;
    for (Label label : labels) {
      int paid = (int) Math.max(0, Math.min(63, (label.loss - labels.get(0).loss) / onePause));
      if (perPauses[paid] >= width) {
        continue;
      }
      int pattern = pattern(label);
      boolean beaten = false;
      for (int better : cells.patternsAtLeast(pattern)) {
        List<Label> rivals = kept.get(better);
        if (rivals != null && beatenByAny(label, rivals, cell)) {
          beaten = true;
          break;
        }
      }
      if (!beaten) {
        if (kept.get(pattern) == null) {
          kept.set(pattern, new ArrayList<>());
        }
        kept.get(pattern).add(label);
        result.add(label);
        perPauses[paid]++;
      }
    }
    return result;
  }

  private int pattern(Label label) {
    int pattern = 0;
    for (int c = craftCount - 1; c >= 0; c--) {
      int code = label.code[c];
      int rank = code == SPENT ? 0 : code == START || code >= 0 ? 1 : 2;
      pattern = pattern * 3 + rank;
    }
    return pattern;
  }

  private boolean beatenByAny(Label label, List<Label> rivals, int cell) {
    for (Label rival : rivals) {
      comparisons++;
      if (beats(rival, label, cell)) {
        return true;
      }
    }
    return false;
  }

  /**
   * Whether every way to go on from {@code worse} can be copied from {@code better} at no more
   * loss.
   */
  private boolean beats(Label better, Label worse, int cell) {
    if (better.loss > worse.loss || better.total > worse.total) {
      return false;
    }
    for (int c = 0; c < craftCount; c++) {
      if (!codeAtLeast(c, better.code[c], worse.code[c])) {
        return false;
      }
    }
    for (int p = 0; p < prefixes; p++) {
      if (better.backlog[p] > worse.backlog[p]) {
        return false;
      }
    }
    if (better.gapSince < worse.gapSince && cells.watchesGaps()) {
      return false;
    }
    // A pause that still runs saves data, which nothing else makes up for.
    if (better.pauseUntil < worse.pauseUntil) {
      return false;
    }
    if (better.chain != 0
        && worse.chain != 0
        && (better.chain != worse.chain || !growsAsCheaply(better, worse))) {
      return false;
    }
    return better.loss + spanPenalty(better, worse, cell) <= worse.loss;
  }

  private static boolean growsAsCheaply(Label better, Label worse) {
    return better.chainFrom <= worse.chainFrom
        ? better.chainFrom + better.chainPaid >= worse.chainFrom + worse.chainPaid
        : better.chainPaid >= worse.chainPaid;
  }

  /** By how much {@code worse} may still catch up because of where its span began. */
  private long spanPenalty(Label better, Label worse, int cell) {
    boolean growsAlone = worse.chain != 0 && better.chain == 0;
    boolean longer = worse.chain != 0 && better.joinUntil < worse.joinUntil;
    if (aim == Aim.PAUSES) {
      return growsAlone || longer ? 1 : 0;
    }
    boolean sameSpan =
        better.spanFrom == worse.spanFrom && better.spanFromLatest == worse.spanFromLatest;
    long penalty = 0;
    if (growsAlone || longer) {
      // The worse label may still lengthen its pause cheaply, where the better one ends its span.
      penalty += cells.longestRepoint() + cells.warmUp();
      penalty += better.spanFrom == cells.longAgo() ? 0 : cells.minimumSpan();
    }
    if (worse.refund > better.refund || (worse.refund > 0 && !sameSpan)) {
      penalty += worse.refund + (sameSpan ? 0 : cells.warmUp());
    }
    if (sameSpan) {
      return penalty;
    }
    int now = cells.begin(cell);
    if (better.spanFrom > worse.spanFrom || better.spanFromLatest > worse.spanFromLatest) {
      // The better label's span is younger and may turn out too short to count.
      penalty += cells.minimumSpan();
    }
    if (worse.spanFromLatest > now - cells.warmUp() && worse.spanFrom != cells.longAgo()) {
      // The worse label may still get its warm-up back.
      penalty += cells.longestRepoint() + cells.warmUp();
    }
    return penalty;
  }

  private boolean codeAtLeast(int craft, int better, int worse) {
    if (better == worse || worse == SPENT) {
      return true;
    }
    if (better == SPENT) {
      return false;
    }
    boolean betterFree = better <= FREE && better != START;
    boolean worseFree = worse <= FREE && worse != START;
    if (betterFree && worseFree) {
      return FREE - better <= FREE - worse;
    }
    if (!cells.monotone(craft)) {
      return false;
    }
    if (betterFree) {
      return better == FREE;
    }
    if (worseFree || better == START || worse == START) {
      return false;
    }
    return better >= worse;
  }
}
