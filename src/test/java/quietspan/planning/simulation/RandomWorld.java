package quietspan.planning.simulation;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.SplittableRandom;
import quietspan.fixture.SyntheticSky;
import quietspan.fixture.TestScenario;
import quietspan.fixture.Variations;
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
import quietspan.model.HighGainAntenna;
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
 * A small world in which everything that moves bits can happen: odd numbers, several contacts at
 * once, missing cross-links, forwarding, overflow, phased profiles, interruptions, waivers. The
 * contacts keep no rule but that they are contacts.
 */
final class RandomWorld {

  private final SplittableRandom random;
  private final int seconds;
  private final OnboardInstant origin;

  final Scenario scenario;
  final SightLines sky;
  final Decisions decisions;
  final List<Waiver> waivers;

  RandomWorld(SplittableRandom random, int seconds) {
    this.random = random;
    this.seconds = seconds;
    TestScenario world = TestScenario.three();
    this.origin = new OnboardInstant(world.begin);
    int craft = Math.min(world.craft.size(), 1 + random.nextInt(6));
    world.craft = new ArrayList<>(world.craft.subList(0, craft));
    world.states = new ArrayList<>(world.states.subList(0, craft));
    world.classes = classes();
    long rate = upTo(3_000) + 20L;
    for (int c = 0; c < craft; c++) {
      world.craft.set(c, craft(world.craft.get(c), world.classes, rate));
      world.states.set(c, state(world.craft.get(c), world.classes));
    }
    world.contacts =
        new ContactRules(
            Duration.ofSeconds(upTo(seconds / 60)),
            3,
            Duration.ofSeconds(upTo(seconds / 100)),
            3,
            Duration.ZERO,
            pick(0, 0.1, 0.07));
    world.data =
        new DataRules(
            Optional.empty(),
            Optional.empty(),
            random.nextBoolean() ? Optional.empty() : Optional.of(pick(0.1, 0.3, 0.5)),
            Optional.empty(),
            Duration.ofSeconds(random.nextBoolean() ? 0 : upTo(seconds / 8)),
            random.nextBoolean());
    world.margins = new Margins(pick(1, 0.9, 0.37), pick(1, 0.8, 0.55), Angle.ZERO, Angle.ZERO);
    world.calendars = new Calendars(List.of(), List.of(), interruptions(), List.of());
    Scenario built = world.build();
    this.scenario = Variations.lasting(built, Duration.ofSeconds(seconds));
    this.sky = new SyntheticSky(scenario, random.nextDouble(1, 300), 0.98, -18);
    this.decisions = new Decisions(repoints(), contacts(rate));
    this.waivers = waivers();
  }

  private int upTo(int most) {
    return random.nextInt(most + 1);
  }

  private double pick(double... values) {
    return values[random.nextInt(values.length)];
  }

  private List<DataClass> classes() {
    List<DataClass> classes = new ArrayList<>();
    int count = 1 + random.nextInt(3);
    for (int k = 0; k < count; k++) {
      long limit = random.nextInt(seconds / 20, 2 * seconds);
      classes.add(new DataClass("class" + k, k + 1, Duration.ofSeconds(limit)));
    }
    return classes;
  }

  private Craft craft(Craft model, List<DataClass> classes, long rate) {
    List<Generation> generation = new ArrayList<>();
    for (DataClass each : classes) {
      if (random.nextInt(8) > 0) {
        generation.add(new Generation(each.name(), profile(rate), pick(0, 0.15, 0.5, 1)));
      }
    }
    HighGainAntenna antenna = model.antenna();
    return new Craft(
        model.name(),
        model.orbit(),
        model.attitude(),
        new HighGainAntenna(
            antenna.steering(),
            antenna.ratedHalfCone(),
            antenna.halfPowerWidth(),
            Duration.ofSeconds(1 + upTo(seconds / 40)),
            Duration.ofSeconds(upTo(seconds / 20)),
            Duration.ZERO),
        model.rates(),
        new DataVolume(rate * seconds * classes.size() / 12 * (1 + upTo(30)) + upTo(1_000)),
        new DataRate(random.nextInt(6) == 0 ? 0 : upTo(5) * rate / 2 + upTo(100)),
        generation);
  }

