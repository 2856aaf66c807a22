package quietspan.planning;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Set;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.DataClass;
import quietspan.model.Generation;
import quietspan.model.Guarded;
import quietspan.model.Profile;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.Waiver;
import quietspan.units.DataRate;

/**
 * The period cut into cells, with everything that {@link Programme} may ask about them. With every
 * {@link Relaxation} in force each answer is at least as favourable as any legal second-resolution
 * plan finds it, so that what the programme proves holds for all of them; with only the unavoidable
 * ones the answers are close to what contacts on real passes achieve.
 */
class Cells {

  /**
   * An interruption that begins in a cell (seconds since the begin of the period, clipped to it).
   *
   * @param closeToPrevious the warm-up after the one before may be shared or lost anyway
   */
  record Stop(int begin, int end, boolean closeToPrevious) {
    int length() {
      return end - begin;
    }
  }

  /**
   * What a repoint of some length that starts in a cell can do.
   *
   * @param earliestStart earliest legal start in the cell, of this repoint or a shorter one
   * @param latestStart latest legal start in the cell, of this repoint or a shorter one
   * @param latestEnd when it ends at the latest, likewise
   * @param bestStart where it loses least
   * @param extra least science time it takes besides interruptions
   * @param merges it can belong to the pause of an interruption
   * @param joinsUntil when it merges: until when a later repoint may belong to the same pause
   * @param crowded it could stand so near to an interruption that a warm-up is shared
   */
  record PauseOption(
      int earliestStart,
      int latestStart,
      int latestEnd,
      int bestStart,
      int extra,
      boolean merges,
      int joinsUntil,
      boolean crowded) {}

  /**
   * How a skeleton is kept away from what the sampled geometry promises; a bound uses {@link
   * #NONE}.
   */
  record Shade(double capacityShare, int latencySlack, double fillShare, double gapShare) {
    static final Shade NONE = new Shade(1, 0, 1, 1);
  }

  private static final int LEVELS = 12;
  private static final int LONG_AGO = Integer.MIN_VALUE / 4;

  /** Aims lie on a grid and samples are finite: optimistic angles are widened by this (rad). */
  private static final double ANGLE_GUARD = Math.toRadians(0.004);

  private final Tables tables;
  private final Set<Relaxation> relaxed;
  private final Shade shade;
  private final int cellLength;
  private final int count;
  private final int craftCount;
  private final int length;

  private final byte[][][] level;
  private final int[][] exit;
  private final boolean[] monotone;
  private final long[][][] capacity;
  private final long[][] setCapacity;
  private final boolean[][] usable;
  private final int[] mustServe;
  private final byte[][] startLevel;
  private final int[] startLast;

  private final int prefixCount;
  private final long[][] generated;
  private final long[][] generatedReduced;
  private final long[][] limit;
  private final long[] startBacklog;
  private final long endLimit;
  private final int[] gapLimit;
  private final int startGapSince;
  private final boolean watchesGaps;

  private final int[] levelLengths;
  private final int[] levelOfMask;
  private final boolean movesOnce;
  private final boolean pausesSave;
  private final int lastKnownCell;
  private final int longestStopCells;
  private final PauseOption[][] pauses;
  private final List<List<Stop>> stops;
  private final int[][] atLeast;
  private final int warmUp;
  private final int minimumSpan;
  private final int quietSince;

