package quietspan.astro;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.hipparchus.geometry.euclidean.threed.Rotation;
import org.hipparchus.geometry.euclidean.threed.Vector3D;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.orekit.frames.Frame;
import org.orekit.time.AbsoluteDate;
import org.orekit.utils.IERSConventions;
import quietspan.fixture.TestScenario;
import quietspan.model.Attitude;
import quietspan.model.Craft;
import quietspan.model.Orbit;
import quietspan.model.Pass;
import quietspan.units.Angle;
import quietspan.units.Distance;

/** Constants, the Sun, the Earth's rotation and formations against published figures. */
final class PublishedValuesTest {

  private static final double DAY = 86_400;

  private static double tdb(String digits) {
    return TimeScales.sinceJ2000(Instant.parse(digits));
  }

  /** IAU 2012 Resolution B2 and the speed of light of the SI; 499.0047838 s follows from them. */
  @Test
  void oneAstronomicalUnitTakesLightSoLong() {
    assertThat(Constants.AU).isEqualTo(149_597_870_700.0);
    assertThat(Constants.AU / Constants.LIGHT).isCloseTo(499.0047838, within(5e-8));
  }

  /** Nominal value of IAU 2015 Resolution B3, to the digits that it gives. */
  @Test
  void massOfTheSunIsTheNominalOne() {
    assertThat(Constants.GM_SUN).isCloseTo(1.3271244e20, within(0.5e13));
  }

  /**
   * Meeus, Astronomical Algorithms, 2nd ed. 1998, example 25.a: R = 0.99766 au by a theory of low
   * precision, which leaves out the pull of the planets and the Moon, some 5e-5 au.
   */
  @Test
  void distanceOfTheSunIsThatOfMeeus() {
    double[] earth = Vsop.load().heliocentric(Vsop.Planet.EARTH, tdb("1992-10-13T00:00:00Z"));
    assertThat(new Vector3D(earth[0], earth[1], earth[2]).getNorm() / Constants.AU)
        .isCloseTo(0.99766, within(1e-4));
  }

  /**
   * Meeus, Astronomical Algorithms, 2nd ed. 1998, example 25.b: apparent right ascension 13h 13m
   * 30.749s, declination -7 deg 47' 01.74". He uses the nutation of 1980, Orekit that of 2000.
   */
  @Test
  void apparentPlaceOfTheSunIsThatOfMeeus() {
    OrekitData data = OrekitData.open(Optional.empty(), Vsop.load());
    double tt = tdb("1992-10-13T00:00:00Z");
    // The Sun stands still in these axes, so aberration and light time are the Earth's motion.
    double[] earth = Vsop.load().heliocentric(Vsop.Planet.EARTH, tt - 0.99766 * 499.0047838);
    AbsoluteDate date = data.j2000().shiftedBy(tt);
    var frames = data.context().getFrames();
    Vector3D apparent =
        frames
            .getGCRF()
            .getStaticTransformTo(frames.getTOD(IERSConventions.IERS_2010, true), date)
            .transformVector(new Vector3D(-earth[0], -earth[1], -earth[2]));
    double hours = Math.toDegrees(apparent.getAlpha()) / 15;
    assertThat((hours + 24) % 24).isCloseTo(13 + 13 / 60.0 + 30.749 / 3600, within(0.02 / 3600));
    assertThat(Math.toDegrees(apparent.getDelta()))
        .isCloseTo(-(7 + 47 / 60.0 + 1.74 / 3600), within(0.2 / 3600));
  }

  /**
   * Meeus, Astronomical Algorithms, 2nd ed. 1998, example 12.a: at 0h UT on 1987-04-10 apparent
   * sidereal time at Greenwich is 13h 10m 46.1351s. It is the right ascension of the zero meridian.
   */
  @Test
  void theEarthIsTurnedAsMeeusSays() {
    OrekitData data = OrekitData.open(Optional.empty(), Vsop.load());
    TimeScales scales = new TimeScales(32.184 + 23);
    double tt = tdb("1987-04-10T00:00:00Z") + scales.ttMinusUtc();
    EarthRotation rotation = new EarthRotation(data, scales, tt - 3 * DAY, tt + 3 * DAY);
    double[] m = new double[9];
    rotation.matrix(tt, m);
    Vector3D meridian = new Vector3D(m[0], m[1], m[2]);
    var frames = data.context().getFrames();
    Vector3D ofDate =
        frames
            .getGCRF()
            .getStaticTransformTo(
                frames.getTOD(IERSConventions.IERS_2010, true), data.j2000().shiftedBy(tt))
            .transformVector(meridian);
    assertThat((Math.toDegrees(ofDate.getAlpha()) / 15 + 24) % 24)
        .isCloseTo(13 + 10 / 60.0 + 46.1351 / 3600, within(0.02 / 3600));
  }

