package quietspan.run;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import quietspan.astro.CoverageSearch;
import quietspan.export.GeometryTables;
import quietspan.export.GeometryTables.Sample;
import quietspan.export.Table;
import quietspan.input.ScenarioReading;
import quietspan.model.BodyDirection;
import quietspan.model.Craft;
import quietspan.model.Geometry;
import quietspan.model.Look;
import quietspan.model.Pass;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Station;
import quietspan.problem.InputException;
import quietspan.problem.Nearest;
import quietspan.problem.Place;
import quietspan.problem.Problem;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;
import quietspan.units.Distance;

/** The geometry of a scenario as tables. */
public final class GeometryRun {

  /** Beyond this nobody reads a table, and memory runs out. */
  private static final long MOST_ROWS = 2_000_000;

  /** On-board time runs at most this far behind ground time: light takes it over 20 au. */
  private static final Duration LIGHT = Duration.ofHours(3);

  /** Half the interval over which a drift is taken; its rate changes little in that time. */
  private static final double DRIFT_SECONDS = 600;

  private final Question question;
  private final ScenarioReading reading;
  private final Scenario scenario;

  private GeometryRun(Question question) {
    this.question = question;
    this.reading = question.source().read();
    this.scenario = reading.scenario();
    question.craft().ifPresent(this::knownCraft);
    question.station().ifPresent(this::knownStation);
  }

  /**
   * What is asked.
   *
   * @param from begin of the table on its clock; absent: that of the period
   * @param to end of the table on its clock, exclusive; absent: that of the period
   * @param craft only this one
   * @param station only this one
   */
  public record Question(
      Source source,
      Optional<java.time.Instant> from,
      Optional<java.time.Instant> to,
      Optional<String> craft,
      Optional<String> station) {}

  /**
   * What comes back.
   *
   * @param sources which leap seconds, Earth orientation and ephemerides served
   * @param warnings remarks upon the scenario
   */
  public record Answer(Table table, List<String> sources, List<Problem> warnings) {}

  /**
   * Every pass; without {@code from} and {@code to} over the period as it is seen on the ground.
   */
  public static Answer passes(Question question) {
    return new GeometryRun(question).passes();
  }

  /** Geometry sampled at whole steps of ground time. */
  public static Answer geometry(Question question, Duration step) {
    return new GeometryRun(question).geometry(step);
  }

  /** The longest coverage from instants at whole steps of on-board time. */
  public static Answer coverage(Question question, Duration step) {
    return new GeometryRun(question).coverage(step);
  }

  private Answer coverage(Duration step) {
    OnboardInstant begin =
        new OnboardInstant(question.from().orElse(scenario.period().begin().utc()));
    OnboardInstant end = new OnboardInstant(question.to().orElse(scenario.period().end().utc()));
    if (!begin.isBefore(end)) {
      throw refusal("--to", "is " + end, "an instant after --from, " + begin);
    }
    refuseTooMany(craft().size() * (Duration.between(begin.utc(), end.utc()).dividedBy(step) + 1));
    Geometry geometry = question.source().geometry(scenario, Interval.of(begin, end));
    List<GeometryTables.Coverage> coverages = new ArrayList<>();
    for (Craft each : craft()) {
      for (OnboardInstant at = begin; at.isBefore(end); at = at.plus(step)) {
        CoverageSearch.longest(scenario, geometry.sightLines(), each, at)
            .map(best -> new GeometryTables.Coverage(each.name(), best.during(), best.aim()))
            .ifPresent(coverages::add);
      }
    }
    return answer(GeometryTables.coverage(coverages), geometry);
  }

  private Answer passes() {
    boolean whole = question.from().isEmpty() && question.to().isEmpty();
    Geometry geometry =
        whole
            ? question.source().geometry(scenario)
            : question.source().geometry(scenario, onboard(span()));
    List<Pass> passes =
        geometry.passes().stream()
            .filter(pass -> question.craft().map(pass.craft()::equals).orElse(true))
            .filter(pass -> question.station().map(pass.station()::equals).orElse(true))
            .flatMap(
                pass ->
                    whole ? Optional.of(pass).stream() : clipped(pass, geometry, span()).stream())
            .toList();
    return answer(GeometryTables.passes(passes), geometry);
  }

  private Answer answer(Table table, Geometry geometry) {
    return new Answer(table, geometry.sources(), reading.warnings());
  }

  /** The stretch that is asked for, on the ground clock. */
  private Interval<GroundInstant> span() {
    GroundInstant from = new GroundInstant(question.from().orElse(scenario.period().begin().utc()));
    GroundInstant to = new GroundInstant(question.to().orElse(scenario.period().end().utc()));
    if (!from.isBefore(to)) {
      throw refusal("--to", "is " + to, "an instant after --from, " + from);
    }
    return Interval.of(from, to);
  }