  Cells(
      Tables tables,
      Links links,
      List<Waiver> waivers,
      Set<Relaxation> relaxed,
      Shade shade,
      int cellLength) {
    this.tables = tables;
    this.relaxed = relaxed;
    this.shade = shade;
    this.cellLength = cellLength;
    this.length = tables.length;
    this.count = (length + cellLength - 1) / cellLength;
    this.craftCount = tables.craftCount;
    Scenario scenario = tables.scenario;

    Beams beams = new Beams(tables, relaxed, cellLength, count, LEVELS, ANGLE_GUARD);
    this.level = beams.level;
    this.exit = beams.exit;
    this.monotone = beams.monotone;
    if (!relaxed.contains(Relaxation.BEAM_CELLS) || !relaxed.contains(Relaxation.BEST_RATE)) {
      // A skeleton need not be the very best; comparing all openings keeps the search small.
      Arrays.fill(monotone, true);
    }
    this.lastKnownCell = beams.known() - 1;
    this.startLevel = beams.startLevel;
    this.startLast = beams.startLast;

    this.capacity = new long[craftCount][count][LEVELS + 1];
    this.setCapacity = new long[1 << craftCount][count];
    this.usable = new boolean[craftCount][count];
    fillCapacities(links, beams);
    this.mustServe = new int[count];
    for (Links.Window one : links.confirmed) {
      int from = Math.max(0, tables.onboardCeil(one.craft(), one.begin()));
      int to = Math.min(length, tables.onboardFloor(one.craft(), one.end()));
      for (int cell = from / cellLength; cell * cellLength < to; cell++) {
        mustServe[cell] |= 1 << one.craft();
      }
    }

    this.warmUp = (int) scenario.rules().science().warmUp().toSeconds();
    this.minimumSpan = (int) scenario.rules().science().minimumSpan().toSeconds();
    this.quietSince =
        scenario
            .start()
            .quietSince()
            .map(since -> (int) (since.epochSecond() - tables.epoch))
            .orElse(0);
    this.stops = stops();
    this.pausesSave =
        scenario.craft().stream()
            .flatMap(craft -> craft.generation().stream())
            .anyMatch(generation -> generation.shareInPauses() < 1);
    List<DataClass> classes = scenario.rules().classes();
    this.prefixCount = classes.size();
    this.generated = new long[prefixCount][count];
    this.generatedReduced = new long[prefixCount][count];
    this.limit = new long[prefixCount][count];
    this.startBacklog = new long[prefixCount];
    this.endLimit = fillData(classes, waivers);
    this.gapLimit = new int[count];
    this.watchesGaps = fillGaps(waivers);
    this.startGapSince = tables.lastContactEnd - (int) Math.floor(leastLight());

    this.levelLengths =
        scenario.craft().stream()
            .mapToInt(craft -> (int) craft.antenna().repointLength().toSeconds())
            .distinct()
            .sorted()
            .toArray();
    this.levelOfMask = new int[1 << craftCount];
    for (int mask = 1; mask < 1 << craftCount; mask++) {
      int longest = 0;
      for (int c = 0; c < craftCount; c++) {
        if ((mask >> c & 1) != 0) {
          longest = Math.max(longest, repointLength(c));
        }
      }
      levelOfMask[mask] = Arrays.binarySearch(levelLengths, longest);
    }
    int together = 0;
    for (int c = 0; c < craftCount; c++) {
      together += repointLength(c);
    }
    // A pause may run on through an interruption, of two only where they lie close together.
    int longestStop = 0;
    int allStops = 0;
    boolean close = false;
    int last = Integer.MIN_VALUE / 2;
    for (int[] stop : tables.stops) {
      longestStop = Math.max(longestStop, stop[1] - stop[0]);
      allStops += stop[1] - stop[0];
      close |= stop[0] - last <= together;
      last = stop[1];
    }
    together += close ? allStops : longestStop;
    this.longestStopCells = longestStop / cellLength + 1;
    int allRepoints = together;
    this.movesOnce =
        scenario.craft().stream()
            .allMatch(craft -> craft.antenna().repointSpacing().toSeconds() > allRepoints);
    this.pauses = new PauseOption[levelLengths.length][count];
    fillPauses(scenario.calendars().guarded());
    this.atLeast = patterns();
  }

  // ---------------------------------------------------------------- answers

  int craftCount() {
    return craftCount;
  }

  int count() {
    return count;
  }

  int length() {
    return length;
  }

  int begin(int cell) {
    return cell * cellLength;
  }

  int end(int cell) {
    return Math.min(length, (cell + 1) * cellLength);
  }

  int prefixCount() {
    return prefixCount;
  }

  /** Bit mask of the craft that confirmed contacts need in a cell. */
  int mustServe(int cell) {
    return mustServe[cell];
  }

  boolean usable(int craft, int cell) {
    return usable[craft][cell];
  }

  /** Whether one aim can serve in the cell it opened in and in this one. */
  boolean serves(int craft, int opened, int cell) {
    int ahead = cell - opened;
    return ahead < level[craft][opened].length && level[craft][opened][ahead] >= 0;
  }

  /** Last cell that an aim opened at a cell can serve. */
  int exit(int craft, int opened) {
    return exit[craft][opened];
  }

  boolean startServes(int craft, int cell) {
    return startLevel[craft][cell] >= 0;
  }

