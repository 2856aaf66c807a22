package quietspan.planning.simulation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.tuple;
import static org.assertj.core.api.Assertions.within;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import quietspan.fixture.SyntheticSky;
import quietspan.fixture.TestScenario;
import quietspan.fixture.Variations;
import quietspan.model.Aim;
import quietspan.model.Contact;
import quietspan.model.ContactRules;
import quietspan.model.CraftState;
import quietspan.model.DataClass;
import quietspan.model.DataRules;
import quietspan.model.Decisions;
import quietspan.model.Finding;
import quietspan.model.Generation;
import quietspan.model.Margins;
import quietspan.model.Outcome;
import quietspan.model.Profile;
import quietspan.model.RateStep;
import quietspan.model.Repoint;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.StoreTrace;
import quietspan.model.Waiver;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;
import quietspan.units.DataRate;
import quietspan.units.DataVolume;

/**
 * One craft, a thousand seconds, 100 bit/s of one class, light for 250 s and a trifle, delivery
 * after 300 s, no overhead, no lock-up: everything can be counted by hand.
 */
final class SimulationTest {

  private static final long SECONDS = 1_000;

  private final TestScenario world = TestScenario.one();
  private final List<Contact> contacts = new ArrayList<>();
  private final List<Repoint> repoints = new ArrayList<>();
  private List<Waiver> waivers = List.of();
  private long store = 1_000_000;
  private long fill;
  private Duration latency = Duration.ofHours(10);
  private Optional<Double> endFillShare = Optional.of(1.0);
  private Optional<Duration> gap = Optional.empty();
  private Optional<Duration> direct = Optional.empty();
  private Optional<Duration> endCoverage = Optional.empty();
  private long length = SECONDS;

  SimulationTest() {
    world.contacts = new ContactRules(Duration.ZERO, 3, Duration.ZERO, 1, Duration.ZERO, 0);
    world.margins = new Margins(1, 1, Angle.ofDegrees(0.1), Angle.ofDegrees(0.01));
  }

  private Scenario scenario() {
    world.classes = List.of(new DataClass("bulk", 1, latency));
    Profile profile =
        new Profile(List.of(new Profile.Step(new OnboardInstant(world.begin), new DataRate(100))));
    world.craft.set(
        0,
        Variations.withStore(
            world.craft.get(0),
            new DataVolume(store),
            List.of(new Generation("bulk", profile, 0.25))));
    world.states.set(
        0,
        Variations.withFill(
            world.states.get(0),
            List.of(new CraftState.Fill("bulk", new DataVolume(fill), Optional.empty()))));
    world.data = new DataRules(gap, direct, endFillShare, endCoverage, Duration.ZERO, true);
    return Variations.lasting(world.build(), Duration.ofSeconds(length));
  }

  private Outcome outcome() {
    Scenario scenario = scenario();
    return Simulation.simulate(
        scenario, new SyntheticSky(scenario), new Decisions(repoints, contacts), waivers);
  }

  private StoreTrace trace() {
    return outcome().stores().get(0);
  }

  private List<Finding> findings(RuleId rule) {
    return outcome().findings().stream().filter(one -> one.rule() == rule).toList();
  }

  private OnboardInstant onboard(long second) {
    return new OnboardInstant(world.begin).plusSeconds(second);
  }

  /** A contact whose image begins 250 s and a part of a second before it. */
  private void contact(long fromOnboard, long toOnboard, long rate) {
    GroundInstant begin = new GroundInstant(world.begin).plusSeconds(fromOnboard + 250);
    RateStep step = new RateStep(begin, new DataRate(rate));
    contact(toOnboard - fromOnboard + 1, List.of(step), Contact.Status.CONFIRMED);
  }

  private void contact(long seconds, List<RateStep> steps, Contact.Status status) {
    GroundInstant begin = steps.get(0).from();
    contacts.add(
        new Contact(
            "c" + contacts.size(),
            "Vellmarch",
            "main",
            "Hask",
            Interval.of(begin, begin.plusSeconds(seconds)),
            steps,
            Set.of(Contact.Service.TELEMETRY),
            status));
  }

