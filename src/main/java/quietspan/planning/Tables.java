package quietspan.planning;

import java.util.ArrayList;
import java.util.List;
import quietspan.link.Link;
import quietspan.model.BodyDirection;
import quietspan.model.Craft;
import quietspan.model.Dish;
import quietspan.model.Geometry;
import quietspan.model.Interruption;
import quietspan.model.Look;
import quietspan.model.RateLadder;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Station;
import quietspan.time.GroundInstant;
import quietspan.time.OnboardInstant;
import quietspan.units.DataRate;

/**
 * The sampled geometry of a scenario in the planner's own numbers. Craft, antennas (every dish of
 * every station, in file order) and samples are indices; instants are seconds since the begin of
 * the period on board. Samples are {@link #STEP} apart on board and run past the end of the period
 * as far as the end coverage needs and the ephemeris reaches.
 */
final class Tables {

  /** Seconds between samples; the Earth moves 0.0035 deg through the body frame meanwhile. */
  static final int STEP = 300;

  /** Stands for an infinite level (dB Hz), so that interpolation stays finite. */
  private static final double FAR = 1e6;

  /** One antenna of one station. */
  record Antenna(int index, Station station, Dish dish) {

    int busyBefore() {
      return (int) dish.setup().toSeconds();
    }

    int busyAfter() {
      return (int) dish.teardown().toSeconds();
    }

    int shortest() {
      return (int) dish.minimumContact().toSeconds();
    }

    int longest() {
      return (int) dish.maximumContact().toSeconds();
    }

    int changeover() {
      return (int) dish.changeover().toSeconds();
    }
  }

  final Scenario scenario;
  final Geometry geometry;
  final SightLines sky;
  final long epoch;
  final int length;
  final int samples;
  final int craftCount;
  final List<Antenna> antennas;

  /** One-way light time at a sample (s), {@code [craft][sample]}. */
  final double[][] lightTime;

  /**
   * Earth in the body frame (rad), {@code [craft][sample]}; azimuth continuous from sample to
   * sample.
   */
  final double[][] azimuth;

  final double[][] elevation;

  /** Earth in the body frame as a unit vector, {@code [craft][3 * sample + axis]}. */
  final double[][] unit;

  /** Carrier to noise density on the beam's axis (dB Hz), {@code [craft][antenna][sample]}. */
  final float[][][] centre;

  /** Ladder of each craft, rising (bit/s). */
  final long[][] ladder;

  /** Any link of each craft: what an antenna contributes is in {@link #centre} already. */
  private final Link[] links;

  /** The rates after overhead and usable share (bit/s). */
  final long[][] effective;

  /** Usable half-cone (rad). */
  final double[] usable;

  /** Repoint with settling, spacing and last repoint before the period of each craft (s). */
  final int[] repoint;

  final int[] spacing;
  final int[] lastRepoint;

  /** Interruptions inside the period, merged, and protected intervals (s). */
  final List<int[]> stops;

  final List<int[]> guarded;
  final int quietSince;

  /** End of the last contact before the period, of the formation and of each craft (ground s). */
  final int lastContactEnd;

  final int[] lastContactEndOf;
  final int warmUp;
  final int minimumSpan;

  private Tables(Scenario scenario, Geometry geometry, int samples) {
    this.scenario = scenario;
    this.geometry = geometry;
    this.sky = geometry.sightLines();
    this.epoch = scenario.period().begin().epochSecond();
    this.length = (int) scenario.period().length().toSeconds();
    this.samples = samples;
    this.craftCount = scenario.craft().size();
    List<Antenna> all = new ArrayList<>();
    for (Station station : scenario.stations()) {
      for (Dish dish : station.dishes()) {
        all.add(new Antenna(all.size(), station, dish));
      }
    }
    this.antennas = List.copyOf(all);
    this.lightTime = new double[craftCount][samples];
    this.azimuth = new double[craftCount][samples];
    this.elevation = new double[craftCount][samples];
    this.unit = new double[craftCount][3 * samples];
    this.centre = new float[craftCount][all.size()][samples];
    this.ladder = new long[craftCount][];
    this.links = new Link[craftCount];
    this.effective = new long[craftCount][];
    this.usable = new double[craftCount];
    this.repoint = new int[craftCount];
    this.spacing = new int[craftCount];
    this.lastRepoint = new int[craftCount];
    for (int c = 0; c < craftCount; c++) {
      Craft craft = scenario.craft().get(c);
      repoint[c] = (int) craft.antenna().repointLength().toSeconds();
      spacing[c] = (int) craft.antenna().repointSpacing().toSeconds();
      lastRepoint[c] =
          scenario
              .start()
              .of(craft.name())
              .lastRepoint()
              .map(at -> second(at.epochSecond()))
              .orElse(Integer.MIN_VALUE);
    }
    this.stops = stops();
    this.guarded =
        scenario.calendars().guarded().stream()
            .map(
                one ->
                    new int[] {
                      second(one.during().begin().epochSecond()),
                      second(one.during().end().epochSecond())
                    })
            .toList();
    this.quietSince =
        scenario.start().quietSince().map(since -> second(since.epochSecond())).orElse(0);
    this.lastContactEndOf = new int[craftCount];
    this.warmUp = (int) scenario.rules().science().warmUp().toSeconds();
    this.minimumSpan = (int) scenario.rules().science().minimumSpan().toSeconds();
    int latest = Integer.MIN_VALUE;
    for (int c = 0; c < craftCount; c++) {
      Craft craft = scenario.craft().get(c);
      GroundInstant first = sky.ground(craft.name(), scenario.period().begin());
      var known = scenario.start().of(craft.name()).lastContactEnd();
      lastContactEndOf[c] = second(known.orElse(first).epochSecond());
      if (known.isPresent()) {
        latest = Math.max(latest, lastContactEndOf[c]);
      }
    }
    this.lastContactEnd =
        scenario
            .start()
            .lastContactEnd()
            .map(end -> second(end.epochSecond()))
            .orElse(latest == Integer.MIN_VALUE ? lastContactEndOf[0] : latest);
  }

