package quietspan.astro;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.hipparchus.util.FastMath;
import org.hipparchus.util.SinCos;
import quietspan.model.Attitude;
import quietspan.model.BodyDirection;
import quietspan.model.Craft;
import quietspan.model.Look;
import quietspan.model.SightLines;
import quietspan.model.Station;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * The sampling interface over tables. Light time is solved between positions in the Sun-centred
 * inertial frame: with Earth-centred positions the Earth's own motion during the light time would
 * be lost, some 6 000 km in range. Immutable, safe to share.
 */
final class Sky implements SightLines {

  private final TimeScales scales;
  private final Track earth;
  private final Track[] tracks;
  private final List<Craft> craft;
  private final EarthRotation rotation;
  private final Map<String, Integer> craftIndex = new HashMap<>();
  private final Map<String, Site> sites = new HashMap<>();
  private final Map<String, Interval<GroundInstant>> known = new HashMap<>();

  /** A station in ITRF axes with its local triad. */
  private static final class Site {
    private final double[] place;
    private final double[] east;
    private final double[] north;
    private final double[] up;

    Site(double[] place, double[] east, double[] north, double[] up) {
      this.place = place;
      this.east = east;
      this.north = north;
      this.up = up;
    }
  }

  Sky(
      TimeScales scales,
      Track earth,
      Track[] tracks,
      List<Craft> craft,
      List<Station> stations,
      EarthRotation rotation) {
    this.scales = scales;
    this.earth = earth;
    this.tracks = tracks.clone();
    this.craft = craft;
    this.rotation = rotation;
    for (Station station : stations) {
      sites.put(station.name(), site(station));
    }
    for (int c = 0; c < craft.size(); c++) {
      craftIndex.put(craft.get(c).name(), c);
    }
    for (int c = 0; c < craft.size(); c++) {
      known.put(craft.get(c).name(), known(c));
    }
  }

  private Interval<GroundInstant> known(int c) {
    double begin = tracks[c].begin();
    double end = tracks[c].end();
    if (craft.get(c).attitude() instanceof Attitude.InFormation) {
      for (Track track : tracks) {
        begin = FastMath.max(begin, track.begin());
        end = FastMath.min(end, track.end());
      }
    }
    double first = FastMath.max(receive(c, begin + 1), earth.begin() + 1);
    double last = FastMath.min(end - 1, earth.end() - 2000);
    return Interval.of(new GroundInstant(scales.utc(first)), new GroundInstant(scales.utc(last)));
  }

  /** Geodetic position on the WGS84 ellipsoid. */
  private static Site site(Station station) {
    SinCos lat = FastMath.sinCos(station.latitude().radians());
    SinCos lon = FastMath.sinCos(station.longitude().radians());
    double flat = Constants.EARTH_FLATTENING;
    double e2 = flat * (2 - flat);
    double n = Constants.EARTH_RADIUS / FastMath.sqrt(1 - e2 * lat.sin() * lat.sin());
    double h = station.altitude().metres();
    return new Site(
        new double[] {
          (n + h) * lat.cos() * lon.cos(),
          (n + h) * lat.cos() * lon.sin(),
          (n * (1 - e2) + h) * lat.sin()
        },
        new double[] {-lon.sin(), lon.cos(), 0},
        new double[] {-lat.sin() * lon.cos(), -lat.sin() * lon.sin(), lat.cos()},
        new double[] {lat.cos() * lon.cos(), lat.cos() * lon.sin(), lat.sin()});
  }

  @Override
  public Interval<GroundInstant> known(String name) {
    index(name);
    return known.get(name);
  }

  private int index(String name) {
    Integer index = craftIndex.get(name);
    if (index == null) {
      throw new IllegalArgumentException("no craft " + name);
    }
    return index;
  }

  /** TT of reception at the Earth's centre of what leaves the craft at a TT. */
  private double receive(int c, double sent) {
    double[] from = new double[3];
    double[] to = new double[3];
    tracks[c].position(sent, from);
    double received = sent;
    for (int i = 0; i < 4; i++) {
      earth.position(FastMath.min(earth.end(), FastMath.max(earth.begin(), received)), to);
      received = sent + distance(from, to) / Constants.LIGHT;
    }
    return received;
  }

