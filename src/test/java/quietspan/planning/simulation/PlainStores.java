package quietspan.planning.simulation;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import quietspan.model.Contact;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.DataClass;
import quietspan.model.Decisions;
import quietspan.model.Finding;
import quietspan.model.Generation;
import quietspan.model.Interruption;
import quietspan.model.Repoint;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Waiver;
import quietspan.time.GroundInstant;
import quietspan.time.OnboardInstant;

/**
 * The stores in the plainest way: one second after the other, every bit by its generation second in
 * a sorted map. Slow; only here to be compared with.
 */
final class PlainStores {

  private static final long NANOS = 1_000_000_000;

  /** A contact on board. */
  private record Heard(Contact contact, String craft, long begin, long end, List<Long> rates) {
    boolean during(long second) {
      return begin <= second && second < end;
    }

    long rate(long second) {
      return rates.get((int) (second - begin));
    }
  }

  private final Scenario scenario;
  private final SightLines sky;
  private final List<Waiver> waivers;
  private final OnboardInstant origin;
  private final int seconds;
  private final List<Craft> craft;
  private final List<DataClass> classes;
  private final boolean[] paused;
  private final List<Heard> heard = new ArrayList<>();

  /** By craft, class and second. */
  private final long[][][] made;

  /** By craft: bits generated before each second. */
  private final long[][] madeBefore;

  /** By craft and class, now. */
  private long[][] heldNow;

  /** By craft and class: bits by generation second. */
  private final List<List<TreeMap<Long, Long>>> bits = new ArrayList<>();

  /** Held at the begin of each second and at the end, by craft, class and second. */
  final long[][][] held;

  final long[][] lost;
  final long[] received;
  final long[] forwarded;
  final long[] down;
  final long[] generated;
  final long[] deliveredByClass;
  final long[] lostByClass;
  final long[] lateByClass;
  final double[] longestByClass;
  final Map<String, Long> deliveredByContact = new LinkedHashMap<>();
  final Map<String, Long> capacityByContact = new LinkedHashMap<>();
  final List<Finding> findings = new ArrayList<>();

  /** By class: bits late in each second, by contact. */
  private final List<Map<String, TreeMap<Long, Long>>> late = new ArrayList<>();

  PlainStores(Scenario scenario, SightLines sky, Decisions decisions, List<Waiver> waivers) {
    this.scenario = scenario;
    this.sky = sky;
    this.waivers = waivers;
    this.origin = scenario.period().begin();
    this.seconds = Math.toIntExact(scenario.period().length().toSeconds());
    this.craft = scenario.craft();
    this.classes = scenario.rules().classes();
    this.paused = new boolean[seconds];
    int m = craft.size();
    this.made = new long[m][classes.size()][seconds];
    this.madeBefore = new long[m][seconds + 1];
    this.held = new long[m][classes.size()][seconds + 1];
    this.lost = new long[m][seconds];
    this.received = new long[m];
    this.forwarded = new long[m];
    this.down = new long[m];
    this.generated = new long[m];
    this.deliveredByClass = new long[classes.size()];
    this.lostByClass = new long[classes.size()];
    this.lateByClass = new long[classes.size()];
    this.longestByClass = new double[classes.size()];
    java.util.Arrays.fill(longestByClass, Double.NEGATIVE_INFINITY);
    classes.forEach(each -> late.add(new LinkedHashMap<>()));
    pause(decisions);
    make();
    hear(decisions);
    start();
    for (int s = 0; s < seconds; s++) {
      keep(s);
      second(s);
    }
    keep(seconds);
    judge();
  }

  private void pause(Decisions decisions) {
    for (Repoint repoint : decisions.repoints()) {
      mark(
          repoint.start(),
          repoint.start().plus(scenario.craft(repoint.craft()).antenna().repointLength()));
    }
    for (Interruption interruption : scenario.calendars().interruptions()) {
      mark(interruption.during().begin(), interruption.during().end());
    }
  }

  private void mark(OnboardInstant from, OnboardInstant to) {
    for (int s = 0; s < seconds; s++) {
      boolean after = origin.plusSeconds((long) s).compareTo(to) >= 0;
      boolean before = origin.plusSeconds(s + 1L).compareTo(from) <= 0;
      paused[s] |= !after && !before;
    }
  }

