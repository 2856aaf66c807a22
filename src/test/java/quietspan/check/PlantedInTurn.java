package quietspan.check;

import static quietspan.check.World.DAY;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import quietspan.fixture.SyntheticSky;
import quietspan.model.Aim;
import quietspan.model.Blocked;
import quietspan.model.ConfirmedContact;
import quietspan.model.Decisions;
import quietspan.model.Frozen;
import quietspan.model.Guarded;
import quietspan.model.Interruption;
import quietspan.model.Repoint;
import quietspan.model.RuleId;
import quietspan.model.Steering;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;

/** Breaches of rules on contacts and repoints beside each other and beside what was promised. */
final class PlantedInTurn {

  private static final SyntheticSky SKY = World.three().sky();
  private static final long EVENING = 19 * 3600;
  private static final long NIGHT = 23 * 3600;
  private static final long REPOINT_LENGTH = 4 * 3600 + 20 * 60;
  private static final long HALF_PAST_NIGHT = NIGHT + 1800;

  private PlantedInTurn() {}

  static List<Planted> cases() {
    List<Planted> cases = new ArrayList<>();
    addAntenna(cases);
    addFormation(cases);
    addAims(cases);
    addRepoints(cases);
    addPeriod(cases);
    addProtected(cases);
    addConfirmed(cases);
    addFrozen(cases);
    return cases;
  }

  private static void addAntenna(List<Planted> cases) {
    cases.add(
        Planted.of(
            RuleId.ANTENNA_FREE,
            "changeover between two craft two seconds short",
            2,
            0,
            world -> merleAtVellmarch(world, DAY - 2),
            world -> merleAtVellmarch(world, DAY)));
    cases.add(
        Planted.of(
            RuleId.ANTENNA_FREE,
            "the same craft again two seconds before teardown and setup are done",
            2,
            0,
            world -> world.contact("x", "Vellmarch", "Hask", DAY - 2, DAY + 2700, 64_000),
            world -> world.contact("x", "Vellmarch", "Hask", DAY, DAY + 2700, 64_000)));
    cases.add(
        blocked("teardown runs into an outage", Blocked.Why.OUTAGE, NIGHT + 900, DAY - 1, -2, 0));
    cases.add(
        blocked(
            "setup begins in a lent slot", Blocked.Why.LENT, EVENING - 7200, EVENING - 2700, 0, 2));
  }

  private static void merleAtVellmarch(World world, long from) {
    world.contact("x", "Vellmarch", "Merle", from, from + 2700, 48_000);
  }

  private static Planted blocked(
      String name, Blocked.Why why, long from, long to, long earlier, long later) {
    return Planted.of(
        RuleId.ANTENNA_FREE,
        name,
        2,
        0,
        world ->
            world.blocked.add(
                new Blocked(
                    why,
                    "Vellmarch",
                    Optional.empty(),
                    World.ground(from + earlier, to + later),
                    "B7")),
        world ->
            world.blocked.add(
                new Blocked(why, "Vellmarch", Optional.of("main"), World.ground(from, to), "B7")));
  }

  private static void merleAtCorrinDowns(World world, long until) {
    world.contact("x", "Corrin Downs", "Merle", until - 3600, until, 48_000);
  }

  private static void addFormation(List<Planted> cases) {
    cases.add(
        Planted.of(
            RuleId.AT_ONCE,
            "two craft at once for two seconds",
            2,
            0,
            world -> {
              world.contactRules(1, 1, Duration.ZERO);
              merleAtCorrinDowns(world, EVENING + 2);
            },
            world -> {
              world.contactRules(1, 1, Duration.ZERO);
              merleAtCorrinDowns(world, EVENING);
            }));
    cases.add(
        Planted.of(
            RuleId.AT_ONCE,
            "two craft at once all along, where a handover of one craft is allowed",
            3600,
            0,
            world -> merleAtCorrinDowns(world, EVENING + 5400),
            world ->
                world.contact(
                    "x", "Corrin Downs", "Hask", EVENING - 1800, EVENING + 5400, 48_000)));
    cases.add(
        Planted.of(
            RuleId.CRAFT_SWITCH,
            "another craft two seconds too early",
            2,
            0,
            world -> merleAtCorrinDowns(world, EVENING - 598),
            world -> merleAtCorrinDowns(world, EVENING - 600)));
  }

