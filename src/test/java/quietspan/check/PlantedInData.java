package quietspan.check;

import static quietspan.check.World.DAY;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import quietspan.fixture.SyntheticSky;
import quietspan.model.Aim;
import quietspan.model.RuleId;
import quietspan.model.Waiver;
import quietspan.time.OnboardInstant;

/** Breaches of rules on data. The store of Merle has no outlet here, so that its fill is plain. */
final class PlantedInData {

  private static final SyntheticSky SKY = World.three().sky();
  private static final int HASK = 0;
  private static final int MERLE = 1;
  private static final int TOVIN = 2;
  private static final long EVENING = 19 * 3600;
  private static final long NIGHT = 23 * 3600;
  private static final long BITS_PER_SECOND = 2_200;
  private static final long MADE = BITS_PER_SECOND * World.PERIOD_SECONDS;

  private PlantedInData() {}

  static List<Planted> cases() {
    List<Planted> cases = new ArrayList<>();
    addStores(cases);
    addEndFill(cases);
    addLatency(cases);
    addSilences(cases);
    addEndCoverage(cases);
    return cases;
  }

  private static void merle(World world, long start, long capacity) {
    world.holds(MERLE, start);
    world.store(MERLE, capacity, 0);
  }

  private static void addStores(List<Planted> cases) {
    Consumer<World> brim =
        world -> {
          world.plannedFill(1);
          world.endFillShare(Optional.of(1.0));
        };
    cases.add(
        Planted.of(
            RuleId.OVERFLOW,
            "a store too small by what is made in the last seconds",
            5_000,
            0,
            brim.andThen(world -> merle(world, 1_000_000, 1_000_000 + MADE - 5_000)),
            brim.andThen(world -> merle(world, 1_000_000, 1_000_000 + MADE))));
    Consumer<World> planned =
        world -> {
          world.plannedFill(0.8);
          world.endFillShare(Optional.of(1.0));
        };
    cases.add(
        Planted.of(
            RuleId.FILL,
            "above the planned fill in the last second",
            1_000,
            0,
            planned.andThen(world -> merle(world, 800_000_000 - MADE + 1_000, 1_000_000_000)),
            planned.andThen(world -> merle(world, 800_000_000 - MADE, 1_000_000_000))));
    cases.add(
        Planted.of(
            RuleId.FILL,
            "above the planned fill in the last two seconds",
            1_000 + 3_200,
            0,
            planned.andThen(world -> merle(world, 800_000_000 - MADE + 3_200, 1_000_000_000)),
            planned.andThen(world -> merle(world, 800_000_001 - MADE, 1_000_000_002))));
  }

  private static void addEndFill(List<Planted> cases) {
    cases.add(
        Planted.of(
            RuleId.END_FILL,
            "above half at the end",
            1_000,
            0,
            world -> merle(world, 1_000_000_000 - MADE + 1_000, 2_000_000_000),
            world -> merle(world, 1_000_000_000 - MADE, 2_000_000_000)));
    cases.add(
        Planted.of(
            RuleId.END_FILL,
            "above a quarter where no limit is given",
            1_000,
            0,
            world -> {
              world.endFillShare(Optional.empty());
              merle(world, 1_000, MADE * 4);
            },
            world -> {
              world.endFillShare(Optional.empty());
              merle(world, 0, MADE * 4);
            }));
    cases.add(
        Planted.of(
            RuleId.END_FILL,
            "above the start fill where that is more than a quarter",
            MADE,
            0,
            world -> {
              world.endFillShare(Optional.empty());
              merle(world, 600_000_000, 2_000_000_000);
            },
            world -> {
              world.endFillShare(Optional.empty());
              merle(world, 600_000_000, 2_000_000_000);
              world.makes(MERLE, 0, 0);
            }));
  }

