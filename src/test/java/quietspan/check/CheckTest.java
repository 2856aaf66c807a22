package quietspan.check;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.time.Duration;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import quietspan.model.Blocked;
import quietspan.model.ConfirmedContact;
import quietspan.model.Decisions;
import quietspan.model.Finding;
import quietspan.model.Frozen;
import quietspan.model.Guarded;
import quietspan.model.Interruption;
import quietspan.model.RuleId;
import quietspan.model.Waiver;

final class CheckTest {

  private static final long EVENING = 19 * 3600;
  private static final long NIGHT = 23 * 3600;
  private static final long DAY = World.DAY;

  @Test
  void aLegalPlanHasMarginsAndNoFindings() {
    World world = World.three(w -> w.repoint("r0", "Hask", NIGHT + 1800));
    CheckReport report = world.check();
    assertThat(report.legal()).isTrue();
    assertThat(report.breaksAuthority()).isFalse();
    assertThat(report.warnings()).isEmpty();
    CheckMargins margins = report.margins();
    assertThat(margins.offPointingDegrees().orElseThrow().subject()).isEqualTo("c2");
    assertThat(margins.offPointingDegrees().orElseThrow().value()).isBetween(0.0, 0.2);
    assertThat(margins.linkDecibels().orElseThrow().value()).isBetween(1.0, 5.0);
    // Twenty hours between two evenings, less an hour of teardown and setup.
    assertThat(margins.turnRoundSeconds().orElseThrow().value()).isEqualTo(19 * 3600);
    double rest = DAY + EVENING - 250 - (NIGHT + 1800 + 4 * 3600 + 1200);
    assertThat(margins.afterRepointSeconds().orElseThrow().value()).isCloseTo(rest, within(1.0));
    assertThat(margins.highestFillPercent().orElseThrow().value()).isBetween(1.0, 20.0);
    assertThat(margins.longestLatencySeconds())
        .extracting(CheckMargins.Extreme::subject)
        .containsExactly("quicklook", "bulk");
    assertThat(report.missable().sentence()).contains("30 s");
    assertThat(report.missable().elevationDegrees()).isBetween(0.01, 0.063);
  }

  @Test
  void costsAndHoursAreThoseOfTheContactsThatRemain() {
    World world = World.three(w -> w.cancel("c2"));
    assertThat(world.check().recount().contactHours()).isEqualTo(8);
    assertThat(world.check().recount().stationCostUnits()).isEqualTo(2 * 2 + 8 * 10);
  }

  @Test
  void findingsComeInOrderOfTime() {
    World world =
        World.three(
            w -> {
              w.contacts.clear();
              w.contact("late", "Vellmarch", "Hask", 2 * DAY + EVENING, 2 * DAY + NIGHT, 240_000);
              w.contact("early", "Vellmarch", "Hask", 10 * 3600, 11 * 3600, 64_000);
            });
    List<Finding> findings = world.check().findings();
    assertThat(findings)
        .isSortedAccordingTo(Comparator.comparing(Finding::at))
        .extracting(Finding::rule)
        .containsExactly(RuleId.ABOVE_MASK, RuleId.KEYHOLE, RuleId.GAP, RuleId.LINK_MARGIN);
  }

  @Test
  void aGapIsAllowedAsFarAsItsWaiverReaches() {
    World world = World.three(w -> w.cancel("c1"));
    double gap = 2 * DAY + EVENING - NIGHT;
    List<Finding> findings = world.check().findings();
    assertThat(findings).extracting(Finding::rule).containsExactly(RuleId.GAP);
    assertThat(findings.get(0).amount()).isEqualTo(gap - 30 * 3600);
    world.waivers.add(waiver(RuleId.GAP, "", (long) gap));
    assertThat(world.check().findings()).isEmpty();
    world.waivers.set(0, waiver(RuleId.GAP, "", (long) gap - 10));
    assertThat(world.check().findings().get(0).amount()).isEqualTo(10);
    world.waivers.set(0, waiver(RuleId.DIRECT, "Hask", (long) gap));
    assertThat(world.check().findings()).hasSize(1);
  }