  int startLast(int craft) {
    return startLast[craft];
  }

  long startCapacity(int craft, int cell) {
    return startLevel[craft][cell] < 0 ? 0 : capacity[craft][cell][startLevel[craft][cell]];
  }

  /** Bits that one craft alone can send in a cell through an aim that opened earlier. */
  long capacity(int craft, int opened, int cell) {
    return capacity[craft][cell][level[craft][opened][cell - opened]];
  }

  /** Bits that a set of craft can send in a cell, each on its beam's axis. */
  long setCapacity(int mask, int cell) {
    return setCapacity[mask][cell];
  }

  long capacityBeforePause(long whole, int cell, int pauseStart) {
    if (relaxed.contains(Relaxation.PAUSE_ANYWHERE)) {
      return whole;
    }
    return whole * Math.max(0, pauseStart - begin(cell)) / Math.max(1, end(cell) - begin(cell));
  }

  boolean monotone(int craft) {
    return monotone[craft];
  }

  long generated(int prefix, int cell, boolean inPause) {
    return inPause && relaxed.contains(Relaxation.PAUSE_SAVES)
        ? generatedReduced[prefix][cell]
        : generated[prefix][cell];
  }

  long limit(int prefix, int cell) {
    return limit[prefix][cell];
  }

  long endLimit(int prefix) {
    return endLimit;
  }

  long[] startBacklog() {
    return startBacklog.clone();
  }

  int startGapSince() {
    return startGapSince;
  }

  int gapLimit(int cell) {
    return gapLimit[cell];
  }

  boolean watchesGaps() {
    return watchesGaps;
  }

  int quietSince() {
    return quietSince;
  }

  int warmUp() {
    return warmUp;
  }

  int minimumSpan() {
    return minimumSpan;
  }

  /** The part of the warm-up of a span that began then which lies inside the period. */
  long warmUpInside(int spanBegin) {
    return spanBegin >= 0 ? warmUp : Math.max(0, spanBegin + warmUp);
  }

  int longAgo() {
    return LONG_AGO;
  }

  /** Older spans than this are all alike, unless something in them may be handed back. */
  int matureAge() {
    return Math.max(minimumSpan, warmUp) + longestRepoint() + cellLength;
  }

  int longestRepoint() {
    return levelLengths[levelLengths.length - 1];
  }

  /** Whether the spacing of repoints keeps every craft from moving twice in one pause. */
  boolean movesOncePerPause() {
    return movesOnce;
  }

  /** Whether less is made in some pause than outside it. */
  boolean pausesSave() {
    return pausesSave;
  }

  int pauseLevel(int movedMask) {
    return levelOfMask[movedMask];
  }

  int levels() {
    return levelLengths.length;
  }

  int levelLength(int pauseLevel) {
    return levelLengths[pauseLevel];
  }

  /**
   * The ways to start a pause in a cell, or null where a protected interval or the end forbids it.
   */
  PauseOption pause(int cell, int pauseLevel) {
    return pauses[pauseLevel][cell];
  }

  List<Stop> stopsFrom(int cell) {
    return stops.get(cell);
  }

  /**
   * What interruptions that begin in a cell cost on their own at least, whatever is planned around
   * them.
   */
  long stopsLoss(int cell) {
    long loss = 0;
    for (Stop stop : stops.get(cell)) {
      loss += stop.length() + (stop.closeToPrevious() ? 0 : warmUpAfter(stop.end()));
    }
    return loss;
  }

  /** The part of the warm-up of a span that begins then which lies inside the period. */
  long warmUpAfter(int end) {
    return Math.max(0, Math.min(warmUp, length - end));
  }

  /** The same for all interruptions that begin in a cell or later; zero unless asked for. */
  long stopsFromOn(int cell, boolean asked) {
    long loss = 0;
    for (int i = cell; asked && i < count; i++) {
      loss += stopsLoss(i);
    }
    return loss;
  }

  /** Seconds between two instants that no interruption takes. */
  long quietSeconds(int from, int to) {
    long quiet = Math.max(0, to - from);
    for (int[] stop : tables.stops) {
      quiet -= Math.max(0, Math.min(stop[1], to) - Math.max(stop[0], from));
    }
    return quiet;
  }

  /** Seconds of interruptions that begin in [from, to), warm-ups included. */
  long stopsWithin(int from, int to) {
    long seconds = 0;
    for (int i = Math.max(0, from - longestStopCells); i < Math.min(count, to); i++) {
      seconds += stopsLoss(i);
    }
    return seconds;
  }

