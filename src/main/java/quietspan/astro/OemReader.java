package quietspan.astro;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.hipparchus.analysis.interpolation.HermiteInterpolator;
import org.hipparchus.geometry.euclidean.threed.Rotation;
import org.hipparchus.geometry.euclidean.threed.Vector3D;
import org.orekit.data.DataSource;
import org.orekit.errors.OrekitException;
import org.orekit.files.ccsds.ndm.ParserBuilder;
import org.orekit.files.ccsds.ndm.odm.oem.Oem;
import org.orekit.files.ccsds.ndm.odm.oem.OemSegment;
import org.orekit.frames.Frame;
import org.orekit.utils.TimeStampedPVCoordinates;
import quietspan.model.Orbit;
import quietspan.problem.InputException;
import quietspan.problem.Place;
import quietspan.problem.Problem;

/**
 * CCSDS orbit ephemeris messages (502.0-B), as text or XML, about the Sun or the barycentre of the
 * solar system in ICRF, GCRF or EME2000 axes.
 */
final class OemReader {

  /** States on each side of an interpolated instant. */
  private static final int NEIGHBOURS = 3;

  private static final String CENTRES = "SUN or SOLAR SYSTEM BARYCENTER";

  /** In both forms of the message. */
  private static final Pattern CENTRE = Pattern.compile("CENTER_NAME\\s*[=>]\\s*([^<]*[^<\\s])");

  private final OrekitData data;
  private final Vsop vsop;
  private final TimeScales scales;

  OemReader(OrekitData data, Vsop vsop, TimeScales scales) {
    this.data = data;
    this.vsop = vsop;
    this.scales = scales;
  }

  /** States of one object in time order, Sun-centred ICRF axes; knows its own span. */
  static final class States implements Track.Source {
    private final List<double[]> rows;

    private States(List<double[]> rows) {
      this.rows = rows;
    }

    double begin() {
      return rows.get(0)[0];
    }

    double end() {
      return rows.get(rows.size() - 1)[0];
    }

    @Override
    public double[] state(double tt) {
      int low = 0;
      int high = rows.size() - 1;
      while (high - low > 1) {
        int middle = (low + high) / 2;
        if (rows.get(middle)[0] <= tt) {
          low = middle;
        } else {
          high = middle;
        }
      }
      int from = Math.max(0, low - NEIGHBOURS + 1);
      int to = Math.min(rows.size(), low + NEIGHBOURS + 1);
      HermiteInterpolator interpolator = new HermiteInterpolator();
      for (int i = from; i < to; i++) {
        double[] row = rows.get(i);
        interpolator.addSamplePoint(
            row[0] - tt,
            new double[] {row[1], row[2], row[3]},
            new double[] {row[4], row[5], row[6]});
      }
      double[][] found = interpolator.derivatives(0, 1);
      return new double[] {
        found[0][0], found[0][1], found[0][2], found[1][0], found[1][1], found[1][2]
      };
    }
  }

  /**
   * Refuses a centre that is not ours before the parser looks for an ephemeris of it.
   *
   * @throws InputException also when the file cannot be read
   */
  private static void knowsCentres(Path file, Orbit.Ephemeris orbit) {
    List<String> lines;
    try {
      lines = Files.readAllLines(file);
    } catch (IOException unreadable) {
      throw refuse(orbit, "", "cannot be read", "a text file in UTF-8");
    }
    for (int i = 0; i < lines.size(); i++) {
      Matcher matcher = CENTRE.matcher(lines.get(i));
      if (matcher.find() && !isSun(matcher.group(1)) && !isBarycentre(matcher.group(1))) {
        throw new InputException(
            Problem.error(
                new Place(orbit.file(), i + 1, matcher.start(1) + 1),
                "CENTER_NAME",
                "is " + matcher.group(1),
                CENTRES));
      }
    }
  }

