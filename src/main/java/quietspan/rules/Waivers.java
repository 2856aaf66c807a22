package quietspan.rules;

import java.time.Duration;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.DataClass;
import quietspan.model.Geometry;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Waiver;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.IntervalSet;
import quietspan.time.OnboardInstant;

/**
 * Limits that no plan can keep, because passes, outages and lent slots leave a stretch without any
 * opportunity that is longer than the limit: for GAP (an opportunity of any craft ends it), DIRECT
 * (of the craft itself) and LATENCY. Nothing else is ever waived. The relaxed limit is as long as
 * the stretch, rounded up to the second.
 *
 * <p>For LATENCY the stretch is that of the formation for craft that send over cross-links, and
 * their own for the others. A bit made when the last opportunity has just ended waits for the whole
 * stretch and then for the earliest delivery: the relaxed limit is the stretch with light time and
 * delivery delay. Lock-up and the time to send what has gathered are not in it. A stretch at the
 * end of the period ends with the period, where what is aboard is judged by its age alone.
 */
public final class Waivers {

  /** The craft of a formation are nearer to each other than this, as light goes. */
  private static final Duration FORMATION_LIGHT = Duration.ofHours(1);

  private final Scenario scenario;
  private final SightLines sightLines;
  private final List<Opportunity> opportunities;
  private final Map<String, Duration> delays = new LinkedHashMap<>();
  private final Duration longestDelay;
  private final List<Waiver> found = new ArrayList<>();

  private Waivers(Scenario scenario, Geometry geometry, List<Opportunity> opportunities) {
    this.scenario = scenario;
    this.sightLines = geometry.sightLines();
    this.opportunities = opportunities;
    scenario.stations().forEach(station -> delays.put(station.name(), station.deliveryDelay()));
    this.longestDelay = Collections.max(delays.values());
  }

  /** GAP, then DIRECT by craft, then LATENCY by class, each in time order. */
  public static List<Waiver> of(Scenario scenario, Geometry geometry) {
    return of(scenario, geometry, Opportunities.of(scenario, geometry));
  }

  /** As above with the opportunities already at hand. */
  public static List<Waiver> of(
      Scenario scenario, Geometry geometry, List<Opportunity> opportunities) {
    Waivers waivers = new Waivers(scenario, geometry, opportunities);
    waivers.gap();
    waivers.direct();
    waivers.latency();
    return List.copyOf(waivers.found);
  }

  private void gap() {
    scenario
        .rules()
        .data()
        .gapLimit()
        .ifPresent(
            limit -> {
              Craft first = scenario.craft().get(0);
              waive(RuleId.GAP, "", limit, stretches(first, formationStart(), opportunities));
            });
  }

  private void direct() {
    scenario
        .rules()
        .data()
        .directLimit()
        .ifPresent(
            limit -> {
              for (Craft craft : scenario.craft()) {
                waive(
                    RuleId.DIRECT,
                    craft.name(),
                    limit,
                    stretches(craft, start(craft), opportunitiesOf(craft)));
              }
            });
  }

