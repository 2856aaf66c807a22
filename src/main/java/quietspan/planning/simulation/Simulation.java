package quietspan.planning.simulation;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import quietspan.link.Link;
import quietspan.model.ClassOutcome;
import quietspan.model.Contact;
import quietspan.model.ContactOutcome;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.DataClass;
import quietspan.model.Decisions;
import quietspan.model.Dish;
import quietspan.model.Finding;
import quietspan.model.Generation;
import quietspan.model.Outcome;
import quietspan.model.Pause;
import quietspan.model.Profile;
import quietspan.model.Repoint;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Station;
import quietspan.model.StorePoint;
import quietspan.model.StoreTrace;
import quietspan.model.Waiver;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.DataRate;
import quietspan.units.DataVolume;

/**
 * The outcome of a plan. Stores are integers and change on whole on-board seconds, within a second
 * in the order generate, cross-link, transmit, overflow; seconds without any transfer are taken in
 * one go.
 */
public final class Simulation {

  private final Scenario scenario;
  private final SightLines sky;
  private final List<Waiver> waivers;
  private final List<Contact> contacts;
  private final Spans spans;
  private final long epoch;
  private final int length;
  private final int craftCount;
  private final int classCount;
  private final List<DataClass> classes;
  private final List<Finding> findings = new ArrayList<>();

  private final List<Image> images = new ArrayList<>();
  private final boolean[] paused;
  private final long[] capacity;
  private final long[] planned;
  private final long[] crossLink;
  private final Parcels[][] store;

  private final long[] generated;
  private final long[] received;
  private final long[] forwarded;
  private final long[] downlinked;
  private final long[] lost;
  private final long[] highest;
  private final long[] lostByClass;
  private final long[] deliveredByClass;
  private final long[] lateByClass;
  private final double[] longest;

  private final List<List<StorePoint>> points = new ArrayList<>();
  private final long[][] slope;
  private final long[][] before;
  private final long[] overSince;
  private final long[] over;
  private final long[] lossSince;
  private final long[] loss;

  /** A contact on board. */
  private static final class Image {
    final Contact contact;
    final int craft;
    final int begin;
    final int end;
    final int[] dataFrom;
    final int[] stepFrom;
    final long[] rate;
    final long delivery;
    long capacity;
    long delivered;

    /** Late delivery in progress, by class: bits, and ground instant of the first (s). */
    final long[] late;

    final double[] lateAt;

    Image(
        Contact contact,
        int craft,
        int begin,
        int end,
        int[] stepFrom,
        int[] dataFrom,
        long[] rate,
        long delivery,
        int classes) {
      this.contact = contact;
      this.craft = craft;
      this.begin = begin;
      this.end = end;
      this.stepFrom = stepFrom;
      this.dataFrom = dataFrom;
      this.rate = rate;
      this.delivery = delivery;
      this.late = new long[classes];
      this.lateAt = new double[classes];
    }

    long rateAt(int second) {
      for (int i = stepFrom.length - 1; i >= 0; i--) {
        if (second >= stepFrom[i]) {
          return second >= dataFrom[i] ? rate[i] : 0;
        }
      }
      return 0;
    }
  }

