package quietspan.units;

/** A plane angle, kept in radians. */
public record Angle(double radians) implements Comparable<Angle> {

  public static final Angle ZERO = new Angle(0);

  public Angle {
    if (!Double.isFinite(radians)) {
      throw new IllegalArgumentException("an angle is a finite number of radians: " + radians);
    }
  }

  public static Angle ofDegrees(double degrees) {
    return new Angle(Math.toRadians(degrees));
  }

  public static Angle ofRadians(double radians) {
    return new Angle(radians);
  }

  public double degrees() {
    return Math.toDegrees(radians);
  }

  public Angle minus(Angle other) {
    return new Angle(radians - other.radians);
  }

  public Angle plus(Angle other) {
    return new Angle(radians + other.radians);
  }

  @Override
  public int compareTo(Angle other) {
    return Double.compare(radians, other.radians);
  }
}