  private long share(long whole, double fraction) {
    return BigDecimal.valueOf(whole)
        .multiply(BigDecimal.valueOf(fraction))
        .setScale(0, RoundingMode.DOWN)
        .longValueExact();
  }

  private long firstSecond(String name, GroundInstant t) {
    return sky.onboard(name, t).ceilToSecond().epochSecond() - origin.epochSecond();
  }

  private void hear(Decisions decisions) {
    var rules = scenario.rules().contacts();
    double payload =
        BigDecimal.ONE.subtract(BigDecimal.valueOf(rules.overheadShare())).doubleValue();
    for (Contact contact : decisions.contacts()) {
      if (contact.status() == Contact.Status.CANCELLED) {
        continue;
      }
      String name = contact.craft();
      long begin = firstSecond(name, contact.during().begin());
      long end =
          sky.onboard(name, contact.during().end()).floorToSecond().epochSecond()
              - origin.epochSecond();
      List<Long> rates = new ArrayList<>();
      long capacity = 0;
      for (int i = 0; i < end - begin; i++) {
        long at = begin + i;
        int step = 0;
        while (step + 1 < contact.steps().size()
            && firstSecond(name, contact.steps().get(step + 1).from()) <= at) {
          step++;
        }
        long since = step == 0 ? begin : firstSecond(name, contact.steps().get(step).from());
        boolean silent =
            i < rules.lockUp().toSeconds() || (step > 0 && at - since < rules.relock().toSeconds());
        long net = share(contact.steps().get(step).rate().bitsPerSecond(), payload);
        rates.add(silent ? 0 : share(net, scenario.rules().margins().usableVolumeShare()));
        if (at >= 0 && at < seconds) {
          capacity += rates.get(i);
        }
      }
      heard.add(new Heard(contact, name, begin, end, rates));
      capacityByContact.put(contact.id(), capacity);
      deliveredByContact.put(contact.id(), 0L);
    }
  }

  private void start() {
    for (Craft one : craft) {
      List<TreeMap<Long, Long>> store = new ArrayList<>();
      for (DataClass each : classes) {
        TreeMap<Long, Long> ages = new TreeMap<>();
        for (CraftState.Fill fill : scenario.start().of(one.name()).fill()) {
          if (!fill.dataClass().equals(each.name())) {
            continue;
          }
          long volume = fill.volume().bits();
          long n = fill.oldest().map(t -> origin.epochSecond() - t.epochSecond()).orElse(0L);
          for (long j = 0; j < n; j++) {
            ages.merge(j - n, volume * (j + 1) / n - volume * j / n, Long::sum);
          }
          if (n == 0) {
            ages.merge(0L, volume, Long::sum);
          }
        }
        ages.values().removeIf(count -> count == 0);
        store.add(ages);
      }
      bits.add(store);
    }
  }

  private void keep(int s) {
    for (int c = 0; c < craft.size(); c++) {
      for (int k = 0; k < classes.size(); k++) {
        held[c][k][s] = (s == 0 ? fill(c, k) : heldNow[c][k]);
      }
    }
  }

  private long fill(int c, int k) {
    if (heldNow == null) {
      heldNow = new long[craft.size()][classes.size()];
      for (int x = 0; x < craft.size(); x++) {
        for (int y = 0; y < classes.size(); y++) {
          heldNow[x][y] = bits.get(x).get(y).values().stream().mapToLong(Long::longValue).sum();
        }
      }
    }
    return heldNow[c][k];
  }

  private long fill(int c) {
    long sum = 0;
    for (long part : heldNow[c]) {
      sum += part;
    }
    return sum;
  }

  private void make() {
    for (int c = 0; c < craft.size(); c++) {
      for (int s = 0; s < seconds; s++) {
        madeBefore[c][s + 1] = madeBefore[c][s];
        for (Generation generation : craft.get(c).generation()) {
          long rate = generation.profile().at(origin.plusSeconds((long) s)).bitsPerSecond();
          long bits = paused[s] ? share(rate, generation.shareInPauses()) : rate;
          made[c][classes.indexOf(scenario.rules().dataClass(generation.dataClass()))][s] += bits;
          madeBefore[c][s + 1] += bits;
        }
      }
    }
  }

  private void put(int c, int k, long generation, long count) {
    if (count > 0) {
      bits.get(c).get(k).merge(generation, count, Long::sum);
      heldNow[c][k] += count;
    }
  }

