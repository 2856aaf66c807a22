package quietspan.agreement;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.Set;
import java.util.TreeSet;
import quietspan.fixture.SyntheticSky;
import quietspan.fixture.TestScenario;
import quietspan.model.Aim;
import quietspan.model.Calendars;
import quietspan.model.Contact;
import quietspan.model.ContactRules;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.DataClass;
import quietspan.model.DataRules;
import quietspan.model.Decisions;
import quietspan.model.Generation;
import quietspan.model.Interruption;
import quietspan.model.Margins;
import quietspan.model.Profile;
import quietspan.model.RateStep;
import quietspan.model.Repoint;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Waiver;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;
import quietspan.units.DataRate;
import quietspan.units.DataVolume;

/**
 * A random world with random decisions, legal or not: stores that overflow, contacts that overlap
 * or leave the period, several rates, phases, pauses, waivers. Everything in it is invented.
 */
record AnyWorld(Scenario scenario, SightLines sight, Decisions decisions, List<Waiver> waivers) {

  static AnyWorld of(Random random) {
    return new Maker(random).make();
  }

  private static final class Maker {

    private static final long[] RATES = {12_000, 24_000, 64_000, 128_000, 240_000};

    private final Random random;
    private final TestScenario scenario = new TestScenario();
    private final Instant begin = scenario.begin;
    private final List<Interruption> interruptions = new ArrayList<>();
    private long seconds;

    Maker(Random random) {
      this.random = random;
    }

    AnyWorld make() {
      scenario.days = 1 + random.nextInt(3);
      seconds = scenario.days * 86_400L;
      classes();
      craft();
      stations();
      rules();
      for (int i = random.nextInt(3); i > 0; i--) {
        long from = between(-7_200, seconds);
        interruptions.add(
            new Interruption(onboard(from, from + between(60, 30_000)), "interruption " + i));
      }
      interruptions.sort(Comparator.comparing(each -> each.during().begin()));
      scenario.calendars = new Calendars(List.of(), List.of(), interruptions, List.of());
      if (chance(0.3)) {
        scenario.quietSince = Optional.of(at(-between(0, 300_000)));
      }
      Scenario built = scenario.build();
      SightLines sight =
          new SyntheticSky(built, 100 + random.nextInt(400) + random.nextDouble(), 0.98, -18);
      Decisions decisions = new Decisions(repoints(), contacts());
      return new AnyWorld(built, sight, decisions, waivers());
    }

    private boolean chance(double probability) {
      return random.nextDouble() < probability;
    }

    private long between(long from, long to) {
      return from + (long) (random.nextDouble() * (to - from + 1));
    }

    private OnboardInstant at(long second) {
      return new OnboardInstant(begin).plusSeconds(second);
    }

    private Interval<OnboardInstant> onboard(long from, long to) {
      return Interval.of(at(from), at(to));
    }

    private GroundInstant ground(long second) {
      return new GroundInstant(begin).plusSeconds(second);
    }

    private void classes() {
      List<DataClass> classes = new ArrayList<>();
      String[] names = {"alerts", "images", "rest"};
      int count = 1 + random.nextInt(names.length);
      for (int i = 0; i < count; i++) {
        classes.add(new DataClass(names[i], i + 1, Duration.ofSeconds(between(3_600, 130_000))));
      }
      scenario.classes = classes;
    }

    private void craft() {
      String[] names = {"Hask", "Merle", "Tovin", "Wren"};
      int count = 1 + random.nextInt(names.length);
      for (int i = 0; i < count; i++) {
        scenario.addCraft(
            names[i],
            2.1,
            4.6,
            49.2,
            Duration.ofSeconds(between(60, 1_800)),
            Duration.ofSeconds(between(60, 18_000)));
        Craft plain = scenario.craft.get(i);
        scenario.craft.set(
            i,
            new Craft(
                plain.name(),
                plain.orbit(),
                plain.attitude(),
                plain.antenna(),
                plain.rates(),
                new DataVolume(between(50_000_000, 3_000_000_000L)),
                new DataRate(chance(0.2) ? 0 : between(1_000, 90_000)),
                generation()));
        state(i);
      }
    }

    private List<Generation> generation() {
      List<Generation> all = new ArrayList<>();
      for (DataClass each : scenario.classes) {
        if (chance(0.9)) {
          TreeSet<Long> steps = new TreeSet<>(Set.of(0L));
          for (int i = random.nextInt(3); i > 0; i--) {
            steps.add(between(-1_000, seconds));
          }
          List<Profile.Step> profile =
              steps.stream()
                  .map(from -> new Profile.Step(at(from), new DataRate(between(0, 15_000))))
                  .toList();
          all.add(new Generation(each.name(), new Profile(profile), random.nextInt(101) / 100.0));
        }
      }
      return all;
    }

