package quietspan.units;

import java.math.BigDecimal;
import java.math.RoundingMode;

/** A data rate in whole bits per second, never negative. */
public record DataRate(long bitsPerSecond) implements Comparable<DataRate> {

  public static final DataRate ZERO = new DataRate(0);

  public DataRate {
    if (bitsPerSecond < 0) {
      throw new IllegalArgumentException("a data rate is not negative: " + bitsPerSecond);
    }
  }

  public static DataRate ofBitsPerSecond(long bitsPerSecond) {
    return new DataRate(bitsPerSecond);
  }

  /**
   * This rate times a fraction, rounded down to the bit per second. The fraction is taken as the
   * decimal number it prints as, so that 0.7 of 10 bit/s is 7 and not 6.
   */
  public DataRate share(double fraction) {
    return new DataRate(
        BigDecimal.valueOf(bitsPerSecond)
            .multiply(BigDecimal.valueOf(fraction))
            .setScale(0, RoundingMode.FLOOR)
            .longValueExact());
  }

  @Override
  public int compareTo(DataRate other) {
    return Long.compare(bitsPerSecond, other.bitsPerSecond);
  }
}