  private static boolean isSun(String centre) {
    return centre.equalsIgnoreCase("SUN");
  }

  private static boolean isBarycentre(String centre) {
    return centre.equalsIgnoreCase("SOLAR SYSTEM BARYCENTER") || centre.equalsIgnoreCase("SSB");
  }

  States read(Path folder, Orbit.Ephemeris orbit) {
    knowsCentres(folder.resolve(orbit.file()), orbit);
    Oem message;
    try {
      message =
          new ParserBuilder(data.context())
              .buildOemParser()
              .parseMessage(new DataSource(folder.resolve(orbit.file()).toFile()));
    } catch (OrekitException | IllegalArgumentException bad) {
      throw refuse(
          orbit, "", "is no orbit ephemeris message: " + bad.getMessage(), "CCSDS 502.0-B");
    }
    List<double[]> rows = new ArrayList<>();
    List<String> objects = new ArrayList<>();
    for (OemSegment segment : message.getSegments()) {
      String name = segment.getMetadata().getObjectName();
      String id = segment.getMetadata().getObjectID();
      if (!objects.contains(name)) {
        objects.add(name);
      }
      if (orbit.object().isEmpty() || orbit.object().equals(name) || orbit.object().equals(id)) {
        add(rows, segment, orbit);
      }
    }
    if (orbit.object().isEmpty() && objects.size() > 1) {
      throw refuse(orbit, "OBJECT_NAME", "holds several objects: " + objects, "name one: object");
    }
    if (rows.size() < 2) {
      throw refuse(
          orbit,
          "OBJECT_NAME",
          "has fewer than two states of "
              + (orbit.object().isEmpty() ? "an object" : orbit.object()),
          "one of " + objects);
    }
    return new States(rows);
  }

  private void add(List<double[]> rows, OemSegment segment, Orbit.Ephemeris orbit) {
    boolean sun = isSun(segment.getMetadata().getCenter().getName());
    String frame =
        segment.getMetadata().getReferenceFrame().getName().toUpperCase(java.util.Locale.ROOT);
    Rotation rotation;
    if (frame.equals("ICRF") || frame.equals("GCRF")) {
      rotation = Rotation.IDENTITY;
    } else if (frame.equals("EME2000") || frame.equals("J2000")) {
      Frame eme = data.context().getFrames().getEME2000();
      rotation =
          eme.getStaticTransformTo(data.context().getFrames().getGCRF(), data.j2000())
              .getRotation();
    } else {
      throw refuse(orbit, "REF_FRAME", "is " + frame, "ICRF, GCRF or EME2000");
    }
    for (TimeStampedPVCoordinates state : segment.getCoordinates()) {
      double tt = state.getDate().durationFrom(data.j2000());
      Vector3D p = rotation.applyTo(state.getPosition());
      Vector3D v = rotation.applyTo(state.getVelocity());
      if (!sun) {
        double[] before = vsop.sunFromBarycentre(scales.tdb(tt) - 500);
        double[] now = vsop.sunFromBarycentre(scales.tdb(tt));
        double[] after = vsop.sunFromBarycentre(scales.tdb(tt) + 500);
        p = p.subtract(new Vector3D(now));
        v = v.subtract(new Vector3D(after).subtract(new Vector3D(before)).scalarMultiply(1e-3));
      }
      if (!rows.isEmpty() && tt <= rows.get(rows.size() - 1)[0]) {
        if (tt == rows.get(rows.size() - 1)[0]) {
          continue;
        }
        throw refuse(orbit, "EPOCH", "runs backwards at " + state.getDate(), "rising epochs");
      }
      rows.add(new double[] {tt, p.getX(), p.getY(), p.getZ(), v.getX(), v.getY(), v.getZ()});
    }
  }

  private static InputException refuse(
      Orbit.Ephemeris orbit, String field, String what, String right) {
    return new InputException(Problem.error(Place.wholeFile(orbit.file()), field, what, right));
  }
}
