package quietspan.check;

import static quietspan.check.World.DAY;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import quietspan.fixture.SyntheticSky;
import quietspan.model.Aim;
import quietspan.model.Dish;
import quietspan.model.LinkBudget;
import quietspan.model.Look;
import quietspan.model.Pass;
import quietspan.model.RateLadder;
import quietspan.model.RuleId;
import quietspan.model.Station;
import quietspan.time.GroundInstant;
import quietspan.units.Angle;
import quietspan.units.DataRate;

/** Breaches of rules on where and how a contact looks. */
final class PlantedInSight {

  private static final SyntheticSky SKY = World.three().sky();
  private static final long EVENING = 19 * 3600;
  private static final GroundInstant LAST_END = World.ground(2 * DAY + 23 * 3600);
  private static final long HOURS_4 = 4 * 3600;

  private PlantedInSight() {}

  static List<Planted> cases() {
    List<Planted> cases = new ArrayList<>();
    addMask(cases);
    addKeyhole(cases);
    addAngles(cases);
    addLink(cases);
    addForm(cases);
    return cases;
  }

  private static void addMask(List<Planted> cases) {
    Pass evening =
        SKY.geometry().passes().stream()
            .filter(pass -> pass.station().equals("Vellmarch") && pass.craft().equals("Hask"))
            .filter(pass -> pass.visible().contains(World.ground(EVENING)))
            .findFirst()
            .orElseThrow();
    long rise = World.second(evening.visible().begin().ceilToSecond());
    cases.add(
        Planted.of(
            RuleId.ABOVE_MASK,
            "begins before the rise",
            evening.visible().begin().secondsSince(World.ground(rise - 4)),
            0.03,
            world -> world.contact("c0", "Vellmarch", "Hask", rise - 4, 23 * 3600, 64_000),
            world -> world.contact("c0", "Vellmarch", "Hask", rise, 23 * 3600, 64_000)));

    // A skyline that rises by 2 deg over 1 deg of azimuth, just where the craft stands at 21:00.
    Look at = look("Vellmarch", 21 * 3600);
    Look oneMinuteLater = look("Vellmarch", 21 * 3600 + 60);
    double rate = (oneMinuteLater.azimuthRadians() - at.azimuthRadians()) / 60;
    double from = at.azimuthRadians();
    cases.add(
        Planted.of(
            RuleId.ABOVE_MASK,
            "passes a tower of 1 deg, up to the height of the craft on one evening",
            Math.toRadians(1) / rate,
            10,
            world -> {
              tower(world, from, at.elevationRadians() + Math.toRadians(3));
              world.contacts.removeIf(each -> !each.id().equals("c0"));
              world.scenario.data = World.data(Optional.empty(), Optional.empty(), 0.5);
            },
            world -> tower(world, from, at.elevationRadians() - Math.toRadians(1))));
  }

  private static void tower(World world, double azimuth, double top) {
    double ground = Math.toRadians(10);
    double width = Math.toRadians(1);
    double wall = 1e-5;
    world.mask(
        "Vellmarch",
        corner(0, ground),
        corner(azimuth - wall, ground),
        corner(azimuth, top),
        corner(azimuth + width, top),
        corner(azimuth + width + wall, ground),
        corner(2 * Math.PI, ground));
  }

  private static Station.MaskPoint corner(double azimuth, double elevation) {
    return new Station.MaskPoint(Angle.ofRadians(azimuth), Angle.ofRadians(elevation));
  }

  private static Look look(String station, long second) {
    return SKY.look(station, "Hask", World.ground(second));
  }