  private static Interval<OnboardInstant> onboard(Interval<GroundInstant> span) {
    return Interval.of(
        new OnboardInstant(span.begin().utc().minus(LIGHT)), new OnboardInstant(span.end().utc()));
  }

  /** The part of a pass inside a stretch. */
  private static Optional<Pass> clipped(
      Pass pass, Geometry geometry, Interval<GroundInstant> span) {
    if (span.contains(pass.visible())) {
      return Optional.of(pass);
    }
    Function<GroundInstant, Look> look =
        instant -> geometry.sightLines().look(pass.station(), pass.craft(), instant);
    return pass.visible()
        .intersection(span)
        .map(
            part -> {
              // Elevation rises to the culmination and falls after it.
              GroundInstant top =
                  pass.culmination().isBefore(part.begin())
                      ? part.begin()
                      : pass.culmination().isAfter(part.end()) ? part.end() : pass.culmination();
              return new Pass(
                  pass.station(),
                  pass.craft(),
                  part,
                  top,
                  Angle.ofRadians(look.apply(top).elevationRadians()),
                  Angle.ofRadians(look.apply(part.begin()).azimuthRadians()),
                  Angle.ofRadians(look.apply(part.end()).azimuthRadians()),
                  true);
            });
  }

  private Answer geometry(Duration step) {
    Interval<GroundInstant> span = span();
    List<Craft> craft = craft();
    refuseTooMany(craft.size() * (span.length().dividedBy(step) + 1));
    Geometry geometry = question.source().geometry(scenario, onboard(span));
    for (Craft each : craft) {
      Interval<GroundInstant> known = geometry.sightLines().known(each.name());
      if (span.begin().isBefore(known.begin()) || span.end().isAfter(known.end())) {
        throw refusal(
            "--from",
            "asks for " + span.begin() + " to " + span.end(),
            each.name() + " is known from " + known.begin() + " to " + known.end());
      }
    }
    List<Sample> samples = new ArrayList<>();
    for (GroundInstant at = span.begin(); at.isBefore(span.end()); at = at.plus(step)) {
      for (Craft each : craft) {
        samples.add(sample(geometry.sightLines(), each.name(), at));
      }
    }
    return answer(GeometryTables.geometry(samples, question.station().isPresent()), geometry);
  }

  private void refuseTooMany(long rows) {
    if (rows > MOST_ROWS) {
      throw refusal("--step", "gives " + rows + " rows", "a longer step or a shorter stretch");
    }
  }

  private Sample sample(SightLines sightLines, String craft, GroundInstant at) {
    Optional<Look> look = question.station().map(name -> sightLines.look(name, craft, at));
    double owlt =
        look.map(each -> Distance.ofMetres(each.rangeMetres()).lightSeconds())
            .orElseGet(() -> sightLines.downlinkSeconds(craft, at));
    return new Sample(
        at,
        craft,
        Distance.ofLightSeconds(owlt).metres(),
        owlt,
        sightLines.sepRadians(craft, at),
        sightLines.speRadians(craft, at),
        sightLines.earth(craft, at),
        drift(sightLines, craft, at),
        look);
  }

  /** Central difference on the on-board clock, one-sided where the trajectory begins or ends. */
  private static double drift(SightLines sightLines, String craft, GroundInstant at) {
    Interval<GroundInstant> known = sightLines.known(craft);
    GroundInstant before = at.plusSeconds(-DRIFT_SECONDS);
    GroundInstant after = at.plusSeconds(DRIFT_SECONDS);
    before = before.isBefore(known.begin()) ? known.begin() : before;
    after = after.isAfter(known.end()) ? known.end() : after;
    BodyDirection from = sightLines.earth(craft, before);
    BodyDirection to = sightLines.earth(craft, after);
    double seconds =
        sightLines.onboard(craft, after).secondsSince(sightLines.onboard(craft, before));
    return from.separation(to) / seconds;
  }

  private List<Craft> craft() {
    return question.craft().map(name -> List.of(scenario.craft(name))).orElse(scenario.craft());
  }

  private void knownCraft(String name) {
    require("--craft", name, scenario.craft().stream().map(Craft::name).toList());
  }

  private void knownStation(String name) {
    require("--station", name, scenario.stations().stream().map(Station::name).toList());
  }

  private void require(String option, String name, List<String> known) {
    if (!known.contains(name)) {
      throw refusal(
          option,
          "is \"" + name + "\"" + Nearest.hint(name, known),
          "one of " + String.join(", ", known));
    }
  }

  private InputException refusal(String option, String what, String right) {
    return new InputException(
        Problem.error(Place.wholeFile(question.source().folder().toString()), option, what, right));
  }
}
