package quietspan.rules;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.tuple;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import quietspan.Seeds;
import quietspan.fixture.SyntheticSky;
import quietspan.fixture.TestScenario;
import quietspan.fixture.Variations;
import quietspan.model.Blocked;
import quietspan.model.Calendars;
import quietspan.model.Contact;
import quietspan.model.CraftState;
import quietspan.model.DataClass;
import quietspan.model.DataRules;
import quietspan.model.Decisions;
import quietspan.model.Finding;
import quietspan.model.Geometry;
import quietspan.model.Pass;
import quietspan.model.RateStep;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.Waiver;
import quietspan.planning.simulation.Simulation;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.units.Angle;
import quietspan.units.DataRate;

/** Two craft, three days from midnight; light takes 100 s, delivery 5 min. */
final class WaiversTest {

  private final TestScenario world = TestScenario.three();
  private final FlatSky sky = new FlatSky();
  private final List<Opportunity> opportunities = new ArrayList<>();

  WaiversTest() {
    world.days = 3;
    world.craft.remove(2);
    world.states.remove(2);
    limits(Duration.ofHours(30), null);
    classes(36);
  }

  private void limits(Duration gap, Duration direct) {
    world.data =
        new DataRules(
            Optional.ofNullable(gap),
            Optional.ofNullable(direct),
            Optional.empty(),
            Optional.empty(),
            Duration.ZERO,
            true);
  }

  private void classes(double... limitHours) {
    List<DataClass> classes = new ArrayList<>();
    String[] names = {"quicklook", "housekeeping", "bulk"};
    for (int k = 0; k < names.length; k++) {
      double hours = k < limitHours.length ? limitHours[k] : 1_000;
      classes.add(new DataClass(names[k], k + 1, Duration.ofMillis((long) (hours * 3_600_000))));
    }
    world.classes = classes;
  }

  /** An opportunity between two ground instants, hours after midnight of the first day. */
  private void opportunity(String craft, double fromHours, double toHours) {
    Interval<GroundInstant> during = Interval.of(hours(fromHours), hours(toHours));
    Pass pass =
        new Pass(
            "Ostrand",
            craft,
            during,
            during.begin(),
            Angle.ofDegrees(45),
            Angle.ofDegrees(100),
            Angle.ofDegrees(260),
            false);
    opportunities.add(new Opportunity("Ostrand", "main", craft, during, pass));
  }

  private static GroundInstant hours(double hours) {
    return FlatSky.noonPlus((hours - 12) * 3_600);
  }

  private List<Waiver> waivers(RuleId rule) {
    Geometry geometry = new Geometry(sky, List.of(), 1, List.of());
    return Waivers.of(world.build(), geometry, opportunities).stream()
        .filter(waiver -> waiver.rule() == rule)
        .toList();
  }

  private static Instant at(double hours) {
    return hours(hours).utc();
  }

  @Test
  void aGapAsLongAsTheLimitIsNotWaived() {
    opportunity("Hask", 1, 2);
    opportunity("Merle", 32, 60);
    assertThat(waivers(RuleId.GAP)).isEmpty();
  }

  @Test
  void aLongerGapIsWaivedByJustAsMuch() {
    opportunity("Hask", 1, 2);
    opportunity("Merle", 32.5, 60);
    assertThat(waivers(RuleId.GAP))
        .containsExactly(
            new Waiver(
                RuleId.GAP,
                "",
                "",
                at(2),
                at(32.5),
                Duration.ofMinutes(30 * 60 + 30),
                "no opportunity from 2031-09-01T02:00:00Z to 2031-09-02T08:30:00Z"));
  }

  /** From the period's begin plus 100 s of light to 40 h, and from 41 h to 72 h and 100 s. */
  @Test
  void gapsAtTheEndsOfThePeriodCount() {
    opportunity("Hask", 40, 41);
    assertThat(waivers(RuleId.GAP))
        .extracting(Waiver::relaxedLimit)
        .containsExactly(
            Duration.ofHours(40).minusSeconds(100), Duration.ofHours(31).plusSeconds(100));
  }

