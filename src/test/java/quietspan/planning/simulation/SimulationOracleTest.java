package quietspan.planning.simulation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.Duration;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import quietspan.Seeds;
import quietspan.model.ClassOutcome;
import quietspan.model.ContactOutcome;
import quietspan.model.Finding;
import quietspan.model.Outcome;
import quietspan.model.StorePoint;
import quietspan.model.StoreTrace;

/** The simulation in jumps against the plain one, second by second. */
final class SimulationOracleTest {

  @Seeds(count = 250)
  void smallWorldsComeOutAsSecondBySecond(SplittableRandom random) {
    compare(new RandomWorld(random, 500 + random.nextInt(4_000)));
  }

  @Seeds(count = 4)
  void daysComeOutAsSecondBySecond(SplittableRandom random) {
    compare(new RandomWorld(random, 86_400 * (1 + random.nextInt(2)) + random.nextInt(1_000)));
  }

  private static void compare(RandomWorld world) {
    PlainStores plain = new PlainStores(world.scenario, world.sky, world.decisions, world.waivers);

    Outcome outcome =
        Simulation.simulate(world.scenario, world.sky, world.decisions, world.waivers);

    for (int c = 0; c < outcome.stores().size(); c++) {
      compareStore(outcome.stores().get(c), plain, c, world);
    }
    for (ContactOutcome contact : outcome.contacts()) {
      assertThat(contact.delivered().bits())
          .as("delivered by %s", contact.contact())
          .isEqualTo(plain.deliveredByContact.get(contact.contact()));
      assertThat(contact.capacity().bits())
          .as("capacity of %s", contact.contact())
          .isEqualTo(plain.capacityByContact.get(contact.contact()));
    }
    assertThat(outcome.contacts()).hasSameSizeAs(plain.deliveredByContact.keySet());
    for (int k = 0; k < outcome.classes().size(); k++) {
      compareClass(outcome.classes().get(k), plain, k);
    }
    compareFindings(outcome.findings(), plain.findings);
  }

  private static void compareStore(StoreTrace trace, PlainStores plain, int c, RandomWorld world) {
    long origin = world.scenario.period().begin().epochSecond();
    List<StorePoint> points = trace.points();
    long highest = 0;
    for (int i = 0; i + 1 < points.size(); i++) {
      StorePoint from = points.get(i);
      StorePoint to = points.get(i + 1);
      long length = to.onboardEpochSecond() - from.onboardEpochSecond();
      for (long j = 0; j <= length; j++) {
        int s = (int) (from.onboardEpochSecond() + j - origin);
        long fill = 0;
        for (int k = 0; k < from.bitsByClass().size(); k++) {
          long a = from.bitsByClass().get(k);
          long slope = (to.bitsByClass().get(k) - a) / length;
          if (a + slope * j != plain.held[c][k][s]) {
            assertThat(a + slope * j)
                .as("%s class %s at second %s", trace.craft(), k, s)
                .isEqualTo(plain.held[c][k][s]);
          }
          fill += a + slope * j;
        }
        highest = Math.max(highest, fill);
      }
    }
    int seconds = (int) world.scenario.period().length().toSeconds();
    assertThat(points.get(0).onboardEpochSecond()).isEqualTo(origin);
    assertThat(points.get(points.size() - 1).onboardEpochSecond()).isEqualTo(origin + seconds);
    for (int i = 1; i + 1 < points.size(); i++) {
      assertThat(slopes(points.get(i - 1), points.get(i)))
          .as("slopes around point %s of %s", i, trace.craft())
          .isNotEqualTo(slopes(points.get(i), points.get(i + 1)));
    }
    assertThat(trace.highestBits()).isEqualTo(highest);
    assertThat(trace.generatedBits()).isEqualTo(plain.generated[c]);
    assertThat(trace.receivedBits()).isEqualTo(plain.received[c]);
    assertThat(trace.forwardedBits()).isEqualTo(plain.forwarded[c]);
    assertThat(trace.downlinkedBits()).isEqualTo(plain.down[c]);
    assertThat(trace.lostBits()).isEqualTo(Arrays.stream(plain.lost[c]).sum());
  }

  private static List<Long> slopes(StorePoint from, StorePoint to) {
    long length = to.onboardEpochSecond() - from.onboardEpochSecond();
    return IntStream.range(0, from.bitsByClass().size())
        .mapToObj(k -> (to.bitsByClass().get(k) - from.bitsByClass().get(k)) / length)
        .toList();
  }

  private static void compareClass(ClassOutcome one, PlainStores plain, int k) {
    assertThat(one.deliveredBits()).isEqualTo(plain.deliveredByClass[k]);
    assertThat(one.lostBits()).isEqualTo(plain.lostByClass[k]);
    assertThat(one.lateBits())
        .as("late bits of %s", one.dataClass())
        .isEqualTo(plain.lateByClass[k]);
    // Light time is solved to the nanosecond on one side and interpolated on the other.
    assertThat(one.longestLatencySeconds().orElse(Double.NEGATIVE_INFINITY))
        .isCloseTo(plain.longestByClass[k], within(1e-6));
  }

  private static void compareFindings(List<Finding> ours, List<Finding> plain) {
    assertThat(ours).as("%s%nagainst%n%s", ours, plain).hasSameSizeAs(plain);
    // Not in order of time: instants of reception may differ by a nanosecond.
    Comparator<Finding> order =
        Comparator.comparing(Finding::rule)
            .thenComparing(Finding::craft)
            .thenComparing(Finding::station)
            .thenComparing(Finding::subject)
            .thenComparing(Finding::at);
    List<Finding> expected = plain.stream().sorted(order).toList();
    List<Finding> found = ours.stream().sorted(order).toList();
    for (int i = 0; i < found.size(); i++) {
      Finding one = found.get(i);
      Finding other = expected.get(i);
      assertThat(one.rule()).isEqualTo(other.rule());
      assertThat(one.craft()).isEqualTo(other.craft());
      assertThat(one.station()).isEqualTo(other.station());
      assertThat(one.subject()).isEqualTo(other.subject());
      assertThat(one.amount()).as("%s", one).isEqualTo(other.amount());
      assertThat(Duration.between(one.at(), other.at()).abs()).isLessThan(Duration.ofNanos(1_000));
    }
  }
}
