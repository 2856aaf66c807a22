package quietspan.export;

import java.math.BigDecimal;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.TreeSet;
import quietspan.model.Aim;
import quietspan.model.Contact;
import quietspan.model.Craft;
import quietspan.model.Decisions;
import quietspan.model.Dish;
import quietspan.model.InputFile;
import quietspan.model.Provenance;
import quietspan.model.RateStep;
import quietspan.model.Repoint;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.Station;
import quietspan.model.Waiver;
import quietspan.problem.Problems;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.DataRate;

/**
 * Reads a {@code plan.json} that may have been edited by hand: decisions and provenance, with every
 * complaint at its line and column. What is derived is not looked at.
 */
public final class PlanReader {

  private static final List<String> FILE =
      List.of("format", "mission", "issued_utc", "summary", "decisions", "derived", "provenance");
  private static final List<String> DECISIONS = List.of("repoints", "contacts");
  private static final List<String> REPOINT =
      List.of("id", "craft", "start_onboard_utc", "aim_azimuth_deg", "aim_elevation_deg");
  private static final List<String> CONTACT =
      List.of(
          "id",
          "station",
          "antenna",
          "craft",
          "begin_ground_utc",
          "end_ground_utc",
          "rate_bit_s",
          "rate_steps",
          "services",
          "status");
  private static final List<String> RATE_STEP = List.of("from_ground_utc", "rate_bit_s");
  private static final List<String> PROVENANCE =
      List.of(
          "version", "inputs", "sources", "seed", "effort", "stepsDone", "interrupted", "waivers");
  private static final List<String> INPUT = List.of("path", "sha256");

  private static final List<String> STATUSES = words(Contact.Status.values());
  private static final List<String> SERVICES = words(Contact.Service.values());
  private static final List<String> RULES =
      Arrays.stream(RuleId.values()).map(RuleId::name).toList();

  private final Problems problems = new Problems();
  private final Optional<Scenario> scenario;
  private final Map<String, String> seen = new HashMap<>();

  private PlanReader(Optional<Scenario> scenario) {
    this.scenario = scenario;
  }

  /**
   * Reads a plan.
   *
   * @param file name of the file, for complaints
   * @param scenario the scenario that the plan is for; when given, craft, stations and antennas
   *     must be its own
   * @throws quietspan.problem.InputException with every complaint when anything is wrong
   */
  public static PlanFile read(String file, byte[] bytes, Optional<Scenario> scenario) {
    PlanReader reader = new PlanReader(scenario);
    Optional<PlanFile> plan =
        JsonTree.read(file, bytes, reader.problems)
            .flatMap(value -> JsonFields.of(value, reader.problems, FILE))
            .flatMap(reader::file);
    reader.problems.throwIfErrors();
    return plan.orElseThrow(() -> new IllegalStateException("a plan without complaints is absent"));
  }

  private static List<String> words(Enum<?>[] values) {
    return Arrays.stream(values).map(PlanJson::word).toList();
  }

  private Optional<PlanFile> file(JsonFields fields) {
    long format = fields.whole("format", 1, Integer.MAX_VALUE);
    if (fields.sound() && format != PlanJson.FORMAT) {
      fields.refuse("format", "is " + format, "this program reads format " + PlanJson.FORMAT);
      return Optional.empty();
    }
    String mission = fields.name("mission");
    if (scenario.isPresent() && !scenario.get().identity().mission().equals(mission)) {
      fields.refuse(
          "mission",
          "is \"" + mission + "\"",
          "the scenario is for \"" + scenario.get().identity().mission() + "\"");
    }
    Instant issued = fields.instant("issued_utc");
    Optional<Decisions> decisions = fields.object("decisions", DECISIONS).flatMap(this::decisions);
    Optional<Provenance> provenance =
        fields.object("provenance", PROVENANCE).flatMap(this::provenance);
    return decisions.isPresent() && provenance.isPresent() && fields.sound()
        ? Optional.of(new PlanFile(mission, issued, decisions.get(), provenance.get()))
        : Optional.empty();
  }

