package quietspan.astro;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import quietspan.model.Craft;
import quietspan.model.Geometry;
import quietspan.model.Orbit;
import quietspan.model.Scenario;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/** Computes the geometry of a scenario. */
public final class GeometryFactory {

  private static final double DAY = 86_400;

  /** Aims are judged this long past the period, and asked a little before it. */
  private static final double BEFORE = 2 * DAY;

  private static final double AFTER = 45 * DAY;

  private static final double STEP = DAY / 4;

  private GeometryFactory() {}

  /**
   * The geometry of a scenario over its period.
   *
   * @param folder the scenario folder, to which ephemeris files are relative
   * @param orekitData a folder or zip with Orekit data, put in front of what is built in
   * @throws quietspan.problem.InputException when an ephemeris or the data cannot be used
   */
  public static Geometry geometry(Scenario scenario, Path folder, Optional<Path> orekitData) {
    return geometry(scenario, folder, orekitData, scenario.period());
  }

  /** As above, with passes over another on-board interval than the period. */
  public static Geometry geometry(
      Scenario scenario, Path folder, Optional<Path> orekitData, Interval<OnboardInstant> span) {
    Vsop vsop = Vsop.load();
    OrekitData data = OrekitData.open(orekitData, vsop);
    List<String> sources = new ArrayList<>(data.sources());
    TimeScales scales = scales(data, span.begin());
    double begin = scales.tt(span.begin()) - BEFORE;
    double end = scales.tt(span.end()) + AFTER;
    OemReader reader = new OemReader(data, vsop, scales);
    Track[] tracks = new Track[scenario.craft().size()];
    for (int c = 0; c < tracks.length; c++) {
      Craft craft = scenario.craft().get(c);
      tracks[c] = track(craft.orbit(), reader, folder, vsop, scales, begin, end);
      if (craft.orbit() instanceof Orbit.Ephemeris file) {
        sources.add("trajectory of " + craft.name() + ": " + file.file());
      }
    }
    Track earth =
        Track.sample(
            tt -> vsop.heliocentric(Vsop.Planet.EARTH, scales.tdb(tt)), begin, end + 4000, STEP);
    Sky sky =
        new Sky(
            scales,
            earth,
            tracks,
            scenario.craft(),
            scenario.stations(),
            new EarthRotation(data, scales, begin, end + 4000));
    return new Geometry(
        sky, new PassSearch(scenario, sky).all(span), data.earthOrientation() ? 0 : 1, sources);
  }

  private static TimeScales scales(OrekitData data, OnboardInstant begin) {
    var utc = data.context().getTimeScales().getUTC();
    var date = data.j2000().shiftedBy(TimeScales.sinceJ2000(begin.utc()) + 69.184);
    return new TimeScales(32.184 - utc.offsetFromTAI(date).toDouble());
  }

  private static Track track(
      Orbit orbit,
      OemReader reader,
      Path folder,
      Vsop vsop,
      TimeScales scales,
      double begin,
      double end) {
    if (orbit instanceof Orbit.Ephemeris file) {
      OemReader.States states = reader.read(folder, file);
      return Track.sample(
          states, Math.max(begin, states.begin()), Math.min(end, states.end()), STEP);
    }
    Orbit.Elements elements =
        orbit instanceof Orbit.Formation formation
            ? FormationOrbit.elements(formation, vsop)
            : (Orbit.Elements) orbit;
    return Track.sample(new Kepler(elements, scales), begin, end, STEP);
  }
}
