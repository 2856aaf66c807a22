package quietspan.rules;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import quietspan.model.Blocked;
import quietspan.model.Dish;
import quietspan.model.Geometry;
import quietspan.model.Pass;
import quietspan.model.Scenario;
import quietspan.model.Station;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.IntervalSet;

/**
 * Finds every opportunity: passes without keyholes, dead zones, elevation limits and Sun limit, and
 * only where a rate closes at the beam's centre, rounded inward to whole seconds and by the guard
 * of the geometry; without the stretches that are not ours, setup and teardown kept clear of them.
 * Pieces shorter than the shortest contact are left out.
 */
public final class Opportunities {

  private final Scenario scenario;
  private final Geometry geometry;

  private Opportunities(Scenario scenario, Geometry geometry) {
    this.scenario = scenario;
    this.geometry = geometry;
  }

  /** All opportunities by begin, station, antenna and craft. */
  public static List<Opportunity> of(Scenario scenario, Geometry geometry) {
    return new Opportunities(scenario, geometry).find();
  }

  /** The instants covered by any of the opportunities. */
  public static IntervalSet<GroundInstant> covered(Collection<Opportunity> opportunities) {
    return IntervalSet.of(opportunities.stream().map(Opportunity::during).toList());
  }

  private List<Opportunity> find() {
    List<Opportunity> found = new ArrayList<>();
    for (Station station : scenario.stations()) {
      for (Dish dish : station.dishes()) {
        IntervalSet<GroundInstant> taken = taken(station, dish);
        for (var craft : scenario.craft()) {
          Reception reception =
              new Reception(scenario, geometry.sightLines(), station, dish, craft);
          for (Pass pass : geometry.passes()) {
            if (pass.station().equals(station.name()) && pass.craft().equals(craft.name())) {
              add(found, reception, pass, dish, taken);
            }
          }
        }
      }
    }
    found.sort(
        Comparator.comparing((Opportunity one) -> one.during().begin())
            .thenComparing(Opportunity::station)
            .thenComparing(Opportunity::antenna)
            .thenComparing(Opportunity::craft));
    return List.copyOf(found);
  }

  /** When a contact would come too near to an outage or a lent slot. */
  private IntervalSet<GroundInstant> taken(Station station, Dish dish) {
    List<Interval<GroundInstant>> taken = new ArrayList<>();
    for (Blocked blocked : scenario.calendars().blocked()) {
      if (blocked.concerns(station.name(), dish.name())) {
        taken.add(blocked.during().widened(dish.teardown(), dish.setup()));
      }
    }
    return IntervalSet.of(taken);
  }

  private void add(
      List<Opportunity> found,
      Reception reception,
      Pass pass,
      Dish dish,
      IntervalSet<GroundInstant> taken) {
    long guard = geometry.guardSeconds();
    for (Interval<GroundInstant> heard : reception.during(pass)) {
      GroundInstant begin = heard.begin().plusSeconds(guard);
      GroundInstant end = heard.end().plusSeconds(-guard);
      if (!begin.isBefore(end)) {
        continue;
      }
      for (Interval<GroundInstant> free :
          new IntervalSet<>(List.of(Interval.of(begin, end))).minus(taken).parts()) {
        GroundInstant from = free.begin().ceilToSecond();
        GroundInstant to = free.end().floorToSecond();
        if (from.isBefore(to) && to.since(from).compareTo(dish.minimumContact()) >= 0) {
          found.add(
              new Opportunity(
                  pass.station(), dish.name(), pass.craft(), Interval.of(from, to), pass));
        }
      }
    }
  }
}
