package quietspan.export;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import quietspan.fixture.SyntheticSky;
import quietspan.fixture.TestScenario;
import quietspan.model.Aim;
import quietspan.model.Bound;
import quietspan.model.ClassOutcome;
import quietspan.model.Contact;
import quietspan.model.ContactOutcome;
import quietspan.model.Craft;
import quietspan.model.Decisions;
import quietspan.model.Finding;
import quietspan.model.InputFile;
import quietspan.model.Outcome;
import quietspan.model.Pause;
import quietspan.model.Plan;
import quietspan.model.Provenance;
import quietspan.model.QuietSpan;
import quietspan.model.RateStep;
import quietspan.model.Repoint;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.StorePoint;
import quietspan.model.StoreTrace;
import quietspan.model.Waiver;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.IntervalSet;
import quietspan.time.OnboardInstant;
import quietspan.units.DataRate;
import quietspan.units.DataVolume;

/**
 * Plans to be written: decisions at random, an outcome that hangs together but was not simulated.
 */
final class PlanFixture {

  static final Scenario SCENARIO = TestScenario.three().build();
  static final SightLines SKY = new SyntheticSky(SCENARIO);

  private final Random random;

  private PlanFixture(long seed) {
    this.random = new Random(seed);
  }

  static Plan legal(long seed) {
    return new PlanFixture(seed).plan(List.of());
  }

  static Plan shortfall(long seed) {
    return new PlanFixture(seed)
        .plan(
            List.of(
                new Finding(
                    RuleId.GAP,
                    Instant.parse("2031-09-04T10:00:00.25Z"),
                    "",
                    "Vellmarch",
                    "",
                    3_600.5,
                    "31.0 h without a contact, \"limit\" 30 h")));
  }

  private Plan plan(List<Finding> findings) {
    Decisions decisions = decisions();
    return new Plan(
        SCENARIO.identity().mission(),
        decisions,
        outcome(decisions, findings),
        Optional.of(
            new Bound(
                Optional.of(640L * 3600),
                Optional.of(2),
                List.of(new Bound.Relaxation("pooled stores", "Stores are one.", Optional.of(90L))),
                "6 h cells")),
        new Provenance(
            "0.1.0",
            List.of(new InputFile("mission.yaml", "ab".repeat(32))),
            List.of("leap seconds: built in"),
            random.nextLong(),
            random.nextInt(100_000),
            random.nextInt(100_000),
            random.nextBoolean(),
            waivers()));
  }

  private List<Waiver> waivers() {
    List<Waiver> waivers = new ArrayList<>();
    if (random.nextBoolean()) {
      waivers.add(
          new Waiver(
              RuleId.LATENCY,
              "Hask",
              "bulk",
              instant(2).plusNanos(random.nextInt(1_000_000_000)),
              instant(5),
              Duration.ofSeconds(150_000 + random.nextInt(9999)),
              "no pass, \"none\" at all"));
      waivers.add(
          new Waiver(RuleId.GAP, "", "", instant(2), instant(5), Duration.ofHours(40), "no pass"));
    }
    return waivers;
  }

  private Instant instant(int day) {
    return SCENARIO.period().begin().utc().plusSeconds(day * 86_400L + random.nextInt(86_400));
  }

  private Decisions decisions() {
    List<Repoint> repoints = new ArrayList<>();
    List<Contact> contacts = new ArrayList<>();
    for (int day = 1; day < 27; day += 1 + random.nextInt(4)) {
      Craft craft = SCENARIO.craft().get(random.nextInt(3));
      if (random.nextInt(3) == 0) {
        repoints.add(
            new Repoint(
                "r" + day + (random.nextBoolean() ? "" : "-\u00e9\ud83d\udce1"),
                craft.name(),
                new OnboardInstant(instant(day)),
                new Aim(random.nextInt(36_000), random.nextInt(18_001) - 9_000)));
      }
      GroundInstant begin = new GroundInstant(instant(day));
      Interval<GroundInstant> during =
          Interval.of(begin, Duration.ofSeconds(3_600 + random.nextInt(10_000)));
      List<RateStep> steps = new ArrayList<>();
      for (int i = 0; i < 1 + random.nextInt(3); i++) {
        steps.add(
            new RateStep(begin.plusSeconds(i * 900L), new DataRate(1 + random.nextInt(240_000))));
      }
      EnumSet<Contact.Service> services = EnumSet.of(Contact.Service.TELEMETRY);
      if (random.nextBoolean()) {
        services.add(Contact.Service.COMMAND);
      }
      contacts.add(
          new Contact(
              "c" + day,
              SCENARIO.stations().get(random.nextInt(3)).name(),
              "main",
              craft.name(),
              during,
              steps,
              services,
              Contact.Status.values()[random.nextInt(3)]));
    }
    return new Decisions(repoints, contacts);
  }

  private Outcome outcome(Decisions decisions, List<Finding> findings) {
    IntervalSet<OnboardInstant> paused =
        IntervalSet.of(
            decisions.repoints().stream()
                .map(
                    repoint ->
                        Interval.of(
                            repoint.start(),
                            SCENARIO.craft(repoint.craft()).antenna().repointLength()))
                .toList());
    List<Pause> pauses =
        paused.parts().stream()
            .map(
                part ->
                    new Pause(
                        part,
                        decisions.repoints().stream()
                            .filter(repoint -> part.contains(repoint.start()))
                            .map(Repoint::id)
                            .toList(),
                        List.of()))
            .toList();
    List<QuietSpan> spans =
        IntervalSet.of(List.of(SCENARIO.period())).minus(paused).parts().stream()
            .map(
                part ->
                    new QuietSpan(
                        part,
                        part.length().toSeconds(),
                        Math.max(0, part.length().toSeconds() - 7_200),
                        part.begin().equals(SCENARIO.period().begin()),
                        part.end().equals(SCENARIO.period().end())))
            .toList();
    List<ContactOutcome> contacts =
        decisions.contacts().stream()
            .filter(contact -> contact.status() != Contact.Status.CANCELLED)
            .map(
                contact ->
                    new ContactOutcome(
                        contact.id(),
                        ContactClocks.of(SCENARIO, SKY, contact).onboard(),
                        new DataVolume(2_000_000_000L),
                        new DataVolume(1_500_000_000L),
                        OptionalDouble.of(30_000.25 + random.nextInt(3_600))))
            .toList();
    return new Outcome(
        pauses,
        spans,
        spans.stream().mapToLong(QuietSpan::valueSeconds).sum(),
        contacts,
        SCENARIO.craft().stream().map(craft -> trace(craft.name())).toList(),
        List.of(
            new ClassOutcome("quicklook", 5_000_000_000L, 0, 0, OptionalDouble.of(40_000.125)),
            new ClassOutcome("bulk", 0, 0, 0, OptionalDouble.empty())),
        contacts.size() * 2.25,
        1234.5,
        findings);
  }

  private StoreTrace trace(String craft) {
    long begin = SCENARIO.period().begin().epochSecond();
    return new StoreTrace(
        craft,
        List.of(
            new StorePoint(begin, 1_000_000_000L, List.of(0L, 0L, 1_000_000_000L)),
            new StorePoint(begin + 86_400, 9_000_000_000L, List.of(1L, 2L, 8_999_999_997L)),
            new StorePoint(begin + 28 * 86_400L, 2_000_000_000L, List.of(0L, 0L, 2_000_000_000L))),
        1_000_000_000L,
        48_384_000_000L,
        0,
        0,
        47_384_000_000L,
        0,
        2_000_000_000L,
        9_000_000_000L);
  }
}