  private Simulation(Scenario scenario, SightLines sky, Decisions decisions, List<Waiver> waivers) {
    this.scenario = scenario;
    this.sky = sky;
    this.waivers = waivers;
    this.contacts =
        decisions.contacts().stream()
            .filter(contact -> contact.status() != Contact.Status.CANCELLED)
            .toList();
    this.spans = Spans.of(scenario, decisions.repoints());
    this.epoch = scenario.period().begin().epochSecond();
    this.length = (int) scenario.period().length().toSeconds();
    this.craftCount = scenario.craft().size();
    this.classes = scenario.rules().classes();
    this.classCount = classes.size();
    this.paused = new boolean[length];
    this.capacity = new long[craftCount];
    this.planned = new long[craftCount];
    this.crossLink = new long[craftCount];
    this.store = new Parcels[craftCount][classCount];
    this.generated = new long[craftCount];
    this.received = new long[craftCount];
    this.forwarded = new long[craftCount];
    this.downlinked = new long[craftCount];
    this.lost = new long[craftCount];
    this.highest = new long[craftCount];
    this.lostByClass = new long[classCount];
    this.deliveredByClass = new long[classCount];
    this.lateByClass = new long[classCount];
    this.longest = new double[classCount];
    this.slope = new long[craftCount][classCount];
    this.before = new long[craftCount][classCount];
    this.overSince = new long[craftCount];
    this.over = new long[craftCount];
    this.lossSince = new long[craftCount];
    this.loss = new long[craftCount];
    Arrays.fill(longest, Double.NEGATIVE_INFINITY);
    Arrays.fill(overSince, -1);
    Arrays.fill(lossSince, -1);
  }

  /** Plays a plan; contacts that are cancelled do nothing. */
  public static Outcome simulate(
      Scenario scenario, SightLines sky, Decisions decisions, List<Waiver> waivers) {
    return new Simulation(scenario, sky, decisions, waivers).run(decisions.repoints());
  }

  private Outcome run(List<Repoint> repoints) {
    prepare();
    play();
    finish();
    gaps();
    endCoverage(repoints);
    findings.sort(
        Comparator.comparing(Finding::at)
            .thenComparing(Finding::rule)
            .thenComparing(Finding::craft)
            .thenComparing(Finding::subject));
    List<StoreTrace> traces = new ArrayList<>();
    for (int c = 0; c < craftCount; c++) {
      traces.add(
          new StoreTrace(
              scenario.craft().get(c).name(),
              points.get(c),
              startBits(c),
              generated[c],
              received[c],
              forwarded[c],
              downlinked[c],
              lost[c],
              fill(c),
              highest[c]));
    }
    List<ClassOutcome> outcomes = new ArrayList<>();
    for (int k = 0; k < classCount; k++) {
      outcomes.add(
          new ClassOutcome(
              classes.get(k).name(),
              deliveredByClass[k],
              lateByClass[k],
              lostByClass[k],
              longest[k] == Double.NEGATIVE_INFINITY
                  ? OptionalDouble.empty()
                  : OptionalDouble.of(longest[k])));
    }
    List<ContactOutcome> contactOutcomes = new ArrayList<>();
    for (Image image : images) {
      if (image.begin < image.end) {
        contactOutcomes.add(
            new ContactOutcome(
                image.contact.id(),
                Interval.of(instant(image.begin), instant(image.end)),
                new DataVolume(image.capacity),
                new DataVolume(image.delivered)));
      }
    }
    return new Outcome(
        spans.pauses(),
        spans.quiet(),
        spans.scienceSeconds(),
        contactOutcomes,
        traces,
        outcomes,
        hours(),
        cost(),
        findings);
  }

  private OnboardInstant instant(long second) {
    return OnboardInstant.ofEpochSecond(epoch + second);
  }

  private double hours() {
    long seconds = 0;
    for (Contact contact : contacts) {
      seconds += contact.during().length().toSeconds();
    }
    return seconds / 3600.0;
  }

  private double cost() {
    double cost = 0;
    for (Contact contact : contacts) {
      Dish dish = scenario.station(contact.station()).dish(contact.antenna()).orElseThrow();
      cost +=
          dish.costPerContact()
              + dish.costPerHour() * contact.during().length().toSeconds() / 3600.0;
    }
    return Math.round(cost * 1000) / 1000.0;
  }

  // ---------------------------------------------------------------- before