    private void state(int index) {
      CraftState plain = scenario.states.get(index);
      List<CraftState.Fill> fills = new ArrayList<>();
      for (DataClass each : scenario.classes) {
        if (chance(0.6)) {
          Optional<OnboardInstant> oldest =
              chance(0.6) ? Optional.of(at(-between(0, 200_000))) : Optional.empty();
          fills.add(
              new CraftState.Fill(each.name(), new DataVolume(between(0, 600_000_000)), oldest));
        }
      }
      Optional<GroundInstant> lastContact =
          chance(0.4) ? Optional.of(ground(-between(0, 100_000))) : Optional.empty();
      scenario.states.set(
          index, new CraftState(plain.craft(), plain.aim(), fills, lastContact, Optional.empty()));
    }

    private void stations() {
      scenario.addStation("Ostrand", 33.9, -103.4, 15, 50.4);
      scenario.addStation("Vellmarch", 38.3, 33.2, 10, 50.1);
    }

    private void rules() {
      scenario.contacts =
          new ContactRules(
              Duration.ofSeconds(between(0, 600)),
              3,
              Duration.ofSeconds(between(0, 120)),
              1 + random.nextInt(3),
              Duration.ZERO,
              random.nextInt(30) / 100.0);
      scenario.margins =
          new Margins(
              between(50, 100) / 100.0,
              between(50, 100) / 100.0,
              Angle.ofDegrees(0.1),
              Angle.ofDegrees(0.01));
      scenario.data =
          new DataRules(
              limit(20_000, 120_000),
              limit(20_000, 200_000),
              chance(0.5) ? Optional.of(between(0, 100) / 100.0) : Optional.empty(),
              limit(3_600, 400_000),
              chance(0.3) ? Duration.ZERO : Duration.ofSeconds(between(1, 40_000)),
              chance(0.5));
    }

    private Optional<Duration> limit(long from, long to) {
      return chance(0.6) ? Optional.of(Duration.ofSeconds(between(from, to))) : Optional.empty();
    }

    private String anyCraft() {
      return scenario.craft.get(random.nextInt(scenario.craft.size())).name();
    }

    private List<Repoint> repoints() {
      List<Repoint> repoints = new ArrayList<>();
      for (int i = random.nextInt(5); i > 0; i--) {
        Aim aim = new Aim((int) between(0, 35_999), (int) between(-1_000, 2_000));
        repoints.add(new Repoint("r" + i, anyCraft(), at(between(-10_000, seconds)), aim));
      }
      return repoints;
    }

    private List<Contact> contacts() {
      List<Contact> contacts = new ArrayList<>();
      for (int i = random.nextInt(5 * scenario.days); i > 0; i--) {
        long from = between(-3_000, seconds + 1_000);
        long to = from + between(30, chance(0.2) ? 1_000 : 25_000);
        contacts.add(contact("c" + i, from, to));
      }
      return contacts;
    }

    private Contact contact(String id, long from, long to) {
      TreeSet<Long> changes = new TreeSet<>(Set.of(from));
      for (int i = random.nextInt(3); i > 0; i--) {
        changes.add(between(from, to - 1));
      }
      List<RateStep> steps =
          changes.stream()
              .map(each -> new RateStep(ground(each), new DataRate(RATES[random.nextInt(5)])))
              .toList();
      Contact.Status status = chance(0.1) ? Contact.Status.CANCELLED : Contact.Status.TENTATIVE;
      return new Contact(
          id,
          chance(0.5) ? "Ostrand" : "Vellmarch",
          "main",
          anyCraft(),
          Interval.of(ground(from), ground(to)),
          steps,
          Set.of(Contact.Service.TELEMETRY),
          status);
    }

    private List<Waiver> waivers() {
      List<Waiver> waivers = new ArrayList<>();
      for (int i = random.nextInt(5); i > 0; i--) {
        RuleId rule = List.of(RuleId.GAP, RuleId.DIRECT, RuleId.LATENCY).get(random.nextInt(3));
        long from = between(-50_000, seconds);
        boolean latency = rule == RuleId.LATENCY;
        boolean ofCraft = rule == RuleId.DIRECT || (latency && chance(0.5));
        String dataClass =
            latency ? scenario.classes.get(random.nextInt(scenario.classes.size())).name() : "";
        waivers.add(
            new Waiver(
                rule,
                ofCraft ? anyCraft() : "",
                dataClass,
                begin.plusSeconds(from),
                begin.plusSeconds(from + between(1, 80_000)),
                Duration.ofSeconds(between(3_600, 250_000)),
                "invented"));
      }
      return waivers;
    }
  }
}
