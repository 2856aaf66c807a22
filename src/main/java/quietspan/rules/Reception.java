package quietspan.rules;

import java.util.ArrayList;
import java.util.List;
import quietspan.link.Link;
import quietspan.model.Craft;
import quietspan.model.Dish;
import quietspan.model.Look;
import quietspan.model.Pass;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Station;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;

/**
 * When one antenna could hear one craft whose beam is centred: inside the antenna's limits, away
 * from the Sun, and with a rate that closes.
 *
 * <p>Looks every 30 s where a limit is near, finds each edge to the second, and skips as far as
 * nothing can change: elevation moves at most with the turning Earth, the Sun-Earth-probe angle by
 * a few degrees a day.
 */
final class Reception {

  private static final long LOOK_SECONDS = 30;

  /** The Earth turns by 7.292e-5 rad/s (WGS84); the rest is for the craft's own motion. */
  private static final double ELEVATION_RATE = 8e-5;

  /** 5 deg a day (rad/s). */
  private static final double SEP_RATE = 1e-6;

  /** Range and G/T within a pass move the lowest usable elevation by less than this (rad). */
  private static final double FLOOR_SLACK = 0.005;

  private final SightLines sightLines;
  private final Station station;
  private final Dish dish;
  private final String craft;
  private final Link link;
  private final double skyline;

  /** Lowest elevation with a rate in the pass that is looked at (rad). */
  private double floor;

  Reception(Scenario scenario, SightLines sightLines, Station station, Dish dish, Craft craft) {
    this.sightLines = sightLines;
    this.station = station;
    this.dish = dish;
    this.craft = craft.name();
    this.link = Link.of(scenario, craft, dish);
    this.skyline =
        station.mask().stream()
            .mapToDouble(point -> point.elevation().radians())
            .min()
            .orElseThrow();
  }

  /** Maximal stretches within a pass, whole seconds, rounded inward. */
  List<Interval<GroundInstant>> during(Pass pass) {
    GroundInstant begin = pass.visible().begin().ceilToSecond();
    GroundInstant end = pass.visible().end().floorToSecond();
    if (!begin.isBefore(end)) {
      return List.of();
    }
    Interval<GroundInstant> whole = Interval.of(begin, end);
    floor = floor(whole);
    if (floor > pass.highestElevation().radians() + FLOOR_SLACK) {
      return List.of();
    }
    return binds(pass, whole) ? search(pass, whole) : List.of(whole);
  }

  /** The elevation above which a rate closes at the greatest range of the pass. */
  private double floor(Interval<GroundInstant> pass) {
    double range =
        Math.max(
            sightLines.look(station.name(), craft, pass.begin()).rangeMetres(),
            sightLines.look(station.name(), craft, pass.end()).rangeMetres());
    double low = Math.max(0, skyline);
    double high = Math.PI / 2;
    if (closes(low, range)) {
      return low;
    }
    if (!closes(high, range)) {
      return Double.POSITIVE_INFINITY;
    }
    while (high - low > 1e-5) {
      double middle = (low + high) / 2;
      if (closes(middle, range)) {
        high = middle;
      } else {
        low = middle;
      }
    }
    return high;
  }

  private boolean closes(double elevation, double range) {
    return link.highestBitsPerSecond(link.centreDbHz(elevation, range), 0) > 0;
  }

  /** Whether any limit could cut the pass. */
  private boolean binds(Pass pass, Interval<GroundInstant> whole) {
    return !dish.deadZones().isEmpty()
        || pass.highestElevation().radians() > dish.highestElevation().radians() - 1e-4
        || dish.lowestElevation().radians() > skyline
        || floor > skyline
        || nearSun(whole);
  }

  private boolean nearSun(Interval<GroundInstant> whole) {
    double limit = station.sepLimit().radians();
    return limit > 0
        && sightLines.sepRadians(craft, whole.begin()) - limit < SEP_RATE * whole.seconds();
  }

  private List<Interval<GroundInstant>> search(Pass pass, Interval<GroundInstant> whole) {
    List<Interval<GroundInstant>> parts = new ArrayList<>();
    long length = whole.length().toSeconds();
    long top =
        (long)
            Math.max(0, Math.min((double) length, pass.culmination().secondsSince(whole.begin())));
    Cursor cursor = new Cursor(whole.begin());
    boolean heard = cursor.hears(0);
    long since = 0;
    long at = 0;
    while (at < length) {
      long next = Math.min(length, at + Math.max(LOOK_SECONDS, (long) cursor.steadySeconds));
      if (at < top && top < next) {
        next = top;
      }
      boolean hears = cursor.hears(next);
      if (hears != heard) {
        double steady = cursor.steadySeconds;
        long last = cursor.lastAlike(at, next, heard);
        if (heard && since < last) {
          parts.add(Interval.of(whole.begin().plusSeconds(since), whole.begin().plusSeconds(last)));
        }
        since = last + 1;
        heard = hears;
        cursor.steadySeconds = steady;
      }
      at = next;
    }
    if (heard && since < length) {
      parts.add(Interval.of(whole.begin().plusSeconds(since), whole.end()));
    }
    return parts;
  }

  /** Looks at seconds of a pass. */
  private final class Cursor {

    private final GroundInstant from;

    /** For how long after the last look nothing can have changed. */
    private double steadySeconds;

    Cursor(GroundInstant from) {
      this.from = from;
    }

    boolean hears(long second) {
      GroundInstant at = from.plusSeconds(second);
      Look look = sightLines.look(station.name(), craft, at);
      double elevation = look.elevationRadians();
      double low = dish.lowestElevation().radians();
      double high = dish.highestElevation().radians();
      double away = Math.min(Math.abs(elevation - low), Math.abs(elevation - high));
      away = Math.min(away, Math.abs(elevation - floor) - FLOOR_SLACK);
      boolean dead = false;
      for (Dish.Sector zone : dish.deadZones()) {
        away = Math.min(away, elevation - zone.upTo().radians());
        dead |= elevation < zone.upTo().radians() && inside(zone, look.azimuthRadians());
      }
      steadySeconds = away / ELEVATION_RATE;
      double limit = station.sepLimit().radians();
      boolean dazzled = false;
      if (limit > 0) {
        double sep = sightLines.sepRadians(craft, at);
        dazzled = sep < limit;
        steadySeconds = Math.min(steadySeconds, Math.abs(sep - limit) / SEP_RATE);
      }
      return elevation >= low
          && elevation <= high
          && !dead
          && !dazzled
          && closes(elevation, look.rangeMetres());
    }

    /** The last second that is like the first one, of two between which it changes. */
    long lastAlike(long first, long changed, boolean heard) {
      long alike = first;
      long other = changed;
      while (other - alike > 1) {
        long middle = alike + (other - alike) / 2;
        if (hears(middle) == heard) {
          alike = middle;
        } else {
          other = middle;
        }
      }
      return alike;
    }
  }

  private static boolean inside(Dish.Sector zone, double azimuth) {
    return eastwards(zone.from().radians(), azimuth)
        <= eastwards(zone.from().radians(), zone.to().radians());
  }

  /** The angle from one azimuth eastwards to another, 0 to below 2 pi (rad). */
  private static double eastwards(double from, double to) {
    double turn = 2 * Math.PI;
    return to - from - turn * Math.floor((to - from) / turn);
  }
}
