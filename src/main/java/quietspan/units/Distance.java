package quietspan.units;

/** A length, kept in metres. */
public record Distance(double metres) {

  /** Speed of light in vacuum (m/s): exact, SI. */
  private static final double LIGHT_METRES_PER_SECOND = 299_792_458.0;

  public Distance {
    if (!Double.isFinite(metres)) {
      throw new IllegalArgumentException("a distance is a finite number of metres: " + metres);
    }
  }

  public static Distance ofMetres(double metres) {
    return new Distance(metres);
  }

  public static Distance ofKilometres(double kilometres) {
    return new Distance(kilometres * 1000);
  }

  /** How far light goes in so many seconds. */
  public static Distance ofLightSeconds(double seconds) {
    return new Distance(LIGHT_METRES_PER_SECOND * seconds);
  }

  /** How long light takes (s). */
  public double lightSeconds() {
    return metres / LIGHT_METRES_PER_SECOND;
  }

  public double kilometres() {
    return metres / 1000;
  }
}