  private Optional<Decisions> decisions(JsonFields fields) {
    List<Repoint> repoints = new ArrayList<>();
    for (JsonFields each : fields.objects("repoints", REPOINT)) {
      repoint(each).ifPresent(repoints::add);
    }
    List<Contact> contacts = new ArrayList<>();
    for (JsonFields each : fields.objects("contacts", CONTACT)) {
      contact(each).ifPresent(contacts::add);
    }
    return fields.sound() ? Optional.of(new Decisions(repoints, contacts)) : Optional.empty();
  }

  private Optional<Repoint> repoint(JsonFields fields) {
    String id = id(fields);
    String craft = craft(fields);
    Instant start = fields.second("start_onboard_utc");
    int azimuth = centidegrees(fields, "aim_azimuth_deg", 0, 35_999);
    int elevation = centidegrees(fields, "aim_elevation_deg", -9_000, 9_000);
    return fields.sound()
        ? Optional.of(
            new Repoint(id, craft, new OnboardInstant(start), new Aim(azimuth, elevation)))
        : Optional.empty();
  }

  private Optional<Contact> contact(JsonFields fields) {
    String id = id(fields);
    antenna(fields);
    String craft = craft(fields);
    GroundInstant begin = new GroundInstant(fields.second("begin_ground_utc"));
    GroundInstant end = new GroundInstant(fields.second("end_ground_utc"));
    if (fields.sound() && !begin.isBefore(end)) {
      fields.refuse("end_ground_utc", "is " + end, "after the contact's begin, " + begin);
    }
    List<RateStep> steps = steps(fields, begin, end);
    TreeSet<Contact.Service> services = new TreeSet<>();
    for (String word : fields.words("services", SERVICES)) {
      if (SERVICES.contains(word)) {
        services.add(Contact.Service.valueOf(upper(word)));
      }
    }
    String status = fields.word("status", STATUSES);
    return fields.sound()
        ? Optional.of(
            new Contact(
                id,
                fields.text("station"),
                fields.text("antenna"),
                craft,
                Interval.of(begin, end),
                steps,
                services,
                Contact.Status.valueOf(upper(status))))
        : Optional.empty();
  }

  private static String upper(String word) {
    return word.toUpperCase(Locale.ROOT);
  }

  private List<RateStep> steps(JsonFields fields, GroundInstant begin, GroundInstant end) {
    if (fields.has("rate_bit_s") == fields.has("rate_steps")) {
      fields.refuse(
          fields.has("rate_bit_s") ? "rate_steps" : "rate_bit_s",
          fields.has("rate_bit_s") ? "stands beside rate_bit_s" : "is missing",
          "exactly one of rate_bit_s, rate_steps");
      return List.of();
    }
    if (fields.has("rate_bit_s")) {
      return List.of(new RateStep(begin, rate(fields)));
    }
    List<RateStep> steps = new ArrayList<>();
    List<JsonFields> objects = fields.objects("rate_steps", RATE_STEP);
    if (fields.sound() && objects.isEmpty()) {
      fields.refuse("rate_steps", "is empty", "at least one rate");
    }
    for (JsonFields each : objects) {
      GroundInstant from = new GroundInstant(each.second("from_ground_utc"));
      DataRate rate = rate(each);
      boolean first = steps.isEmpty();
      if (first && each.sound() && !from.equals(begin)) {
        each.refuse("from_ground_utc", "is " + from, "the first rate begins with the contact");
      } else if (!first && each.sound() && !steps.get(steps.size() - 1).from().isBefore(from)) {
        each.refuse("from_ground_utc", "is " + from, "rates in time order");
      } else if (each.sound() && !from.isBefore(end)) {
        each.refuse("from_ground_utc", "is " + from, "before the contact's end, " + end);
      }
      steps.add(new RateStep(from, rate));
    }
    return steps;
  }

  private static DataRate rate(JsonFields fields) {
    return new DataRate(fields.whole("rate_bit_s", 1, Long.MAX_VALUE));
  }

