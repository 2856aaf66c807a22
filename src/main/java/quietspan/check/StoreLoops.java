package quietspan.check;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import quietspan.model.ClassOutcome;
import quietspan.model.ContactOutcome;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.DataClass;
import quietspan.model.Scenario;
import quietspan.model.StorePoint;
import quietspan.model.StoreTrace;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.DataVolume;

/**
 * The stores second by second, in integers: generate, cross-link, transmit, overflow. Plain on
 * purpose: nothing is skipped or summed up, so that it can disagree with a cleverer simulation.
 */
final class StoreLoops {

  private final Scenario scenario;
  private final Timeline timeline;
  private final List<Image> images;
  private final LateBook ages;
  private final int craftCount;
  private final int classCount;
  private final long begin;
  private final long seconds;

  private final AgeQueue[][] queues;
  private final long[] fill;
  private final long[] capacity;
  private final long[] planned;
  private final long[] crossLink;

  private final long[] start;
  private final long[] generated;
  private final long[] received;
  private final long[] forwarded;
  private final long[] downlinked;
  private final long[] lost;
  private final long[] highest;
  private final long[] deliveredOfClass;
  private final long[] lostOfClass;
  private final long[] deliveredIn;
  private final double[] longestIn;
  private final long[] sinkGeneratesUntil;

  private final List<List<StorePoint>> points = new ArrayList<>();
  private final Excess.Book overflows;
  private final Excess.Book overfills;

  StoreLoops(Scenario scenario, Timeline timeline, List<Image> images, LateBook ages) {
    this.scenario = scenario;
    this.timeline = timeline;
    this.images = images;
    this.ages = ages;
    this.craftCount = scenario.craft().size();
    this.classCount = scenario.rules().classes().size();
    this.begin = scenario.period().begin().epochSecond();
    this.seconds = scenario.period().length().toSeconds();
    this.queues = new AgeQueue[craftCount][classCount];
    this.fill = new long[craftCount];
    this.capacity = new long[craftCount];
    this.planned = new long[craftCount];
    this.crossLink = new long[craftCount];
    this.start = new long[craftCount];
    this.generated = new long[craftCount];
    this.received = new long[craftCount];
    this.forwarded = new long[craftCount];
    this.downlinked = new long[craftCount];
    this.lost = new long[craftCount];
    this.highest = new long[craftCount];
    this.deliveredOfClass = new long[classCount];
    this.lostOfClass = new long[classCount];
    this.deliveredIn = new long[images.size()];
    this.longestIn = new double[images.size()];
    Arrays.fill(longestIn, Double.NEGATIVE_INFINITY);
    this.sinkGeneratesUntil = new long[craftCount];
    this.overflows = new Excess.Book(craftCount);
    this.overfills = new Excess.Book(craftCount);
    for (int craft = 0; craft < craftCount; craft++) {
      load(craft);
    }
  }

  private void load(int index) {
    Craft craft = scenario.craft().get(index);
    capacity[index] = craft.store().bits();
    planned[index] = share(scenario.rules().margins().plannedFillShare(), craft.store());
    crossLink[index] = craft.crossLink().bitsPerSecond();
    for (int dataClass = 0; dataClass < classCount; dataClass++) {
      queues[index][dataClass] = new AgeQueue();
    }
    for (CraftState.Fill each : scenario.start().of(craft.name()).fill()) {
      DataClass dataClass = scenario.rules().dataClass(each.dataClass());
      AgeQueue queue = queues[index][scenario.rules().classes().indexOf(dataClass)];
      addStartFill(queue, each);
      start[index] += each.volume().bits();
    }
    fill[index] = start[index];
    highest[index] = start[index];
    points.add(new ArrayList<>());
  }

  /** Ages linear from the oldest bit to the begin of the period, or all made at its begin. */
  private void addStartFill(AgeQueue queue, CraftState.Fill startFill) {
    long volume = startFill.volume().bits();
    long ages = startFill.oldest().map(oldest -> begin - oldest.epochSecond()).orElse(0L);
    if (ages <= 0) {
      queue.add(0, volume);
      return;
    }
    long each = volume / ages;
    long rest = volume % ages;
    long before = 0;
    for (long j = 0; j < ages; j++) {
      // volume * (j + 1) / ages, rounded down, without leaving 64 bits.
      long upTo = each * (j + 1) + rest * (j + 1) / ages;
      queue.add(j - ages, upTo - before);
      before = upTo;
    }
  }

  static long share(double share, DataVolume of) {
    return BigDecimal.valueOf(share)
        .multiply(BigDecimal.valueOf(of.bits()))
        .setScale(0, RoundingMode.FLOOR)
        .longValueExact();
  }

