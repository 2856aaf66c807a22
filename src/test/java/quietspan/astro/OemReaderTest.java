package quietspan.astro;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.hipparchus.geometry.euclidean.threed.Rotation;
import org.hipparchus.geometry.euclidean.threed.Vector3D;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import quietspan.fixture.TestScenario;
import quietspan.model.Craft;
import quietspan.model.Look;
import quietspan.model.Orbit;
import quietspan.model.SightLines;
import quietspan.problem.InputException;
import quietspan.time.GroundInstant;

/**
 * Trajectories written as orbit ephemeris messages (CCSDS 502.0-B-3, 2023, chapter 5 and its XML
 * form in 505.0-B) and read back give the geometry of the orbits they were made from.
 */
final class OemReaderTest {

  private static final int DAYS = 12;
  private static final double STEP = 6 * 3600;

  @TempDir private Path folder;

  private final Vsop vsop = Vsop.load();
  private final TimeScales scales = new TimeScales(69.184);

  private static TestScenario formation() {
    TestScenario test = TestScenario.three();
    test.days = DAYS;
    return test;
  }

  /** TT seconds of the begin of the period. */
  private double begin() {
    return TimeScales.sinceJ2000(formation().begin) + scales.ttMinusUtc();
  }

  /** One craft's trajectory from some days before the period on, as a message. */
  private String message(
      int craft, boolean xml, String centre, String frame, String timeSystem, int from, int to) {
    Kepler orbit =
        new Kepler(
            FormationOrbit.elements((Orbit.Formation) formation().craft.get(craft).orbit(), vsop),
            scales);
    OrekitData data = OrekitData.open(Optional.empty(), vsop);
    Rotation axes =
        frame.equals("EME2000")
            ? data.context()
                .getFrames()
                .getGCRF()
                .getStaticTransformTo(data.context().getFrames().getEME2000(), data.j2000())
                .getRotation()
            : Rotation.IDENTITY;
    StringBuilder lines = new StringBuilder();
    String first = null;
    String last = null;
    for (double day = from; day <= to; day += STEP / 86_400) {
      double tt = begin() + day * 86_400;
      double[] s = orbit.state(tt);
      Vector3D p = new Vector3D(s[0], s[1], s[2]);
      Vector3D v = new Vector3D(s[3], s[4], s[5]);
      if (!centre.equals("SUN")) {
        Vector3D before = new Vector3D(vsop.sunFromBarycentre(scales.tdb(tt) - 100));
        Vector3D after = new Vector3D(vsop.sunFromBarycentre(scales.tdb(tt) + 100));
        p = p.add(new Vector3D(vsop.sunFromBarycentre(scales.tdb(tt))));
        v = v.add(after.subtract(before).scalarMultiply(1 / 200.0));
      }
      p = axes.applyTo(p).scalarMultiply(1e-3);
      v = axes.applyTo(v).scalarMultiply(1e-3);
      double written =
          switch (timeSystem) {
            case "UTC" -> tt - scales.ttMinusUtc();
            case "TDB" -> scales.tdb(tt);
            default -> tt;
          };
      String epoch = new TimeScales(0).utc(written).toString().replace("Z", "");
      first = first == null ? epoch : first;
      last = epoch;
      lines.append(
          xml
              ? String.format(
                  Locale.ROOT,
                  "<stateVector><EPOCH>%s</EPOCH><X>%.6f</X><Y>%.6f</Y><Z>%.6f</Z><X_DOT>%.12f</X_DOT>"
                      + "<Y_DOT>%.12f</Y_DOT><Z_DOT>%.12f</Z_DOT></stateVector>%n",
                  epoch,
                  p.getX(),
                  p.getY(),
                  p.getZ(),
                  v.getX(),
                  v.getY(),
                  v.getZ())
              : String.format(
                  Locale.ROOT,
                  "%s %.6f %.6f %.6f %.12f %.12f %.12f%n",
                  epoch,
                  p.getX(),
                  p.getY(),
                  p.getZ(),
                  v.getX(),
                  v.getY(),
                  v.getZ()));
    }
    String[][] metadata = {
      {"OBJECT_NAME", "CRAFT " + craft},
      {"OBJECT_ID", "2030-001" + (char) ('A' + craft)},
      {"CENTER_NAME", centre},
      {"REF_FRAME", frame},
      {"TIME_SYSTEM", timeSystem},
      {"START_TIME", first},
      {"STOP_TIME", last}
    };
    StringBuilder head = new StringBuilder();
    for (String[] one : metadata) {
      head.append(
          xml
              ? "<" + one[0] + ">" + one[1] + "</" + one[0] + ">\n"
              : one[0] + " = " + one[1] + "\n");
    }
    return xml
        ? "<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n"
            + "<oem id=\"CCSDS_OEM_VERS\" version=\"2.0\"><header>"
            + "<CREATION_DATE>2031-08-01T00:00:00</CREATION_DATE><ORIGINATOR>INVENTED</ORIGINATOR>"
            + "</header><body><segment><metadata>"
            + head
            + "</metadata><data>"
            + lines
            + "</data></segment></body></oem>\n"
        : "CCSDS_OEM_VERS = 2.0\nCREATION_DATE = 2031-08-01T00:00:00\nORIGINATOR = INVENTED\n\n"
            + "META_START\n"
            + head
            + "META_STOP\n\n"
            + lines;
  }

