package quietspan.agreement;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import quietspan.check.Check;
import quietspan.check.CheckReport;
import quietspan.check.Stale;
import quietspan.fixture.SyntheticSky;
import quietspan.fixture.TestScenario;
import quietspan.model.ContactRules;
import quietspan.model.Craft;
import quietspan.model.Decisions;
import quietspan.model.Finding;
import quietspan.model.Geometry;
import quietspan.model.HighGainAntenna;
import quietspan.model.LinkBudget;
import quietspan.model.Margins;
import quietspan.model.Outcome;
import quietspan.model.Pass;
import quietspan.model.Plan;
import quietspan.model.Provenance;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.Waiver;
import quietspan.planning.Planner;
import quietspan.planning.simulation.Simulation;
import quietspan.rules.Waivers;
import quietspan.time.Interval;
import quietspan.units.Angle;

/**
 * A planner that works with a fault believes its plan to be legal; the check, which shares nothing
 * of the faulty part, does not.
 */
final class FaultInjectionTest {

  private static final int DAYS = 10;
  private static final Scenario TRUE = world().build();
  private static final Geometry SKY = new SyntheticSky(TRUE).geometry();
  private static final List<Waiver> WAIVERS = Waivers.of(TRUE, SKY);

  private static TestScenario world() {
    TestScenario world = TestScenario.three();
    world.days = DAYS;
    return world;
  }

  private static Planner.Result plan(Scenario scenario, Geometry geometry) {
    return Planner.plan(
        scenario,
        geometry,
        WAIVERS,
        new Planner.Options(1, 0, 10_000),
        stage -> {},
        new AtomicBoolean());
  }

  private static CheckReport check(Decisions decisions) {
    return Check.check(TRUE, SKY.sightLines(), decisions, WAIVERS);
  }

  private static Set<RuleId> rules(List<Finding> findings) {
    return findings.stream().map(Finding::rule).collect(Collectors.toSet());
  }

  private static Plan stored(Decisions decisions, Outcome outcome) {
    return new Plan(
        "Test formation",
        decisions,
        outcome,
        Optional.empty(),
        new Provenance("1", List.of(), List.of(), 1, 0, 0, false, WAIVERS));
  }

  private static Stale stale(Plan plan) {
    return Stale.compare(plan, check(plan.decisions()).recount(), List.of(), WAIVERS);
  }

  @Test
  void withoutAFaultPlannerAndCheckAreOfOneMind() {
    Planner.Result result = plan(TRUE, SKY);
    assertThat(result.decisions().contacts()).hasSizeGreaterThan(DAYS);
    assertThat(result.outcome().findings()).isEmpty();
    assertThat(check(result.decisions()).findings()).isEmpty();
    assertThat(stale(stored(result.decisions(), result.outcome())).differences()).isEmpty();
  }

  /** The link carries all of its rate from the first second on. */
  private static Scenario forgetsLosses() {
    TestScenario world = world();
    ContactRules rules = world.contacts;
    world.contacts =
        new ContactRules(
            Duration.ZERO,
            rules.rateSteps(),
            rules.relock(),
            rules.contactsAtOnce(),
            rules.craftSwitch(),
            0);
    Margins margins = world.margins;
    world.margins =
        new Margins(
            1, margins.plannedFillShare(), margins.pointingAllowance(), margins.coneAllowance());
    return world.build();
  }

  @Test
  void aSimulationThatForgetsLossesLeavesDataTooLate() {
    Planner.Result result = plan(forgetsLosses(), SKY);
    assertThat(result.outcome().findings()).isEmpty();
    assertThat(rules(check(result.decisions()).findings())).contains(RuleId.LATENCY);
  }

  @Test
  void whatAFaultySimulationSaysIsStale() {
    Decisions decisions = plan(TRUE, SKY).decisions();
    Outcome wrong = Simulation.simulate(forgetsLosses(), SKY.sightLines(), decisions, WAIVERS);
    Stale stale = stale(stored(decisions, wrong));
    assertThat(stale.verdict()).isEqualTo(Stale.Verdict.STALE);
    String contact = decisions.contacts().get(0).id();
    assertThat(stale.differences())
        .extracting(Stale.Difference::what)
        .contains("contact " + contact + " capacity in bit");
  }

  @Test
  void passesThatRiseTooEarlyAreBelowTheMask() {
    Duration early = Duration.ofMinutes(20);
    List<Pass> wide =
        SKY.passes().stream()
            .map(
                pass ->
                    new Pass(
                        pass.station(),
                        pass.craft(),
                        Interval.of(
                            pass.visible().begin().minus(early), pass.visible().end().plus(early)),
                        pass.culmination(),
                        pass.highestElevation(),
                        pass.riseAzimuth(),
                        pass.setAzimuth(),
                        pass.clipped()))
            .toList();
    Geometry faulty = new Geometry(SKY.sightLines(), wide, SKY.guardSeconds(), SKY.sources());
    Planner.Result result = plan(TRUE, faulty);
    assertThat(result.outcome().findings()).isEmpty();
    assertThat(rules(check(result.decisions()).findings())).contains(RuleId.ABOVE_MASK);
  }

  @Test
  void aRateChosenWithoutTheMarginDoesNotClose() {
    TestScenario world = world();
    LinkBudget link = world.link.orElseThrow();
    world.link =
        Optional.of(
            new LinkBudget(
                link.frequencyHz(),
                link.requiredEbN0Db(),
                link.implementationLossDb(),
                link.otherLossesDb(),
                link.marginDb() - 2));
    Planner.Result result = plan(world.build(), SKY);
    assertThat(result.outcome().findings()).isEmpty();
    assertThat(rules(check(result.decisions()).findings())).contains(RuleId.LINK_MARGIN);
  }

  @Test
  void aBeamBelievedTooWideLosesTheEarth() {
    TestScenario world = world();
    world.craft.replaceAll(FaultInjectionTest::wider);
    Planner.Result result = plan(world.build(), SKY);
    assertThat(result.outcome().findings()).isEmpty();
    assertThat(rules(check(result.decisions()).findings())).contains(RuleId.OFF_POINTING);
  }

  private static Craft wider(Craft craft) {
    HighGainAntenna antenna = craft.antenna();
    return new Craft(
        craft.name(),
        craft.orbit(),
        craft.attitude(),
        new HighGainAntenna(
            antenna.steering(),
            antenna.ratedHalfCone().plus(Angle.ofDegrees(0.15)),
            antenna.halfPowerWidth(),
            antenna.move(),
            antenna.settle(),
            antenna.repointSpacing()),
        craft.rates(),
        craft.store(),
        craft.crossLink(),
        craft.generation());
  }
}
