package quietspan.astro;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import org.hipparchus.util.FastMath;
import org.hipparchus.util.SinCos;

/**
 * Planetary positions by VSOP87B (Bretagnon and Francou 1988, Astronomy and Astrophysics
 * 202:309-315). The Earth's series is whole: within some 30 km of the best ephemerides in
 * 2025-2045. The other planets are cut at 1e-6 rad or au and serve only to place the barycentre of
 * the solar system.
 */
final class Vsop {

  /**
   * The planets that are carried, with the Sun's mass over theirs (IAU 2009 system, Luzum et al.
   * 2011).
   */
  enum Planet {
    EARTH(328_900.56),
    VENUS(408_523.719),
    MARS(3_098_703.59),
    JUPITER(1_047.348644),
    SATURN(3_497.9018),
    URANUS(22_902.98),
    NEPTUNE(19_412.26);

    final double sunOverPlanet;

    Planet(double sunOverPlanet) {
      this.sunOverPlanet = sunOverPlanet;
    }
  }

  /** Seconds of a Julian millennium. */
  private static final double MILLENNIUM = 365_250 * 86_400.0;

  /** Terms a, b, c in a row, by power of time. */
  private static final class Series {
    private final double[][] byPower;

    Series(double[][] byPower) {
      this.byPower = byPower;
    }

    double[][] byPower() {
      return byPower;
    }
  }

  private final Map<Planet, Series[]> series;

  private Vsop(Map<Planet, Series[]> series) {
    this.series = series;
  }

  /** Reads the series from the resource beside this class. */
  static Vsop load() {
    Map<Planet, Map<String, List<double[]>>> read = new EnumMap<>(Planet.class);
    try (InputStream stream = Vsop.class.getResourceAsStream("vsop87b.txt");
        BufferedReader reader =
            new BufferedReader(new InputStreamReader(stream, StandardCharsets.US_ASCII))) {
      List<double[]> terms = null;
      for (String line = reader.readLine(); line != null; line = reader.readLine()) {
        char first = line.charAt(0);
        if (first == '#') {
          continue;
        }
        int space = line.indexOf(' ');
        if (first >= 'a') {
          Planet planet =
              Planet.valueOf(line.substring(0, space).toUpperCase(java.util.Locale.ROOT));
          terms = new ArrayList<>();
          read.computeIfAbsent(planet, key -> new java.util.HashMap<>())
              .put(line.substring(space + 1), terms);
        } else {
          int second = line.indexOf(' ', space + 1);
          terms.add(
              new double[] {
                Double.parseDouble(line.substring(0, space)),
                Double.parseDouble(line.substring(space + 1, second)),
                Double.parseDouble(line.substring(second + 1))
              });
        }
      }
    } catch (IOException broken) {
      throw new UncheckedIOException("the planetary series cannot be read", broken);
    }
    Map<Planet, Series[]> all = new EnumMap<>(Planet.class);
    read.forEach(
        (planet, parts) ->
            all.put(planet, new Series[] {join(parts, "L"), join(parts, "B"), join(parts, "R")}));
    return new Vsop(all);
  }

  private static Series join(Map<String, List<double[]>> parts, String coordinate) {
    double[][] byPower = new double[6][];
    for (int power = 0; power < 6; power++) {
      List<double[]> terms = parts.getOrDefault(coordinate + " " + power, List.of());
      byPower[power] = terms.stream().flatMapToDouble(java.util.Arrays::stream).toArray();
    }
    return new Series(byPower);
  }

  /** Mean longitude of the Earth in the J2000 ecliptic (rad): the secular terms of its series. */
  double earthMeanLongitude(double tdb) {
    double[][] longitude = series.get(Planet.EARTH)[0].byPower();
    return longitude[0][0] + longitude[1][0] * (tdb / MILLENNIUM);
  }

  /** Sun-centred position and velocity in ICRF axes (m, m/s) at TDB seconds since J2000.0. */
  double[] heliocentric(Planet planet, double tdb) {
    double t = tdb / MILLENNIUM;
    Series[] three = series.get(planet);
    double[] l = evaluate(three[0], t);
    double[] b = evaluate(three[1], t);
    double[] r = evaluate(three[2], t);
    SinCos lon = FastMath.sinCos(l[0]);
    SinCos lat = FastMath.sinCos(b[0]);
    double[] p = {r[0] * lat.cos() * lon.cos(), r[0] * lat.cos() * lon.sin(), r[0] * lat.sin()};
    double rho = r[1] * lat.cos() - r[0] * lat.sin() * b[1];
    double[] v = {
      rho * lon.cos() - r[0] * lat.cos() * lon.sin() * l[1],
      rho * lon.sin() + r[0] * lat.cos() * lon.cos() * l[1],
      r[1] * lat.sin() + r[0] * lat.cos() * b[1]
    };
    double[] state = new double[6];
    for (int i = 0; i < 3; i++) {
      for (int k = 0; k < 3; k++) {
        state[i] += Constants.VSOP_TO_FK5[i][k] * p[k] * Constants.AU;
        state[i + 3] += Constants.VSOP_TO_FK5[i][k] * v[k] * Constants.AU / MILLENNIUM;
      }
    }
    return state;
  }

  /**
   * Sun from the barycentre of the solar system, ICRF axes (m), good to some hundred kilometres.
   */
  double[] sunFromBarycentre(double tdb) {
    double[] sum = new double[3];
    double mass = 1;
    for (Planet planet : Planet.values()) {
      double[] at = heliocentric(planet, tdb);
      mass += 1 / planet.sunOverPlanet;
      for (int i = 0; i < 3; i++) {
        sum[i] -= at[i] / planet.sunOverPlanet;
      }
    }
    for (int i = 0; i < 3; i++) {
      sum[i] /= mass;
    }
    return sum;
  }

  /** Value and rate per millennium. */
  private static double[] evaluate(Series series, double t) {
    double value = 0;
    double rate = 0;
    double power = 1;
    double powerRate = 0;
    for (int n = 0; n < series.byPower().length; n++) {
      double[] terms = series.byPower()[n];
      double sum = 0;
      double sumRate = 0;
      for (int i = 0; i < terms.length; i += 3) {
        SinCos angle = FastMath.sinCos(terms[i + 1] + terms[i + 2] * t);
        sum += terms[i] * angle.cos();
        sumRate -= terms[i] * terms[i + 2] * angle.sin();
      }
      value += sum * power;
      rate += sumRate * power + sum * powerRate;
      powerRate = (n + 1) * power;
      power *= t;
    }
    return new double[] {value, rate};
  }
}