  private void prepare() {
    for (Pause pause : spans.pauses()) {
      int from = (int) (pause.during().begin().epochSecond() - epoch);
      int to = (int) (pause.during().end().ceilToSecond().epochSecond() - epoch);
      Arrays.fill(paused, Math.max(0, from), Math.min(length, to), true);
    }
    for (int c = 0; c < craftCount; c++) {
      Craft craft = scenario.craft().get(c);
      capacity[c] = craft.store().bits();
      planned[c] =
          new DataRate(capacity[c])
              .share(scenario.rules().margins().plannedFillShare())
              .bitsPerSecond();
      crossLink[c] = craft.crossLink().bitsPerSecond();
      for (int k = 0; k < classCount; k++) {
        store[c][k] = new Parcels();
        fillStart(c, k);
      }
      points.add(new ArrayList<>());
      highest[c] = fill(c);
      record(c, 0);
    }
    for (Contact contact : contacts) {
      images.add(image(contact));
    }
  }

  private void fillStart(int c, int k) {
    for (CraftState.Fill one : state(c).fill()) {
      if (!one.dataClass().equals(classes.get(k).name())) {
        continue;
      }
      long volume = one.volume().bits();
      long span = one.oldest().map(oldest -> epoch - oldest.epochSecond()).orElse(0L);
      if (span <= 0) {
        store[c][k].add(0, 1, volume);
        continue;
      }
      for (long j = 0; j < span; j++) {
        long upTo = share(volume, j + 1, span);
        store[c][k].add(j - span, j - span + 1, upTo - share(volume, j, span));
      }
    }
  }

  /** floor(volume * part / whole) without overflow. */
  private static long share(long volume, long part, long whole) {
    return volume / whole * part + volume % whole * part / whole;
  }

  private CraftState state(int c) {
    return scenario.start().of(scenario.craft().get(c).name());
  }

  private long startBits(int c) {
    return state(c).fill().stream().mapToLong(fill -> fill.volume().bits()).sum();
  }

  private int indexOf(String craft) {
    for (int c = 0; c < craftCount; c++) {
      if (scenario.craft().get(c).name().equals(craft)) {
        return c;
      }
    }
    throw new IllegalArgumentException("no craft " + craft);
  }

  private Image image(Contact contact) {
    int steps = contact.steps().size();
    int[] stepFrom = new int[steps];
    int[] dataFrom = new int[steps];
    long[] rate = new long[steps];
    long lockUp = scenario.rules().contacts().lockUp().toSeconds();
    long relock = scenario.rules().contacts().relock().toSeconds();
    for (int i = 0; i < steps; i++) {
      stepFrom[i] =
          (int)
              (sky.onboard(contact.craft(), contact.steps().get(i).from())
                      .ceilToSecond()
                      .epochSecond()
                  - epoch);
      dataFrom[i] = stepFrom[i] + (int) (i == 0 ? lockUp : relock);
      rate[i] = Link.effectiveRate(scenario, contact.steps().get(i).rate()).bitsPerSecond();
    }
    int end =
        (int)
            (sky.onboard(contact.craft(), contact.during().end()).floorToSecond().epochSecond()
                - epoch);
    Station station = scenario.station(contact.station());
    return new Image(
        contact,
        indexOf(contact.craft()),
        stepFrom[0],
        end,
        stepFrom,
        dataFrom,
        rate,
        station.deliveryDelay().toSeconds(),
        classCount);
  }

  // ---------------------------------------------------------------- playing

  /** Seconds at which anything can change: contacts, steps, locks, forwarding, pauses, profiles. */
  private int[] edges(int ahead) {
    List<Integer> all = new ArrayList<>(List.of(0, length));
    for (Image image : images) {
      all.add(image.begin);
      all.add(image.end);
      all.add(image.begin - ahead);
      for (int i = 0; i < image.stepFrom.length; i++) {
        all.add(image.stepFrom[i]);
        all.add(image.dataFrom[i]);
      }
    }
    for (Pause pause : spans.pauses()) {
      all.add((int) (pause.during().begin().epochSecond() - epoch));
      all.add((int) (pause.during().end().ceilToSecond().epochSecond() - epoch));
    }
    for (Craft craft : scenario.craft()) {
      for (Generation generation : craft.generation()) {
        for (Profile.Step step : generation.profile().steps()) {
          all.add((int) (step.from().ceilToSecond().epochSecond() - epoch));
        }
      }
    }
    return all.stream()
        .mapToInt(edge -> Math.max(0, Math.min(length, edge)))
        .sorted()
        .distinct()
        .toArray();
  }