  int craft(String name) {
    for (int c = 0; c < craftCount; c++) {
      if (scenario.craft().get(c).name().equals(name)) {
        return c;
      }
    }
    throw new IllegalArgumentException("no craft " + name);
  }

  int antenna(String station, String name) {
    return antennas.stream()
        .filter(one -> one.station().name().equals(station) && one.dish().name().equals(name))
        .findFirst()
        .orElseThrow()
        .index();
  }

  /** Seconds since the begin of the period, kept within what an int can hold with room to spare. */
  int second(long epochSecond) {
    return (int)
        Math.max(Integer.MIN_VALUE / 4, Math.min(Integer.MAX_VALUE / 4, epochSecond - epoch));
  }

  private List<int[]> stops() {
    List<int[]> merged = new ArrayList<>();
    List<int[]> parts = new ArrayList<>();
    for (Interruption interruption : scenario.calendars().interruptions()) {
      int a = Math.max(0, second(interruption.during().begin().epochSecond()));
      int b = Math.min(length, second(interruption.during().end().epochSecond()));
      if (a < b) {
        parts.add(new int[] {a, b});
      }
    }
    parts.sort(java.util.Comparator.comparingInt(part -> part[0]));
    for (int[] part : parts) {
      int[] last = merged.isEmpty() ? null : merged.get(merged.size() - 1);
      if (last != null && part[0] <= last[1]) {
        last[1] = Math.max(last[1], part[1]);
      } else {
        merged.add(part);
      }
    }
    return List.copyOf(merged);
  }

  /** Light time at a second on board, between samples (s). */
  double lightAt(int craft, int second) {
    int sample = Math.max(0, Math.min(samples - 2, second / STEP));
    double part = (second - (double) sample * STEP) / STEP;
    return lightTime[craft][sample]
        + part * (lightTime[craft][sample + 1] - lightTime[craft][sample]);
  }

  /** First whole ground second at which the wave of this on-board second or a later one arrives. */
  int groundCeil(int craft, int second) {
    return second + (int) Math.ceil(lightAt(craft, second));
  }

  int groundFloor(int craft, int second) {
    return second + (int) Math.floor(lightAt(craft, second));
  }

  /** On-board second of the wave received at a ground second, rounded up. */
  int onboardCeil(int craft, int ground) {
    return (int) Math.ceil(ground - lightAt(craft, ground - (int) lightTime[craft][0]) - 1e-9);
  }

  int onboardFloor(int craft, int ground) {
    return (int) Math.floor(ground - lightAt(craft, ground - (int) lightTime[craft][0]) + 1e-9);
  }

  static Tables of(Scenario scenario, Geometry geometry) {
    int length = (int) scenario.period().length().toSeconds();
    int after =
        (int)
            scenario
                .rules()
                .data()
                .endCoverage()
                .map(java.time.Duration::toSeconds)
                .orElse(0L)
                .longValue();
    int samples = (length + after) / STEP + 2;
    Tables tables = new Tables(scenario, geometry, samples);
    for (int c = 0; c < tables.craftCount; c++) {
      tables.fill(c);
    }
    return tables;
  }

