package quietspan.export;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import quietspan.export.Table.Kind;
import quietspan.model.Contact;
import quietspan.model.ContactOutcome;
import quietspan.model.DataClass;
import quietspan.model.Finding;
import quietspan.model.Pause;
import quietspan.model.Plan;
import quietspan.model.QuietSpan;
import quietspan.model.Repoint;
import quietspan.model.Scenario;
import quietspan.model.StorePoint;
import quietspan.model.StoreTrace;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/** The tables of a plan, by the name of their file. */
public final class PlanTables {

  private final Scenario scenario;
  private final Plan plan;

  private PlanTables(Scenario scenario, Plan plan) {
    this.scenario = scenario;
    this.plan = plan;
  }

  static Map<String, Table> of(Scenario scenario, Plan plan, List<ContactClocks> clocks) {
    PlanTables tables = new PlanTables(scenario, plan);
    Map<String, Table> all = new LinkedHashMap<>();
    all.put("contacts", tables.contacts(clocks));
    all.put("repoints", tables.repoints());
    all.put("pauses", tables.pauses());
    all.put("quiet-spans", tables.quietSpans());
    all.put("stores", tables.stores());
    all.put("weeks", tables.weeks());
    all.put("findings", tables.findings());
    return all;
  }

  private Table contacts(List<ContactClocks> clocks) {
    Map<String, ContactOutcome> outcomes =
        plan.outcome().contacts().stream()
            .collect(Collectors.toMap(ContactOutcome::contact, outcome -> outcome));
    Table table =
        Table.of(
                "id",
                "station",
                "antenna",
                "craft",
                "status",
                "services",
                "setup_ground_utc",
                "begin_ground_utc",
                "end_ground_utc",
                "teardown_ground_utc",
                "begin_onboard_utc",
                "end_onboard_utc",
                "uplink_begin_onboard_utc",
                "uplink_end_onboard_utc")
            .and(Kind.NUMBER, "owlt_s")
            .and(Kind.TEXT, "rate_bit_s")
            .and(
                Kind.NUMBER,
                "begin_azimuth_deg",
                "begin_elevation_deg",
                "end_azimuth_deg",
                "end_elevation_deg",
                "capacity_bit",
                "delivered_bit");
    for (ContactClocks each : clocks) {
      Contact contact = each.contact();
      ContactOutcome outcome = outcomes.get(contact.id());
      table.row(
          contact.id(),
          contact.station(),
          contact.antenna(),
          contact.craft(),
          PlanJson.word(contact.status()),
          contact.services().stream().map(PlanJson::word).collect(Collectors.joining(" ")),
          each.busy().begin(),
          contact.during().begin(),
          contact.during().end(),
          each.busy().end(),
          each.onboard().begin(),
          each.onboard().end(),
          each.uplinkBegin(),
          each.uplinkEnd(),
          Decimal.fixed(each.owltSeconds(), 3),
          rates(contact),
          Words.degrees(each.begin().azimuthRadians()),
          Words.degrees(each.begin().elevationRadians()),
          Words.degrees(each.end().azimuthRadians()),
          Words.degrees(each.end().elevationRadians()),
          outcome == null ? "" : outcome.capacity().bits(),
          outcome == null ? "" : outcome.delivered().bits());
    }
    return table;
  }

  /** One rate, or each rate after the instant from which it holds. */
  private static String rates(Contact contact) {
    return contact.steps().size() == 1
        ? Long.toString(contact.steps().get(0).rate().bitsPerSecond())
        : contact.steps().stream()
            .map(step -> step.from() + " " + step.rate().bitsPerSecond())
            .collect(Collectors.joining(" "));
  }