  @Test
  void theFirstGapBeginsWithTheLastContactBeforeThePeriod() {
    lastContact(0, -10);
    lastContact(1, -5.5);
    opportunity("Hask", 25, 26);
    opportunity("Hask", 50, 71);
    assertThat(waivers(RuleId.GAP))
        .extracting(Waiver::begin, Waiver::relaxedLimit)
        .containsExactly(tuple(at(-5.5), Duration.ofMinutes(30 * 60 + 30)));
  }

  private void lastContact(int craft, double endHours) {
    CraftState state = world.states.get(craft);
    world.states.set(
        craft,
        new CraftState(
            state.craft(),
            state.aim(),
            state.fill(),
            Optional.of(hours(endHours)),
            state.lastRepoint()));
  }

  @Test
  void partsOfASecondAreRoundedUp() {
    opportunity("Hask", 1, 2);
    opportunity("Merle", 33 + 0.25 / 3_600, 60);
    assertThat(waivers(RuleId.GAP))
        .extracting(Waiver::relaxedLimit)
        .containsExactly(Duration.ofHours(31).plusSeconds(1));
  }

  @Test
  void directLooksAtEachCraftAlone() {
    limits(null, Duration.ofHours(40));
    opportunity("Hask", 1, 2);
    opportunity("Merle", 20, 21);
    opportunity("Hask", 43, 44);
    opportunity("Merle", 60, 61);
    assertThat(waivers(RuleId.DIRECT))
        .extracting(Waiver::craft, Waiver::begin, Waiver::relaxedLimit)
        .containsExactly(tuple("Hask", at(2), Duration.ofHours(41)));
    assertThat(waivers(RuleId.GAP)).isEmpty();
  }

  /** 20 h on the ground, 100 s of light, 300 s of delivery. */
  @Test
  void latencyIsRelaxedByStretchLightAndDelivery() {
    classes(12, 20.2);
    opportunity("Hask", 1, 20);
    opportunity("Merle", 40, 71);
    assertThat(waivers(RuleId.LATENCY))
        .containsExactly(
            new Waiver(
                RuleId.LATENCY,
                "",
                "quicklook",
                at(20).minusSeconds(100),
                at(40).minusSeconds(100),
                Duration.ofHours(20).plusSeconds(400),
                "no opportunity from 2031-09-01T20:00:00Z to 2031-09-02T16:00:00Z"));
  }

  /** 400 s beyond 20 h: the limit is reached, then missed by a second. */
  @Test
  void lightAndDeliveryCountAgainstTheLimit() {
    opportunity("Hask", 1, 20);
    opportunity("Merle", 40, 71);
    classes(20 + 400 / 3_600.0);
    assertThat(waivers(RuleId.LATENCY)).isEmpty();
    classes(20 + 399 / 3_600.0);
    assertThat(waivers(RuleId.LATENCY)).hasSize(1);
  }

  @Test
  void aCraftWithoutCrossLinkNeedsItsOwnOpportunity() {
    classes(30);
    world.craft.set(1, Variations.withCrossLink(world.craft.get(1), DataRate.ZERO));
    opportunity("Merle", 1, 2);
    opportunity("Hask", 20, 21);
    opportunity("Hask", 40, 41);
    opportunity("Merle", 42, 71);
    opportunity("Hask", 60, 71);
    assertThat(waivers(RuleId.LATENCY))
        .extracting(Waiver::craft, Waiver::begin, Waiver::relaxedLimit)
        .containsExactly(
            tuple("Merle", at(2).minusSeconds(100), Duration.ofHours(40).plusSeconds(400)));
  }

  /** What is aboard at the end is judged by its age there: from 50 h less 100 s to 72 h. */
  @Test
  void theLastStretchEndsWithThePeriod() {
    classes(12);
    opportunity("Hask", 0.1, 50);
    assertThat(waivers(RuleId.LATENCY))
        .extracting(Waiver::relaxedLimit)
        .containsExactly(Duration.ofHours(22).plusSeconds(100));
  }

  @Test
  void withoutLimitsOnlyLatencyIsLeft() {
    limits(null, null);
    classes(1_000);
    assertThat(waivers(RuleId.GAP)).isEmpty();
    assertThat(waivers(RuleId.DIRECT)).isEmpty();
    assertThat(waivers(RuleId.LATENCY)).isEmpty();
  }

