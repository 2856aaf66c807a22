package quietspan.astro;

import java.util.Comparator;
import java.util.Optional;
import java.util.PriorityQueue;
import org.hipparchus.util.FastMath;
import org.hipparchus.util.MathUtils;
import quietspan.model.Aim;
import quietspan.model.BodyDirection;
import quietspan.model.Craft;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Steering;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;

/**
 * The longest that one aim of a craft can serve from an instant on: of all aims within the
 * antenna's travel and on its steps, the one whose usable cone the Earth leaves last.
 *
 * <p>Exact on the grid of aims, by branch and bound: if any aim of a box serves up to an instant,
 * then the box's centre does so with a cone wider by the box's radius. The Earth is looked at every
 * hour, in which it moves by a twenty-fifth of a degree, so an excursion beyond the cone that
 * begins and ends within one hour is not seen; the end is bisected to half a second.
 */
public final class CoverageSearch {

  private static final long STEP_SECONDS = 3_600;

  /** No hold lasts longer than this. */
  private static final long LONGEST_SECONDS = 120 * 86_400L;

  private static final double END_SECONDS = 0.5;

  private final SightLines sightLines;
  private final Craft craft;
  private final double cone;
  private final GroundInstant start;
  private final double[][] earth;

  private CoverageSearch(
      Scenario scenario, SightLines sightLines, Craft craft, GroundInstant start) {
    this.sightLines = sightLines;
    this.craft = craft;
    this.cone = scenario.usableHalfCone(craft).radians();
    this.start = start;
    double known = sightLines.known(craft.name()).end().secondsSince(start);
    int samples = 1 + (int) (FastMath.min(known, LONGEST_SECONDS) / STEP_SECONDS);
    this.earth = new double[samples][];
  }

  /** An aim and how long it holds the Earth. */
  public record Coverage(Interval<OnboardInstant> during, Aim aim) {}

  /**
   * The longest coverage from an on-board instant.
   *
   * @return absent when no aim has the Earth in its cone at that instant, or the trajectory is not
   *     known then
   */
  public static Optional<Coverage> longest(
      Scenario scenario, SightLines sightLines, Craft craft, OnboardInstant from) {
    Interval<GroundInstant> known = sightLines.known(craft.name());
    if (from.isBefore(sightLines.onboard(craft.name(), known.begin()))
        || !from.isBefore(sightLines.onboard(craft.name(), known.end()))) {
      return Optional.empty();
    }
    CoverageSearch search =
        new CoverageSearch(scenario, sightLines, craft, sightLines.ground(craft.name(), from));
    return search
        .best()
        .map(
            best ->
                new Coverage(
                    Interval.of(
                        from,
                        sightLines.onboard(craft.name(), search.start.plusSeconds(best.seconds()))),
                    best.aim()));
  }

  private record Best(Aim aim, double seconds) {}

  /**
   * Aims by their number of steps from the lower limits, both ends included.
   *
   * @param bound no aim in it serves longer (s)
   */
  private record Box(
      int fromAzimuth, int toAzimuth, int fromElevation, int toElevation, double bound) {
    boolean single() {
      return fromAzimuth == toAzimuth && fromElevation == toElevation;
    }

    boolean wide() {
      return toAzimuth - fromAzimuth >= toElevation - fromElevation;
    }
  }

  private Optional<Best> best() {
    PriorityQueue<Box> boxes =
        new PriorityQueue<>(
            Comparator.comparingDouble(Box::bound)
                .reversed()
                .thenComparingInt(Box::fromAzimuth)
                .thenComparingInt(Box::fromElevation));
    Grid grid = new Grid(craft.antenna().steering());
    offer(boxes, grid, 0, grid.azimuths() - 1, 0, grid.elevations() - 1);
    while (!boxes.isEmpty()) {
      Box box = boxes.poll();
      if (box.single()) {
        // Its bound is exact, and no other box can have more.
        Aim aim = grid.aim(box.fromAzimuth(), box.fromElevation());
        return box.bound() <= 0 ? Optional.empty() : Optional.of(new Best(aim, box.bound()));
      }
      if (box.wide()) {
        int middle = (box.fromAzimuth() + box.toAzimuth()) / 2;
        offer(boxes, grid, box.fromAzimuth(), middle, box.fromElevation(), box.toElevation());
        offer(boxes, grid, middle + 1, box.toAzimuth(), box.fromElevation(), box.toElevation());
      } else {
        int middle = (box.fromElevation() + box.toElevation()) / 2;
        offer(boxes, grid, box.fromAzimuth(), box.toAzimuth(), box.fromElevation(), middle);
        offer(boxes, grid, box.fromAzimuth(), box.toAzimuth(), middle + 1, box.toElevation());
      }
    }
    return Optional.empty();
  }

