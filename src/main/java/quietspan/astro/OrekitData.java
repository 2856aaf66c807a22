package quietspan.astro;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hipparchus.geometry.euclidean.threed.Vector3D;
import org.orekit.bodies.CelestialBodyFactory;
import org.orekit.data.DataContext;
import org.orekit.data.DirectoryCrawler;
import org.orekit.data.LazyLoadedDataContext;
import org.orekit.data.ZipJarCrawler;
import org.orekit.errors.OrekitException;
import org.orekit.frames.EOPHistory;
import org.orekit.frames.Frame;
import org.orekit.time.AbsoluteDate;
import org.orekit.time.DateComponents;
import org.orekit.time.OffsetModel;
import org.orekit.utils.IERSConventions;
import quietspan.problem.InputException;
import quietspan.problem.Place;
import quietspan.problem.Problem;

/**
 * One explicit data context: what the user gives in front, what is built in behind. Orekit's
 * default context is never touched.
 */
final class OrekitData {

  /**
   * UTC - TAI of each day on which it changed: year, month, TAI - UTC (s); IERS Bulletin C 52 and
   * before.
   */
  private static final int[][] LEAPS = {
    {1972, 1, 10}, {1972, 7, 11}, {1973, 1, 12}, {1974, 1, 13}, {1975, 1, 14}, {1976, 1, 15},
    {1977, 1, 16}, {1978, 1, 17}, {1979, 1, 18}, {1980, 1, 19}, {1981, 7, 20}, {1982, 7, 21},
    {1983, 7, 22}, {1985, 7, 23}, {1988, 1, 24}, {1990, 1, 25}, {1991, 1, 26}, {1992, 7, 27},
    {1993, 7, 28}, {1994, 7, 29}, {1996, 1, 30}, {1997, 7, 31}, {1999, 1, 32}, {2006, 1, 33},
    {2009, 1, 34}, {2012, 7, 35}, {2015, 7, 36}, {2017, 1, 37}
  };

  private final LazyLoadedDataContext context = new LazyLoadedDataContext();
  private final List<String> sources = new ArrayList<>();
  private final boolean earthOrientation;

  private OrekitData(Optional<Path> given, Vsop vsop) {
    given.ifPresent(this::crawl);
    context.getTimeScales().addDefaultUTCTAIOffsetsLoaders();
    context.getTimeScales().addUTCTAIOffsetsLoader(OrekitData::builtInLeaps);
    this.earthOrientation = given.isPresent() && hasEarthOrientation();
    if (!earthOrientation) {
      context.getFrames().clearEOPHistoryLoaders();
      context
          .getFrames()
          .addEOPHistoryLoader(IERSConventions.IERS_2010, (converter, history) -> {});
    }
    addBodies(vsop);
    sources.add(
        "leap seconds: "
            + (given.isPresent() ? "data given, else " : "")
            + "built-in table, last step 2017-01-01");
    sources.add(
        earthOrientation
            ? "Earth orientation: data given, " + span()
            : "Earth orientation: none (UT1 = UTC, pole at zero), up to 0.9 s");
    sources.add("Sun and Earth: VSOP87B, Bretagnon & Francou 1988, about 30 km");
  }

  static OrekitData open(Optional<Path> given, Vsop vsop) {
    return new OrekitData(given, vsop);
  }

  private void crawl(Path given) {
    if (!Files.exists(given)) {
      throw new InputException(
          Problem.error(
              Place.wholeFile(given.toString()),
              "--orekit-data",
              "does not exist",
              "a folder or zip with Orekit data"));
    }
    try {
      context
          .getDataProvidersManager()
          .addProvider(
              Files.isDirectory(given)
                  ? new DirectoryCrawler(given.toFile())
                  : new ZipJarCrawler(given.toFile()));
    } catch (OrekitException unusable) {
      throw new InputException(
          Problem.error(
              Place.wholeFile(given.toString()),
              "--orekit-data",
              "cannot be used: " + unusable.getMessage(),
              "a folder or zip with Orekit data"));
    }
  }

  private static List<OffsetModel> builtInLeaps() {
    List<OffsetModel> offsets = new ArrayList<>();
    for (int[] leap : LEAPS) {
      offsets.add(new OffsetModel(new DateComponents(leap[0], leap[1], 1), leap[2]));
    }
    return offsets;
  }

  private boolean hasEarthOrientation() {
    try {
      EOPHistory history = context.getFrames().getEOPHistory(IERSConventions.IERS_2010, true);
      return history.getEntries().size() > 4;
    } catch (OrekitException none) {
      return false;
    }
  }

  private String span() {
    EOPHistory history = context.getFrames().getEOPHistory(IERSConventions.IERS_2010, true);
    return "until "
        + history.getEndDate().toString(context.getTimeScales().getUTC()).substring(0, 10);
  }

  private void addBodies(Vsop vsop) {
    AbsoluteDate epoch = j2000();
    Frame gcrf = context.getFrames().getGCRF();
    SeriesBody sun =
        new SeriesBody(
            "Sun",
            Constants.GM_SUN,
            gcrf,
            epoch,
            tt -> {
              double[] earth = vsop.heliocentric(Vsop.Planet.EARTH, tt);
              return new Vector3D(-earth[0], -earth[1], -earth[2]);
            });
    SeriesBody barycentre =
        new SeriesBody(
            "solar system barycenter",
            Constants.GM_SUN,
            gcrf,
            epoch,
            tt -> {
              double[] earth = vsop.heliocentric(Vsop.Planet.EARTH, tt);
              double[] offset = vsop.sunFromBarycentre(tt);
              return new Vector3D(
                  -earth[0] - offset[0], -earth[1] - offset[1], -earth[2] - offset[2]);
            });
    var bodies = context.getCelestialBodies();
    bodies.addCelestialBodyLoader(CelestialBodyFactory.SUN, name -> sun);
    bodies.addCelestialBodyLoader(CelestialBodyFactory.SOLAR_SYSTEM_BARYCENTER, name -> barycentre);
  }

  DataContext context() {
    return context;
  }

  boolean earthOrientation() {
    return earthOrientation;
  }

  /** Which data served, a line each. */
  List<String> sources() {
    return List.copyOf(sources);
  }

  AbsoluteDate j2000() {
    return new AbsoluteDate(2000, 1, 1, 12, 0, 0.0, context.getTimeScales().getTT());
  }
}