  private static void addKeyhole(List<Planted> cases) {
    double atBegin = look("Vellmarch", EVENING).elevationRadians();
    double soonAfter = look("Vellmarch", EVENING + 5).elevationRadians();
    double high = Math.toRadians(90);
    double low = Math.toRadians(5);
    cases.add(
        Planted.of(
            RuleId.KEYHOLE,
            "below the lowest elevation",
            5,
            0.03,
            world -> world.looks("Vellmarch", soonAfter, high),
            world -> world.looks("Vellmarch", atBegin, high)));

    // The last evening culminates highest of the three, by the sidereal day.
    double culmination = 0;
    for (long second = 21 * 3600; second < 22 * 3600; second++) {
      culmination = Math.max(culmination, look("Vellmarch", second).elevationRadians());
    }
    double highest = culmination;
    cases.add(
        Planted.of(
            RuleId.KEYHOLE,
            "above the highest elevation",
            600,
            30,
            world -> {
              world.contact("c1", "Vellmarch", "Hask", DAY + EVENING, DAY + 21 * 3600, 64_000);
              world.contact(
                  "c2", "Vellmarch", "Hask", 2 * DAY + EVENING, 2 * DAY + 21 * 3600, 64_000);
              world.looks("Vellmarch", low, elevationAround(highest, 300));
            },
            world -> world.looks("Vellmarch", low, highest + 1e-6)));

    double west = look("Vellmarch", 23 * 3600 - 3).azimuthRadians();
    double atEnd = look("Vellmarch", 2 * DAY + 23 * 3600).azimuthRadians();
    cases.add(
        Planted.of(
            RuleId.KEYHOLE,
            "in a dead zone for the last three seconds",
            3,
            0.03,
            world -> {
              world.contact("c1", "Vellmarch", "Hask", DAY + EVENING, DAY + 22 * 3600, 64_000);
              world.contact(
                  "c2", "Vellmarch", "Hask", 2 * DAY + EVENING, 2 * DAY + 22 * 3600, 64_000);
              world.looks("Vellmarch", low, high, zone(west, west + 1, Math.toRadians(80)));
            },
            world ->
                world.looks("Vellmarch", low, high, zone(atEnd, atEnd + 1, Math.toRadians(80)))));
  }

  /** The elevation that the first evening exceeds for this long on either side of its highest. */
  private static double elevationAround(double highest, long seconds) {
    for (long second = 21 * 3600; second < 22 * 3600; second++) {
      if (look("Vellmarch", second).elevationRadians() >= highest - 1e-9) {
        return look("Vellmarch", second - seconds).elevationRadians();
      }
    }
    throw new IllegalStateException("no culmination in that hour");
  }

  private static Dish.Sector zone(double from, double to, double upTo) {
    return new Dish.Sector(Angle.ofRadians(from), Angle.ofRadians(to), Angle.ofRadians(upTo));
  }

  private static void addAngles(List<Planted> cases) {
    double sepAtEnd = Math.toDegrees(SKY.withSep(77, -0.7).sepRadians("Hask", LAST_END));
    cases.add(
        Planted.of(
            RuleId.SEP,
            "a falling angle passes the limit at the end of the last contact",
            0.01,
            1e-9,
            world -> {
              world.sky = sky -> sky.withSep(77, -0.7);
              world.sepLimit("Vellmarch", sepAtEnd + 0.01);
            },
            world -> {
              world.sky = sky -> sky.withSep(77, -0.7);
              world.sepLimit("Vellmarch", sepAtEnd - 1e-6);
            }));

    double offPointing =
        Math.toDegrees(
            World.three()
                .build()
                .start()
                .of("Hask")
                .aim()
                .direction()
                .separation(SKY.earth("Hask", LAST_END)));
    double allowances = 0.11;
    var steering = World.three().scenario.craft.get(0).antenna().steering();
    cases.add(
        Planted.of(
            RuleId.OFF_POINTING,
            "the Earth leaves the cone before the last contact ends",
            0.01,
            1e-9,
            world -> world.antenna(0, steering, offPointing - 0.01 + allowances, Duration.ZERO),
            world -> world.antenna(0, steering, offPointing + 1e-6 + allowances, Duration.ZERO)));

    // An aim ahead by 2 deg of azimuth would lose the Earth of the first evening.
    cases.add(
        new Planted(
            RuleId.OFF_POINTING,
            "a repoint before the last contact aims too far ahead",
            Math.toDegrees(
                    new Aim(4500, 800)
                        .direction()
                        .separation(SKY.earth("Hask", World.ground(2 * DAY + EVENING))))
                - 1.99,
            1e-9,
            World.three(
                world -> world.repoint("r0", "Hask", DAY + 23 * 3600 + 1800, new Aim(4500, 800))),
            World.three(
                world -> world.repoint("r0", "Hask", DAY + 23 * 3600 + 1800, new Aim(4300, 800)))));
  }

