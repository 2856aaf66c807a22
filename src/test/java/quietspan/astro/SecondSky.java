package quietspan.astro;

import java.time.Instant;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hipparchus.geometry.euclidean.threed.Vector3D;
import org.orekit.bodies.CelestialBody;
import org.orekit.bodies.GeodeticPoint;
import org.orekit.bodies.OneAxisEllipsoid;
import org.orekit.frames.Frame;
import org.orekit.frames.TopocentricFrame;
import org.orekit.orbits.CartesianOrbit;
import org.orekit.orbits.KeplerianOrbit;
import org.orekit.orbits.PositionAngleType;
import org.orekit.propagation.analytical.KeplerianPropagator;
import org.orekit.time.AbsoluteDate;
import org.orekit.utils.Constants;
import org.orekit.utils.IERSConventions;
import org.orekit.utils.PVCoordinates;
import org.orekit.utils.TrackingCoordinates;
import quietspan.model.BodyDirection;
import quietspan.model.Craft;
import quietspan.model.Look;
import quietspan.model.Orbit;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Station;
import quietspan.time.ClockInstant;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * Sight lines of three craft in formation by another route: Orekit's Keplerian propagators, frame
 * tree and topocentric frames, with the light time iterated here and nothing tabulated. Shares with
 * the program the data context and the elements of the craft.
 */
final class SecondSky implements SightLines {

  private final OrekitData data = OrekitData.open(Optional.empty(), Vsop.load());
  private final Scenario scenario;
  private final boolean lightTakesTime;
  private final CelestialBody sun = data.context().getCelestialBodies().getSun();
  private final Frame sunFrame = sun.getInertiallyOrientedFrame();
  private final Frame gcrf = data.context().getFrames().getGCRF();
  private final List<KeplerianPropagator> craft = new ArrayList<>();
  private final Map<String, TopocentricFrame> stations = new HashMap<>();

  SecondSky(Scenario scenario, boolean lightTakesTime) {
    this.scenario = scenario;
    this.lightTakesTime = lightTakesTime;
    Vsop vsop = Vsop.load();
    for (Craft one : scenario.craft()) {
      craft.add(propagator(FormationOrbit.elements((Orbit.Formation) one.orbit(), vsop)));
    }
    OneAxisEllipsoid earth =
        new OneAxisEllipsoid(
            Constants.WGS84_EARTH_EQUATORIAL_RADIUS,
            Constants.WGS84_EARTH_FLATTENING,
            data.context().getFrames().getITRF(IERSConventions.IERS_2010, true));
    for (Station station : scenario.stations()) {
      stations.put(
          station.name(),
          new TopocentricFrame(
              earth,
              new GeodeticPoint(
                  station.latitude().radians(),
                  station.longitude().radians(),
                  station.altitude().metres()),
              station.name()));
    }
  }

  private KeplerianPropagator propagator(Orbit.Elements elements) {
    AbsoluteDate epoch =
        new AbsoluteDate(
            elements.epochTdb().toString().replace("Z", ""),
            data.context().getTimeScales().getTDB());
    // In the ecliptic first, then turned into the equator of the ICRF.
    PVCoordinates ecliptic =
        new KeplerianOrbit(
                elements.semiMajorAxis().metres(),
                elements.eccentricity(),
                elements.inclination().radians(),
                elements.argumentOfPerihelion().radians(),
                elements.node().radians(),
                elements.meanAnomaly().radians(),
                PositionAngleType.MEAN,
                sunFrame,
                epoch,
                quietspan.astro.Constants.GM_SUN)
            .getPVCoordinates();
    return new KeplerianPropagator(
        new CartesianOrbit(
            new PVCoordinates(turned(ecliptic.getPosition()), turned(ecliptic.getVelocity())),
            sunFrame,
            epoch,
            quietspan.astro.Constants.GM_SUN));
  }

  private static Vector3D turned(Vector3D ecliptic) {
    double[][] m = quietspan.astro.Constants.ECLIPTIC_TO_ICRF;
    return new Vector3D(
        new Vector3D(m[0]).dotProduct(ecliptic),
        new Vector3D(m[1]).dotProduct(ecliptic),
        new Vector3D(m[2]).dotProduct(ecliptic));
  }

  /** The propagator of a craft, for Orekit's own detectors. */
  KeplerianPropagator propagator(String name) {
    return craft.get(index(name));
  }

  TopocentricFrame station(String name) {
    return stations.get(name);
  }

