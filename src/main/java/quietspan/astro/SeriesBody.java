package quietspan.astro;

import java.util.function.DoubleFunction;
import org.hipparchus.CalculusFieldElement;
import org.hipparchus.geometry.euclidean.threed.FieldVector3D;
import org.hipparchus.geometry.euclidean.threed.Vector3D;
import org.orekit.bodies.CelestialBody;
import org.orekit.frames.FieldTransform;
import org.orekit.frames.Frame;
import org.orekit.frames.Transform;
import org.orekit.frames.TransformProvider;
import org.orekit.time.AbsoluteDate;
import org.orekit.time.FieldAbsoluteDate;
import org.orekit.utils.PVCoordinates;
import org.orekit.utils.TimeStampedPVCoordinates;

/**
 * The Sun or the barycentre of the solar system for Orekit, placed by the embedded series, so that
 * messages that name them as centre can be read without ephemeris files.
 */
final class SeriesBody implements CelestialBody {

  private final String name;
  private final double gm;
  private final Frame gcrf;
  private final AbsoluteDate j2000;

  /** Position in the GCRF (m) by TT seconds since J2000.0. */
  private final transient DoubleFunction<Vector3D> place;

  private final Frame frame;

  SeriesBody(
      String name, double gm, Frame gcrf, AbsoluteDate j2000, DoubleFunction<Vector3D> place) {
    this.name = name;
    this.gm = gm;
    this.gcrf = gcrf;
    this.j2000 = j2000;
    this.place = place;
    this.frame = new Frame(gcrf, new Shift(this), name + "/ICRF axes", true);
  }

  /** Moves the origin to a body, keeping the axes. */
  private record Shift(SeriesBody body) implements TransformProvider {

    private static final long serialVersionUID = 1L;

    @Override
    public Transform getTransform(AbsoluteDate date) {
      return new Transform(date, body.state(date).negate());
    }

    @Override
    public <T extends CalculusFieldElement<T>> FieldTransform<T> getTransform(
        FieldAbsoluteDate<T> date) {
      return new FieldTransform<>(date.getField(), getTransform(date.toAbsoluteDate()));
    }
  }

  private PVCoordinates state(AbsoluteDate date) {
    double tt = date.durationFrom(j2000);
    Vector3D before = place.apply(tt - 50);
    Vector3D after = place.apply(tt + 50);
    return new PVCoordinates(place.apply(tt), after.subtract(before).scalarMultiply(0.01));
  }

  @Override
  public TimeStampedPVCoordinates getPVCoordinates(AbsoluteDate date, Frame other) {
    return gcrf.getTransformTo(other, date)
        .transformPVCoordinates(new TimeStampedPVCoordinates(date, state(date)));
  }

  @Override
  public <T extends CalculusFieldElement<T>> FieldVector3D<T> getPosition(
      FieldAbsoluteDate<T> date, Frame other) {
    return new FieldVector3D<>(
        date.getField(), getPVCoordinates(date.toAbsoluteDate(), other).getPosition());
  }

  @Override
  public Frame getInertiallyOrientedFrame() {
    return frame;
  }

  @Override
  public Frame getBodyOrientedFrame() {
    return frame;
  }

  @Override
  public String getName() {
    return name;
  }

  @Override
  public double getGM() {
    return gm;
  }
}