  private void waive(
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
                roundedUp(stretch.length()),
                reason(stretch)));
      }
    }
  }

  /** Craft that share their stretches: all that send over cross-links, or one that does not. */
  private record Senders(List<Craft> craft, boolean together) {}

  private void latency() {
    for (DataClass dataClass : scenario.rules().classes()) {
      for (Senders senders : senders(dataClass)) {
        Craft first = senders.craft().get(0);
        List<Opportunity> own = senders.together() ? opportunities : opportunitiesOf(first);
        GroundInstant start = senders.together() ? formationStart() : start(first);
        for (Interval<GroundInstant> stretch : stretches(first, start, own)) {
          waive(dataClass, senders, stretch, own);
        }
      }
    }
  }

  private List<Senders> senders(DataClass dataClass) {
    List<Craft> makers =
        scenario.craft().stream().filter(craft -> holds(craft, dataClass.name())).toList();
    List<Craft> linked =
        makers.stream()
            .filter(craft -> scenario.craft().size() > 1 && craft.crossLink().bitsPerSecond() > 0)
            .toList();
    List<Senders> senders = new ArrayList<>();
    if (!linked.isEmpty()) {
      senders.add(new Senders(linked, true));
    }
    for (Craft craft : makers) {
      if (!linked.contains(craft)) {
        senders.add(new Senders(List.of(craft), false));
      }
    }
    return senders;
  }

  private boolean holds(Craft craft, String dataClass) {
    return craft.generation().stream().anyMatch(one -> one.dataClass().equals(dataClass))
        || scenario.start().of(craft.name()).fill().stream()
            .anyMatch(one -> one.dataClass().equals(dataClass));
  }

  private void waive(
      DataClass dataClass,
      Senders senders,
      Interval<GroundInstant> stretch,
      List<Opportunity> own) {
    Duration light =
        Duration.between(
            sightLines.onboard(senders.craft().get(0).name(), stretch.begin()).utc(),
            stretch.begin().utc());
    Duration atMost = stretch.length().plus(light).plus(longestDelay).plus(FORMATION_LIGHT);
    if (atMost.compareTo(dataClass.latencyLimit()) <= 0) {
      return;
    }
    Optional<GroundInstant> delivery = earliestDelivery(stretch.end(), own);
    Duration longest = Duration.ZERO;
    OnboardInstant begin = null;
    OnboardInstant end = null;
    for (Craft craft : senders.craft()) {
      OnboardInstant closed = sightLines.onboard(craft.name(), stretch.begin());
      OnboardInstant opened = sightLines.onboard(craft.name(), stretch.end());
      Duration wait =
          delivery
              .map(at -> Duration.between(closed.utc(), at.utc()))
              .orElseGet(() -> scenario.period().end().since(closed));
      longest = longest.compareTo(wait) < 0 ? wait : longest;
      begin = begin == null || closed.isBefore(begin) ? closed : begin;
      end = end == null || end.isBefore(opened) ? opened : end;
    }
    if (longest.compareTo(dataClass.latencyLimit()) > 0) {
      found.add(
          new Waiver(
              RuleId.LATENCY,
              senders.together() ? "" : senders.craft().get(0).name(),
              dataClass.name(),
              begin.utc(),
              end.utc(),
              roundedUp(longest),
              reason(stretch)));
    }
  }

  /** When data received from an instant on can first be delivered; empty when never. */
  private Optional<GroundInstant> earliestDelivery(GroundInstant from, List<Opportunity> own) {
    return own.stream()
        .filter(one -> !one.during().begin().isBefore(from))
        .map(one -> one.during().begin().plus(delays.get(one.station())))
        .min(GroundInstant::compareTo);
  }

  private List<Opportunity> opportunitiesOf(Craft craft) {
    return opportunities.stream().filter(one -> one.craft().equals(craft.name())).toList();
  }

  private GroundInstant formationStart() {
    return scenario
        .start()
        .lastContactEnd()
        .or(
            () ->
                scenario.start().craft().stream()
                    .map(CraftState::lastContactEnd)
                    .flatMap(Optional::stream)
                    .max(GroundInstant::compareTo))
        .orElseGet(() -> periodBegin(scenario.craft().get(0)));
  }

  private GroundInstant start(Craft craft) {
    return scenario.start().of(craft.name()).lastContactEnd().orElseGet(() -> periodBegin(craft));
  }

  private GroundInstant periodBegin(Craft craft) {
    return sightLines.ground(craft.name(), scenario.period().begin());
  }

  /** Stretches without opportunity from a start to the end of the period on a craft's clock. */
  private List<Interval<GroundInstant>> stretches(
      Craft clock, GroundInstant start, List<Opportunity> own) {
    GroundInstant end = sightLines.ground(clock.name(), scenario.period().end());
    return start.isBefore(end)
        ? IntervalSet.of(List.of(Interval.of(start, end))).minus(Opportunities.covered(own)).parts()
        : List.of();
  }

  private static String reason(Interval<GroundInstant> stretch) {
    return "no opportunity from " + stretch.begin() + " to " + stretch.end();
  }

  private static Duration roundedUp(Duration duration) {
    return Duration.ofSeconds(duration.getSeconds() + (duration.getNano() > 0 ? 1 : 0));
  }
}