  AbsoluteDate date(ClockInstant<?> instant) {
    Instant utc = instant.utc();
    return new AbsoluteDate(
        utc.toString().replace("Z", ""), data.context().getTimeScales().getUTC());
  }

  private int index(String name) {
    for (int c = 0; c < craft.size(); c++) {
      if (scenario.craft().get(c).name().equals(name)) {
        return c;
      }
    }
    throw new IllegalArgumentException("no craft " + name);
  }

  private Vector3D craftAt(int c, AbsoluteDate date) {
    return craft.get(c).getPosition(date, sunFrame);
  }

  private Vector3D earthAt(AbsoluteDate date) {
    return sun.getPosition(date, gcrf).negate();
  }

  private double light(int c, AbsoluteDate received, Vector3D place) {
    double light = 0;
    for (int i = 0; lightTakesTime && i < 6; i++) {
      light = craftAt(c, received.shiftedBy(-light)).distance(place) / Constants.SPEED_OF_LIGHT;
    }
    return light;
  }

  @Override
  public Interval<GroundInstant> known(String name) {
    return Interval.of(
        new GroundInstant(scenario.period().begin().utc()).plusSeconds(-86_400),
        new GroundInstant(scenario.period().end().utc()).plusSeconds(40 * 86_400));
  }

  @Override
  public double downlinkSeconds(String name, GroundInstant receive) {
    AbsoluteDate date = date(receive);
    return light(index(name), date, earthAt(date));
  }

  @Override
  public double uplinkSeconds(String name, GroundInstant transmit) {
    AbsoluteDate date = date(transmit);
    Vector3D place = earthAt(date);
    double light = 0;
    for (int i = 0; lightTakesTime && i < 6; i++) {
      light =
          craftAt(index(name), date.shiftedBy(light)).distance(place) / Constants.SPEED_OF_LIGHT;
    }
    return light;
  }

  @Override
  public GroundInstant ground(String name, OnboardInstant sent) {
    AbsoluteDate date = date(sent);
    Vector3D place = craftAt(index(name), date);
    double light = 0;
    for (int i = 0; lightTakesTime && i < 6; i++) {
      light = earthAt(date.shiftedBy(light)).distance(place) / Constants.SPEED_OF_LIGHT;
    }
    return new GroundInstant(sent.utc()).plusSeconds(light);
  }

  @Override
  public Look look(String station, String name, GroundInstant receive) {
    AbsoluteDate date = date(receive);
    TopocentricFrame frame = stations.get(station);
    int c = index(name);
    Vector3D place = frame.getPosition(date, sunFrame);
    Vector3D there = craftAt(c, date.shiftedBy(-light(c, date, place)));
    TrackingCoordinates found = frame.getTrackingCoordinates(there, sunFrame, date);
    return new Look(found.getAzimuth(), found.getElevation(), found.getRange());
  }

  @Override
  public BodyDirection earth(String name, GroundInstant receive) {
    AbsoluteDate date = date(receive);
    Vector3D earth = earthAt(date);
    int c = index(name);
    AbsoluteDate sent = date.shiftedBy(-light(c, date, earth));
    Vector3D self = craftAt(c, sent);
    Vector3D one = craftAt((c + 1) % 3, sent).subtract(self).normalize();
    Vector3D two = craftAt((c + 2) % 3, sent).subtract(self).normalize();
    Vector3D x = one.add(two).normalize();
    Vector3D z = one.crossProduct(two).normalize();
    if (z.dotProduct(self) > 0) {
      z = z.negate();
    }
    Vector3D line = earth.subtract(self).normalize();
    return new BodyDirection(
        Math.atan2(line.dotProduct(z.crossProduct(x)), line.dotProduct(x)),
        Math.asin(line.dotProduct(z)));
  }

  @Override
  public double sepRadians(String name, GroundInstant receive) {
    AbsoluteDate date = date(receive);
    Vector3D earth = earthAt(date);
    Vector3D self = craftAt(index(name), date.shiftedBy(-light(index(name), date, earth)));
    return Vector3D.angle(earth.negate(), self.subtract(earth));
  }

  @Override
  public double speRadians(String name, GroundInstant receive) {
    AbsoluteDate date = date(receive);
    Vector3D earth = earthAt(date);
    Vector3D self = craftAt(index(name), date.shiftedBy(-light(index(name), date, earth)));
    return Vector3D.angle(self.negate(), earth.subtract(self));
  }
}