  private void fill(int c) {
    Craft craft = scenario.craft().get(c);
    usable[c] = scenario.usableHalfCone(craft).radians();
    fillLadder(c, craft);
    List<Link> links =
        antennas.stream().map(antenna -> Link.of(scenario, craft, antenna.dish())).toList();
    GroundInstant last = sky.known(craft.name()).end();
    double previous = Double.NaN;
    GroundInstant kept = null;
    for (int i = 0; i < samples; i++) {
      OnboardInstant sent = OnboardInstant.ofEpochSecond(epoch + (long) i * STEP);
      GroundInstant received = kept;
      if (kept == null
          || i * (long) STEP <= length
          || sent.utc().isBefore(last.utc().minusSeconds(4000))) {
        received = sky.ground(craft.name(), sent);
        kept = received;
      }
      lightTime[c][i] = java.time.Duration.between(sent.utc(), received.utc()).toNanos() / 1e9;
      BodyDirection earth = sky.earth(craft.name(), received);
      double turn = earth.azimuthRadians();
      if (!Double.isNaN(previous)) {
        turn += 2 * Math.PI * Math.rint((previous - turn) / (2 * Math.PI));
      }
      previous = turn;
      azimuth[c][i] = turn;
      elevation[c][i] = earth.elevationRadians();
      double cos = StrictMath.cos(earth.elevationRadians());
      unit[c][3 * i] = cos * StrictMath.cos(turn);
      unit[c][3 * i + 1] = cos * StrictMath.sin(turn);
      unit[c][3 * i + 2] = StrictMath.sin(earth.elevationRadians());
      if (i * (long) STEP <= length + STEP) {
        fillLinks(c, craft, i, received, links);
      }
    }
  }

  private void fillLadder(int c, Craft craft) {
    List<DataRate> rates = new ArrayList<>();
    if (craft.rates() instanceof RateLadder.ByBudget budget) {
      rates.addAll(budget.rates());
    } else if (craft.rates() instanceof RateLadder.ByOffPointing table) {
      table.rows().forEach(row -> rates.add(0, row.rate()));
    }
    links[c] = Link.of(scenario, craft, antennas.get(0).dish());
    ladder[c] = rates.stream().mapToLong(DataRate::bitsPerSecond).toArray();
    effective[c] =
        rates.stream()
            .mapToLong(rate -> Link.effectiveRate(scenario, rate).bitsPerSecond())
            .toArray();
  }

  private void fillLinks(int c, Craft craft, int i, GroundInstant received, List<Link> links) {
    Look look = null;
    for (Antenna antenna : antennas) {
      if (antenna.index() == 0
          || !antennas.get(antenna.index() - 1).station().equals(antenna.station())) {
        look = sky.look(antenna.station().name(), craft.name(), received);
      }
      centre[c][antenna.index()][i] =
          (float)
              Math.max(
                  -FAR,
                  Math.min(
                      FAR,
                      links
                          .get(antenna.index())
                          .centreDbHz(look.elevationRadians(), look.rangeMetres())));
    }
  }

  /** Step of the ladder that closes at this axis level (dB Hz) and off-pointing (rad), or -1. */
  int step(int craft, double centreDb, double off) {
    if (off > usable[craft]) {
      return -1;
    }
    long bits = centreDb <= -FAR ? 0 : links[craft].highestBitsPerSecond(centreDb, off);
    return bits == 0 ? -1 : java.util.Arrays.binarySearch(ladder[craft], bits);
  }

  /** Data rate after overhead and usable share (bit/s); zero where no rate closes. */
  long effectiveRate(int craft, double centreDb, double off) {
    int step = step(craft, centreDb, off);
    return step < 0 ? 0 : effective[craft][step];
  }

  /** Station cost of a contact, thousandths of a unit. */
  long cost(Use use) {
    Dish dish = antennas.get(use.antenna()).dish();
    return Math.round(1000 * (dish.costPerContact() + dish.costPerHour() * use.length() / 3600.0));
  }

  /**
   * Highest step of the ladder that closes throughout a contact under the holds of a draft,
   * whatever step it states; -1 when none does or the craft is moving or the Earth outside its
   * cone.
   */
  int rateStep(Draft draft, Use use) {
    int begin = onboardFloor(use.craft(), use.begin());
    int end = onboardCeil(use.craft(), use.end());
    if (begin < 0 || end > length) {
      return -1;
    }
    Hold hold = draft.holdDuring(use.craft(), begin, end);
    if (hold == null) {
      return -1;
    }
    boolean covered = false;
    for (int[] part : hold.covered) {
      covered |= part[0] <= begin && end <= part[1];
    }
    if (!covered) {
      return -1;
    }
    return rateStep(hold, use.antenna(), begin, end);
  }

  /** As {@link #rateStep(Draft, Use)} for a stretch on board that the hold covers. */
  int rateStep(Hold hold, int antenna, int begin, int end) {
    int c = hold.craft;
    float[] row = centre[c][antenna];
    int first = begin / STEP + 1;
    int last = (end - 1) / STEP;
    int step = Math.min(stepAt(hold, row, begin), stepAt(hold, row, end));
    for (int i = first; i <= last && step >= 0; i++) {
      step = Math.min(step, step(c, row[i], hold.off(i)));
    }
    return step;
  }

  /**
   * Between samples, link and off-pointing lie on the better side of the chord, so the chord is
   * safe.
   */
  private int stepAt(Hold hold, float[] row, int second) {
    int i = Math.min(samples - 2, second / STEP);
    double part = (second - (double) i * STEP) / STEP;
    double level = row[i] + part * (row[i + 1] - row[i]);
    double off = hold.off(i) + part * (hold.off(i + 1) - hold.off(i));
    return step(hold.craft, level - 0.002, Math.min(off, usable[hold.craft]));
  }
}