  /** What is interpolated over half a day is Orekit's own rotation to 1e-8 rad. */
  @Test
  void rotationBetweenItsSamplesIsOrekits() {
    OrekitData data = OrekitData.open(Optional.empty(), Vsop.load());
    TimeScales scales = new TimeScales(69.184);
    double begin = tdb("2031-09-01T00:00:00Z");
    EarthRotation rotation = new EarthRotation(data, scales, begin, begin + 92 * DAY);
    Frame gcrf = data.context().getFrames().getGCRF();
    Frame itrf = data.context().getFrames().getITRF(IERSConventions.IERS_2010, true);
    double[] m = new double[9];
    for (double tt = begin + 1234.5; tt < begin + 91 * DAY; tt += 0.37 * DAY) {
      rotation.matrix(tt, m);
      Rotation ours =
          new Rotation(
              new double[][] {{m[0], m[1], m[2]}, {m[3], m[4], m[5]}, {m[6], m[7], m[8]}}, 1e-9);
      Rotation theirs = gcrf.getStaticTransformTo(itrf, data.j2000().shiftedBy(tt)).getRotation();
      assertThat(Rotation.distance(ours, theirs)).isLessThan(1e-8);
    }
  }

  /** Largest minus smallest arm over a year (km), and the elements of the first craft. */
  private static double armChange(double armKm, boolean secondOrder) {
    Vsop vsop = Vsop.load();
    TimeScales scales = new TimeScales(69.184);
    Kepler[] craft = new Kepler[3];
    for (int c = 0; c < 3; c++) {
      craft[c] =
          new Kepler(
              FormationOrbit.elements(
                  new Orbit.Formation(
                      Instant.parse("2031-09-01T00:00:00Z"),
                      Distance.ofKilometres(armKm),
                      Angle.ofDegrees(-20),
                      Angle.ZERO,
                      secondOrder,
                      c),
                  vsop),
              scales);
    }
    double longest = 0;
    double shortest = Double.POSITIVE_INFINITY;
    double begin = tdb("2031-09-01T00:00:00Z");
    for (double t = begin; t < begin + 366 * DAY; t += DAY / 2) {
      for (int c = 0; c < 3; c++) {
        double[] a = craft[c].state(t);
        double[] b = craft[(c + 1) % 3].state(t);
        double arm = new Vector3D(a[0] - b[0], a[1] - b[1], a[2] - b[2]).getNorm() / 1000;
        longest = Math.max(longest, arm);
        shortest = Math.min(shortest, arm);
      }
    }
    return longest - shortest;
  }

  /**
   * Nayak et al. 2006, gr-qc/0507105: with 5 million km arms and a plane tilted by exactly 60 deg
   * the arms change by about 115 000 km over a year; 114 142 km when recomputed from its formulas.
   */
  @Test
  void armsOfFiveMillionKilometresChangeAsPublished() {
    assertThat(armChange(5e6, false)).isCloseTo(114_142, within(150.0));
  }

  /**
   * Yang 2025, arXiv 2501.00936: the best formation of 2.5 million km arms has e = 0.004824, i =
   * 0.008356 rad and arms that change by about 12 000 km.
   */
  @Test
  void armsOfTheBestFormationOfHalfTheSizeChangeAsPublished() {
    Orbit.Elements elements =
        FormationOrbit.elements(
            new Orbit.Formation(
                Instant.parse("2031-09-01T00:00:00Z"),
                Distance.ofKilometres(2.5e6),
                Angle.ofDegrees(-20),
                Angle.ZERO,
                true,
                0),
            Vsop.load());
    assertThat(elements.eccentricity()).isCloseTo(0.004824, within(0.002 * 0.004824));
    assertThat(elements.inclination().radians()).isCloseTo(0.008356, within(0.005 * 0.008356));
    assertThat(armChange(2.5e6, true)).isCloseTo(12_060, within(500.0));
  }