  @Test
  void theImageIsRoundedInward() {
    contact(100, 200, 1_000);
    assertThat(outcome().contacts().get(0).onboard())
        .isEqualTo(Interval.of(onboard(100), onboard(200)));
  }

  /** 10 000 bit gathered and 100 a second made: at 300 bit/s dry after 50 s. */
  @Test
  void theStoreDrainsAndThenPassesOnWhatIsMade() {
    contact(100, 200, 300);
    Outcome outcome = outcome();
    assertThat(outcome.contacts().get(0).capacity()).isEqualTo(new DataVolume(30_000));
    assertThat(outcome.contacts().get(0).delivered()).isEqualTo(new DataVolume(20_000));
    assertThat(outcome.stores().get(0).points())
        .extracting(
            point -> point.onboardEpochSecond() - world.begin.getEpochSecond(),
            point -> point.fillBits())
        .containsExactly(
            tuple(0L, 0L),
            tuple(100L, 10_000L),
            tuple(150L, 0L),
            tuple(200L, 0L),
            tuple(1_000L, 80_000L));
  }

  @Test
  void lockUpOverheadAndUsableShareCostCapacity() {
    world.contacts =
        new ContactRules(Duration.ofSeconds(10), 3, Duration.ZERO, 1, Duration.ZERO, 0.1);
    world.margins = new Margins(0.9, 1, Angle.ofDegrees(0.1), Angle.ofDegrees(0.01));
    contact(100, 200, 1_000);
    assertThat(outcome().contacts().get(0).capacity()).isEqualTo(new DataVolume(90 * 810));
  }

  /** Steps at 100 and 140 on board; re-lock 5 s. */
  @Test
  void aChangeOfRateCostsItsLock() {
    world.contacts =
        new ContactRules(Duration.ofSeconds(10), 3, Duration.ofSeconds(5), 1, Duration.ZERO, 0);
    GroundInstant begin = new GroundInstant(world.begin).plusSeconds(350L);
    RateStep first = new RateStep(begin, new DataRate(1_000));
    RateStep second = new RateStep(begin.plusSeconds(40L), new DataRate(500));
    contact(101, List.of(first, second), Contact.Status.CONFIRMED);
    assertThat(outcome().contacts().get(0).capacity())
        .isEqualTo(new DataVolume(30 * 1_000 + 55 * 500));
  }

  @Test
  void cancelledContactsDoNothing() {
    GroundInstant begin = new GroundInstant(world.begin).plusSeconds(350L);
    RateStep only = new RateStep(begin, new DataRate(1_000));
    contact(101, List.of(only), Contact.Status.CANCELLED);
    Outcome outcome = outcome();
    assertThat(outcome.contacts()).isEmpty();
    assertThat(outcome.contactHours()).isZero();
    assertThat(outcome.stationCostUnits()).isZero();
    assertThat(outcome.stores().get(0).downlinkedBits()).isZero();
  }

  /** 10 units an hour and 2 a contact; each contact lasts a second more than its image. */
  @Test
  void hoursAndCostAreThoseOfTheStation() {
    contact(0, 359, 1_000);
    contact(500, 859, 1_000);
    assertThat(outcome().contactHours()).isCloseTo(0.2, within(1e-12));
    assertThat(outcome().stationCostUnits()).isCloseTo(6, within(1e-12));
  }

  /** 4 h 20 min of pause from second 500: a quarter is made. */
  @Test
  void lessIsMadeInPauses() {
    repoints.add(new Repoint("r", "Hask", onboard(500), new Aim(0, 0)));
    assertThat(trace().generatedBits()).isEqualTo(500 * 100 + 500 * 25);
  }

