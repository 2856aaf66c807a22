package quietspan.agreement;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Comparator;
import java.util.EnumSet;
import java.util.List;
import java.util.Random;
import java.util.Set;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import quietspan.Seeds;
import quietspan.check.Check;
import quietspan.model.ContactOutcome;
import quietspan.model.Finding;
import quietspan.model.Outcome;
import quietspan.model.RuleId;
import quietspan.model.StorePoint;
import quietspan.model.StoreTrace;
import quietspan.planning.simulation.Simulation;

/**
 * The simulation of the planner and the loops of the check were written apart, from the rules
 * alone. Whatever follows from decisions is the same in both, to the bit.
 */
final class SimulationAgreementTest {

  @Seeds(count = 60)
  void bothCountTheSame(Random random) {
    AnyWorld world = AnyWorld.of(random);
    Outcome planned =
        Simulation.simulate(world.scenario(), world.sight(), world.decisions(), world.waivers());
    Outcome checked =
        Check.check(world.scenario(), world.sight(), world.decisions(), world.waivers()).recount();
    assertThat(checked.pauses()).isEqualTo(planned.pauses());
    assertThat(checked.quietSpans()).isEqualTo(planned.quietSpans());
    assertThat(checked.scienceSeconds()).isEqualTo(planned.scienceSeconds());
    assertThat(checked.contactHours()).isCloseTo(planned.contactHours(), within(1e-9));
    assertThat(checked.stationCostUnits()).isCloseTo(planned.stationCostUnits(), within(1e-9));
    sameContacts(planned.contacts(), checked.contacts());
    sameStores(planned.stores(), checked.stores());
    sameClasses(planned, checked);
    sameFindings(planned.findings(), checked.findings());
  }

  @Test
  void theWorldsBreakEveryDataRule() {
    Set<RuleId> broken = EnumSet.noneOf(RuleId.class);
    for (long seed = 1; seed <= 30; seed++) {
      AnyWorld world = AnyWorld.of(new Random(seed));
      Simulation.simulate(world.scenario(), world.sight(), world.decisions(), world.waivers())
          .findings()
          .forEach(each -> broken.add(each.rule()));
    }
    assertThat(broken)
        .containsExactlyElementsOf(
            Arrays.stream(RuleId.values())
                .filter(each -> each.kind() == RuleId.Kind.DATA)
                .toList());
  }

  private static void sameContacts(List<ContactOutcome> planned, List<ContactOutcome> checked) {
    assertThat(checked).hasSameSizeAs(planned);
    for (int i = 0; i < planned.size(); i++) {
      ContactOutcome one = planned.get(i);
      ContactOutcome other = checked.get(i);
      assertThat(other.contact()).isEqualTo(one.contact());
      assertThat(other.onboard()).isEqualTo(one.onboard());
      assertThat(other.capacity()).as(one.contact()).isEqualTo(one.capacity());
      assertThat(other.delivered()).as(one.contact()).isEqualTo(one.delivered());
      if (one.longestLatencySeconds().isPresent()) {
        assertThat(other.longestLatencySeconds().orElseThrow())
            .as(one.contact())
            .isCloseTo(one.longestLatencySeconds().getAsDouble(), within(1e-3));
      }
    }
  }

  /** Totals, and the fill of every class at every instant at which both have a point. */
  private static void sameStores(List<StoreTrace> planned, List<StoreTrace> checked) {
    assertThat(checked).hasSameSizeAs(planned);
    for (int i = 0; i < planned.size(); i++) {
      StoreTrace one = planned.get(i);
      StoreTrace other = checked.get(i);
      String craft = one.craft();
      assertThat(other.craft()).isEqualTo(craft);
      assertThat(other.startBits()).as(craft).isEqualTo(one.startBits());
      assertThat(other.generatedBits()).as(craft).isEqualTo(one.generatedBits());
      assertThat(other.receivedBits()).as(craft).isEqualTo(one.receivedBits());
      assertThat(other.forwardedBits()).as(craft).isEqualTo(one.forwardedBits());
      assertThat(other.downlinkedBits()).as(craft).isEqualTo(one.downlinkedBits());
      assertThat(other.lostBits()).as(craft).isEqualTo(one.lostBits());
      assertThat(other.endBits()).as(craft).isEqualTo(one.endBits());
      assertThat(other.highestBits()).as(craft).isEqualTo(one.highestBits());
      TreeMap<Long, StorePoint> points = new TreeMap<>();
      one.points().forEach(point -> points.put(point.onboardEpochSecond(), point));
      int common = 0;
      for (StorePoint point : other.points()) {
        StorePoint same = points.get(point.onboardEpochSecond());
        if (same != null) {
          assertThat(point).as(craft).isEqualTo(same);
          common++;
        }
      }
      assertThat(common).as("instants in common").isGreaterThanOrEqualTo(2);
    }
  }

  private static void sameClasses(Outcome planned, Outcome checked) {
    assertThat(checked.classes()).hasSameSizeAs(planned.classes());
    for (int i = 0; i < planned.classes().size(); i++) {
      var one = planned.classes().get(i);
      var other = checked.classes().get(i);
      assertThat(other.dataClass()).isEqualTo(one.dataClass());
      assertThat(other.deliveredBits()).as(one.dataClass()).isEqualTo(one.deliveredBits());
      assertThat(other.lateBits()).as(one.dataClass()).isEqualTo(one.lateBits());
      assertThat(other.lostBits()).as(one.dataClass()).isEqualTo(one.lostBits());
      assertThat(other.longestLatencySeconds().isPresent())
          .isEqualTo(one.longestLatencySeconds().isPresent());
      assertThat(other.longestLatencySeconds().orElse(0))
          .as(one.dataClass())
          .isCloseTo(one.longestLatencySeconds().orElse(0), within(1e-3));
    }
  }

  /** Rules of contacts and repoints are not the simulation's. */
  private static void sameFindings(List<Finding> planned, List<Finding> checked) {
    List<Finding> one = dataFindings(planned);
    List<Finding> other = dataFindings(checked);
    assertThat(other.stream().map(SimulationAgreementTest::place).toList())
        .isEqualTo(one.stream().map(SimulationAgreementTest::place).toList());
    for (int i = 0; i < one.size(); i++) {
      assertThat(other.get(i).amount())
          .as(other.get(i).detail())
          .isCloseTo(one.get(i).amount(), within(1.01));
    }
  }

  private static String place(Finding finding) {
    // The sky is sampled by the one to the second, by the other to a hundredth of it.
    boolean ofSky = finding.rule() == RuleId.END_COVERAGE;
    return String.join(
        "|",
        finding.rule().name(),
        finding.craft(),
        finding.station(),
        finding.subject(),
        ofSky ? "" : Long.toString(finding.at().getEpochSecond()));
  }

  private static List<Finding> dataFindings(List<Finding> all) {
    return all.stream()
        .filter(each -> each.rule().kind() == RuleId.Kind.DATA)
        .sorted(
            Comparator.comparing(Finding::rule)
                .thenComparing(Finding::craft)
                .thenComparing(Finding::station)
                .thenComparing(Finding::subject)
                .thenComparing(Finding::at))
        .toList();
  }
}
