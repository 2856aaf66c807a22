package quietspan.run;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import quietspan.check.Check;
import quietspan.check.CheckReport;
import quietspan.check.Stale;
import quietspan.model.ContactOutcome;
import quietspan.model.Decisions;
import quietspan.model.Geometry;
import quietspan.model.Outcome;
import quietspan.model.Plan;
import quietspan.model.Provenance;
import quietspan.model.Scenario;
import quietspan.model.Waiver;

/**
 * Decisions as the simulation and the check see them. Figures are those of the simulation; findings
 * and the latency of each contact are those of the check, whose word counts.
 *
 * @param outcome what is written
 * @param report of the check
 * @param disagreements where simulation and check count differently: a fault of the program
 */
record Judgement(Outcome outcome, CheckReport report, List<String> disagreements) {

  /**
   * Lets the check judge a simulated outcome.
   *
   * @param waivers those that the scenario itself gives
   */
  static Judgement of(
      Scenario scenario,
      Geometry geometry,
      Decisions decisions,
      Outcome simulated,
      List<Waiver> waivers) {
    CheckReport report = Check.check(scenario, geometry.sightLines(), decisions, waivers);
    Provenance nowhere =
        new Provenance("", scenario.identity().inputs(), List.of(), 0, 0, 0, false, waivers);
    Plan plan =
        new Plan(
            scenario.identity().mission(),
            decisions,
            simulated,
            java.util.Optional.empty(),
            nowhere);
    List<String> disagreements =
        Stale.compare(plan, report.recount(), scenario.identity().inputs(), waivers)
            .differences()
            .stream()
            .map(
                difference ->
                    "the simulation says "
                        + difference.stored()
                        + " and the check "
                        + difference.now()
                        + " of "
                        + difference.what())
            .toList();
    return new Judgement(written(simulated, report), report, disagreements);
  }

  private static Outcome written(Outcome simulated, CheckReport report) {
    Map<String, ContactOutcome> recounted = new HashMap<>();
    report.recount().contacts().forEach(contact -> recounted.put(contact.contact(), contact));
    return new Outcome(
        simulated.pauses(),
        simulated.quietSpans(),
        simulated.scienceSeconds(),
        simulated.contacts().stream()
            .map(contact -> withLatency(contact, recounted.get(contact.contact())))
            .toList(),
        simulated.stores(),
        simulated.classes(),
        simulated.contactHours(),
        simulated.stationCostUnits(),
        report.findings());
  }

  private static ContactOutcome withLatency(ContactOutcome simulated, ContactOutcome recounted) {
    return recounted == null
        ? simulated
        : new ContactOutcome(
            simulated.contact(),
            simulated.onboard(),
            simulated.capacity(),
            simulated.delivered(),
            recounted.longestLatencySeconds());
  }
}