  /** An id that no other decision has: everything that is subscribed to hangs on it. */
  private String id(JsonFields fields) {
    String id = fields.name("id");
    if (!id.isEmpty()) {
      String before = seen.putIfAbsent(id, fields.place("id").toString());
      if (before != null) {
        fields.refuse("id", "is \"" + id + "\" like that at " + before, "an id of its own");
      }
    }
    return id;
  }

  private String craft(JsonFields fields) {
    return scenario
        .map(each -> fields.word("craft", each.craft().stream().map(Craft::name).toList()))
        .orElseGet(() -> fields.name("craft"));
  }

  private void antenna(JsonFields fields) {
    if (scenario.isEmpty()) {
      fields.name("station");
      fields.name("antenna");
      return;
    }
    List<Station> stations = scenario.get().stations();
    String name = fields.word("station", stations.stream().map(Station::name).toList());
    stations.stream()
        .filter(station -> station.name().equals(name))
        .findFirst()
        .ifPresentOrElse(
            station -> fields.word("antenna", station.dishes().stream().map(Dish::name).toList()),
            () -> fields.name("antenna"));
  }

  private static int centidegrees(JsonFields fields, String key, int least, int most) {
    String right =
        "hundredths of a degree from " + Words.degrees(least) + " to " + Words.degrees(most);
    Optional<BigDecimal> degrees = fields.decimal(key, right);
    if (degrees.isEmpty()) {
      return 0;
    }
    BigDecimal hundredths = degrees.get().movePointRight(2).stripTrailingZeros();
    if (hundredths.scale() > 0
        || hundredths.compareTo(BigDecimal.valueOf(least)) < 0
        || hundredths.compareTo(BigDecimal.valueOf(most)) > 0) {
      fields.refuse(key, "is " + degrees.get().toPlainString(), right);
      return 0;
    }
    return hundredths.intValueExact();
  }

  private Optional<Provenance> provenance(JsonFields fields) {
    String version = fields.name("version");
    List<InputFile> inputs = new ArrayList<>();
    for (JsonFields each : fields.objects("inputs", INPUT)) {
      inputs.add(new InputFile(each.name("path"), each.name("sha256")));
    }
    List<String> sources = fields.texts("sources");
    long seed = fields.whole("seed", Long.MIN_VALUE, Long.MAX_VALUE);
    long effort = fields.whole("effort", 0, Long.MAX_VALUE);
    long stepsDone = fields.whole("stepsDone", 0, Long.MAX_VALUE);
    boolean interrupted = fields.flag("interrupted");
    List<Waiver> waivers = new ArrayList<>();
    for (JsonFields each : fields.objects("waivers", waiverKeys())) {
      waiver(each).ifPresent(waivers::add);
    }
    return fields.sound()
        ? Optional.of(
            new Provenance(version, inputs, sources, seed, effort, stepsDone, interrupted, waivers))
        : Optional.empty();
  }

  private static List<String> waiverKeys() {
    return List.of(
        "rule",
        "craft",
        "data_class",
        "begin_ground_utc",
        "end_ground_utc",
        "begin_onboard_utc",
        "end_onboard_utc",
        "relaxed_limit_s",
        "reason");
  }

  private Optional<Waiver> waiver(JsonFields fields) {
    String word = fields.word("rule", RULES);
    if (!RULES.contains(word)) {
      return Optional.empty();
    }
    RuleId rule = RuleId.valueOf(word);
    String clock = Words.waiverClock(rule);
    String craft = fields.text("craft");
    String dataClass = fields.text("data_class");
    Instant begin = fields.instant("begin_" + clock + "_utc");
    Instant end = fields.instant("end_" + clock + "_utc");
    long limit = fields.whole("relaxed_limit_s", 0, Integer.MAX_VALUE);
    String reason = fields.text("reason");
    return fields.sound()
        ? Optional.of(
            new Waiver(rule, craft, dataClass, begin, end, Duration.ofSeconds(limit), reason))
        : Optional.empty();
  }
}