  private static void addAims(List<Planted> cases) {
    Steering narrow =
        new Steering.TwoAxes(degrees(30), degrees(41), degrees(8), degrees(9), degrees(0));
    addAim(cases, "past the travel in azimuth", narrow, 0.01, aim(4101, 800), aim(4100, 800));
    addAim(cases, "below the travel in elevation", narrow, 0.01, aim(4100, 799), aim(4100, 800));
    Steering stepped =
        new Steering.TwoAxes(degrees(30), degrees(30), degrees(0), degrees(60), degrees(0.5));
    addAim(cases, "between two steps", stepped, 0.25, aim(4125, 800), aim(4150, 800));
    Steering northern =
        new Steering.AzimuthOnly(degrees(350), degrees(41), degrees(8.004), degrees(0));
    addAim(cases, "azimuth only, across north", northern, 0.02, aim(4102, 800), aim(4100, 800));
    addAim(cases, "off the built-in elevation", northern, 0.016, aim(4100, 802), aim(4100, 800));
  }

  private static Aim aim(int azimuth, int elevation) {
    return new Aim(azimuth, elevation);
  }

  private static Angle degrees(double degrees) {
    return Angle.ofDegrees(degrees);
  }

  private static void addAim(
      List<Planted> cases, String name, Steering steering, double beyond, Aim breach, Aim inside) {
    cases.add(
        Planted.of(
            RuleId.AIM_LIMITS,
            name,
            beyond,
            1e-9,
            world -> aimedAt(world, steering, breach),
            world -> aimedAt(world, steering, inside)));
  }

  private static void aimedAt(World world, Steering steering, Aim aim) {
    world.antenna(0, steering, 2.1, Duration.ZERO);
    world.repoint("r0", "Hask", HALF_PAST_NIGHT, aim);
  }

  private static void addRepoints(List<Planted> cases) {
    OnboardInstant secondEvening = SKY.onboard("Hask", World.ground(DAY + EVENING));
    long image = World.second(secondEvening);
    cases.add(
        Planted.of(
            RuleId.STILL,
            "still settling when the contact begins",
            World.onboard(image + 3).secondsSince(secondEvening),
            1e-6,
            world -> world.repoint("r0", "Hask", image + 3 - REPOINT_LENGTH),
            world -> world.repoint("r0", "Hask", image - REPOINT_LENGTH)));
    cases.add(
        Planted.of(
            RuleId.STILL,
            "begins before the contact ends",
            SKY.onboard("Hask", World.ground(NIGHT)).secondsSince(World.onboard(NIGHT - 260)),
            1e-6,
            world -> world.repoint("r0", "Hask", NIGHT - 260),
            world -> world.repoint("r0", "Merle", NIGHT - 260)));
    cases.add(
        Planted.of(
            RuleId.REPOINT_SPACING,
            "the next repoint begins before the last has settled",
            2,
            0,
            world -> twoRepoints(world, REPOINT_LENGTH - 2, Duration.ZERO),
            world -> twoRepoints(world, REPOINT_LENGTH, Duration.ZERO)));
    cases.add(
        Planted.of(
            RuleId.REPOINT_SPACING,
            "two seconds under the antenna's spacing",
            2,
            0,
            world -> twoRepoints(world, 36_000 - 2, Duration.ofHours(10)),
            world -> twoRepoints(world, 36_000, Duration.ofHours(10))));
    cases.add(
        Planted.of(
            RuleId.REPOINT_SPACING,
            "too soon after the last repoint before the period",
            2,
            0,
            world -> {
              world.lastRepoint(0, -3600);
              world.repoint("r0", "Hask", REPOINT_LENGTH - 3602);
            },
            world -> {
              world.lastRepoint(0, -3600);
              world.repoint("r0", "Hask", REPOINT_LENGTH - 3600);
            }));
  }

  private static void twoRepoints(World world, long apart, Duration spacing) {
    world.antenna(0, world.scenario.craft.get(0).antenna().steering(), 2.1, spacing);
    world.repoint("r0", "Hask", HALF_PAST_NIGHT);
    world.repoint("r1", "Hask", HALF_PAST_NIGHT + apart);
  }

  private static void addPeriod(List<Planted> cases) {
    long end = World.PERIOD_SECONDS;
    cases.add(
        Planted.of(
            RuleId.PERIOD,
            "settles two seconds after the period",
            2,
            0,
            world -> world.repoint("r0", "Merle", end - REPOINT_LENGTH + 2),
            world -> world.repoint("r0", "Merle", end - REPOINT_LENGTH)));
    cases.add(
        Planted.of(
            RuleId.PERIOD,
            "starts two seconds before the period",
            2,
            0,
            world -> world.repoint("r0", "Merle", -2),
            world -> world.repoint("r0", "Merle", 0)));
    long lastReception = World.second(SKY.ground("Hask", World.onboard(end)));
    cases.add(
        Planted.of(
            RuleId.PERIOD,
            "a contact whose image ends after the period",
            SKY.onboard("Hask", World.ground(lastReception + 2)).secondsSince(World.onboard(end)),
            1e-6,
            world -> lateContact(world, lastReception + 2),
            world -> lateContact(world, lastReception)));
  }