  private void play() {
    int ahead = (int) scenario.rules().data().forwardAhead().toSeconds();
    int[] edges = edges(ahead);
    long[][] rate = new long[craftCount][classCount];
    for (int i = 0; i + 1 < edges.length; i++) {
      int from = edges[i];
      int to = edges[i + 1];
      generation(from, rate);
      List<Image> now =
          images.stream().filter(image -> image.begin <= from && from < image.end).toList();
      List<Integer> sinks = sinks(from, now, ahead);
      boolean links =
          !sinks.isEmpty()
              && craftCount > 1
              && (!paused[from] || scenario.rules().data().crossLinksInPauses());
      int[] sinkUntil = new int[craftCount];
      for (int c : sinks) {
        sinkUntil[c] = ownUntil(c, from, now);
      }
      boolean transfers = links || !now.isEmpty();
      if (!transfers && quietlyFits(from, to, rate)) {
        pass(from, to, rate);
      } else {
        for (int s = from; s < to; s++) {
          second(s, rate, now, sinks, links, sinkUntil);
        }
      }
    }
  }

  /** Craft that receive over cross-links at a second, in mission order. */
  private List<Integer> sinks(int second, List<Image> now, int ahead) {
    if (!now.isEmpty()) {
      return now.stream().map(image -> image.craft).distinct().sorted().toList();
    }
    if (ahead <= 0) {
      return List.of();
    }
    return images.stream()
        .filter(image -> image.begin > second && image.begin - second <= ahead)
        .min(
            Comparator.comparingInt((Image image) -> image.begin)
                .thenComparingInt(image -> image.craft))
        .map(image -> List.of(image.craft))
        .orElse(List.of());
  }

  /**
   * Until when a sink's own data count against its room: its contact's end, else its next begin.
   */
  private int ownUntil(int craft, int second, List<Image> now) {
    int until = second;
    for (Image image : now) {
      if (image.craft == craft) {
        until = Math.max(until, image.end);
      }
    }
    if (until > second) {
      return Math.min(length, until);
    }
    return images.stream()
        .filter(image -> image.craft == craft && image.begin > second)
        .mapToInt(image -> image.begin)
        .min()
        .orElse(second);
  }

  private void generation(int second, long[][] rate) {
    for (int c = 0; c < craftCount; c++) {
      Arrays.fill(rate[c], 0);
      for (Generation generation : scenario.craft().get(c).generation()) {
        DataRate at = generation.profile().at(instant(second));
        if (paused[second]) {
          at = at.share(generation.shareInPauses());
        }
        for (int k = 0; k < classCount; k++) {
          if (classes.get(k).name().equals(generation.dataClass())) {
            rate[c][k] += at.bitsPerSecond();
          }
        }
      }
    }
  }

  /** Bits a craft will make in [from, to), pauses as planned. */
  private long makes(int c, int from, int to) {
    long bits = 0;
    int s = from;
    while (s < to) {
      // Rates change only at edges; stepping to the next change is enough.
      int next = s + 1;
      while (next < to && paused[next] == paused[s] && !profileEdge(c, next)) {
        next++;
      }
      for (Generation generation : scenario.craft().get(c).generation()) {
        DataRate at = generation.profile().at(instant(s));
        if (paused[s]) {
          at = at.share(generation.shareInPauses());
        }
        bits += at.bitsPerSecond() * (next - s);
      }
      s = next;
    }
    return bits;
  }

