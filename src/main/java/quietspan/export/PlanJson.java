package quietspan.export;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import java.io.IOException;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.time.Instant;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import quietspan.check.CheckMargins;
import quietspan.check.CheckReport;
import quietspan.model.Aim;
import quietspan.model.Bound;
import quietspan.model.ClassOutcome;
import quietspan.model.Contact;
import quietspan.model.ContactOutcome;
import quietspan.model.Finding;
import quietspan.model.InputFile;
import quietspan.model.Outcome;
import quietspan.model.Pause;
import quietspan.model.Plan;
import quietspan.model.Provenance;
import quietspan.model.QuietSpan;
import quietspan.model.RateStep;
import quietspan.model.Repoint;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.StoreTrace;
import quietspan.model.Waiver;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * Writes {@code plan.json}, format 1. Keys stand in a fixed order, numbers are plain decimals,
 * instants are UTC with their clock in the key; one decision stands on one line, so that a person
 * can edit it and a comparison of two files reads well.
 */
public final class PlanJson {

  /** Raised when a reader of an older file would be misled. */
  static final int FORMAT = 1;

  private final JsonGenerator json;

  private PlanJson(JsonGenerator json) {
    this.json = json;
  }

  /** The whole file. */
  public static String write(Scenario scenario, SightLines sightLines, Plan plan) {
    return written(json -> json.file(scenario, sightLines, plan));
  }

  /**
   * What a command says of a plan: its summary, where it is, and what is to be remarked.
   *
   * @param folder as the user gave it
   */
  public static String report(String folder, Summary summary, List<String> warnings) {
    return written(
        json -> {
          json.json.writeStartObject();
          json.json.writeStringField("folder", folder);
          json.summary(summary);
          json.strings("warnings", warnings);
          json.json.writeEndObject();
        });
  }

  /**
   * What the check says of a plan.
   *
   * @param plan as the user gave it
   * @param scenario folder that the plan was held against
   * @param altered inputs and waivers that are not those of the scenario
   * @param stale derived values that do not follow from the decisions
   */
  public static String verdict(
      String plan,
      String scenario,
      Summary summary,
      CheckReport report,
      List<String> altered,
      List<String> stale) {
    return written(
        json -> {
          json.json.writeStartObject();
          json.json.writeStringField("plan", plan);
          json.json.writeStringField("scenario", scenario);
          json.json.writeBooleanField("passed", report.legal() && altered.isEmpty());
          json.summary(summary);
          json.list("findings", report.findings(), json::finding);
          json.margins(report.margins());
          json.strings("warnings", report.warnings());
          json.strings("assumptions", report.assumptions());
          json.strings("altered", altered);
          json.strings("stale", stale);
          json.json.writeStringField("missable", report.missable().sentence());
          json.json.writeEndObject();
        });
  }

  private void margins(CheckMargins margins) throws IOException {
    json.writeObjectFieldStart("margins");
    margin("off_pointing_deg", margins.offPointingDegrees());
    margin("link_db", margins.linkDecibels());
    margin("turn_round_s", margins.turnRoundSeconds());
    margin("after_repoint_s", margins.afterRepointSeconds());
    margin("highest_fill_percent", margins.highestFillPercent());
    for (CheckMargins.Extreme latency : margins.longestLatencySeconds()) {
      margin("longest_latency_s " + latency.subject(), Optional.of(latency));
    }
    json.writeEndObject();
  }

  private void margin(String key, Optional<CheckMargins.Extreme> extreme) throws IOException {
    if (extreme.isPresent()) {
      json.writeObjectFieldStart(key);
      json.writeNumberField("value", Decimal.rounded(extreme.get().value(), 6));
      json.writeStringField("subject", extreme.get().subject());
      json.writeEndObject();
    } else {
      json.writeNullField(key);
    }
  }

  private interface Content {
    void write(PlanJson json) throws IOException;
  }