  /**
   * Light time of what is received at a place (Sun-centred, m) at a TT; leaves the craft in {@code
   * from}.
   */
  private double light(int c, double received, double[] place, double[] from) {
    double light = 0;
    for (int i = 0; i < 4; i++) {
      tracks[c].position(received - light, from);
      light = distance(from, place) / Constants.LIGHT;
    }
    return light;
  }

  @Override
  public double downlinkSeconds(String name, GroundInstant receive) {
    double tt = scales.tt(receive);
    double[] place = new double[3];
    earth.position(tt, place);
    return light(index(name), tt, place, new double[3]);
  }

  @Override
  public double uplinkSeconds(String name, GroundInstant transmit) {
    int c = index(name);
    double tt = scales.tt(transmit);
    double[] place = new double[3];
    double[] to = new double[3];
    earth.position(tt, place);
    double light = 0;
    for (int i = 0; i < 4; i++) {
      tracks[c].position(tt + light, to);
      light = distance(place, to) / Constants.LIGHT;
    }
    return light;
  }

  @Override
  public GroundInstant ground(String name, OnboardInstant sent) {
    int c = index(name);
    double tt = scales.tt(sent);
    return new GroundInstant(sent.utc()).plusSeconds(receive(c, tt) - tt);
  }

  @Override
  public Look look(String station, String name, GroundInstant receive) {
    int c = index(name);
    Site site = sites.get(station);
    if (site == null) {
      throw new IllegalArgumentException("no station " + station);
    }
    double tt = scales.tt(receive);
    double[] m = new double[9];
    rotation.matrix(tt, m);
    double[] centre = new double[3];
    earth.position(tt, centre);
    double[] place = new double[3];
    for (int k = 0; k < 3; k++) {
      // ITRF to ICRF: the transposed matrix.
      place[k] =
          centre[k] + m[k] * site.place[0] + m[3 + k] * site.place[1] + m[6 + k] * site.place[2];
    }
    double[] from = new double[3];
    double light = light(c, tt, place, from);
    double[] line = new double[3];
    double[] local = new double[3];
    for (int k = 0; k < 3; k++) {
      line[k] = from[k] - place[k];
    }
    for (int k = 0; k < 3; k++) {
      local[k] = m[3 * k] * line[0] + m[3 * k + 1] * line[1] + m[3 * k + 2] * line[2];
    }
    double e = dot(site.east, local);
    double n = dot(site.north, local);
    double u = dot(site.up, local);
    double azimuth = FastMath.atan2(e, n);
    return new Look(
        azimuth < 0 ? azimuth + 2 * FastMath.PI : azimuth,
        FastMath.atan2(u, FastMath.sqrt(e * e + n * n)),
        light * Constants.LIGHT);
  }

  @Override
  public BodyDirection earth(String name, GroundInstant receive) {
    int c = index(name);
    double tt = scales.tt(receive);
    double[] place = new double[3];
    double[] from = new double[3];
    earth.position(tt, place);
    double light = light(c, tt, place, from);
    double[] axes = new double[9];
    body(c, tt - light, from, axes);
    double[] line = {place[0] - from[0], place[1] - from[1], place[2] - from[2]};
    return direction(axes, line);
  }

  /** A Sun-centred ICRF line in body axes. */
  private static BodyDirection direction(double[] axes, double[] line) {
    double x = axes[0] * line[0] + axes[1] * line[1] + axes[2] * line[2];
    double y = axes[3] * line[0] + axes[4] * line[1] + axes[5] * line[2];
    double z = axes[6] * line[0] + axes[7] * line[1] + axes[8] * line[2];
    return new BodyDirection(FastMath.atan2(y, x), FastMath.atan2(z, FastMath.sqrt(x * x + y * y)));
  }