  /**
   * Decibels left at 64 kbit/s over Eb/N0 and losses, by the textbook formula written out: EIRP
   * 49.2 dBW, G/T 50.1 dB/K, 8.42 GHz, Boltzmann's constant of the SI (exact since 2019).
   */
  private static double spareDb(long second, double bitsPerSecond) {
    GroundInstant at = World.ground(second);
    Look look = SKY.look("Vellmarch", "Hask", at);
    double offPointing =
        World.three()
            .build()
            .start()
            .of("Hask")
            .aim()
            .direction()
            .separation(SKY.earth("Hask", at));
    double wavelengths = look.rangeMetres() * 8.42e9 / 299_792_458.0;
    double offAxis = (Math.toDegrees(offPointing) + 0.1) / 4.6;
    double noiseDensity =
        49.2
            + 50.1
            - 0.3
            - 20 * StrictMath.log10(4 * Math.PI * wavelengths)
            - 12 * offAxis * offAxis
            - 0.05 / StrictMath.sin(look.elevationRadians())
            - 10 * StrictMath.log10(1.380649e-23);
    return noiseDensity - 10 * StrictMath.log10(bitsPerSecond) - 1.5 - 1.0;
  }

  private static void addLink(List<Planted> cases) {
    double spare = Double.POSITIVE_INFINITY;
    for (long second = 2 * DAY + EVENING; second <= 2 * DAY + 23 * 3600; second += 10) {
      spare = Math.min(spare, spareDb(second, 64_000));
    }
    double least = spare;
    cases.add(
        Planted.of(
            RuleId.LINK_MARGIN,
            "the last contact closes with less than the margin",
            0.01,
            1e-6,
            world -> world.scenario.link = budget(least + 0.01),
            world -> world.scenario.link = budget(least - 1e-6)));

    double offAxis =
        Math.toDegrees(
                World.three()
                    .build()
                    .start()
                    .of("Hask")
                    .aim()
                    .direction()
                    .separation(SKY.earth("Hask", LAST_END)))
            + 0.1;
    cases.add(
        Planted.of(
            RuleId.LINK_MARGIN,
            "a plain table allows half the rate at the end of the last contact",
            10 * StrictMath.log10(2),
            1e-9,
            world -> table(world, offAxis - 1e-4),
            world -> table(world, offAxis + 1e-6)));
  }

  private static Optional<LinkBudget> budget(double marginDb) {
    return Optional.of(new LinkBudget(8.42e9, 1.5, 1.0, 0.3, marginDb));
  }

  private static void table(World world, double upToDegrees) {
    world.rates(
        0,
        new RateLadder.ByOffPointing(
            List.of(
                new RateLadder.ByOffPointing.Row(
                    Angle.ofDegrees(upToDegrees), new DataRate(64_000)),
                new RateLadder.ByOffPointing.Row(Angle.ofDegrees(3), new DataRate(32_000)))));
  }

  private static void addForm(List<Planted> cases) {
    Duration four = Duration.ofHours(4);
    Duration ten = Duration.ofHours(10);
    cases.add(
        Planted.of(
            RuleId.MIN_LENGTH,
            "two seconds short",
            2,
            0,
            world -> {
              world.lengths("Vellmarch", four, ten);
              world.contact("c0", "Vellmarch", "Hask", EVENING, EVENING + HOURS_4 - 2, 64_000);
            },
            world -> world.lengths("Vellmarch", four, ten)));
    cases.add(
        Planted.of(
            RuleId.MAX_LENGTH,
            "two seconds long",
            2,
            0,
            world -> {
              world.lengths("Vellmarch", Duration.ofMinutes(40), four);
              world.contact("c0", "Vellmarch", "Hask", EVENING, EVENING + HOURS_4 + 2, 64_000);
            },
            world -> world.lengths("Vellmarch", Duration.ofMinutes(40), four)));
    cases.add(
        Planted.of(
            RuleId.RATE_STEPS,
            "two rates where one is allowed",
            1,
            0,
            world -> world.secondRate("c0", EVENING + 3600, 48_000),
            world -> {
              world.contactRules(2, 1, Duration.ofMinutes(10));
              world.secondRate("c0", EVENING + 3600, 48_000);
            }));
    cases.add(
        Planted.of(
            RuleId.RATE_STEPS,
            "a rate that is not on the ladder",
            1,
            0,
            world -> world.contact("c0", "Vellmarch", "Hask", EVENING, EVENING + HOURS_4, 63_999),
            world -> world.contact("c0", "Vellmarch", "Hask", EVENING, EVENING + HOURS_4, 48_000)));
    cases.add(
        Planted.of(
            RuleId.RELOCK,
            "the last rate ends with its lock",
            1,
            0,
            world -> {
              world.contactRules(2, 1, Duration.ofMinutes(10));
              world.secondRate("c0", EVENING + HOURS_4 - 60, 48_000);
            },
            world -> {
              world.contactRules(2, 1, Duration.ofMinutes(10));
              world.secondRate("c0", EVENING + HOURS_4 - 61, 48_000);
            }));
  }
}