  /** Dhurandhar et al. 2005, gr-qc/0410093: e = L / (2 sqrt(3) a), i = L / (2 a) to first order. */
  @ParameterizedTest
  @CsvSource({"1e5, false", "1e5, true", "1.6e6, false"})
  void elementsOfSmallFormationsAreThoseOfFirstOrder(double armKm, boolean secondOrder) {
    Orbit.Elements elements =
        FormationOrbit.elements(
            new Orbit.Formation(
                Instant.parse("2031-09-01T00:00:00Z"),
                Distance.ofKilometres(armKm),
                Angle.ofDegrees(-20),
                Angle.ZERO,
                secondOrder,
                1),
            Vsop.load());
    double ratio = armKm * 1000 / Constants.AU;
    assertThat(elements.eccentricity())
        .isCloseTo(ratio / (2 * Math.sqrt(3)), within(ratio * ratio));
    assertThat(elements.inclination().radians()).isCloseTo(ratio / 2, within(ratio * ratio));
  }

  /**
   * Computed for circular orbits: a craft that trails the Earth by 20 deg is 2 sin(10 deg) au away,
   * 51 954 795 km or 173.303 s, and stands 80 deg from the Sun. "20 deg, about 50 million km" is
   * common practice, no source.
   */
  @Test
  void twentyDegreesBehindTheEarth() {
    Vector3D earth = new Vector3D(Constants.AU, 0, 0);
    Vector3D craft = new Vector3D(Math.toRadians(-20), 0).scalarMultiply(Constants.AU);
    Vector3D line = craft.subtract(earth);
    assertThat(line.getNorm() / 1000).isCloseTo(51_954_795, within(1.0));
    assertThat(line.getNorm() / Constants.LIGHT).isCloseTo(173.303, within(5e-4));
    assertThat(Math.toDegrees(Vector3D.angle(line, earth.negate()))).isCloseTo(80, within(1e-9));
  }

  /**
   * Computed: the stars gain 235.91 s a solar day (sidereal day 86 164.0905 s), a craft at a fixed
   * angle behind the Earth does not: it culminates at nearly the same solar time all year, within
   * some 18 min either way, while its rise wanders by hours.
   */
  @Test
  void aTrailingCraftCulminatesAtTheSameSolarTimeAllYear() {
    TestScenario test = TestScenario.one();
    test.days = 365;
    Craft old = test.craft.get(0);
    double mean =
        Vsop.load().earthMeanLongitude(TimeScales.sinceJ2000(test.begin)) - Math.toRadians(20);
    test.craft.set(
        0,
        new Craft(
            old.name(),
            new Orbit.Elements(
                test.begin,
                Distance.ofMetres(Constants.AU),
                0,
                Angle.ZERO,
                Angle.ZERO,
                Angle.ZERO,
                Angle.ofRadians(mean)),
            new Attitude.SunPointing(),
            old.antenna(),
            old.rates(),
            old.store(),
            old.crossLink(),
            old.generation()));
    List<Pass> passes =
        GeometryFactory.geometry(test.build(), Path.of("."), Optional.empty()).passes().stream()
            .filter(pass -> !pass.clipped())
            .toList();
    assertThat(passes.size()).isBetween(360, 368);
    double[] culmination =
        spread(passes.stream().mapToDouble(p -> solar(p.culmination())).toArray());
    double[] rise = spread(passes.stream().mapToDouble(p -> solar(p.visible().begin())).toArray());
    assertThat((culmination[1] - culmination[0]) / 60).isBetween(20.0, 37.0);
    assertThat((rise[1] - rise[0]) / 3600).isGreaterThan(2.0);
  }

  private static double solar(quietspan.time.GroundInstant at) {
    return Math.floorMod(at.utc().getEpochSecond(), 86_400L);
  }

  /** Smallest and largest of times of day that do not pass midnight. */
  private static double[] spread(double[] seconds) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    double first = seconds[0];
    for (double one : seconds) {
      double near = one - DAY * Math.rint((one - first) / DAY);
      low = Math.min(low, near);
      high = Math.max(high, near);
    }
    return new double[] {low, high};
  }
}
