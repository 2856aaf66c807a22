package quietspan.astro;

import org.hipparchus.util.FastMath;
import quietspan.model.Orbit;
import quietspan.units.Angle;
import quietspan.units.Distance;

/**
 * Elements of a craft in a triangle that turns once a year. First order: Dhurandhar et al. 2005,
 * gr-qc/0410093; the exact relations of arm, tilt, eccentricity and inclination used here reproduce
 * the arm changes of Nayak et al. 2006, gr-qc/0507105. The nodes of the craft are 120 deg apart,
 * their mean anomalies run back by as much, perihelion is 270 deg from the node, and the semi-major
 * axis is 1 au.
 */
final class FormationOrbit {

  private FormationOrbit() {}

  static Orbit.Elements elements(Orbit.Formation formation, Vsop vsop) {
    double alpha = formation.arm().metres() / (2 * Constants.AU);
    double tilt = FastMath.PI / 3 + (formation.secondOrderTilt() ? 5 * alpha / 8 : 0);
    double third = 1 / FastMath.sqrt(3.0);
    double e =
        FastMath.sqrt(1 + 4 * third * alpha * FastMath.cos(tilt) + 4 * alpha * alpha / 3) - 1;
    double inclination =
        FastMath.atan2(
            2 * third * alpha * FastMath.sin(tilt), 1 + 2 * third * alpha * FastMath.cos(tilt));
    double centre =
        vsop.earthMeanLongitude(TimeScales.sinceJ2000(formation.epochTdb()))
            + formation.lead().radians();
    double turn = 2 * FastMath.PI * formation.corner() / 3;
    double firstNode = centre + formation.phase().radians();
    double perihelion = 3 * FastMath.PI / 2;
    return new Orbit.Elements(
        formation.epochTdb(),
        Distance.ofMetres(Constants.AU),
        e,
        Angle.ofRadians(inclination),
        Angle.ofRadians(firstNode + turn),
        Angle.ofRadians(perihelion),
        Angle.ofRadians(centre - firstNode - perihelion - turn));
  }
}