  /** First cell in which a craft that moves in a pause from a cell may serve again. */
  int availableAfterMove(int craft, int cell, int pauseStart) {
    int ready = repointLength(craft);
    return relaxed.contains(Relaxation.PAUSE_ANYWHERE)
        ? cell + ready / cellLength
        : (pauseStart + ready + cellLength - 1) / cellLength;
  }

  /** Whether the new aim of a craft may serve in the cell in which it moved. */
  boolean availableInSameCell(int craft, int cell) {
    return relaxed.contains(Relaxation.PAUSE_ANYWHERE)
        && availableAfterMove(craft, cell, begin(cell)) == cell;
  }

  boolean coversAfterEnd(int craft, int code, boolean start, boolean free) {
    if (tables.scenario.rules().data().endCoverage().isEmpty() || free) {
      return true;
    }
    int ahead =
        (int) tables.scenario.rules().data().endCoverage().orElseThrow().toSeconds() / cellLength;
    int needed = Math.min(lastKnownCell, count - 1 + ahead);
    return start ? startLast[craft] >= needed : code >= 0 && exit[craft][code] >= needed;
  }

  /** Patterns of free, open and spent craft that are at least as good, most free first. */
  int[] patternsAtLeast(int pattern) {
    return atLeast[pattern];
  }

  int repointLength(int craft) {
    return (int) tables.scenario.craft().get(craft).antenna().repointLength().toSeconds();
  }

  // ---------------------------------------------------------------- filling

  private void fillCapacities(Links links, Beams beams) {
    double[] off = new double[LEVELS + 1];
    boolean best = relaxed.contains(Relaxation.BEST_RATE);
    for (int cell = 0; cell < count; cell++) {
      int from = begin(cell) / Tables.STEP;
      int to = (end(cell) - 1) / Tables.STEP;
      for (int c = 0; c < craftCount; c++) {
        double reach = tables.usable[c];
        for (int l = 0; l <= LEVELS; l++) {
          off[l] = best ? reach * l / (LEVELS + 1) : Math.min(reach, reach * l / LEVELS);
          long bits = 0;
          if (beams.reachable(c, cell)) {
            for (int i = from; i <= to; i++) {
              bits += links.alone(c, i, off[l], best);
            }
          }
          capacity[c][cell][l] = (long) (bits * shade.capacityShare());
        }
        usable[c][cell] = capacity[c][cell][0] > 0;
      }
      for (int mask = 1; mask < 1 << craftCount; mask++) {
        long bits = 0;
        for (int i = from; i <= to; i++) {
          bits += links.together(mask, i, best);
        }
        setCapacity[mask][cell] = (long) (bits * shade.capacityShare());
      }
    }
  }

  private List<List<Stop>> stops() {
    List<List<Stop>> byCell = new ArrayList<>();
    for (int cell = 0; cell < count; cell++) {
      byCell.add(new ArrayList<>());
    }
    int furthest = Integer.MIN_VALUE / 2;
    int begin = -1;
    int end = -1;
    int longest = java.util.stream.IntStream.of(tables.repoint).max().orElse(0);
    int near = craftCount * longest + 2 * warmUp;
    for (int[] stop : tables.stops) {
      begin = stop[0];
      end = stop[1];
      boolean close = relaxed.contains(Relaxation.JOINED_PAUSES) && begin - furthest <= near;
      byCell.get(begin / cellLength).add(new Stop(begin, end, close));
      furthest = end;
    }
    return byCell;
  }

