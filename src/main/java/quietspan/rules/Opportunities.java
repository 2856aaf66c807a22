package quietspan.rules;

import java.time.Duration;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import quietspan.link.Link;
import quietspan.model.Blocked;
import quietspan.model.Craft;
import quietspan.model.Dish;
import quietspan.model.Geometry;
import quietspan.model.Look;
import quietspan.model.Pass;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Station;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.IntervalSet;

/**
 * Finds every opportunity: passes rounded inward, without keyholes, dead zones, elevation limits
 * and Sun limit, without stretches that are not ours (setup and teardown kept clear of them), and
 * only where a rate closes on the beam's axis. Pieces shorter than the shortest contact are left
 * out.
 */
public final class Opportunities {

  private static final int SCAN = 60;

  private final Scenario scenario;
  private final SightLines sky;
  private final int guard;

  private Opportunities(Scenario scenario, Geometry geometry) {
    this.scenario = scenario;
    this.sky = geometry.sightLines();
    this.guard = geometry.guardSeconds();
  }

  /** All opportunities by begin, station, antenna and craft. */
  public static List<Opportunity> of(Scenario scenario, Geometry geometry) {
    Opportunities search = new Opportunities(scenario, geometry);
    List<Opportunity> all = new ArrayList<>();
    for (Pass pass : geometry.passes()) {
      for (Dish dish : scenario.station(pass.station()).dishes()) {
        search.add(all, pass, dish);
      }
    }
    all.sort(
        Comparator.comparing((Opportunity one) -> one.during().begin())
            .thenComparing(Opportunity::station)
            .thenComparing(Opportunity::antenna)
            .thenComparing(Opportunity::craft));
    return all;
  }

  private void add(List<Opportunity> all, Pass pass, Dish dish) {
    Station station = scenario.station(pass.station());
    Craft craft = scenario.craft(pass.craft());
    GroundInstant begin = pass.visible().begin().ceilToSecond().plusSeconds((long) guard);
    GroundInstant end = pass.visible().end().floorToSecond().plusSeconds(-(long) guard);
    if (!begin.isBefore(end)) {
      return;
    }
    IntervalSet<GroundInstant> free = allowed(station, craft, dish, Interval.of(begin, end));
    List<Interval<GroundInstant>> taken = new ArrayList<>();
    for (Blocked blocked : scenario.calendars().blocked()) {
      if (blocked.concerns(station.name(), dish.name())) {
        // A contact may begin one setup after it ends and must end one teardown before it begins.
        taken.add(blocked.during().widened(dish.teardown(), dish.setup()));
      }
    }
    for (Interval<GroundInstant> piece : free.minus(IntervalSet.of(taken)).parts()) {
      Interval<GroundInstant> whole = inward(piece);
      if (whole != null && whole.length().compareTo(dish.minimumContact()) >= 0) {
        all.add(new Opportunity(station.name(), dish.name(), craft.name(), whole, pass));
      }
    }
  }

  private static Interval<GroundInstant> inward(Interval<GroundInstant> piece) {
    GroundInstant begin = piece.begin().ceilToSecond();
    GroundInstant end = piece.end().floorToSecond();
    return begin.isBefore(end) ? Interval.of(begin, end) : null;
  }

  /** The part of a pass in which the antenna can point there and hears, to the second, inward. */
  private IntervalSet<GroundInstant> allowed(
      Station station, Craft craft, Dish dish, Interval<GroundInstant> pass) {
    Link link = Link.of(scenario, craft, dish);
    List<Interval<GroundInstant>> parts = new ArrayList<>();
    long length = pass.length().toSeconds();
    long open = allows(station, craft, dish, link, pass.begin()) ? 0 : -1;
    for (long t = 0; t < length; t += SCAN) {
      long next = Math.min(length, t + SCAN);
      boolean here = allows(station, craft, dish, link, pass.begin().plusSeconds(t));
      boolean then = allows(station, craft, dish, link, pass.begin().plusSeconds(next));
      if (here != then) {
        long edge = edge(station, craft, dish, link, pass.begin(), t, next, here);
        if (here && open < edge) {
          parts.add(Interval.of(pass.begin().plusSeconds(open), pass.begin().plusSeconds(edge)));
          open = -1;
        } else if (!here) {
          open = edge;
        }
      }
    }
    if (open >= 0 && open < length) {
      parts.add(Interval.of(pass.begin().plusSeconds(open), pass.end()));
    }
    return IntervalSet.of(parts);
  }

  /** The last allowed second before a change, or the first after it, one second inward. */
  private long edge(
      Station station,
      Craft craft,
      Dish dish,
      Link link,
      GroundInstant from,
      long low,
      long high,
      boolean allowedFirst) {
    long a = low;
    long b = high;
    while (b - a > 1) {
      long middle = (a + b) / 2;
      if (allows(station, craft, dish, link, from.plusSeconds(middle)) == allowedFirst) {
        a = middle;
      } else {
        b = middle;
      }
    }
    return allowedFirst ? Math.max(0, a - 1) : b + 1;
  }

  private boolean allows(
      Station station, Craft craft, Dish dish, Link link, GroundInstant instant) {
    Look look = sky.look(station.name(), craft.name(), instant);
    double elevation = look.elevationRadians();
    if (elevation < dish.lowestElevation().radians()
        || elevation > dish.highestElevation().radians()) {
      return false;
    }
    for (Dish.Sector zone : dish.deadZones()) {
      if (elevation < zone.upTo().radians()
          && within(look.azimuthRadians(), zone.from().radians(), zone.to().radians())) {
        return false;
      }
    }
    if (station.sepLimit().radians() > 0
        && sky.sepRadians(craft.name(), instant) < station.sepLimit().radians()) {
      return false;
    }
    return link.highestRate(elevation, look.rangeMetres(), 0).bitsPerSecond() > 0;
  }

  private static boolean within(double azimuth, double from, double to) {
    double turn = 2 * Math.PI;
    double width = to - from - turn * Math.floor((to - from) / turn);
    double into = azimuth - from - turn * Math.floor((azimuth - from) / turn);
    return into <= width;
  }

  /** Stretches without any of the given opportunities, between two instants. */
  static List<Interval<GroundInstant>> without(
      List<Opportunity> opportunities, GroundInstant from, GroundInstant to) {
    IntervalSet<GroundInstant> seen =
        IntervalSet.of(opportunities.stream().map(Opportunity::during).toList());
    return from.isBefore(to)
        ? IntervalSet.of(List.of(Interval.of(from, to))).minus(seen).parts()
        : List.of();
  }

  static Duration longest(Duration a, Duration b) {
    return a.compareTo(b) >= 0 ? a : b;
  }
}
