package quietspan.check;

import quietspan.model.Aim;
import quietspan.model.Decisions;
import quietspan.model.Repoint;
import quietspan.model.Scenario;
import quietspan.model.Steering;
import quietspan.time.OnboardInstant;

/** Where antennas are held, and where they may be. */
final class Aims {

  /** Aims are written in hundredths of a degree, so half of one is lost in rounding. */
  private static final double ROUNDING_DEGREES = 0.005;

  private static final double EXACT_DEGREES = 1e-9;

  private Aims() {}

  /** The aim held at an instant outside the craft's repoints. */
  static Aim held(Scenario scenario, Decisions decisions, String craft, OnboardInstant at) {
    Aim aim = scenario.start().of(craft).aim();
    for (Repoint repoint : decisions.repoints()) {
      if (repoint.craft().equals(craft) && !repoint.start().isAfter(at)) {
        aim = repoint.aim();
      }
    }
    return aim;
  }

  /** How far an aim lies from the nearest one that the antenna can hold (deg); zero when it can. */
  static double beyondLimits(Steering steering, Aim aim) {
    double azimuth = aim.azimuthCentidegrees() / 100.0;
    double elevation = aim.elevationCentidegrees() / 100.0;
    double azimuthExcess =
        beyondTravel(steering.azimuthFrom().degrees(), steering.azimuthTo().degrees(), azimuth);
    if (azimuthExcess == 0) {
      azimuthExcess =
          offSteps(eastwards(steering.azimuthFrom().degrees(), azimuth), steering.step().degrees());
    }
    double elevationExcess;
    if (steering instanceof Steering.TwoAxes axes) {
      double low = axes.elevationFrom().degrees();
      double high = axes.elevationTo().degrees();
      elevationExcess = atLeastExact(Math.max(low - elevation, elevation - high));
      if (elevationExcess == 0) {
        elevationExcess = offSteps(elevation - low, axes.step().degrees());
      }
    } else {
      double built = ((Steering.AzimuthOnly) steering).elevation().degrees();
      elevationExcess = atLeastRounding(Math.abs(elevation - built));
    }
    return Math.max(azimuthExcess, elevationExcess);
  }

  private static double beyondTravel(double from, double to, double azimuth) {
    if (from == to || to - from >= 360) {
      return 0;
    }
    double width = eastwards(from, to);
    double place = eastwards(from, azimuth);
    return place <= width ? 0 : atLeastExact(Math.min(place - width, 360 - place));
  }

  private static double offSteps(double place, double step) {
    if (step <= 0) {
      return 0;
    }
    double steps = Math.rint(place / step);
    return atLeastRounding(Math.abs(place - steps * step));
  }

  private static double atLeastExact(double degrees) {
    return degrees > EXACT_DEGREES ? degrees : 0;
  }

  private static double atLeastRounding(double degrees) {
    return degrees > ROUNDING_DEGREES + EXACT_DEGREES ? degrees : 0;
  }

  private static double eastwards(double from, double to) {
    double turn = to - from;
    double place = turn - 360 * Math.floor(turn / 360);
    // The limit itself, a rounding error to its west, is not a whole turn away.
    return 360 - place <= EXACT_DEGREES ? 0 : place;
  }
}