  private long fillData(List<DataClass> classes, List<Waiver> waivers) {
    Scenario scenario = tables.scenario;
    long[] planned = new long[craftCount];
    long allPlanned = 0;
    long allEnd = 0;
    for (int c = 0; c < craftCount; c++) {
      Craft craft = scenario.craft().get(c);
      planned[c] =
          new DataRate(craft.store().bits())
              .share(scenario.rules().margins().plannedFillShare())
              .bitsPerSecond();
      allPlanned += planned[c];
      allEnd += Limits.endFillBits(scenario, craft);
    }
    long[] totalLatency = new long[count];
    for (int p = 0; p < prefixCount; p++) {
      DataClass dataClass = classes.get(p);
      long[] full = cumulative(dataClass, false);
      long[] reduced = cumulative(dataClass, true);
      long startBits = 0;
      for (CraftState state : scenario.start().craft()) {
        for (CraftState.Fill fill : state.fill()) {
          if (fill.dataClass().equals(dataClass.name())) {
            startBits += fill.volume().bits();
          }
        }
      }
      startBacklog[p] = startBits + (p == 0 ? 0 : startBacklog[p - 1]);
      for (int cell = 0; cell < count; cell++) {
        long before = p == 0 ? 0 : generated[p - 1][cell];
        long beforeReduced = p == 0 ? 0 : generatedReduced[p - 1][cell];
        generated[p][cell] = before + full[end(cell)] - full[begin(cell)];
        generatedReduced[p][cell] = beforeReduced + reduced[end(cell)] - reduced[begin(cell)];
        totalLatency[cell] += youngEnough(dataClass, end(cell), startBits, full, waivers);
        long fill = (long) (allPlanned * shade.fillShare());
        limit[p][cell] = Math.min(fill, totalLatency[cell]);
        if (!relaxed.contains(Relaxation.WHOLE_CELLS)) {
          // What comes last in the cell may have to wait for the next one.
          limit[p][cell] -= generated[p][cell] / 2;
        }
      }
    }
    return allEnd;
  }

  /** Bits of a class generated before each second by all craft, interruptions counted as pauses. */
  private long[] cumulative(DataClass dataClass, boolean allPaused) {
    long[] total = new long[length + 1];
    boolean[] stopped = new boolean[length];
    if (!allPaused) {
      for (List<Stop> list : stops) {
        for (Stop stop : list) {
          Arrays.fill(stopped, stop.begin(), stop.end(), true);
        }
      }
    }
    for (Craft craft : tables.scenario.craft()) {
      for (Generation generation : craft.generation()) {
        if (!generation.dataClass().equals(dataClass.name())) {
          continue;
        }
        var steps = generation.profile().steps();
        for (int k = 0; k < steps.size(); k++) {
          int from = k == 0 ? 0 : Math.max(0, firstSecond(steps.get(k)));
          int to = k + 1 == steps.size() ? length : Math.min(length, firstSecond(steps.get(k + 1)));
          long rate = steps.get(k).rate().bitsPerSecond();
          long paused = steps.get(k).rate().share(generation.shareInPauses()).bitsPerSecond();
          for (int s = from; s < to; s++) {
            total[s + 1] += allPaused || stopped[s] ? paused : rate;
          }
        }
      }
    }
    for (int s = 0; s < length; s++) {
      total[s + 1] += total[s];
    }
    return total;
  }

  /** First second in which a step of a profile holds: they change on whole seconds. */
  private int firstSecond(Profile.Step step) {
    return tables.second(step.from().ceilToSecond().epochSecond());
  }

  private double leastLight() {
    return Arrays.stream(tables.lightTime).flatMapToDouble(Arrays::stream).min().orElse(0);
  }

  private double mostLight() {
    return Arrays.stream(tables.lightTime).flatMapToDouble(Arrays::stream).max().orElse(0);
  }

  /** The most bits of a class that may still be aboard at a second without being late. */
  private long youngEnough(
      DataClass dataClass, int at, long startBits, long[] full, List<Waiver> waivers) {
    long allowed = dataClass.latencyLimit().toSeconds();
    for (Waiver waiver : waivers) {
      if (waiver.rule() == RuleId.LATENCY && waiver.dataClass().equals(dataClass.name())) {
        long relaxed = waiver.relaxedLimit().toSeconds();
        long from = waiver.begin().getEpochSecond() - tables.epoch;
        long to = waiver.end().getEpochSecond() - tables.epoch;
        if (from <= at && to >= at - relaxed) {
          allowed = Math.max(allowed, relaxed);
        }
      }
    }
    allowed -= shade.latencySlack();
    // What leaves the craft at this second is on the ground a light time later.
    int sample = Math.min(tables.samples - 1, at / Tables.STEP);
    double quickest = Double.MAX_VALUE;
    for (int c = 0; c < craftCount; c++) {
      quickest = Math.min(quickest, tables.lightTime[c][sample]);
    }
    // At the end of the period, what is aboard is judged by its age alone.
    allowed -= at >= length ? -1 : (long) Math.floor(quickest) - 1;
    if (allowed < 0) {
      allowed = 0;
    }
    long oldest = at - allowed;
    if (oldest > 0) {
      return full[at] - full[(int) oldest];
    }
    return full[at] + youngStart(dataClass, startBits, oldest);
  }