  private boolean profileEdge(int c, int second) {
    for (Generation generation : scenario.craft().get(c).generation()) {
      if (generation.profile().steps().size() > 1) {
        for (Profile.Step step : generation.profile().steps()) {
          if (step.from().ceilToSecond().epochSecond() - epoch == second) {
            return true;
          }
        }
      }
    }
    return false;
  }

  private long fill(int c) {
    long sum = 0;
    for (int k = 0; k < classCount; k++) {
      sum += store[c][k].total();
    }
    return sum;
  }

  /** Whether nothing crosses a limit while only generation runs. */
  private boolean quietlyFits(int from, int to, long[][] rate) {
    for (int c = 0; c < craftCount; c++) {
      long sum = Arrays.stream(rate[c]).sum();
      long end = fill(c) + sum * (to - from);
      if (end > planned[c] || overSince[c] >= 0 || lossSince[c] >= 0) {
        return false;
      }
    }
    return true;
  }

  private void pass(int from, int to, long[][] rate) {
    for (int c = 0; c < craftCount; c++) {
      for (int k = 0; k < classCount; k++) {
        before[c][k] = store[c][k].total();
        store[c][k].add(from, to, rate[c][k]);
        generated[c] += rate[c][k] * (to - from);
      }
      highest[c] = Math.max(highest[c], fill(c));
      bend(c, from, rate[c]);
      if (to == length) {
        record(c, to);
      }
    }
  }

  private void second(
      int s, long[][] rate, List<Image> now, List<Integer> sinks, boolean links, int[] sinkUntil) {
    for (int c = 0; c < craftCount; c++) {
      for (int k = 0; k < classCount; k++) {
        before[c][k] = store[c][k].total();
        store[c][k].add(s, s + 1, rate[c][k]);
        generated[c] += rate[c][k];
      }
    }
    if (links) {
      int sink = sinks.get(0);
      long room = Math.max(0, planned[sink] - ownBits(sink, s + 1, sinkUntil[sink])) - fill(sink);
      for (int c = 0; c < craftCount && room > 0; c++) {
        if (!sinks.contains(c) && crossLink[c] > 0) {
          room -= forward(c, sink, Math.min(room, crossLink[c]));
        }
      }
    }
    for (int c : sinks) {
      Image best = null;
      long fastest = 0;
      for (Image image : now) {
        if (image.craft == c) {
          long at = image.rateAt(s);
          image.capacity += at;
          if (at > fastest) {
            fastest = at;
            best = image;
          }
        }
      }
      if (best != null) {
        transmit(best, s, fastest);
      }
    }
    for (int c = 0; c < craftCount; c++) {
      limits(c, s);
      long[] change = new long[classCount];
      for (int k = 0; k < classCount; k++) {
        change[k] = store[c][k].total() - before[c][k];
      }
      bend(c, s, change);
      if (s + 1 == length) {
        record(c, length);
      }
    }
  }

  /** What a sink will make itself; constant rates within a contact need no loop. */
  private long ownBits(int c, int from, int to) {
    if (from >= to) {
      return 0;
    }
    if (cachedCraft != c || cachedUntil != to || cachedFrom > from) {
      cachedCraft = c;
      cachedUntil = to;
      cachedFrom = from;
      cachedBits = makes(c, from, to);
    } else {
      while (cachedFrom < from) {
        cachedBits -= makes(c, cachedFrom, cachedFrom + 1);
        cachedFrom++;
      }
    }
    return cachedBits;
  }

  private int cachedCraft = -1;
  private int cachedUntil = -1;
  private int cachedFrom;
  private long cachedBits;

  private long forward(int from, int to, long quota) {
    long left = quota;
    for (int k = 0; k < classCount && left > 0; k++) {
      Parcels target = store[to][k];
      left -= store[from][k].takeOldest(left, target::add);
    }
    long moved = quota - left;
    forwarded[from] += moved;
    received[to] += moved;
    return moved;
  }