  private Profile profile(long rate) {
    List<Profile.Step> steps = new ArrayList<>();
    long at = -upTo(100);
    do {
      steps.add(
          new Profile.Step(
              origin.plusSeconds(at).plus(Duration.ofMillis(upTo(2) * 250L)),
              new DataRate(random.nextInt(6) == 0 ? 0 : rate + upTo(7) * rate / 5)));
      at += 1 + upTo(seconds / 2);
    } while (at < seconds && random.nextInt(3) > 0);
    return new Profile(steps);
  }

  private CraftState state(Craft one, List<DataClass> classes) {
    List<CraftState.Fill> fill = new ArrayList<>();
    for (DataClass each : classes) {
      if (random.nextInt(3) > 0) {
        long most = one.store().bits() / classes.size();
        long volume = random.nextInt(5) == 0 ? upTo(50) : random.nextLong(most + 1) / (1 + upTo(4));
        Optional<OnboardInstant> oldest =
            random.nextInt(3) == 0
                ? Optional.empty()
                : Optional.of(origin.plusSeconds(-1L - upTo(seconds)));
        fill.add(new CraftState.Fill(each.name(), new DataVolume(volume), oldest));
      }
    }
    return new CraftState(one.name(), new Aim(0, 0), fill, Optional.empty(), Optional.empty());
  }

  private List<Interruption> interruptions() {
    List<Interruption> interruptions = new ArrayList<>();
    for (int i = upTo(2); i > 0; i--) {
      OnboardInstant begin = origin.plusSeconds((long) upTo(seconds));
      interruptions.add(
          new Interruption(
              Interval.of(begin, Duration.ofSeconds(1 + upTo(seconds / 10))), "calibration " + i));
    }
    return interruptions;
  }

  private List<Repoint> repoints() {
    List<Repoint> repoints = new ArrayList<>();
    for (int i = upTo(2); i > 0; i--) {
      String name = scenario.craft().get(random.nextInt(scenario.craft().size())).name();
      repoints.add(
          new Repoint("r" + i, name, origin.plusSeconds((long) upTo(seconds)), new Aim(0, 0)));
    }
    return repoints;
  }

  private List<Contact> contacts(long rate) {
    List<Contact> contacts = new ArrayList<>();
    long light = (long) sky.downlinkSeconds("Hask", new GroundInstant(origin.utc()));
    for (int i = upTo(9); i > 0; i--) {
      String name = scenario.craft().get(random.nextInt(scenario.craft().size())).name();
      String station = scenario.stations().get(random.nextInt(3)).name();
      GroundInstant begin =
          new GroundInstant(origin.utc())
              .plusSeconds(light - seconds / 20 + random.nextInt(seconds));
      long length = 1L + upTo(seconds / 4);
      List<RateStep> steps = new ArrayList<>();
      GroundInstant from = begin;
      do {
        steps.add(new RateStep(from, new DataRate(1 + upTo(24) * rate / 2 + upTo(10))));
        from = from.plusSeconds(1L + upTo((int) length));
      } while (from.isBefore(begin.plusSeconds(length)) && random.nextBoolean());
      contacts.add(
          new Contact(
              "c" + i,
              station,
              "main",
              name,
              Interval.of(begin, begin.plusSeconds(length)),
              steps,
              Set.of(Contact.Service.TELEMETRY),
              random.nextInt(9) == 0 ? Contact.Status.CANCELLED : Contact.Status.CONFIRMED));
    }
    return contacts;
  }

  private List<Waiver> waivers() {
    List<Waiver> waivers = new ArrayList<>();
    for (int i = upTo(3); i > 0; i--) {
      DataClass dataClass =
          scenario.rules().classes().get(random.nextInt(scenario.rules().classes().size()));
      OnboardInstant begin = origin.plusSeconds((long) upTo(seconds) - seconds / 4);
      waivers.add(
          new Waiver(
              RuleId.LATENCY,
              "",
              dataClass.name(),
              begin.utc(),
              begin.plusSeconds(1L + upTo(seconds / 3)).utc(),
              dataClass.latencyLimit().plusSeconds(upTo(seconds / 4)),
              "random"));
    }
    return waivers;
  }
}