  private static void addLatency(List<Planted> cases) {
    Consumer<World> noOutlet = world -> world.store(MERLE, 2_000_000_000, 0);
    cases.add(
        Planted.of(
            RuleId.LATENCY,
            "the oldest second is still aboard at the end",
            200,
            0,
            noOutlet.andThen(quicklook(World.PERIOD_SECONDS - 1)),
            noOutlet.andThen(quicklook(World.PERIOD_SECONDS))));

    // What Hask makes in the second after its first contact waits longest: until the first second
    // of data in the second contact. The third contact is earlier in the day.
    long made = World.second(SKY.onboard("Hask", World.ground(NIGHT)));
    OnboardInstant begin = SKY.onboard("Hask", World.ground(DAY + EVENING)).ceilToSecond();
    OnboardInstant sent = begin.plusSeconds(301L);
    double latency =
        SKY.ground("Hask", sent).secondsSince(World.ground(made))
            + Duration.ofMinutes(5).toSeconds();
    Consumer<World> haskAlone =
        world -> {
          world.makes(MERLE, 0, 0);
          world.makes(TOVIN, 0, 0);
          world.evening("c2", 2, EVENING - 1800);
        };
    cases.add(
        Planted.of(
            RuleId.LATENCY,
            "delivered late in the first second of data",
            200,
            0,
            haskAlone.andThen(quicklook((long) Math.floor(latency))),
            haskAlone.andThen(quicklook((long) Math.ceil(latency)))));
    cases.add(
        Planted.of(
            RuleId.LATENCY,
            "later than a waiver allows, and the waiver holds only where it was made",
            200,
            0,
            haskAlone
                .andThen(quicklook((long) Math.floor(latency)))
                .andThen(waived(RuleId.LATENCY, "", "quicklook", 0, made, 40)),
            haskAlone
                .andThen(quicklook((long) Math.floor(latency)))
                .andThen(waived(RuleId.LATENCY, "", "quicklook", made, made + 1, 40))));
  }

  private static Consumer<World> quicklook(long limitSeconds) {
    return world -> world.classes(Duration.ofSeconds(limitSeconds), Duration.ofDays(4));
  }

  private static Consumer<World> waived(
      RuleId rule, String craft, String dataClass, long from, long to, long hours) {
    return world ->
        world.waivers.add(
            new Waiver(
                rule,
                craft,
                dataClass,
                World.ground(from).utc(),
                World.ground(to).utc(),
                Duration.ofHours(hours),
                "no pass"));
  }

  private static void addSilences(List<Planted> cases) {
    Duration limit = Duration.ofHours(20).minusSeconds(2);
    Consumer<World> earlierThirdDay = world -> world.evening("c2", 2, EVENING - 1800);
    Consumer<World> twoSecondsLess =
        earlierThirdDay.andThen(
            world -> world.scenario.data = World.data(Optional.of(limit), Optional.empty(), 0.5));
    cases.add(
        Planted.of(
            RuleId.GAP,
            "twenty hours between two evenings",
            2,
            0,
            twoSecondsLess,
            earlierThirdDay.andThen(
                world ->
                    world.scenario.data =
                        World.data(Optional.of(Duration.ofHours(20)), Optional.empty(), 0.5))));
    cases.add(
        Planted.of(
            RuleId.GAP,
            "a waiver for another stretch does not help",
            2,
            0,
            twoSecondsLess.andThen(waived(RuleId.GAP, "", "", 0, NIGHT - 1, 24)),
            twoSecondsLess.andThen(waived(RuleId.GAP, "", "", NIGHT + 10, NIGHT + 20, 20))));
    cases.add(
        new Planted(
            RuleId.DIRECT,
            "twenty hours without a contact of its own",
            2,
            0,
            direct(limit),
            direct(limit.plusSeconds(2))));
  }

  private static World direct(Duration limit) {
    World world = World.one();
    world.evening("c2", 2, EVENING - 1800);
    world.scenario.data = World.data(Optional.empty(), Optional.of(limit), 0.5);
    return world;
  }

  private static void addEndCoverage(List<Planted> cases) {
    long end = World.PERIOD_SECONDS;
    World world = World.one();
    SyntheticSky sky = world.sky();
    Aim aim = world.scenario.states.get(HASK).aim();
    long second = end;
    while (Math.toDegrees(
            aim.direction()
                .separation(sky.earth("Hask", sky.ground("Hask", World.onboard(second)))))
        <= 1.99) {
      second++;
    }
    long covered = second - end;
    cases.add(
        new Planted(
            RuleId.END_COVERAGE,
            "the Earth leaves the cone two seconds too soon",
            2,
            1.01,
            asksCoverage(covered + 2),
            asksCoverage(covered - 1)));
  }

  private static World asksCoverage(long seconds) {
    World world = World.one();
    world.endCoverage(Duration.ofSeconds(seconds));
    return world;
  }
}
