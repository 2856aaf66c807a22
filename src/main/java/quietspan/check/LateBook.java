package quietspan.check;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import quietspan.model.Contact;
import quietspan.model.DataClass;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.Waiver;
import quietspan.time.GroundInstant;
import quietspan.time.OnboardInstant;

/**
 * Ages of delivered bits. The latency of a bit is the ground instant at which its reception ends,
 * plus the station's delivery delay, less the on-board instant at which its second of generation
 * began.
 */
final class LateBook implements AgeQueue.Taker {

  /**
   * Successive seconds of one contact that all deliver late bits of one class.
   *
   * @param image index of the contact's image
   * @param last its last second
   * @param from end of reception of the first late bit
   * @param worstSeconds longest time beyond the limit
   */
  record Run(
      int image,
      Contact contact,
      DataClass dataClass,
      long last,
      GroundInstant from,
      long bits,
      double worstSeconds) {}

  /** Bits do not know who made them, so a waiver holds for its stretch whoever it was given for. */
  private record Relaxed(int dataClass, double from, double to, double limit) {}

  private final Scenario scenario;
  private final Sight sight;
  private final List<DataClass> classes;
  private final double[] limits;
  private final List<Relaxed> relaxed = new ArrayList<>();
  private final List<Run> runs = new ArrayList<>();
  private final Run[][] open;
  private final long[] minuteOfLight;
  private final double[][] lightAtMinute;
  private final double[] longest;
  private final long[] late;

  private int dataClass;
  private double delivered;
  private long deliveredBits;
  private long lateBits;
  private double worst;
  private double oldestAge;

  LateBook(Scenario scenario, Sight sight, List<Waiver> waivers) {
    this.scenario = scenario;
    this.sight = sight;
    this.classes = scenario.rules().classes();
    this.limits = classes.stream().mapToDouble(each -> Seconds.of(each.latencyLimit())).toArray();
    int count = scenario.craft().size();
    this.open = new Run[count][classes.size()];
    this.minuteOfLight = new long[count];
    Arrays.fill(minuteOfLight, Long.MIN_VALUE);
    this.lightAtMinute = new double[count][2];
    this.longest = new double[classes.size()];
    Arrays.fill(longest, Double.NEGATIVE_INFINITY);
    this.late = new long[classes.size()];
    OnboardInstant begin = scenario.period().begin();
    for (Waiver waiver : waivers) {
      if (waiver.rule() == RuleId.LATENCY) {
        relaxed.add(
            new Relaxed(
                classes.indexOf(scenario.rules().dataClass(waiver.dataClass())),
                new OnboardInstant(waiver.begin()).secondsSince(begin),
                new OnboardInstant(waiver.end()).secondsSince(begin),
                Seconds.of(waiver.relaxedLimit())));
      }
    }
  }

  /** Sends bits of one class in one second of a contact; returns how many there were. */
  long send(AgeQueue queue, int ofClass, Image image, long second, long bits) {
    dataClass = ofClass;
    delivered = second + 1 + light(image.craft(), second + 1) + image.deliverySeconds();
    deliveredBits = 0;
    lateBits = 0;
    worst = 0;
    oldestAge = Double.NEGATIVE_INFINITY;
    queue.takeOldest(bits, this);
    longest[ofClass] = Math.max(longest[ofClass], oldestAge);
    if (lateBits > 0) {
      noteLate(image, second);
    }
    return deliveredBits;
  }

  /** Longest latency in the last call of {@link #send}; minus infinity when it sent nothing. */
  double oldestSent() {
    return oldestAge;
  }

  @Override
  public void take(long generated, long bits) {
    double latency = delivered - generated;
    oldestAge = Math.max(oldestAge, latency);
    deliveredBits += bits;
    double over = latency - limit(generated);
    if (over > 0) {
      lateBits += bits;
      worst = Math.max(worst, over);
    }
  }

  private double limit(long generated) {
    double limit = limits[dataClass];
    for (Relaxed each : relaxed) {
      if (each.dataClass == dataClass && each.from <= generated && generated < each.to) {
        limit = Math.max(limit, each.limit);
      }
    }
    return limit;
  }

  private void noteLate(Image image, long second) {
    late[dataClass] += lateBits;
    Run before = open[image.craft()][dataClass];
    boolean goesOn = before != null && before.image == image.index() && before.last == second - 1;
    if (before != null && !goesOn) {
      runs.add(before);
    }
    OnboardInstant sent = scenario.period().begin().plusSeconds(second + 1);
    open[image.craft()][dataClass] =
        new Run(
            image.index(),
            image.contact(),
            classes.get(dataClass),
            second,
            goesOn ? before.from : sight.ground(image.contact().craft(), sent),
            goesOn ? before.bits + lateBits : lateBits,
            goesOn ? Math.max(before.worstSeconds, worst) : worst);
  }

  /**
   * One-way light time of a wave that leaves at a second of the period, linear between whole
   * minutes: the formation's acceleration of some 6 mm/s2 bends it by less than 10 ns.
   */
  private double light(int index, long second) {
    long minute = Math.floorDiv(second, 60L);
    if (minute != minuteOfLight[index]) {
      minuteOfLight[index] = minute;
      lightAtMinute[index][0] = lightOf(index, minute * 60);
      lightAtMinute[index][1] = lightOf(index, minute * 60 + 60);
    }
    double part = (second - minute * 60) / 60.0;
    return lightAtMinute[index][0] + part * (lightAtMinute[index][1] - lightAtMinute[index][0]);
  }

  private double lightOf(int index, long second) {
    OnboardInstant sent = scenario.period().begin().plusSeconds(second);
    GroundInstant received = sight.ground(scenario.craft().get(index).name(), sent);
    return received.secondsSince(new GroundInstant(sent.utc()));
  }

  /** Bits that are still aboard at the end of the period and older than their limit. */
  long lateAboard(AgeQueue queue, int ofClass, long end) {
    dataClass = ofClass;
    delivered = end;
    lateBits = 0;
    oldestAge = Double.NEGATIVE_INFINITY;
    queue.forEach(this);
    longest[ofClass] = Math.max(longest[ofClass], oldestAge);
    late[ofClass] += lateBits;
    return lateBits;
  }

  long lateBits(int ofClass) {
    return late[ofClass];
  }

  OptionalDouble longest(int ofClass) {
    return Double.isFinite(longest[ofClass])
        ? OptionalDouble.of(longest[ofClass])
        : OptionalDouble.empty();
  }

  /** All runs, those still open included. */
  List<Run> runs() {
    List<Run> all = new ArrayList<>(runs);
    for (Run[] ofCraft : open) {
      for (Run run : ofCraft) {
        if (run != null) {
          all.add(run);
        }
      }
    }
    return all;
  }
}
