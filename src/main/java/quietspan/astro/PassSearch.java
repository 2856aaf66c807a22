package quietspan.astro;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.hipparchus.analysis.UnivariateFunction;
import org.hipparchus.analysis.solvers.BrentSolver;
import org.hipparchus.optim.MaxEval;
import org.hipparchus.optim.nonlinear.scalar.GoalType;
import org.hipparchus.optim.univariate.BrentOptimizer;
import org.hipparchus.optim.univariate.SearchInterval;
import org.hipparchus.optim.univariate.UnivariateObjectiveFunction;
import quietspan.model.Craft;
import quietspan.model.Look;
import quietspan.model.Pass;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Skyline;
import quietspan.model.Station;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.units.Angle;

/**
 * When each station sees each craft above its mask: a grid of ten minutes, extremes between grid
 * points looked at where they could change the sign, crossings by Brent's method to a tenth of a
 * millisecond.
 */
final class PassSearch {

  private static final double GRID = 600;
  private static final double ACCURACY = 1e-4;

  private final SightLines sky;
  private final Scenario scenario;

  PassSearch(Scenario scenario, SightLines sky) {
    this.scenario = scenario;
    this.sky = sky;
  }

  List<Pass> all(Interval<quietspan.time.OnboardInstant> period) {
    List<Pass> passes = new ArrayList<>();
    for (Station station : scenario.stations()) {
      for (Craft craft : scenario.craft()) {
        GroundInstant from =
            later(groundOf(craft, period.begin(), true), sky.known(craft.name()).begin());
        GroundInstant to =
            earlier(groundOf(craft, period.end(), false), sky.known(craft.name()).end());
        if (from.isBefore(to)) {
          new Search(station, craft.name(), from, to.secondsSince(from)).run(passes);
        }
      }
    }
    passes.sort(
        Comparator.comparing((Pass pass) -> pass.visible().begin())
            .thenComparing(Pass::station)
            .thenComparing(Pass::craft));
    return passes;
  }

  private GroundInstant groundOf(
      Craft craft, quietspan.time.OnboardInstant instant, boolean begin) {
    try {
      return sky.ground(craft.name(), instant);
    } catch (IllegalArgumentException outside) {
      // The ephemeris does not reach that far.
      return begin ? sky.known(craft.name()).begin() : sky.known(craft.name()).end();
    }
  }

  private static GroundInstant later(GroundInstant a, GroundInstant b) {
    return a.isAfter(b) ? a : b;
  }

  private static GroundInstant earlier(GroundInstant a, GroundInstant b) {
    return a.isBefore(b) ? a : b;
  }

  /** One station and craft, in seconds from the begin of the search. */
  private final class Search {
    private final Station station;
    private final String craft;
    private final GroundInstant from;
    private final double length;
    private final UnivariateFunction above = this::above;

    Search(Station station, String craft, GroundInstant from, double length) {
      this.station = station;
      this.craft = craft;
      this.from = from;
      this.length = length;
    }

    private Look look(double t) {
      return sky.look(station.name(), craft, from.plusSeconds(t));
    }

    private double above(double t) {
      Look look = look(t);
      return look.elevationRadians() - Skyline.elevation(station, look.azimuthRadians());
    }

    void run(List<Pass> passes) {
      List<Double> crossings = new ArrayList<>();
      double before = above.value(0);
      double here = before;
      boolean startsVisible = here > 0;
      double t = 0;
      double previous = Double.NaN;
      while (t < length) {
        double next = Math.min(length, t + GRID);
        double then = above.value(next);
        if (here > 0 != then > 0) {
          crossings.add(root(t, next));
        } else if (!Double.isNaN(previous) && turns(before, here, then)) {
          extreme(previous, next, here > 0, crossings);
        }
        previous = t;
        before = here;
        here = then;
        t = next;
      }
      crossings.sort(null);
      Double rise = startsVisible ? Double.valueOf(0) : null;
      boolean clipped = startsVisible;
      for (double crossing : crossings) {
        if (rise == null) {
          rise = crossing;
          clipped = false;
        } else {
          add(passes, rise, crossing, clipped);
          rise = null;
        }
      }
      if (rise != null) {
        add(passes, rise, length, true);
      }
    }

    /** Whether the middle of three values on one side of zero is the one nearest to it. */
    private boolean turns(double a, double b, double c) {
      return b > 0 ? b <= a && b <= c : b >= a && b >= c;
    }

    /**
     * Looks for a short pass, or a short dip below the mask, between grid points of the same sign.
     */
    private void extreme(double low, double high, boolean dip, List<Double> crossings) {
      double top =
          new BrentOptimizer(1e-9, 1)
              .optimize(
                  new MaxEval(200),
                  new UnivariateObjectiveFunction(above),
                  dip ? GoalType.MINIMIZE : GoalType.MAXIMIZE,
                  new SearchInterval(low, high))
              .getPoint();
      if (above.value(top) > 0 != dip) {
        crossings.add(root(low, top));
        crossings.add(root(top, high));
      }
    }

    private double root(double low, double high) {
      if (above.value(low) == 0) {
        return low;
      }
      return above.value(high) == 0 ? high : new BrentSolver(ACCURACY).solve(200, above, low, high);
    }

    private void add(List<Pass> passes, double rise, double set, boolean clipped) {
      if (set - rise < 1e-3) {
        return;
      }
      UnivariateFunction elevation = t -> look(t).elevationRadians();
      double top = rise;
      for (double t = rise; t < set; t += GRID) {
        if (elevation.value(t) > elevation.value(top)) {
          top = t;
        }
      }
      double low = Math.max(rise, top - GRID);
      double high = Math.min(set, top + GRID);
      top =
          new BrentOptimizer(1e-10, 0.01)
              .optimize(
                  new MaxEval(200),
                  new UnivariateObjectiveFunction(elevation),
                  GoalType.MAXIMIZE,
                  new SearchInterval(low, high))
              .getPoint();
      if (elevation.value(rise) >= elevation.value(top)) {
        top = rise;
      } else if (elevation.value(set) >= elevation.value(top)) {
        top = set;
      }
      passes.add(
          new Pass(
              station.name(),
              craft,
              Interval.of(from.plusSeconds(rise), from.plusSeconds(set)),
              from.plusSeconds(top),
              Angle.ofRadians(elevation.value(top)),
              Angle.ofRadians(look(rise).azimuthRadians()),
              Angle.ofRadians(look(set).azimuthRadians()),
              clipped));
    }
  }
}