  private void transmit(Image image, int s, long quota) {
    long left = quota;
    double arrival = arrival(image.craft, s + 1) + image.delivery;
    for (int k = 0; k < classCount && left > 0; k++) {
      int dataClass = k;
      long late = lateByClass[k];
      long sent =
          store[image.craft][k].takeOldest(
              left, (from, to, bits) -> judge(image.craft, dataClass, from, to, bits, arrival));
      left -= sent;
      deliveredByClass[k] += sent;
      long more = lateByClass[k] - late;
      if (more > 0) {
        if (image.late[k] == 0) {
          image.lateAt[k] = arrival - image.delivery;
        }
        image.late[k] += more;
      } else if (sent > 0) {
        flushLate(image, k);
      }
    }
    long sent = quota - left;
    downlinked[image.craft] += sent;
    image.delivered += sent;
    if (s + 1 == image.end) {
      for (int k = 0; k < classCount; k++) {
        flushLate(image, k);
      }
    }
  }

  /** Reports a run of late deliveries of one class in one contact. */
  private void flushLate(Image image, int k) {
    if (image.late[k] > 0) {
      Instant at = instant(0).utc().plusMillis(Math.round(image.lateAt[k] * 1000));
      add(
          RuleId.LATENCY,
          at,
          scenario.craft().get(image.craft).name(),
          image.contact.station(),
          classes.get(k).name(),
          (double) image.late[k],
          image.late[k] + " bit of " + classes.get(k).name() + " arrive late");
      image.late[k] = 0;
    }
  }

  private int arrivalMinute = -1;
  private int arrivalCraft = -1;
  private double arrivalHere;
  private double arrivalNext;

  /** Ground second of what leaves at an on-board second, light time linear within a minute. */
  private double arrival(int c, int second) {
    int minute = second / 60;
    if (minute != arrivalMinute || c != arrivalCraft) {
      arrivalMinute = minute;
      arrivalCraft = c;
      arrivalHere = light(c, minute * 60);
      arrivalNext = light(c, minute * 60 + 60);
    }
    double part = (second - minute * 60) / 60.0;
    return second + arrivalHere + part * (arrivalNext - arrivalHere);
  }

  private double light(int c, int second) {
    OnboardInstant sent = instant(second);
    GroundInstant heard = sky.ground(scenario.craft().get(c).name(), sent);
    return Duration.between(sent.utc(), heard.utc()).toNanos() / 1e9;
  }

  private void judge(int c, int k, long from, long to, long bits, double arrival) {
    longest[k] = Math.max(longest[k], arrival - from);
    lateByClass[k] += lateBits(c, k, from, to, bits, arrival);
  }

  /** Bits of [from, to) that are too old at an arrival second. */
  private long lateBits(int c, int k, long from, long to, long bits, double arrival) {
    double limit = classes.get(k).latencyLimit().toSeconds();
    long lateSeconds = Math.max(0, Math.min(to, (long) Math.ceil(arrival - limit)) - from);
    if (lateSeconds == 0 || waivers.isEmpty()) {
      return lateSeconds * bits;
    }
    long late = 0;
    for (long g = from; g < from + lateSeconds; g++) {
      if (arrival - g > limit(c, k, g)) {
        late += bits;
      }
    }
    return late;
  }

  private double limit(int c, int k, long made) {
    double limit = classes.get(k).latencyLimit().toSeconds();
    for (Waiver waiver : waivers) {
      if (waiver.rule() == RuleId.LATENCY
          && waiver.dataClass().equals(classes.get(k).name())
          && (waiver.craft().isEmpty() || waiver.craft().equals(scenario.craft().get(c).name()))
          && !instant(made).utc().isBefore(waiver.begin())
          && instant(made).utc().isBefore(waiver.end())) {
        limit = Math.max(limit, (double) waiver.relaxedLimit().toSeconds());
      }
    }
    return limit;
  }

