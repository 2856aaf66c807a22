package quietspan.astro;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.orekit.propagation.analytical.KeplerianPropagator;
import org.orekit.propagation.events.ElevationDetector;
import org.orekit.propagation.events.EventsLogger;
import org.orekit.propagation.events.handlers.ContinueOnEvent;
import org.orekit.utils.ElevationMask;
import quietspan.Seeds;
import quietspan.check.Check;
import quietspan.check.CheckReport;
import quietspan.export.PlanReader;
import quietspan.input.ScenarioReader;
import quietspan.model.BodyDirection;
import quietspan.model.Decisions;
import quietspan.model.Geometry;
import quietspan.model.Look;
import quietspan.model.Pass;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Station;
import quietspan.rules.Waivers;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/** The demo's geometry and the verdict on its plan, by another route. */
final class SecondSkyTest {

  private static final Path FOLDER = Path.of("stations-demo");
  private static final double MICRODEGREES_10 = Math.toRadians(1e-5);

  private static Scenario scenario;
  private static Geometry geometry;
  private static SecondSky second;

  private static synchronized void prepare() {
    if (scenario == null) {
      scenario = ScenarioReader.read(FOLDER, Optional.empty()).scenario();
      geometry = GeometryFactory.geometry(scenario, FOLDER, Optional.empty());
      second = new SecondSky(scenario, true);
    }
  }

  @Seeds(count = 3)
  void bothSkiesAgree(Random random) {
    prepare();
    SightLines first = geometry.sightLines();
    for (int i = 0; i < 40; i++) {
      GroundInstant at =
          new GroundInstant(scenario.period().begin().utc())
              .plusSeconds(Math.rint(random.nextDouble() * 91 * 86_400 * 1000) / 1000);
      String craft = scenario.craft().get(random.nextInt(3)).name();
      Station station = scenario.stations().get(random.nextInt(scenario.stations().size()));
      Look a = first.look(station.name(), craft, at);
      Look b = second.look(station.name(), craft, at);
      assertThat(a.elevationRadians()).isCloseTo(b.elevationRadians(), within(MICRODEGREES_10));
      double turn = a.azimuthRadians() - b.azimuthRadians();
      assertThat(Math.sin(turn) * Math.cos(a.elevationRadians()))
          .isCloseTo(0, within(MICRODEGREES_10));
      assertThat(a.rangeMetres()).isCloseTo(b.rangeMetres(), within(1_000.0));
      BodyDirection earth = first.earth(craft, at);
      assertThat(earth.separation(second.earth(craft, at))).isLessThan(MICRODEGREES_10);
      assertThat(first.downlinkSeconds(craft, at))
          .isCloseTo(second.downlinkSeconds(craft, at), within(1e-5));
      assertThat(first.uplinkSeconds(craft, at))
          .isCloseTo(second.uplinkSeconds(craft, at), within(1e-5));
      OnboardInstant sent = new OnboardInstant(at.utc());
      assertThat(first.ground(craft, sent).secondsSince(second.ground(craft, sent)))
          .isCloseTo(0, within(1e-5));
      assertThat(first.sepRadians(craft, at))
          .isCloseTo(second.sepRadians(craft, at), within(MICRODEGREES_10));
      assertThat(first.speRadians(craft, at))
          .isCloseTo(second.speRadians(craft, at), within(MICRODEGREES_10));
    }
  }

  /** Orekit's detectors know no light time, so it is switched off in the sky that is searched. */
  private static void passesAreThoseOfDetectors(int days) {
    prepare();
    SecondSky still = new SecondSky(scenario, false);
    OnboardInstant begin = scenario.period().begin();
    OnboardInstant end = begin.plusSeconds(days * 86_400.0);
    List<Pass> passes = new PassSearch(scenario, still).all(Interval.of(begin, end));
    int compared = 0;
    for (Station station : scenario.stations()) {
      for (var craft : scenario.craft()) {
        List<Double> ours = new ArrayList<>();
        for (Pass pass : passes) {
          if (pass.station().equals(station.name()) && pass.craft().equals(craft.name())) {
            add(ours, pass.visible().begin().secondsSince(new GroundInstant(begin.utc())), days);
            add(ours, pass.visible().end().secondsSince(new GroundInstant(begin.utc())), days);
          }
        }
        List<Double> theirs = events(still, station, craft.name(), begin, end);
        assertThat(ours).as(station.name() + " " + craft.name()).hasSameSizeAs(theirs);
        for (int i = 0; i < ours.size(); i++) {
          assertThat(ours.get(i)).isCloseTo(theirs.get(i), within(0.01));
          compared++;
        }
      }
    }
    assertThat(compared).isGreaterThan(20 * days);
  }

  /** What begins or ends with the search is no event. */
  private static void add(List<Double> list, double seconds, int days) {
    if (seconds > 1e-3 && seconds < days * 86_400 - 1e-3) {
      list.add(seconds);
    }
  }

  private static List<Double> events(
      SecondSky sky, Station station, String craft, OnboardInstant begin, OnboardInstant end) {
    double[][] mask =
        station.mask().stream()
            .map(
                point ->
                    new double[] {
                      point.azimuth().radians() % (2 * Math.PI), point.elevation().radians()
                    })
            .toArray(double[][]::new);
    EventsLogger logger = new EventsLogger();
    KeplerianPropagator propagator = sky.propagator(craft);
    propagator.clearEventsDetectors();
    ElevationDetector detector =
        new ElevationDetector(300, 1e-4, sky.station(station.name()))
            .withHandler(new ContinueOnEvent());
    boolean flat =
        station.mask().stream()
            .allMatch(
                point ->
                    point.elevation().radians() == station.mask().get(0).elevation().radians());
    propagator.addEventDetector(
        logger.monitorDetector(
            flat
                ? detector.withConstantElevation(station.mask().get(0).elevation().radians())
                : detector.withElevationMask(new ElevationMask(mask))));
    propagator.propagate(sky.date(begin), sky.date(end));
    return logger.getLoggedEvents().stream()
        .map(event -> event.getState().getDate().durationFrom(sky.date(begin)))
        .toList();
  }

  @Test
  void passesOfTwoDaysAreThoseOfOrekitsDetectors() {
    passesAreThoseOfDetectors(2);
  }

  @Test
  @Tag("proof")
  void passesOfThirteenWeeksAreThoseOfOrekitsDetectors() {
    passesAreThoseOfDetectors(91);
  }

  /** The check over all of the plan, on both skies. */
  @Test
  @Tag("proof")
  void theDemoPlanIsJudgedTheSame() throws IOException {
    prepare();
    Path file = Path.of("plans", "sallow-triad", "plan.json");
    Decisions decisions =
        PlanReader.read(file.toString(), Files.readAllBytes(file), Optional.of(scenario))
            .decisions();
    var waivers = Waivers.of(scenario, geometry);
    CheckReport one = Check.check(scenario, geometry.sightLines(), decisions, waivers);
    CheckReport other = Check.check(scenario, second, decisions, waivers);
    assertThat(one.findings()).isEmpty();
    assertThat(other.findings()).isEmpty();
    assertThat(other.recount().scienceSeconds()).isEqualTo(one.recount().scienceSeconds());
  }
}