  /** Takes bits from the oldest or the newest end. */
  private Map<Long, Long> take(int c, int k, long count, boolean oldest) {
    TreeMap<Long, Long> store = bits.get(c).get(k);
    TreeMap<Long, Long> taken = new TreeMap<>();
    long left = count;
    while (left > 0) {
      var entry = oldest ? store.firstEntry() : store.lastEntry();
      long part = Math.min(left, entry.getValue());
      taken.put(entry.getKey(), part);
      if (part == entry.getValue()) {
        store.remove(entry.getKey());
      } else {
        store.put(entry.getKey(), entry.getValue() - part);
      }
      left -= part;
    }
    heldNow[c][k] -= count;
    return taken;
  }

  private void second(int s) {
    for (int c = 0; c < craft.size(); c++) {
      for (int k = 0; k < classes.size(); k++) {
        put(c, k, s, made[c][k][s]);
        generated[c] += made[c][k][s];
      }
    }
    if (!paused[s] || scenario.rules().data().crossLinksInPauses()) {
      crossLink(s);
    }
    transmit(s);
    for (int c = 0; c < craft.size(); c++) {
      long excess = Math.max(0, fill(c) - craft.get(c).store().bits());
      lost[c][s] = excess;
      for (int k = classes.size() - 1; k >= 0; k--) {
        long part = Math.min(excess, heldNow[c][k]);
        take(c, k, part, false);
        lostByClass[k] += part;
        excess -= part;
      }
    }
  }

  private void crossLink(int s) {
    List<Integer> sinks = new ArrayList<>();
    long until = -1;
    for (int c = 0; c < craft.size(); c++) {
      for (Heard one : heard) {
        if (one.craft().equals(craft.get(c).name()) && one.during(s)) {
          if (!sinks.contains(c)) {
            sinks.add(c);
          }
          if (sinks.get(0) == c) {
            until = Math.max(until, one.end());
          }
        }
      }
    }
    if (sinks.isEmpty()) {
      long ahead = scenario.rules().data().forwardAhead().toSeconds();
      for (int c = 0; c < craft.size(); c++) {
        for (Heard one : heard) {
          boolean coming = one.begin() > s && one.begin() < one.end() && one.begin() - s <= ahead;
          if (one.craft().equals(craft.get(c).name())
              && coming
              && (until < 0 || one.begin() < until)) {
            until = one.begin();
            sinks = List.of(c);
          }
        }
      }
    }
    if (sinks.isEmpty()) {
      return;
    }
    int sink = sinks.get(0);
    long own = madeBefore[sink][(int) Math.min(until, seconds)] - madeBefore[sink][s + 1];
    long planned =
        share(craft.get(sink).store().bits(), scenario.rules().margins().plannedFillShare());
    long allowance = Math.max(0, planned - own);
    for (int c = 0; c < craft.size(); c++) {
      if (sinks.contains(c)) {
        continue;
      }
      long budget = craft.get(c).crossLink().bitsPerSecond();
      for (int k = 0; k < classes.size(); k++) {
        long room = Math.max(0, allowance - fill(sink));
        long count = Math.min(heldNow[c][k], Math.min(budget, room));
        int dataClass = k;
        take(c, k, count, true).forEach((g, part) -> put(sink, dataClass, g, part));
        budget -= count;
        forwarded[c] += count;
        received[sink] += count;
      }
    }
  }

  private void transmit(int s) {
    for (int c = 0; c < craft.size(); c++) {
      Heard best = null;
      for (Heard one : heard) {
        if (one.craft().equals(craft.get(c).name())
            && one.during(s)
            && (best == null || one.rate(s) > best.rate(s))) {
          best = one;
        }
      }
      if (best == null) {
        continue;
      }
      long budget = best.rate(s);
      for (int k = 0; k < classes.size(); k++) {
        long count = Math.min(budget, heldNow[c][k]);
        budget -= count;
        down[c] += count;
        deliveredByClass[k] += count;
        deliveredByContact.merge(best.contact().id(), count, Long::sum);
        Instant delivered =
            sky.ground(best.craft(), origin.plusSeconds(s + 1L))
                .plus(scenario.station(best.contact().station()).deliveryDelay())
                .utc();
        long tooLate = tally(k, take(c, k, count, true), delivered);
        if (tooLate > 0) {
          late.get(k)
              .computeIfAbsent(best.contact().id(), id -> new TreeMap<>())
              .put((long) s, tooLate);
        }
      }
    }
  }