  private void limits(int c, int s) {
    long held = fill(c);
    if (held > capacity[c]) {
      long excess = held - capacity[c];
      if (lossSince[c] < 0) {
        lossSince[c] = s;
      }
      loss[c] += excess;
      lost[c] += excess;
      for (int k = classCount - 1; k >= 0 && excess > 0; k--) {
        long dropped = store[c][k].dropNewest(excess);
        lostByClass[k] += dropped;
        excess -= dropped;
      }
      held = capacity[c];
    } else if (lossSince[c] >= 0) {
      flushLoss(c);
    }
    highest[c] = Math.max(highest[c], held);
    if (held > planned[c]) {
      if (overSince[c] < 0) {
        overSince[c] = s;
      }
      over[c] += held - planned[c];
    } else if (overSince[c] >= 0) {
      flushOver(c);
    }
  }

  private void flushLoss(int c) {
    add(
        RuleId.OVERFLOW,
        instant(lossSince[c]).utc(),
        scenario.craft().get(c).name(),
        "",
        "",
        (double) loss[c],
        loss[c] + " bit do not fit");
    lossSince[c] = -1;
    loss[c] = 0;
  }

  private void flushOver(int c) {
    add(
        RuleId.FILL,
        instant(overSince[c]).utc(),
        scenario.craft().get(c).name(),
        "",
        "",
        (double) over[c],
        "above the planned fill");
    overSince[c] = -1;
    over[c] = 0;
  }

  /** Adds a point where a slope changes. */
  private void bend(int c, int second, long[] rate) {
    if (!Arrays.equals(slope[c], rate)) {
      if (second > 0) {
        List<Long> byClass = new ArrayList<>();
        long sum = 0;
        for (int k = 0; k < classCount; k++) {
          byClass.add(before[c][k]);
          sum += before[c][k];
        }
        points.get(c).add(new StorePoint(epoch + second, sum, byClass));
      }
      System.arraycopy(rate, 0, slope[c], 0, classCount);
    }
  }

  private void record(int c, int second) {
    List<Long> byClass = new ArrayList<>();
    for (int k = 0; k < classCount; k++) {
      byClass.add(store[c][k].total());
    }
    points.get(c).add(new StorePoint(epoch + second, fill(c), byClass));
  }

  // ---------------------------------------------------------------- after

  private void finish() {
    for (int c = 0; c < craftCount; c++) {
      if (lossSince[c] >= 0) {
        flushLoss(c);
      }
      if (overSince[c] >= 0) {
        flushOver(c);
      }
      Craft craft = scenario.craft().get(c);
      int index = c;
      long allowed =
          scenario
              .rules()
              .data()
              .endFillShare()
              .map(share -> new DataRate(craft.store().bits()).share(share).bitsPerSecond())
              .orElseGet(
                  () ->
                      Math.max(
                          startBits(index),
                          new DataRate(craft.store().bits()).share(0.25).bitsPerSecond()));
      if (fill(c) > allowed) {
        add(
            RuleId.END_FILL,
            scenario.period().end().utc(),
            craft.name(),
            "",
            "",
            (double) (fill(c) - allowed),
            fill(c) + " bit aboard at the end, " + allowed + " allowed");
      }
    }
    for (Image image : images) {
      for (int k = 0; k < classCount; k++) {
        flushLate(image, k);
      }
    }
    for (int k = 0; k < classCount; k++) {
      long[] late = new long[1];
      int dataClass = k;
      for (int c = 0; c < craftCount; c++) {
        int craft = c;
        if (store[c][k].total() > 0) {
          longest[k] = Math.max(longest[k], (double) (length - store[c][k].oldest()));
        }
        store[c][k].all(
            (from, to, bits) -> late[0] += lateBits(craft, dataClass, from, to, bits, length));
      }
      if (late[0] > 0) {
        lateByClass[k] += late[0];
        add(
            RuleId.LATENCY,
            sky.ground(scenario.craft().get(0).name(), scenario.period().end()).utc(),
            "",
            "",
            classes.get(k).name(),
            (double) late[0],
            late[0] + " bit of " + classes.get(k).name() + " aboard at the end are late");
      }
    }
  }

