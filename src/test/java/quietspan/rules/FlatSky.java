package quietspan.rules;

import java.util.List;
import java.util.function.ToDoubleFunction;
import quietspan.model.BodyDirection;
import quietspan.model.Geometry;
import quietspan.model.Look;
import quietspan.model.Pass;
import quietspan.model.SightLines;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;

/**
 * A sky to compute by hand: light takes 100 s, elevation and Sun angle are functions of time, the
 * azimuth is 180 deg at noon and moves by 15 deg an hour, the range is that of the light time.
 */
final class FlatSky implements SightLines {

  static final double LIGHT_SECONDS = 100;

  static final GroundInstant NOON = GroundInstant.parse("2031-09-01T12:00:00Z");

  /** In degrees, by seconds since noon. */
  ToDoubleFunction<Double> elevation = since -> 45;

  ToDoubleFunction<Double> sep = since -> 75;

  private static double sinceNoon(GroundInstant instant) {
    return instant.secondsSince(NOON);
  }

  static GroundInstant noonPlus(double seconds) {
    return NOON.plusSeconds(seconds);
  }

  /** One pass of one craft. */
  Geometry pass(String station, String craft, double fromNoon, double toNoon, int guard) {
    GroundInstant top = noonPlus(0);
    Pass pass =
        new Pass(
            station,
            craft,
            Interval.of(noonPlus(fromNoon), noonPlus(toNoon)),
            top,
            Angle.ofDegrees(elevation.applyAsDouble(0.0)),
            Angle.ofDegrees(100),
            Angle.ofDegrees(260),
            false);
    return new Geometry(this, List.of(pass), guard, List.of("flat sky"));
  }

  @Override
  public Interval<GroundInstant> known(String craft) {
    return Interval.of(NOON.plusSeconds(-50 * 86_400L), NOON.plusSeconds(50 * 86_400L));
  }

  @Override
  public double downlinkSeconds(String craft, GroundInstant receive) {
    return LIGHT_SECONDS;
  }

  @Override
  public double uplinkSeconds(String craft, GroundInstant transmit) {
    return LIGHT_SECONDS;
  }

  @Override
  public GroundInstant ground(String craft, OnboardInstant sent) {
    return new GroundInstant(sent.utc()).plusSeconds(LIGHT_SECONDS);
  }

  @Override
  public Look look(String station, String craft, GroundInstant receive) {
    double since = sinceNoon(receive);
    return new Look(
        Math.toRadians(180 + 15 * since / 3600),
        Math.toRadians(elevation.applyAsDouble(since)),
        7.5e10);
  }

  @Override
  public BodyDirection earth(String craft, GroundInstant receive) {
    return new BodyDirection(0, 0);
  }

  @Override
  public double sepRadians(String craft, GroundInstant receive) {
    return Math.toRadians(sep.applyAsDouble(sinceNoon(receive)));
  }

  @Override
  public double speRadians(String craft, GroundInstant receive) {
    return Math.toRadians(75);
  }
}