  /** Body axes as rows at an on-board TT. */
  private void body(int c, double tt, double[] self, double[] axes) {
    double[] x;
    double[] z;
    Attitude law = craft.get(c).attitude();
    if (law instanceof Attitude.Inertial inertial) {
      inertial(inertial, axes);
      return;
    }
    if (law instanceof Attitude.SunPointing || tracks.length == 1) {
      x = unit(self, -1);
      z = across(eclipticNorth(), x);
    } else if (tracks.length == 2) {
      double[] other = new double[3];
      tracks[1 - c].position(tt, other);
      x = towards(self, other);
      z = across(unit(self, -1), x);
    } else {
      double[] one = new double[3];
      double[] two = new double[3];
      tracks[(c + 1) % tracks.length].position(tt, one);
      tracks[(c + 2) % tracks.length].position(tt, two);
      double[] a = towards(self, one);
      double[] b = towards(self, two);
      x = unit(new double[] {a[0] + b[0], a[1] + b[1], a[2] + b[2]}, 1);
      z = unit(cross(a, b), 1);
      if (dot(z, self) > 0) {
        z = unit(z, -1);
      }
    }
    double[] y = cross(z, x);
    System.arraycopy(x, 0, axes, 0, 3);
    System.arraycopy(y, 0, axes, 3, 3);
    System.arraycopy(z, 0, axes, 6, 3);
  }

  private static void inertial(Attitude.Inertial law, double[] axes) {
    SinCos ra = FastMath.sinCos(law.rightAscension().radians());
    SinCos dec = FastMath.sinCos(law.declination().radians());
    SinCos roll = FastMath.sinCos(law.roll().radians());
    double[] x = {dec.cos() * ra.cos(), dec.cos() * ra.sin(), dec.sin()};
    double[] east = {-ra.sin(), ra.cos(), 0};
    double[] north = cross(x, east);
    for (int k = 0; k < 3; k++) {
      axes[k] = x[k];
      axes[3 + k] = roll.cos() * east[k] + roll.sin() * north[k];
      axes[6 + k] = -roll.sin() * east[k] + roll.cos() * north[k];
    }
  }

  private static double[] eclipticNorth() {
    return new double[] {
      Constants.ECLIPTIC_TO_ICRF[0][2],
      Constants.ECLIPTIC_TO_ICRF[1][2],
      Constants.ECLIPTIC_TO_ICRF[2][2]
    };
  }

  @Override
  public double sepRadians(String name, GroundInstant receive) {
    double[] place = new double[3];
    double[] from = new double[3];
    geometry(name, receive, place, from);
    // From the Earth: the Sun is at the origin.
    return angle(
        new double[] {-place[0], -place[1], -place[2]},
        new double[] {from[0] - place[0], from[1] - place[1], from[2] - place[2]});
  }

  @Override
  public double speRadians(String name, GroundInstant receive) {
    double[] place = new double[3];
    double[] from = new double[3];
    geometry(name, receive, place, from);
    return angle(
        new double[] {-from[0], -from[1], -from[2]},
        new double[] {place[0] - from[0], place[1] - from[1], place[2] - from[2]});
  }

  private void geometry(String name, GroundInstant receive, double[] place, double[] from) {
    double tt = scales.tt(receive);
    earth.position(tt, place);
    light(index(name), tt, place, from);
  }

  private static double angle(double[] a, double[] b) {
    double[] across = cross(a, b);
    return FastMath.atan2(FastMath.sqrt(dot(across, across)), dot(a, b));
  }

  private static double[] towards(double[] from, double[] to) {
    return unit(new double[] {to[0] - from[0], to[1] - from[1], to[2] - from[2]}, 1);
  }

  /** The part of a vector normal to a unit vector, as a unit vector. */
  private static double[] across(double[] vector, double[] normal) {
    double along = dot(vector, normal);
    return unit(
        new double[] {
          vector[0] - along * normal[0],
          vector[1] - along * normal[1],
          vector[2] - along * normal[2]
        },
        1);
  }

  private static double[] unit(double[] v, double sign) {
    double length = FastMath.sqrt(dot(v, v)) * sign;
    return new double[] {v[0] / length, v[1] / length, v[2] / length};
  }

  private static double[] cross(double[] a, double[] b) {
    return new double[] {
      a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]
    };
  }

  private static double dot(double[] a, double[] b) {
    return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
  }

  private static double distance(double[] a, double[] b) {
    double x = a[0] - b[0];
    double y = a[1] - b[1];
    double z = a[2] - b[2];
    return FastMath.sqrt(x * x + y * y + z * z);
  }
}