  @Test
  void aFullStoreLosesNothingUntilItIsBeyondFull() {
    store = 100_000;
    assertThat(findings(RuleId.OVERFLOW)).isEmpty();
    store = 99_999;
    assertThat(findings(RuleId.OVERFLOW))
        .extracting(Finding::at, Finding::craft, Finding::amount)
        .containsExactly(tuple(onboard(999).utc(), "Hask", 1.0));
  }

  /** Beyond 99 700 bit at the end of seconds 997, 998 and 999: by 100, 200 and 300 bit. */
  @Test
  void fillAtTheLimitIsAllowedAndEachBitBeyondCounts() {
    world.margins = new Margins(1, 0.1, Angle.ZERO, Angle.ZERO);
    store = 1_000_000;
    assertThat(findings(RuleId.FILL)).isEmpty();
    store = 997_000;
    assertThat(findings(RuleId.FILL))
        .extracting(Finding::at, Finding::amount)
        .containsExactly(tuple(onboard(997).utc(), 600.0));
  }

  @Test
  void theStoreAtTheEndMayBeAsFullAsAsked() {
    endFillShare = Optional.of(0.1);
    assertThat(findings(RuleId.END_FILL)).isEmpty();
    store = 999_990;
    assertThat(findings(RuleId.END_FILL))
        .extracting(Finding::at, Finding::amount)
        .containsExactly(tuple(onboard(SECONDS).utc(), 1.0));
  }

  /** A quarter of 360 000 is 90 000; a start fill above that counts instead. */
  @Test
  void withoutALimitTheEndMayBeAQuarterOrAsFullAsTheBegin() {
    endFillShare = Optional.empty();
    store = 400_000;
    assertThat(findings(RuleId.END_FILL)).isEmpty();
    store = 360_000;
    assertThat(findings(RuleId.END_FILL)).extracting(Finding::amount).containsExactly(10_000.0);
    fill = 95_000;
    assertThat(findings(RuleId.END_FILL)).extracting(Finding::amount).containsExactly(100_000.0);
  }

  /**
   * Made in second 0, sent in second 400, received 401 s and 250.0007 s of light later, delivered
   * 300 s after that: 951.0007 s old. From then on twice as much is sent as made, so ages fall.
   */
  @ParameterizedTest(name = "limit {0} ms: {1} bit late")
  @CsvSource({"951001, 0", "951000, 100", "950001, 100", "950000, 300"})
  void bitsAreLateBeyondTheLimitOnly(long limitMillis, double late) {
    latency = Duration.ofMillis(limitMillis);
    contact(400, 1_000, 200);
    List<Finding> found = findings(RuleId.LATENCY);
    assertThat(found.stream().mapToDouble(Finding::amount).sum()).isEqualTo(late);
    found.forEach(
        one ->
            assertThat(one)
                .extracting(Finding::craft, Finding::station, Finding::subject)
                .containsExactly("Hask", "Vellmarch", "bulk"));
    assertThat(outcome().classes().get(0).lateBits()).isEqualTo((long) late);
    assertThat(outcome().classes().get(0).longestLatencySeconds().orElseThrow())
        .isCloseTo(951.0007, within(1e-4));
  }

  @Test
  void aWaivedStretchHasItsOwnLimit() {
    latency = Duration.ofSeconds(950);
    contact(400, 1_000, 200);
    waivers = List.of(latencyWaiver(0, 1, 952));
    assertThat(outcome().classes().get(0).lateBits()).isEqualTo(200);
    waivers = List.of(latencyWaiver(0, 400, 952));
    assertThat(findings(RuleId.LATENCY)).isEmpty();
    waivers = List.of(latencyWaiver(0, 400, 951));
    assertThat(outcome().classes().get(0).lateBits()).isEqualTo(100);
  }

  private Waiver latencyWaiver(long from, long to, long seconds) {
    return new Waiver(
        RuleId.LATENCY,
        "",
        "bulk",
        onboard(from).utc(),
        onboard(to).utc(),
        Duration.ofSeconds(seconds),
        "by hand");
  }