  private long youngStart(DataClass dataClass, long startBits, long oldest) {
    long young = 0;
    for (CraftState state : tables.scenario.start().craft()) {
      for (CraftState.Fill fill : state.fill()) {
        if (!fill.dataClass().equals(dataClass.name())) {
          continue;
        }
        long since = fill.oldest().map(instant -> instant.epochSecond() - tables.epoch).orElse(0L);
        if (since >= oldest) {
          young += fill.volume().bits();
        } else {
          young += Math.round(fill.volume().bits() * ((double) oldest / since)) + 1;
        }
      }
    }
    return Math.min(young, startBits);
  }

  private boolean fillGaps(List<Waiver> waivers) {
    var gap = tables.scenario.rules().data().gapLimit();
    Arrays.fill(gapLimit, Integer.MAX_VALUE / 2);
    if (gap.isEmpty()) {
      return false;
    }
    int base = (int) (gap.orElseThrow().toSeconds() * shade.gapShare());
    if (steadyLatency() + 2L * cellLength <= base) {
      // Data made all the time must come down sooner than this anyway.
      return false;
    }
    for (int cell = 0; cell < count; cell++) {
      int allowed = base;
      for (Waiver waiver : waivers) {
        if (waiver.rule() == RuleId.GAP) {
          int relaxed = (int) waiver.relaxedLimit().toSeconds();
          int from = tables.second(waiver.begin().getEpochSecond());
          int to = tables.second(waiver.end().getEpochSecond());
          if (from <= end(cell) + relaxed && to >= begin(cell) - relaxed) {
            allowed = Math.max(allowed, relaxed);
          }
        }
      }
      // A gap is judged on the ground, where light time may stretch or shrink it.
      gapLimit[cell] = allowed + (int) Math.ceil(mostLight() - leastLight()) + 2;
    }
    return true;
  }

  /**
   * Shortest latency limit among classes that some craft makes at every instant, pauses included
   * (s).
   */
  private long steadyLatency() {
    long shortest = Integer.MAX_VALUE;
    for (Craft craft : tables.scenario.craft()) {
      for (Generation generation : craft.generation()) {
        boolean always =
            generation.profile().steps().stream()
                .allMatch(
                    step -> step.rate().share(generation.shareInPauses()).bitsPerSecond() > 0);
        if (always) {
          shortest =
              Math.min(
                  shortest,
                  tables
                      .scenario
                      .rules()
                      .dataClass(generation.dataClass())
                      .latencyLimit()
                      .toSeconds());
        }
      }
    }
    return shortest;
  }

  private void fillPauses(List<Guarded> guarded) {
    for (int l = 0; l < levelLengths.length; l++) {
      for (int cell = 0; cell < count; cell++) {
        pauses[l][cell] = withShorter(option(cell, levelLengths[l], guarded), l, cell);
      }
    }
  }

  /**
   * Craft with shorter repoints may begin earlier or later in the cell than the one that counts.
   */
  private PauseOption withShorter(PauseOption own, int l, int cell) {
    PauseOption shorter = l == 0 ? null : pauses[l - 1][cell];
    if (own == null || shorter == null || !relaxed.contains(Relaxation.PAUSE_ANYWHERE)) {
      return own;
    }
    return new PauseOption(
        Math.min(own.earliestStart(), shorter.earliestStart()),
        Math.max(own.latestStart(), shorter.latestStart()),
        Math.max(own.latestEnd(), shorter.latestEnd()),
        own.bestStart(),
        own.extra(),
        own.merges() || shorter.merges(),
        Math.max(own.joinsUntil(), shorter.joinsUntil()),
        own.crowded() || shorter.crowded());
  }