  private static Waiver waiver(RuleId rule, String craft, long seconds) {
    return new Waiver(
        rule,
        craft,
        "",
        World.ground(DAY).utc(),
        World.ground(2 * DAY).utc(),
        Duration.ofSeconds(seconds),
        "no pass");
  }

  @Test
  void aConfirmedContactInAnOutageCountsAsCancelledAndSomebodyIsTold() {
    World world =
        World.three(
            w -> {
              w.confirmed.add(promise("k1", "Vellmarch"));
              w.blocked.add(
                  new Blocked(
                      Blocked.Why.OUTAGE,
                      "Vellmarch",
                      Optional.empty(),
                      World.ground(EVENING + 3600, EVENING + 3700),
                      "bearing change"));
              w.cancel("c0");
              w.contact("x", "Corrin Downs", "Hask", EVENING - 3600, EVENING + 3600, 32_000);
            });
    CheckReport report = world.check();
    assertThat(report.findings()).isEmpty();
    assertThat(report.warnings())
        .singleElement()
        .asString()
        .contains("k1", "Vellmarch", "bearing change", "cancelled");
  }

  @Test
  void aConfirmedContactAtALostStationCountsAsCancelled() {
    World world = World.three(w -> w.confirmed.add(promise("k2", "Elsewhere")));
    assertThat(world.check().findings()).isEmpty();
    assertThat(world.check().warnings()).singleElement().asString().contains("k2", "Elsewhere");
  }

  private static ConfirmedContact promise(String id, String station) {
    return new ConfirmedContact(
        id, station, "main", "Hask", World.ground(EVENING, NIGHT), "confirmed");
  }

  @Test
  void aFrozenContactAtALostStationCountsAsCancelled() {
    World world = World.three();
    Decisions published =
        new Decisions(
            List.of(),
            List.of(World.made("old", "Elsewhere", "Hask", World.ground(3600, 7200), 64_000)));
    world.frozen = Optional.of(new Frozen(published, World.ground(7200), World.onboard(0)));
    assertThat(world.check().findings()).isEmpty();
    assertThat(world.check().warnings()).singleElement().asString().contains("old", "Elsewhere");
  }

  @Test
  void anInterruptionInsideAProtectedIntervalIsOnlyAWarning() {
    World world =
        World.three(
            w -> {
              w.guarded.add(new Guarded(World.onboard(36_000, 72_000), "deep field"));
              w.interruptions.add(new Interruption(World.onboard(40_000, 41_000), "calibration"));
            });
    assertThat(world.check().findings()).isEmpty();
    assertThat(world.check().warnings())
        .singleElement()
        .asString()
        .contains("deep field", "calibration");
  }

  @Test
  void whatTheEphemerisDoesNotCoverIsNotSeen() {
    World world =
        World.three(
            w ->
                w.contact(
                    "c2", "Vellmarch", "Hask", 100 * DAY + EVENING, 100 * DAY + NIGHT, 64_000));
    List<Finding> findings = world.check().findings();
    assertThat(findings)
        .extracting(Finding::rule)
        .contains(RuleId.ABOVE_MASK, RuleId.PERIOD, RuleId.GAP);
  }

  @Test
  void namesThatTheScenarioDoesNotKnowAreRefused() {
    World world =
        World.three(
            w -> {
              w.contact("x", "Elsewhere", "Nobody", EVENING, NIGHT, 64_000);
              w.contact("y", "Elsewhere", "Nobody", EVENING, NIGHT, 64_000);
              w.cancel("y");
            });
    assertThat(Check.unknownNames(world.build(), world.decisions()))
        .containsExactly("craft Nobody", "station Elsewhere");
    assertThatThrownBy(world::check)
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("Elsewhere");
  }

  @Test
  void whatIsTakenForGrantedIsSaid() {
    assertThat(World.three().check().assumptions())
        .anyMatch(each -> each.contains("between craft"))
        .anyMatch(each -> each.contains("Merle holds of bulk"));
    World one = World.one();
    one.startFill(0, 1_000, Optional.of(World.onboard(-10)));
    assertThat(one.check().assumptions()).hasSize(1);
  }
}