  private Table repoints() {
    Table table =
        Table.of("id", "craft", "start_onboard_utc", "moved_onboard_utc", "settled_onboard_utc")
            .and(Kind.NUMBER, "aim_azimuth_deg", "aim_elevation_deg");
    for (Repoint repoint : plan.decisions().repoints()) {
      var antenna = scenario.craft(repoint.craft()).antenna();
      table.row(
          repoint.id(),
          repoint.craft(),
          repoint.start(),
          repoint.start().plus(antenna.move()),
          repoint.start().plus(antenna.repointLength()),
          Words.degrees(repoint.aim().azimuthCentidegrees()),
          Words.degrees(repoint.aim().elevationCentidegrees()));
    }
    return table;
  }

  private static Table spans(String... more) {
    return Table.of("begin_onboard_utc", "end_onboard_utc")
        .and(Kind.NUMBER, "length_s")
        .and(Kind.TEXT, more);
  }

  private Table pauses() {
    Table table = spans("repoints", "interruptions");
    for (Pause pause : plan.outcome().pauses()) {
      Interval<OnboardInstant> during = pause.during();
      table.row(
          during.begin(),
          during.end(),
          during.length().toSeconds(),
          String.join(" ", pause.repoints()),
          String.join("; ", pause.interruptions()));
    }
    return table;
  }

  private Table quietSpans() {
    Table table = spans().and(Kind.NUMBER, "value_s").and(Kind.FLAG, "open_before", "open_after");
    for (QuietSpan span : plan.outcome().quietSpans()) {
      table.row(
          span.during().begin(),
          span.during().end(),
          span.lengthSeconds(),
          span.valueSeconds(),
          span.openBefore(),
          span.openAfter());
    }
    return table;
  }

  /** Points where a slope changes; linear between. One row per point and data class. */
  private Table stores() {
    List<String> classes = scenario.rules().classes().stream().map(DataClass::name).toList();
    Table table =
        Table.of("craft", "onboard_utc")
            .and(Kind.NUMBER, "fill_bit")
            .and(Kind.NUMBER, classes.stream().map(name -> name + "_bit").toArray(String[]::new));
    for (StoreTrace trace : plan.outcome().stores()) {
      for (StorePoint point : trace.points()) {
        Object[] row = new Object[3 + classes.size()];
        row[0] = trace.craft();
        row[1] = OnboardInstant.ofEpochSecond(point.onboardEpochSecond());
        row[2] = point.fillBits();
        for (int i = 0; i < classes.size(); i++) {
          row[3 + i] = point.bitsByClass().get(i);
        }
        table.row(row);
      }
    }
    return table;
  }

  private Table weeks() {
    Table table =
        Table.of()
            .and(Kind.NUMBER, "week")
            .and(Kind.TEXT, "begin_onboard_utc", "end_onboard_utc")
            .and(
                Kind.NUMBER,
                "contacts",
                "contact_s",
                "capacity_bit",
                "delivered_bit",
                "generated_bit",
                "highest_fill_percent",
                "longest_latency_s");
    for (Week week : Week.of(scenario, plan)) {
      table.row(
          week.number(),
          week.during().begin(),
          week.during().end(),
          week.contacts(),
          week.contactSeconds(),
          week.capacityBits(),
          week.deliveredBits(),
          week.generatedBits(),
          Decimal.fixed(100 * week.highestFill(), 2),
          week.longestLatencySeconds().isPresent()
              ? Decimal.fixed(week.longestLatencySeconds().getAsDouble(), 3)
              : "");
    }
    return table;
  }

  private Table findings() {
    return findings(plan.outcome().findings());
  }

  /** Broken rules, in the order given. */
  public static Table findings(List<Finding> findings) {
    Table table =
        Table.of("rule", "clock", "at_utc", "craft", "station", "subject")
            .and(Kind.NUMBER, "amount")
            .and(Kind.TEXT, "unit", "detail");
    for (Finding finding : findings) {
      table.row(
          finding.rule(),
          Words.clock(finding.rule()),
          Words.milliseconds(finding.at()),
          finding.craft(),
          finding.station(),
          finding.subject(),
          Decimal.rounded(finding.amount(), 6).toPlainString(),
          finding.rule().unit().symbol(),
          finding.detail());
    }
    return table;
  }
}