  private static final class Sky {
    final TestScenario world = TestScenario.three();

    Sky(SplittableRandom random) {
      world.days = 6;
      List<Blocked> blocked = new ArrayList<>();
      for (int i = 0; i < 6; i++) {
        GroundInstant begin =
            new GroundInstant(world.begin).plusSeconds((long) random.nextInt(5 * 86_400));
        blocked.add(
            new Blocked(
                Blocked.Why.OUTAGE,
                world.stations.get(random.nextInt(3)).name(),
                Optional.empty(),
                Interval.of(begin, Duration.ofHours(1 + random.nextInt(60))),
                "outage " + i));
      }
      world.calendars = new Calendars(blocked, List.of(), List.of(), List.of());
    }

    void limits(Duration gap, Duration direct) {
      world.data =
          new DataRules(
              Optional.of(gap),
              Optional.of(direct),
              Optional.empty(),
              Optional.empty(),
              Duration.ZERO,
              true);
    }
  }

  @Seeds(count = 6)
  void aWaiverIsGoneWhenTheLimitIsAsLongAsTheStretch(SplittableRandom random) {
    Sky sky = new Sky(random);
    sky.limits(Duration.ofHours(3), Duration.ofHours(4));
    Scenario tight = sky.world.build();
    List<Waiver> waivers = Waivers.of(tight, new SyntheticSky(tight).geometry());
    for (RuleId rule : List.of(RuleId.GAP, RuleId.DIRECT)) {
      Duration longest =
          waivers.stream()
              .filter(waiver -> waiver.rule() == rule)
              .map(Waiver::relaxedLimit)
              .max(Duration::compareTo)
              .orElseThrow();
      sky.limits(longest, longest);
      Scenario loose = sky.world.build();
      assertThat(Waivers.of(loose, new SyntheticSky(loose).geometry()))
          .noneMatch(waiver -> waiver.rule() == rule);
      sky.limits(longest.minusSeconds(2), longest.minusSeconds(2));
      Scenario near = sky.world.build();
      assertThat(Waivers.of(near, new SyntheticSky(near).geometry()))
          .anyMatch(waiver -> waiver.rule() == rule);
    }
  }

  /** Whoever hears at every opportunity keeps the relaxed limits, and no shorter ones. */
  @Seeds(count = 6)
  void usingEveryOpportunityJustKeepsTheRelaxedLimits(SplittableRandom random) {
    Sky sky = new Sky(random);
    sky.limits(Duration.ofHours(3), Duration.ofHours(4));
    Scenario scenario = sky.world.build();
    Geometry geometry = new SyntheticSky(scenario).geometry();
    List<Contact> contacts = new ArrayList<>();
    for (Opportunity one : Opportunities.of(scenario, geometry)) {
      contacts.add(
          new Contact(
              "c" + contacts.size(),
              one.station(),
              one.antenna(),
              one.craft(),
              one.during(),
              List.of(new RateStep(one.during().begin(), new DataRate(200_000))),
              Set.of(Contact.Service.TELEMETRY),
              Contact.Status.CONFIRMED));
    }
    Decisions all = new Decisions(List.of(), contacts);
    List<Waiver> waivers = Waivers.of(scenario, geometry);

    assertThat(gaps(scenario, geometry, all, waivers)).isEmpty();

    List<Waiver> shorter =
        waivers.stream()
            .map(
                waiver ->
                    new Waiver(
                        waiver.rule(),
                        waiver.craft(),
                        waiver.dataClass(),
                        waiver.begin(),
                        waiver.end(),
                        waiver.relaxedLimit().minusSeconds(1),
                        waiver.reason()))
            .toList();
    assertThat(gaps(scenario, geometry, all, shorter))
        .hasSize((int) waivers.stream().filter(one -> one.rule() != RuleId.LATENCY).count())
        .isNotEmpty();
  }

  private static List<Finding> gaps(
      Scenario scenario, Geometry geometry, Decisions decisions, List<Waiver> waivers) {
    return Simulation.simulate(scenario, geometry.sightLines(), decisions, waivers)
        .findings()
        .stream()
        .filter(one -> one.rule() == RuleId.GAP || one.rule() == RuleId.DIRECT)
        .toList();
  }
}