  StoreRecord run() {
    for (Stretch stretch : timeline.stretches()) {
      point(stretch.from);
      for (int craft = 0; craft < craftCount; craft++) {
        sinkGeneratesUntil[craft] = timeline.generatedBefore(craft, stretch.sinkUntil[craft]);
      }
      for (long second = stretch.from; second < stretch.to; second++) {
        for (int craft = 0; craft < craftCount; craft++) {
          generate(craft, stretch.generation[craft], second);
        }
        for (int craft = 0; craft < craftCount; craft++) {
          if (stretch.sink[craft] >= 0) {
            send(craft, stretch.sink[craft]);
          }
        }
        for (int craft = 0; craft < craftCount; craft++) {
          if (stretch.sending[craft] != null) {
            transmit(stretch.sending[craft], stretch.rate[craft], second);
          }
        }
        for (int craft = 0; craft < craftCount; craft++) {
          overflow(craft, second);
          highest[craft] = Math.max(highest[craft], fill[craft]);
          overfills.note(craft, second, fill[craft] - planned[craft]);
        }
      }
    }
    point(seconds);
    return result();
  }

  private void generate(int craft, long[] rates, long second) {
    for (int dataClass = 0; dataClass < classCount; dataClass++) {
      queues[craft][dataClass].add(second, rates[dataClass]);
      fill[craft] += rates[dataClass];
      generated[craft] += rates[dataClass];
    }
  }

  /** A sink keeps room, below its planned fill, for what it will itself make until then. */
  private long room(int sink) {
    long stillToMake = sinkGeneratesUntil[sink] - generated[sink];
    return Math.max(0, planned[sink] - stillToMake) - fill[sink];
  }

  private void send(int craft, int sink) {
    long left = Math.min(crossLink[craft], room(sink));
    for (int dataClass = 0; dataClass < classCount && left > 0; dataClass++) {
      AgeQueue from = queues[craft][dataClass];
      long moved = Math.min(left, from.total());
      from.takeOldest(moved, queues[sink][dataClass]::add);
      left -= moved;
      fill[craft] -= moved;
      fill[sink] += moved;
      forwarded[craft] += moved;
      received[sink] += moved;
    }
  }

  private void transmit(Image image, long rate, long second) {
    int craft = image.craft();
    int contact = image.index();
    long left = rate;
    for (int dataClass = 0; dataClass < classCount && left > 0; dataClass++) {
      long sent = ages.send(queues[craft][dataClass], dataClass, image, second, left);
      longestIn[contact] = Math.max(longestIn[contact], ages.oldestSent());
      left -= sent;
      fill[craft] -= sent;
      downlinked[craft] += sent;
      deliveredOfClass[dataClass] += sent;
      deliveredIn[contact] += sent;
    }
  }

  /** The newest bits of the lowest priority are lost first. */
  private void overflow(int craft, long second) {
    long over = Math.max(0, fill[craft] - capacity[craft]);
    overflows.note(craft, second, over);
    lost[craft] += over;
    fill[craft] -= over;
    for (int dataClass = classCount - 1; dataClass >= 0 && over > 0; dataClass--) {
      long dropped = queues[craft][dataClass].dropNewest(over);
      lostOfClass[dataClass] += dropped;
      over -= dropped;
    }
  }

  private void point(long second) {
    for (int craft = 0; craft < craftCount; craft++) {
      List<Long> byClass = new ArrayList<>();
      for (AgeQueue queue : queues[craft]) {
        byClass.add(queue.total());
      }
      points.get(craft).add(new StorePoint(begin + second, fill[craft], byClass));
    }
  }

  private StoreRecord result() {
    List<StoreTrace> traces = new ArrayList<>();
    for (int craft = 0; craft < craftCount; craft++) {
      traces.add(
          new StoreTrace(
              scenario.craft().get(craft).name(),
              points.get(craft),
              start[craft],
              generated[craft],
              received[craft],
              forwarded[craft],
              downlinked[craft],
              lost[craft],
              fill[craft],
              highest[craft]));
    }
    List<Long> lateAboard = new ArrayList<>();
    List<ClassOutcome> classes = new ArrayList<>();
    for (int dataClass = 0; dataClass < classCount; dataClass++) {
      long bits = 0;
      for (int craft = 0; craft < craftCount; craft++) {
        bits += ages.lateAboard(queues[craft][dataClass], dataClass, seconds);
      }
      lateAboard.add(bits);
      classes.add(
          new ClassOutcome(
              scenario.rules().classes().get(dataClass).name(),
              deliveredOfClass[dataClass],
              ages.lateBits(dataClass),
              lostOfClass[dataClass],
              ages.longest(dataClass)));
    }
    return new StoreRecord(
        traces,
        contacts(),
        classes,
        overflows.closed(),
        overfills.closed(),
        ages.runs(),
        lateAboard);
  }

  private List<ContactOutcome> contacts() {
    List<ContactOutcome> outcomes = new ArrayList<>();
    for (int i = 0; i < images.size(); i++) {
      Image image = images.get(i);
      if (image.begin() >= image.end()) {
        continue;
      }
      outcomes.add(
          new ContactOutcome(
              image.contact().id(),
              Interval.of(
                  OnboardInstant.ofEpochSecond(begin + image.begin()),
                  OnboardInstant.ofEpochSecond(begin + image.end())),
              new DataVolume(image.capacityBits()),
              new DataVolume(deliveredIn[i]),
              Double.isFinite(longestIn[i])
                  ? OptionalDouble.of(longestIn[i])
                  : OptionalDouble.empty()));
    }
    return outcomes;
  }
}