  private void gaps() {
    Craft first = scenario.craft().get(0);
    scenario
        .rules()
        .data()
        .gapLimit()
        .ifPresent(
            limit -> {
              GroundInstant since =
                  scenario
                      .start()
                      .lastContactEnd()
                      .or(
                          () ->
                              scenario.start().craft().stream()
                                  .flatMap(state -> state.lastContactEnd().stream())
                                  .max(GroundInstant::compareTo))
                      .orElseGet(() -> sky.ground(first.name(), scenario.period().begin()));
              gaps(RuleId.GAP, "", contacts, since, first, limit);
            });
    scenario
        .rules()
        .data()
        .directLimit()
        .ifPresent(
            limit -> {
              for (Craft craft : scenario.craft()) {
                GroundInstant since =
                    scenario
                        .start()
                        .of(craft.name())
                        .lastContactEnd()
                        .orElseGet(() -> sky.ground(craft.name(), scenario.period().begin()));
                List<Contact> own =
                    contacts.stream().filter(one -> one.craft().equals(craft.name())).toList();
                gaps(RuleId.DIRECT, craft.name(), own, since, craft, limit);
              }
            });
  }

  private void gaps(
      RuleId rule,
      String craft,
      List<Contact> own,
      GroundInstant since,
      Craft clock,
      Duration limit) {
    GroundInstant last = since;
    for (Contact contact : own) {
      gap(rule, craft, last, contact.during().begin(), limit);
      if (contact.during().end().isAfter(last)) {
        last = contact.during().end();
      }
    }
    gap(rule, craft, last, sky.ground(clock.name(), scenario.period().end()), limit);
  }

  private void gap(
      RuleId rule, String craft, GroundInstant from, GroundInstant to, Duration limit) {
    if (!from.isBefore(to)) {
      return;
    }
    double allowed = limit.toSeconds();
    for (Waiver waiver : waivers) {
      if (waiver.rule() == rule
          && waiver.craft().equals(craft)
          && waiver.begin().isBefore(to.utc())
          && waiver.end().isAfter(from.utc())) {
        allowed = Math.max(allowed, (double) waiver.relaxedLimit().toSeconds());
      }
    }
    double seconds = to.secondsSince(from);
    if (seconds > allowed) {
      add(
          rule,
          from.utc(),
          craft,
          "",
          craft,
          seconds - allowed,
          "no contact for " + Math.round(seconds) + " s");
    }
  }

  private void endCoverage(List<Repoint> repoints) {
    if (scenario.rules().data().endCoverage().isEmpty()) {
      return;
    }
    long asked = scenario.rules().data().endCoverage().orElseThrow().toSeconds();
    for (Craft craft : scenario.craft()) {
      var aim = scenario.start().of(craft.name()).aim();
      for (Repoint repoint : repoints) {
        if (repoint.craft().equals(craft.name())) {
          aim = repoint.aim();
        }
      }
      double usable = scenario.usableHalfCone(craft).radians();
      long covered = 0;
      while (covered <= asked) {
        GroundInstant heard = sky.ground(craft.name(), instant(length + covered));
        if (aim.direction().separation(sky.earth(craft.name(), heard)) > usable) {
          break;
        }
        covered += 30;
      }
      if (covered <= asked) {
        add(
            RuleId.END_COVERAGE,
            scenario.period().end().utc(),
            craft.name(),
            "",
            "",
            (double) (asked - Math.max(0, covered - 30)),
            "the aim at the end holds the Earth for " + Math.max(0, covered - 30) + " s");
      }
    }
  }

  private void add(
      RuleId rule,
      Instant at,
      String craft,
      String station,
      String subject,
      double amount,
      String detail) {
    findings.add(new Finding(rule, at, craft, station, subject, amount, detail));
  }
}