  private static void lateContact(World world, long until) {
    world.contact("c2", "Vellmarch", "Hask", 2 * DAY + EVENING, until, 64_000);
  }

  private static void addProtected(List<Planted> cases) {
    long settled = HALF_PAST_NIGHT + REPOINT_LENGTH;
    cases.add(
        Planted.of(
            RuleId.PROTECTED,
            "settling runs into it",
            2,
            0,
            world -> guardedRepoint(world, settled - 2),
            world -> guardedRepoint(world, settled)));
    cases.add(
        Planted.of(
            RuleId.PROTECTED,
            "an interruption joins a repoint to it",
            600,
            0,
            world -> {
              world.interruptions.add(
                  new Interruption(World.onboard(settled, settled + 1200), "calibration"));
              guardedRepoint(world, settled + 600);
            },
            world -> {
              world.interruptions.add(
                  new Interruption(World.onboard(settled + 1, settled + 1200), "calibration"));
              guardedRepoint(world, settled + 600);
            }));
  }

  private static void guardedRepoint(World world, long guardedFrom) {
    world.guarded.add(new Guarded(World.onboard(guardedFrom, guardedFrom + 7200), "G1"));
    world.repoint("r0", "Merle", HALF_PAST_NIGHT);
  }

  private static void addConfirmed(List<Planted> cases) {
    cases.add(
        confirmed(
            "two seconds longer than the contact",
            2,
            promise("main", EVENING, NIGHT + 2),
            promise("main", EVENING, NIGHT)));
    cases.add(
        confirmed(
            "cancelled by the plan",
            4 * 3600,
            world -> {
              promise("main", EVENING, NIGHT).accept(world);
              world.contact("x", "Vellmarch", "Merle", EVENING, NIGHT, 48_000);
              world.cancel("c0");
            },
            promise("main", EVENING + 1, NIGHT - 1)));
  }

  private static Planted confirmed(
      String name, double amount, Consumer<World> breach, Consumer<World> inside) {
    return Planted.of(RuleId.CONFIRMED, name, amount, 0, breach, inside);
  }

  private static Consumer<World> promise(String antenna, long from, long to) {
    return world ->
        world.confirmed.add(
            new ConfirmedContact(
                "k1", "Vellmarch", antenna, "Hask", World.ground(from, to), "confirmed"));
  }

  private static void addFrozen(List<Planted> cases) {
    cases.add(
        frozen(
            "a contact that has begun ends earlier",
            freeze(EVENING + 1, 0),
            freeze(EVENING, 0),
            world -> world.contact("c0", "Vellmarch", "Hask", EVENING, NIGHT - 60, 64_000)));
    cases.add(
        frozen(
            "a contact that has begun is taken back",
            freeze(EVENING + 1, 0),
            freeze(EVENING, 0),
            world -> {
              world.cancel("c0");
              world.contact("x", "Vellmarch", "Hask", EVENING + 10, NIGHT, 64_000);
            }));
    cases.add(
        frozen(
            "a contact is added before the freeze",
            freeze(DAY + 1, 0),
            freeze(DAY, 0),
            world -> world.contact("x", "Vellmarch", "Hask", DAY, DAY + 2700, 64_000)));
    cases.add(
        frozen(
            "a repoint that has begun moves",
            freeze(0, HALF_PAST_NIGHT + 1),
            freeze(0, HALF_PAST_NIGHT),
            world -> {
              world.repoints.clear();
              world.repoint("r0", "Merle", HALF_PAST_NIGHT + 600);
            }));
  }

  private static Planted frozen(
      String name, Consumer<World> after, Consumer<World> before, Consumer<World> change) {
    Consumer<World> publish = world -> world.repoint("r0", "Merle", HALF_PAST_NIGHT);
    return Planted.of(
        RuleId.FROZEN,
        name,
        1,
        0,
        publish.andThen(after).andThen(change),
        publish.andThen(before).andThen(change));
  }

  /** What stands in the world now is published and frozen up to these seconds. */
  private static Consumer<World> freeze(long contactsBefore, long repointsBefore) {
    return world -> {
      List<Repoint> repoints = List.copyOf(world.repoints);
      world.frozen =
          Optional.of(
              new Frozen(
                  new Decisions(repoints, List.copyOf(world.contacts)),
                  World.ground(contactsBefore),
                  World.onboard(repointsBefore)));
    };
  }
}
