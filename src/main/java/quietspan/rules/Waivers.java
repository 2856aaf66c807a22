package quietspan.rules;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.DataClass;
import quietspan.model.Geometry;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.Station;
import quietspan.model.Waiver;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;

/**
 * Limits that no plan can keep, because geometry, outages and lent slots leave a stretch without
 * any opportunity that is longer than the limit. A function of the scenario alone, for GAP, DIRECT
 * and LATENCY; the relaxed limit is that stretch, rounded up to the second, for LATENCY with light
 * time and delivery delay on top. Lost data and fill are never waived.
 */
public final class Waivers {

  private final Scenario scenario;
  private final Geometry geometry;
  private final List<Opportunity> opportunities;
  private final List<Waiver> found = new ArrayList<>();

  private Waivers(Scenario scenario, Geometry geometry, List<Opportunity> opportunities) {
    this.scenario = scenario;
    this.geometry = geometry;
    this.opportunities = opportunities;
  }

  public static List<Waiver> of(Scenario scenario, Geometry geometry) {
    return of(scenario, geometry, Opportunities.of(scenario, geometry));
  }

  /** As above with the opportunities already at hand. */
  public static List<Waiver> of(
      Scenario scenario, Geometry geometry, List<Opportunity> opportunities) {
    Waivers waivers = new Waivers(scenario, geometry, opportunities);
    waivers.gaps();
    waivers.direct();
    waivers.latencies();
    return List.copyOf(waivers.found);
  }

  private GroundInstant ground(Craft craft, boolean begin) {
    return geometry
        .sightLines()
        .ground(craft.name(), begin ? scenario.period().begin() : scenario.period().end());
  }

  private void gaps() {
    Optional<Duration> limit = scenario.rules().data().gapLimit();
    if (limit.isEmpty()) {
      return;
    }
    Craft first = scenario.craft().get(0);
    GroundInstant from = lastContact().orElse(ground(first, true));
    add(
        RuleId.GAP,
        "",
        limit.get(),
        Opportunities.without(opportunities, from, ground(first, false)));
  }

  private Optional<GroundInstant> lastContact() {
    return scenario
        .start()
        .lastContactEnd()
        .or(
            () ->
                scenario.start().craft().stream()
                    .map(CraftState::lastContactEnd)
                    .flatMap(Optional::stream)
                    .max(GroundInstant::compareTo));
  }

  private void direct() {
    Optional<Duration> limit = scenario.rules().data().directLimit();
    if (limit.isEmpty()) {
      return;
    }
    for (Craft craft : scenario.craft()) {
      GroundInstant from =
          scenario.start().of(craft.name()).lastContactEnd().orElse(ground(craft, true));
      add(
          RuleId.DIRECT,
          craft.name(),
          limit.get(),
          Opportunities.without(of(craft), from, ground(craft, false)));
    }
  }

  private List<Opportunity> of(Craft craft) {
    return opportunities.stream().filter(one -> one.craft().equals(craft.name())).toList();
  }

  private void add(
      RuleId rule, String craft, Duration limit, List<Interval<GroundInstant>> stretches) {
    for (Interval<GroundInstant> stretch : stretches) {
      if (stretch.length().compareTo(limit) > 0) {
        found.add(
            new Waiver(
                rule,
                craft,
                "",
                stretch.begin().utc(),
                stretch.end().utc(),
                ceil(stretch.length()),
                reason(stretch)));
      }
    }
  }

  private static String reason(Interval<GroundInstant> stretch) {
    return "no opportunity from " + stretch.begin() + " to " + stretch.end();
  }

  private static Duration ceil(Duration duration) {
    return duration.getNano() == 0 ? duration : Duration.ofSeconds(duration.getSeconds() + 1);
  }

  /** A bit made at the begin of a stretch without opportunity waits for all of it. */
  private void latencies() {
    Duration delivery =
        scenario.stations().stream()
            .map(Station::deliveryDelay)
            .reduce(Duration.ZERO, Opportunities::longest);
    for (DataClass dataClass : scenario.rules().classes()) {
      for (Craft craft : scenario.craft()) {
        boolean makes =
            craft.generation().stream().anyMatch(one -> one.dataClass().equals(dataClass.name()));
        if (!makes) {
          continue;
        }
        boolean forwards = craft.crossLink().bitsPerSecond() > 0 && scenario.craft().size() > 1;
        List<Interval<GroundInstant>> stretches =
            Opportunities.without(
                forwards ? opportunities : of(craft), ground(craft, true), ground(craft, false));
        for (Interval<GroundInstant> stretch : stretches) {
          double light = geometry.sightLines().downlinkSeconds(craft.name(), stretch.begin());
          Duration needed =
              stretch.length().plus(delivery).plusMillis((long) Math.ceil(light * 1000));
          String who = forwards ? "" : craft.name();
          boolean said =
              found.stream()
                  .anyMatch(
                      one ->
                          one.rule() == RuleId.LATENCY
                              && one.craft().equals(who)
                              && one.dataClass().equals(dataClass.name())
                              && one.reason().equals(reason(stretch)));
          if (!said && needed.compareTo(dataClass.latencyLimit()) > 0) {
            found.add(
                new Waiver(
                    RuleId.LATENCY,
                    who,
                    dataClass.name(),
                    geometry.sightLines().onboard(craft.name(), stretch.begin()).utc(),
                    geometry.sightLines().onboard(craft.name(), stretch.end()).utc(),
                    ceil(needed),
                    reason(stretch)));
          }
        }
      }
    }
  }
}
