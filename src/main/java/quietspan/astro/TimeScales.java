package quietspan.astro;

import java.time.Instant;
import org.hipparchus.util.FastMath;
import quietspan.time.ClockInstant;

/**
 * From written UTC to the seconds of TT since J2000.0 that this package counts in. The offset of
 * UTC is that at the begin of the period: a leap second inside it would be reported, not applied.
 */
record TimeScales(double ttMinusUtc) {

  /** 2000-01-01T12:00:00Z in seconds since 1970. */
  private static final long J2000 = 946_728_000L;

  double tt(ClockInstant<?> instant) {
    return sinceJ2000(instant.utc()) + ttMinusUtc;
  }

  /** The digits of a date and time as seconds since 2000-01-01T12:00:00 of the same scale. */
  static double sinceJ2000(Instant digits) {
    return digits.getEpochSecond() - J2000 + digits.getNano() / 1e9;
  }

  Instant utc(double tt) {
    double seconds = tt - ttMinusUtc;
    double whole = FastMath.floor(seconds);
    return Instant.ofEpochSecond(J2000 + (long) whole)
        .plusNanos(FastMath.round((seconds - whole) * 1e9));
  }

  /**
   * TDB from TT, good to 30 microseconds (Explanatory Supplement to the Astronomical Almanac, 3rd
   * ed. 2013, eq. 3.2: the leading term; from memory).
   */
  double tdb(double tt) {
    double g = 6.2400 + 628.3020 * tt / (36_525 * 86_400.0);
    return tt + 0.001657 * FastMath.sin(g);
  }
}
