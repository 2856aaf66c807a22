package quietspan.units;

import java.math.BigDecimal;
import java.math.RoundingMode;

/** An amount of data in whole bits, never negative. */
public record DataVolume(long bits) implements Comparable<DataVolume> {

  public static final DataVolume ZERO = new DataVolume(0);

  public DataVolume {
    if (bits < 0) {
      throw new IllegalArgumentException("a data volume is not negative: " + bits);
    }
  }

  public static DataVolume ofBits(long bits) {
    return new DataVolume(bits);
  }

  /** 1 Gbit is 1 000 000 000 bit. */
  public double gigabits() {
    return bits / 1e9;
  }

  /** This volume times a fraction, rounded down to the bit; the fraction as in {@link DataRate}. */
  public DataVolume share(double fraction) {
    return new DataVolume(
        BigDecimal.valueOf(bits)
            .multiply(BigDecimal.valueOf(fraction))
            .setScale(0, RoundingMode.FLOOR)
            .longValueExact());
  }

  @Override
  public int compareTo(DataVolume other) {
    return Long.compare(bits, other.bits);
  }
}