  /** Seconds 0 to 399 are more than 600 s old at second 1 000. */
  @Test
  void whatIsAboardAtTheEndIsJudgedByItsAge() {
    latency = Duration.ofMinutes(10);
    assertThat(findings(RuleId.LATENCY))
        .extracting(Finding::craft, Finding::subject, Finding::amount)
        .containsExactly(tuple("", "bulk", 40_000.0));
    assertThat(findings(RuleId.LATENCY).get(0).at())
        .isBetween(onboard(1_250).utc(), onboard(1_251).utc());
  }

  /** From 250.0 s, the begin on the ground, to 350 s; from 451 s to 1 250.001 s. */
  @Test
  void gapsRunFromTheBeginAndToTheEnd() {
    contact(100, 200, 1_000);
    gap = Optional.of(Duration.ofSeconds(800));
    direct = Optional.of(Duration.ofSeconds(99));
    assertThat(findings(RuleId.GAP)).isEmpty();
    assertThat(findings(RuleId.DIRECT))
        .extracting(Finding::subject, Finding::amount)
        .satisfiesExactly(
            first -> assertThat((double) first.toList().get(1)).isCloseTo(0.9998, within(1e-3)),
            last -> assertThat((double) last.toList().get(1)).isCloseTo(700.001, within(1e-3)));
    gap = Optional.of(Duration.ofSeconds(799));
    assertThat(findings(RuleId.GAP)).hasSize(1);
    assertThat(findings(RuleId.GAP).get(0).at())
        .isEqualTo(new GroundInstant(world.begin).plusSeconds(451L + 799).utc());
  }

  @Test
  void aGapIsJudgedByTheLongestWaiverThatOverlapsIt() {
    contact(100, 200, 1_000);
    gap = Optional.of(Duration.ofSeconds(500));
    Waiver waiver =
        new Waiver(
            RuleId.GAP,
            "",
            "",
            onboard(600).utc(),
            onboard(700).utc(),
            Duration.ofSeconds(800),
            "by hand");
    assertThat(findings(RuleId.GAP)).hasSize(1);
    waivers = List.of(waiver);
    assertThat(findings(RuleId.GAP)).isEmpty();
  }

  /** Against a look every second for ten days after the end. */
  @ParameterizedTest(name = "aim {0} hundredths of a degree ahead")
  @CsvSource({"-250", "-150", "0", "100", "180", "199"})
  void coverageAtTheEndIsThatOfAllLooks(int ahead) {
    length = 86_400;
    endCoverage = Optional.of(Duration.ofDays(10));
    repoints.add(new Repoint("r", "Hask", onboard(40_000), new Aim(4_098 + ahead, 802)));
    Scenario scenario = scenario();
    SightLines sky = new SyntheticSky(scenario);
    double cone = Math.toRadians(2.1 - 0.01 - 0.1);
    long covered = 0;
    while (covered < 10 * 86_400
        && sky.earth("Hask", sky.ground("Hask", onboard(length + covered)))
                .separation(new Aim(4_098 + ahead, 802).direction())
            <= cone) {
      covered++;
    }

    assertThat(findings(RuleId.END_COVERAGE))
        .extracting(Finding::craft, Finding::amount, Finding::at)
        .containsExactly(tuple("Hask", 10 * 86_400.0 - covered, onboard(length + covered).utc()));
    endCoverage = Optional.of(Duration.ofSeconds(covered > 0 ? covered - 1 : 0));
    assertThat(findings(RuleId.END_COVERAGE)).isEmpty();
  }

  @Test
  void lightTimeBetweenTheHoursIsThatOfTheSky() {
    length = 10_000;
    Scenario scenario = scenario();
    SightLines sky = new SyntheticSky(scenario);
    LightTable table = LightTable.of(scenario, sky);
    for (long second = 0; second <= length; second += 37) {
      Duration solved = Duration.between(world.begin, sky.ground("Hask", onboard(second)).utc());
      assertThat(table.receivedNanos(0, second) / 1e9)
          .isCloseTo(solved.toNanos() / 1e9, within(1e-3));
    }
  }
}
