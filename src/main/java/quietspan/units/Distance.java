package quietspan.units;

/** A length, kept in metres. */
public record Distance(double metres) {

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

  public double kilometres() {
    return metres / 1000;
  }
}