  private void offer(
      PriorityQueue<Box> boxes, Grid grid, int fromAz, int toAz, int fromEl, int toEl) {
    double west = grid.azimuth(fromAz);
    double east = grid.azimuth(toAz);
    double low = grid.elevation(fromEl);
    double high = grid.elevation(toEl);
    boolean single = fromAz == toAz && fromEl == toEl;
    BodyDirection centre =
        single
            ? grid.aim(fromAz, fromEl).direction()
            : new BodyDirection((west + east) / 2, (low + high) / 2);
    // The way along the meridian and then along a parallel is never shorter than the great circle;
    // an aim may stand half a hundredth of a degree off its place when the step is odd.
    double radius = single ? 0 : (east - west) / 2 + (high - low) / 2 + FastMath.toRadians(0.01);
    double seconds = served(centre, cone + radius);
    if (seconds >= 0) {
      boxes.add(new Box(fromAz, toAz, fromEl, toEl, seconds));
    }
  }

  /** Ground seconds from the start until the Earth leaves the cone; negative when it is not in. */
  private double served(BodyDirection aim, double halfCone) {
    if (halfCone >= FastMath.PI) {
      return (earth.length - 1) * (double) STEP_SECONDS;
    }
    double[] axis = vector(aim);
    double least = FastMath.cos(halfCone);
    if (dot(axis, earth(0)) < least) {
      return -1;
    }
    for (int i = 1; i < earth.length; i++) {
      if (dot(axis, earth(i)) < least) {
        return leaves(axis, least, (i - 1) * (double) STEP_SECONDS, i * (double) STEP_SECONDS);
      }
    }
    return (earth.length - 1) * (double) STEP_SECONDS;
  }

  private double leaves(double[] axis, double least, double inside, double outside) {
    double in = inside;
    double out = outside;
    while (out - in > END_SECONDS) {
      double middle = (in + out) / 2;
      if (dot(axis, vector(sightLines.earth(craft.name(), start.plusSeconds(middle)))) < least) {
        out = middle;
      } else {
        in = middle;
      }
    }
    return in;
  }

  private double[] earth(int sample) {
    if (earth[sample] == null) {
      earth[sample] =
          vector(sightLines.earth(craft.name(), start.plusSeconds(sample * STEP_SECONDS)));
    }
    return earth[sample];
  }

  private static double[] vector(BodyDirection direction) {
    double cosElevation = FastMath.cos(direction.elevationRadians());
    return new double[] {
      cosElevation * FastMath.cos(direction.azimuthRadians()),
      cosElevation * FastMath.sin(direction.azimuthRadians()),
      FastMath.sin(direction.elevationRadians())
    };
  }

  private static double dot(double[] a, double[] b) {
    return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
  }

  /** The aims that an antenna can take: whole steps above the lower limits of its travel. */
  private static final class Grid {
    private static final double FINEST = FastMath.toRadians(0.01);

    private final double step;
    private final double azimuthFrom;
    private final double elevationFrom;
    private final int azimuths;
    private final int elevations;

    Grid(Steering steering) {
      this.step = steering.step().radians() > 0 ? steering.step().radians() : FINEST;
      this.azimuthFrom = steering.azimuthFrom().radians();
      double travel =
          MathUtils.normalizeAngle(steering.azimuthTo().radians() - azimuthFrom, FastMath.PI);
      boolean wholeCircle = steering.azimuthFrom().equals(steering.azimuthTo());
      this.azimuths =
          wholeCircle
              ? (int) FastMath.ceil(MathUtils.TWO_PI / step - 1e-6)
              : 1 + (int) (travel / step + 1e-6);
      if (steering instanceof Steering.TwoAxes axes) {
        this.elevationFrom = axes.elevationFrom().radians();
        this.elevations = 1 + (int) ((axes.elevationTo().radians() - elevationFrom) / step + 1e-6);
      } else {
        this.elevationFrom = ((Steering.AzimuthOnly) steering).elevation().radians();
        this.elevations = 1;
      }
    }

    int azimuths() {
      return azimuths;
    }

    int elevations() {
      return elevations;
    }

    double azimuth(int steps) {
      return azimuthFrom + steps * step;
    }

    double elevation(int steps) {
      return elevationFrom + steps * step;
    }

    Aim aim(int azimuthSteps, int elevationSteps) {
      return Aim.nearest(
          Angle.ofRadians(azimuth(azimuthSteps)), Angle.ofRadians(elevation(elevationSteps)));
    }
  }
}