  private SightLines sky(TestScenario test) {
    return GeometryFactory.geometry(test.build(), folder, Optional.empty()).sightLines();
  }

  private TestScenario fromFiles(
      boolean xml, String centre, String frame, String timeSystem, int from, int to)
      throws IOException {
    TestScenario test = formation();
    for (int c = 0; c < 3; c++) {
      String file = "craft-" + c + ".oem";
      Files.writeString(folder.resolve(file), message(c, xml, centre, frame, timeSystem, from, to));
      Craft old = test.craft.get(c);
      test.craft.set(
          c,
          new Craft(
              old.name(),
              new Orbit.Ephemeris(file, ""),
              old.attitude(),
              old.antenna(),
              old.rates(),
              old.store(),
              old.crossLink(),
              old.generation()));
    }
    return test;
  }

  @ParameterizedTest(name = "xml {0}, {1}, {2}, {3}")
  @CsvSource(
      textBlock =
          """
          false, SUN, ICRF, TDB
          false, SUN, EME2000, UTC
          false, SUN, GCRF, TT
          false, SOLAR SYSTEM BARYCENTER, ICRF, TDB
          true, SUN, ICRF, UTC
          true, SOLAR SYSTEM BARYCENTER, EME2000, TDB
          """)
  void whatIsReadBackIsWhatWasWritten(boolean xml, String centre, String frame, String timeSystem)
      throws IOException {
    SightLines read = sky(fromFiles(xml, centre, frame, timeSystem, -5, DAYS + 5));
    SightLines made = sky(formation());
    for (int hour = 0; hour < DAYS * 24; hour += 7) {
      GroundInstant at = new GroundInstant(formation().begin).plusSeconds(hour * 3600 + 900);
      for (Craft craft : formation().craft) {
        Look a = read.look("Vellmarch", craft.name(), at);
        Look b = made.look("Vellmarch", craft.name(), at);
        assertThat(a.rangeMetres()).isCloseTo(b.rangeMetres(), within(20.0));
        assertThat(a.elevationRadians()).isCloseTo(b.elevationRadians(), within(1e-9));
        // 20 m in an arm of 1.6 million km turn the body frame by some 1e-8 rad.
        assertThat(read.earth(craft.name(), at).separation(made.earth(craft.name(), at)))
            .isLessThan(3e-8);
      }
    }
  }

  /** Usable from the light time after the first state to the last state. */
  @Test
  void whatIsKnownIsTheSpanOfTheStates() throws IOException {
    SightLines read = sky(fromFiles(false, "SUN", "ICRF", "UTC", -1, 8));
    GroundInstant begin = new GroundInstant(formation().begin);
    var known = read.known("Hask");
    double light = read.downlinkSeconds("Hask", begin);
    assertThat(known.begin().secondsSince(begin)).isCloseTo(-86_400 + light, within(5.0));
    assertThat(known.end().since(begin))
        .isBetween(Duration.ofDays(8).minusSeconds(5), Duration.ofDays(8).plusSeconds(1));
  }

  @ParameterizedTest(name = "{0} for {1}")
  @CsvSource(
      textBlock =
          """
          CENTER_NAME = SUN, CENTER_NAME = EARTH, CENTER_NAME
          REF_FRAME = ICRF, REF_FRAME = ITRF2000, REF_FRAME
          CCSDS_OEM_VERS = 2.0, NO SUCH LINE, ''
          TIME_SYSTEM = UTC, TIME_SYSTEM = LOCAL, ''
          """)
  void whatCannotBeUsedIsRefusedWithItsField(String was, String becomes, String field)
      throws IOException {
    TestScenario test = fromFiles(false, "SUN", "ICRF", "UTC", -2, DAYS + 2);
    Path file = folder.resolve("craft-1.oem");
    String text = Files.readString(file);
    assertThat(text).contains(was);
    Files.writeString(file, text.replace(was, becomes));
    assertThatThrownBy(() -> sky(test))
        .isInstanceOf(InputException.class)
        .hasMessageStartingWith("craft-1.oem:")
        .hasMessageContaining(field);
  }

  @Test
  void aMissingFileIsRefused() throws IOException {
    TestScenario test = fromFiles(false, "SUN", "ICRF", "UTC", -2, DAYS + 2);
    Files.delete(folder.resolve("craft-2.oem"));
    assertThatThrownBy(() -> sky(test))
        .isInstanceOf(InputException.class)
        .hasMessageContaining("craft-2.oem");
  }

  @Test
  void statesThatRunBackwardsAreRefused() throws IOException {
    TestScenario test = fromFiles(false, "SUN", "ICRF", "UTC", -2, DAYS + 2);
    Path file = folder.resolve("craft-0.oem");
    List<String> lines = new java.util.ArrayList<>(Files.readAllLines(file));
    int last = lines.size() - 1;
    java.util.Collections.swap(lines, last - 4, last - 3);
    Files.write(file, lines);
    assertThatThrownBy(() -> sky(test))
        .isInstanceOf(InputException.class)
        .hasMessageContaining("craft-0.oem");
  }
}