  private static String written(Content content) {
    StringWriter text = new StringWriter();
    try (JsonGenerator json = new JsonFactory().createGenerator(text)) {
      json.configure(JsonGenerator.Feature.WRITE_BIGDECIMAL_AS_PLAIN, true);
      json.setPrettyPrinter(new LinePerEntry(3));
      content.write(new PlanJson(json));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return text.append('\n').toString();
  }

  private void file(Scenario scenario, SightLines sightLines, Plan plan) throws IOException {
    json.writeStartObject();
    json.writeNumberField("format", FORMAT);
    json.writeStringField("mission", plan.mission());
    instant("issued_utc", scenario.identity().issued());
    summary(Summary.of(scenario, plan));
    json.writeObjectFieldStart("decisions");
    list("repoints", plan.decisions().repoints(), this::repoint);
    list("contacts", plan.decisions().contacts(), this::contact);
    json.writeEndObject();
    derived(scenario, sightLines, plan);
    provenance(plan.provenance());
    json.writeEndObject();
  }

  private void summary(Summary summary) throws IOException {
    json.writeObjectFieldStart("summary");
    json.writeStringField("status", word(summary.status()));
    json.writeNumberField("scienceHours", Decimal.hours(summary.scienceSeconds()));
    if (summary.boundScienceSeconds().isPresent()) {
      long gap = summary.gapSeconds().orElseThrow();
      json.writeNumberField(
          "boundScienceHours", Decimal.hours(summary.boundScienceSeconds().get()));
      json.writeNumberField("gapHours", Decimal.hours(gap));
      json.writeNumberField(
          "gapPercent", Decimal.rounded(100.0 * gap / summary.periodSeconds(), 4));
    } else {
      json.writeNullField("boundScienceHours");
      json.writeNullField("gapHours");
      json.writeNullField("gapPercent");
    }
    json.writeNumberField("pauses", summary.pauses());
    if (summary.boundPauses().isPresent()) {
      json.writeNumberField("boundPauses", summary.boundPauses().get());
    } else {
      json.writeNullField("boundPauses");
    }
    if (summary.longestQuietSpanSeconds().isPresent()) {
      json.writeNumberField(
          "longestQuietSpanHours", Decimal.hours(summary.longestQuietSpanSeconds().getAsLong()));
    }
    if (summary.shortestQuietSpanSeconds().isPresent()) {
      json.writeNumberField(
          "shortestQuietSpanHours", Decimal.hours(summary.shortestQuietSpanSeconds().getAsLong()));
    }
    json.writeNumberField("lostGbit", Decimal.gigabits(summary.lostBits()));
    json.writeNumberField(
        "highestFillPercent", Decimal.rounded(100 * summary.highestFillShare(), 4));
    if (summary.longestLatencySeconds().isPresent()) {
      json.writeNumberField(
          "longestLatencyHours", Decimal.hours(summary.longestLatencySeconds().getAsDouble()));
    } else {
      json.writeNullField("longestLatencyHours");
    }
    json.writeNumberField("contactHours", Decimal.rounded(summary.contactHours(), 4));
    json.writeNumberField("stationCostUnits", Decimal.rounded(summary.stationCostUnits(), 4));
    strings("waivers", summary.waivers().stream().map(Words::sentence).toList());
    json.writeEndObject();
  }

  private void repoint(Repoint repoint) throws IOException {
    json.writeStringField("id", repoint.id());
    json.writeStringField("craft", repoint.craft());
    onboard("start_onboard_utc", repoint.start());
    aim(repoint.aim());
  }

  private void contact(Contact contact) throws IOException {
    json.writeStringField("id", contact.id());
    json.writeStringField("station", contact.station());
    json.writeStringField("antenna", contact.antenna());
    json.writeStringField("craft", contact.craft());
    instant("begin_ground_utc", contact.during().begin().utc());
    instant("end_ground_utc", contact.during().end().utc());
    if (contact.steps().size() == 1) {
      json.writeNumberField("rate_bit_s", contact.steps().get(0).rate().bitsPerSecond());
    } else {
      list("rate_steps", contact.steps(), this::rateStep);
    }
    words("services", contact.services());
    json.writeStringField("status", word(contact.status()));
  }

  private void rateStep(RateStep step) throws IOException {
    instant("from_ground_utc", step.from().utc());
    json.writeNumberField("rate_bit_s", step.rate().bitsPerSecond());
  }

  private void derived(Scenario scenario, SightLines sightLines, Plan plan) throws IOException {
    Outcome outcome = plan.outcome();
    json.writeObjectFieldStart("derived");
    json.writeNumberField("science_s", outcome.scienceSeconds());
    list("pauses", outcome.pauses(), this::pause);
    list("quiet_spans", outcome.quietSpans(), this::quietSpan);
    list("contacts", outcome.contacts(), this::contactOutcome);
    list("stores", outcome.stores(), this::store);
    list("classes", outcome.classes(), this::dataClass);
    list("weeks", Week.of(scenario, plan), this::week);
    list("end_states", EndState.of(scenario, sightLines, plan), this::endState);
    list("findings", outcome.findings(), this::finding);
    if (plan.bound().isPresent()) {
      bound(plan.bound().get());
    } else {
      json.writeNullField("bound");
    }
    json.writeEndObject();
  }

  private void pause(Pause pause) throws IOException {
    during(pause.during());
    strings("repoints", pause.repoints());
    strings("interruptions", pause.interruptions());
  }

  private void quietSpan(QuietSpan span) throws IOException {
    during(span.during());
    json.writeNumberField("length_s", span.lengthSeconds());
    json.writeNumberField("value_s", span.valueSeconds());
    json.writeBooleanField("open_before", span.openBefore());
    json.writeBooleanField("open_after", span.openAfter());
  }

  private void contactOutcome(ContactOutcome contact) throws IOException {
    json.writeStringField("id", contact.contact());
    during(contact.onboard());
    json.writeNumberField("capacity_bit", contact.capacity().bits());
    json.writeNumberField("delivered_bit", contact.delivered().bits());
  }

  private void store(StoreTrace store) throws IOException {
    json.writeStringField("craft", store.craft());
    json.writeNumberField("start_bit", store.startBits());
    json.writeNumberField("generated_bit", store.generatedBits());
    json.writeNumberField("received_bit", store.receivedBits());
    json.writeNumberField("forwarded_bit", store.forwardedBits());
    json.writeNumberField("downlinked_bit", store.downlinkedBits());
    json.writeNumberField("lost_bit", store.lostBits());
    json.writeNumberField("end_bit", store.endBits());
    json.writeNumberField("highest_bit", store.highestBits());
  }

  private void dataClass(ClassOutcome each) throws IOException {
    json.writeStringField("data_class", each.dataClass());
    json.writeNumberField("delivered_bit", each.deliveredBits());
    json.writeNumberField("late_bit", each.lateBits());
    json.writeNumberField("lost_bit", each.lostBits());
    if (each.longestLatencySeconds().isPresent()) {
      json.writeNumberField(
          "longest_latency_s", Decimal.rounded(each.longestLatencySeconds().getAsDouble(), 3));
    }
  }

  private void week(Week week) throws IOException {
    json.writeNumberField("week", week.number());
    during(week.during());
    json.writeNumberField("contacts", week.contacts());
    json.writeNumberField("contact_s", week.contactSeconds());
    json.writeNumberField("capacity_bit", week.capacityBits());
    json.writeNumberField("delivered_bit", week.deliveredBits());
    json.writeNumberField("generated_bit", week.generatedBits());
    json.writeNumberField("highest_fill_percent", Decimal.rounded(100 * week.highestFill(), 4));
    if (week.longestLatencySeconds().isPresent()) {
      json.writeNumberField(
          "longest_latency_s", Decimal.rounded(week.longestLatencySeconds().getAsDouble(), 3));
    }
  }

  private void endState(EndState state) throws IOException {
    json.writeStringField("craft", state.craft());
    aim(state.aim());
    json.writeNumberField("fill_bit", state.fillBits());
    onboard("earth_held_until_onboard_utc", state.earthHeldUntil());
  }

  private void aim(Aim aim) throws IOException {
    json.writeNumberField("aim_azimuth_deg", Words.degrees(aim.azimuthCentidegrees()));
    json.writeNumberField("aim_elevation_deg", Words.degrees(aim.elevationCentidegrees()));
  }

  private void finding(Finding finding) throws IOException {
    json.writeStringField("rule", finding.rule().name());
    json.writeStringField(
        "at_" + Words.clock(finding.rule()) + "_utc", Words.milliseconds(finding.at()));
    json.writeStringField("craft", finding.craft());
    json.writeStringField("station", finding.station());
    json.writeStringField("subject", finding.subject());
    json.writeNumberField("amount", Decimal.rounded(finding.amount(), 6));
    json.writeStringField("unit", finding.rule().unit().symbol());
    json.writeStringField("detail", finding.detail());
  }

  private void bound(Bound bound) throws IOException {
    json.writeObjectFieldStart("bound");
    json.writeBooleanField("legal_plan_possible", bound.scienceSeconds().isPresent());
    if (bound.scienceSeconds().isPresent()) {
      json.writeNumberField("science_s", bound.scienceSeconds().get());
    }
    if (bound.pauses().isPresent()) {
      json.writeNumberField("pauses", bound.pauses().get());
    }
    json.writeStringField("method", bound.method());
    list("relaxations", bound.relaxations(), this::relaxation);
    json.writeEndObject();
  }

  private void relaxation(Bound.Relaxation relaxation) throws IOException {
    json.writeStringField("name", relaxation.name());
    json.writeStringField("sentence", relaxation.sentence());
    if (relaxation.costSeconds().isPresent()) {
      json.writeNumberField("cost_s", relaxation.costSeconds().get());
    }
  }

  private void provenance(Provenance provenance) throws IOException {
    json.writeObjectFieldStart("provenance");
    json.writeStringField("version", provenance.version());
    list("inputs", provenance.inputs(), this::input);
    strings("sources", provenance.sources());
    json.writeNumberField("seed", provenance.seed());
    json.writeNumberField("effort", provenance.effort());
    json.writeNumberField("stepsDone", provenance.stepsDone());
    json.writeBooleanField("interrupted", provenance.interrupted());
    list("waivers", provenance.waivers(), this::waiver);
    json.writeEndObject();
  }

  private void input(InputFile input) throws IOException {
    json.writeStringField("path", input.path());
    json.writeStringField("sha256", input.sha256());
  }

  private void waiver(Waiver waiver) throws IOException {
    String clock = Words.waiverClock(waiver.rule());
    json.writeStringField("rule", waiver.rule().name());
    json.writeStringField("craft", waiver.craft());
    json.writeStringField("data_class", waiver.dataClass());
    instant("begin_" + clock + "_utc", waiver.begin());
    instant("end_" + clock + "_utc", waiver.end());
    json.writeNumberField("relaxed_limit_s", waiver.relaxedLimit().toSeconds());
    json.writeStringField("reason", waiver.reason());
  }

  private void during(Interval<OnboardInstant> during) throws IOException {
    onboard("begin_onboard_utc", during.begin());
    onboard("end_onboard_utc", during.end());
  }

  private void onboard(String key, OnboardInstant instant) throws IOException {
    instant(key, instant.utc());
  }

  private void instant(String key, Instant instant) throws IOException {
    json.writeStringField(key, instant.toString());
  }

  private void strings(String key, List<String> texts) throws IOException {
    json.writeArrayFieldStart(key);
    for (String text : texts) {
      json.writeString(text);
    }
    json.writeEndArray();
  }

  private void words(String key, Iterable<? extends Enum<?>> values) throws IOException {
    json.writeArrayFieldStart(key);
    for (Enum<?> value : values) {
      json.writeString(word(value));
    }
    json.writeEndArray();
  }

  static String word(Enum<?> value) {
    return value.name().toLowerCase(Locale.ROOT);
  }

  private interface Fields<T> {
    void write(T item) throws IOException;
  }

  private <T> void list(String key, List<T> items, Fields<T> fields) throws IOException {
    json.writeArrayFieldStart(key);
    for (T item : items) {
      json.writeStartObject();
      fields.write(item);
      json.writeEndObject();
    }
    json.writeEndArray();
  }
}