  private PauseOption option(int cell, int repoint, List<Guarded> guarded) {
    int first = begin(cell);
    int last = Math.min(end(cell) - 1, length - repoint);
    List<Integer> starts = new ArrayList<>(List.of(first, last));
    for (List<Stop> list : stops) {
      for (Stop stop : list) {
        starts.add(stop.begin());
        starts.add(stop.begin() - repoint);
        starts.add(stop.end());
        starts.add(stop.end() - repoint);
      }
    }
    for (Guarded interval : guarded) {
      starts.add(tables.second(interval.during().begin().epochSecond()) - repoint);
      starts.add(tables.second(interval.during().end().epochSecond()));
    }
    int earliest = Integer.MAX_VALUE;
    int latest = -1;
    int best = -1;
    long bestCost = Long.MAX_VALUE;
    int extra = Integer.MAX_VALUE;
    boolean merges = false;
    boolean crowded = false;
    int joins = 0;
    starts.sort(null);
    int reach =
        relaxed.contains(Relaxation.JOINED_PAUSES) ? (craftCount - 1) * longestRepoint() : 0;
    for (int start : starts) {
      if (start < first || start > last || isGuarded(start, start + repoint, guarded)) {
        continue;
      }
      if (!relaxed.contains(Relaxation.JOINED_PAUSES)
          && joinsGuarded(start, start + repoint, guarded)) {
        continue;
      }
      earliest = Math.min(earliest, start);
      latest = Math.max(latest, start);
      int more = repoint;
      boolean touches = false;
      for (List<Stop> list : stops) {
        for (Stop stop : list) {
          more -=
              Math.max(0, Math.min(stop.end(), start + repoint) - Math.max(stop.begin(), start));
          int far = reach + warmUp;
          crowded |= start - far <= stop.end() && start + repoint + far >= stop.begin();
          if (start - reach <= stop.end() && start + repoint + reach >= stop.begin()) {
            touches = true;
            joins = Math.max(joins, stop.end() + reach);
          }
        }
      }
      merges |= touches;
      extra = Math.min(extra, more);
      long cost = (long) more + (touches ? 0 : warmUp);
      if (cost < bestCost) {
        bestCost = cost;
        best = start;
      }
    }
    if (best < 0) {
      return null;
    }
    if (!relaxed.contains(Relaxation.JOINED_PAUSES)) {
      boolean touches = touchesStop(best, repoint);
      boolean anywhere = relaxed.contains(Relaxation.PAUSE_ANYWHERE);
      return new PauseOption(
          anywhere ? earliest : best,
          anywhere ? latest : best,
          (anywhere ? latest : best) + repoint,
          best,
          extraAt(best, repoint),
          touches,
          joins,
          touches);
    }
    return new PauseOption(earliest, latest, latest + repoint, best, extra, merges, joins, crowded);
  }

  /**
   * Whether the pause that a repoint makes together with interruptions overlaps a protected
   * interval.
   */
  private boolean joinsGuarded(int from, int to, List<Guarded> guarded) {
    int begin = from;
    int end = to;
    for (List<Stop> list : stops) {
      for (Stop stop : list) {
        if (from <= stop.end() && to >= stop.begin()) {
          begin = Math.min(begin, stop.begin());
          end = Math.max(end, stop.end());
        }
      }
    }
    return isGuarded(begin, end, guarded);
  }

  private int extraAt(int start, int repoint) {
    int more = repoint;
    for (List<Stop> list : stops) {
      for (Stop stop : list) {
        more -= Math.max(0, Math.min(stop.end(), start + repoint) - Math.max(stop.begin(), start));
      }
    }
    return more;
  }

  private boolean touchesStop(int start, int repoint) {
    return stops.stream()
        .flatMap(List::stream)
        .anyMatch(stop -> start <= stop.end() && start + repoint >= stop.begin());
  }

  private boolean isGuarded(int from, int to, List<Guarded> guarded) {
    for (Guarded interval : guarded) {
      if (from < tables.second(interval.during().end().epochSecond())
          && to > tables.second(interval.during().begin().epochSecond())) {
        return true;
      }
    }
    return false;
  }

  private int[][] patterns() {
    int all = 1;
    for (int c = 0; c < craftCount; c++) {
      all *= 3;
    }
    int[][] result = new int[all][];
    for (int pattern = 0; pattern < all; pattern++) {
      List<Integer> better = new ArrayList<>();
      for (int other = all - 1; other >= 0; other--) {
        int p = pattern;
        int o = other;
        boolean least = true;
        for (int c = 0; c < craftCount; c++) {
          least &= o % 3 >= p % 3;
          p /= 3;
          o /= 3;
        }
        if (least) {
          better.add(other);
        }
      }
      result[pattern] = better.stream().mapToInt(Integer::intValue).toArray();
    }
    return result;
  }
}
