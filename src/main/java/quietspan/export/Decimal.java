package quietspan.export;

import java.math.BigDecimal;
import java.math.RoundingMode;

/** Numbers as plain decimals: the same digits on every machine and in every language. */
final class Decimal {

  private static final BigDecimal SECONDS_PER_HOUR = BigDecimal.valueOf(3600);

  private Decimal() {}

  /** Rounded half to even at so many places; trailing zeros stay. */
  static String fixed(double value, int places) {
    return new BigDecimal(value).setScale(places, RoundingMode.HALF_EVEN).toPlainString();
  }

  /** Rounded half to even at so many places, without trailing zeros. */
  static BigDecimal rounded(double value, int places) {
    return trimmed(new BigDecimal(value).setScale(places, RoundingMode.HALF_EVEN));
  }

  /** Hours to a ten-thousandth (0.36 s). */
  static BigDecimal hours(long seconds) {
    return trimmed(BigDecimal.valueOf(seconds).divide(SECONDS_PER_HOUR, 4, RoundingMode.HALF_EVEN));
  }

  static BigDecimal hours(double seconds) {
    return trimmed(new BigDecimal(seconds).divide(SECONDS_PER_HOUR, 4, RoundingMode.HALF_EVEN));
  }

  /** Exact. */
  static BigDecimal gigabits(long bits) {
    return trimmed(BigDecimal.valueOf(bits, 9));
  }

  private static BigDecimal trimmed(BigDecimal value) {
    BigDecimal stripped = value.stripTrailingZeros();
    return stripped.scale() < 0 ? stripped.setScale(0) : stripped;
  }
}