  private long limitNanos(int k, long generation) {
    long limit = classes.get(k).latencyLimit().toNanos();
    Instant at = origin.utc().plusSeconds(generation);
    for (Waiver waiver : waivers) {
      if (waiver.rule() == RuleId.LATENCY
          && waiver.dataClass().equals(classes.get(k).name())
          && !at.isBefore(waiver.begin())
          && at.isBefore(waiver.end())) {
        limit = Math.max(limit, waiver.relaxedLimit().toNanos());
      }
    }
    return limit;
  }

  private long tally(int k, Map<Long, Long> some, Instant delivered) {
    long tooLate = 0;
    for (var entry : some.entrySet()) {
      long nanos = Duration.between(origin.utc(), delivered).toNanos() - entry.getKey() * NANOS;
      longestByClass[k] = Math.max(longestByClass[k], nanos / 1e9);
      if (nanos > limitNanos(k, entry.getKey())) {
        tooLate += entry.getValue();
      }
    }
    lateByClass[k] += tooLate;
    return tooLate;
  }

  private void judge() {
    for (int c = 0; c < craft.size(); c++) {
      String name = craft.get(c).name();
      long planned =
          share(craft.get(c).store().bits(), scenario.rules().margins().plannedFillShare());
      long[] over = new long[seconds];
      for (int s = 0; s < seconds; s++) {
        for (int k = 0; k < classes.size(); k++) {
          over[s] += held[c][k][s + 1];
        }
        over[s] = Math.max(0, over[s] - planned);
      }
      runs(RuleId.FILL, name, over);
      runs(RuleId.OVERFLOW, name, lost[c]);
    }
    for (int k = 0; k < classes.size(); k++) {
      for (var byContact : late.get(k).entrySet()) {
        Heard one =
            heard.stream()
                .filter(each -> each.contact().id().equals(byContact.getKey()))
                .findFirst()
                .orElseThrow();
        long[] each = new long[seconds];
        byContact.getValue().forEach((s, count) -> each[s.intValue()] = count);
        for (long[] run : runs(each)) {
          Instant at = sky.ground(one.craft(), origin.plusSeconds(run[0] + 1)).utc();
          add(
              RuleId.LATENCY,
              at,
              one.craft(),
              one.contact().station(),
              classes.get(k).name(),
              run[1]);
        }
      }
      long aboard = 0;
      for (int c = 0; c < craft.size(); c++) {
        aboard += tally(k, bits.get(c).get(k), scenario.period().end().utc());
      }
      if (aboard > 0) {
        Instant at = sky.ground(craft.get(0).name(), scenario.period().end()).utc();
        add(RuleId.LATENCY, at, "", "", classes.get(k).name(), aboard);
      }
    }
    for (int c = 0; c < craft.size(); c++) {
      long startFill = 0;
      for (long[] byClass : held[c]) {
        startFill += byClass[0];
      }
      long capacity = craft.get(c).store().bits();
      var asked = scenario.rules().data().endFillShare();
      long limit =
          asked.isPresent()
              ? share(capacity, asked.get())
              : Math.max(startFill, share(capacity, 0.25));
      if (fill(c) > limit) {
        add(
            RuleId.END_FILL,
            scenario.period().end().utc(),
            craft.get(c).name(),
            "",
            "",
            fill(c) - limit);
      }
    }
    findings.sort(
        Comparator.comparing(Finding::at)
            .thenComparing(Finding::rule)
            .thenComparing(Finding::craft)
            .thenComparing(Finding::station)
            .thenComparing(Finding::subject));
  }

  private void runs(RuleId rule, String name, long[] amounts) {
    for (long[] run : runs(amounts)) {
      add(rule, origin.plusSeconds(run[0]).utc(), name, "", "", run[1]);
    }
  }

  /** First second and sum of each run of numbers above zero. */
  private static List<long[]> runs(long[] amounts) {
    List<long[]> runs = new ArrayList<>();
    for (int s = 0; s < amounts.length; s++) {
      if (amounts[s] > 0) {
        if (s == 0 || amounts[s - 1] == 0) {
          runs.add(new long[] {s, 0});
        }
        runs.get(runs.size() - 1)[1] += amounts[s];
      }
    }
    return runs;
  }

  private void add(
      RuleId rule, Instant at, String name, String station, String subject, long amount) {
    findings.add(new Finding(rule, at, name, station, subject, (double) amount, ""));
  }
}
