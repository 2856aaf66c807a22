package quietspan.input;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.math.BigDecimal;
import java.time.Duration;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import quietspan.Seeds;

class QuantityTest {

  private static final Map<String, Quantity<?>> KINDS =
      Map.of(
          "angle", Quantity.ANGLE,
          "time", Quantity.DURATION,
          "volume", Quantity.VOLUME,
          "rate", Quantity.RATE,
          "length", Quantity.DISTANCE,
          "frequency", Quantity.FREQUENCY,
          "power", Quantity.POWER,
          "merit", Quantity.GAIN_OVER_TEMPERATURE,
          "ratio", Quantity.DECIBEL,
          "share", Quantity.SHARE);

  private static double number(String kind, String text) throws Refusal {
    return switch (kind) {
      case "angle" -> Quantity.ANGLE.parse(text).degrees();
      case "time" -> Quantity.DURATION.parse(text).toSeconds();
      case "volume" -> Quantity.VOLUME.parse(text).bits();
      case "rate" -> Quantity.RATE.parse(text).bitsPerSecond();
      case "length" -> Quantity.DISTANCE.parse(text).metres();
      default -> (Double) KINDS.get(kind).parse(text);
    };
  }

  @ParameterizedTest(name = "{0} {1}")
  @CsvSource(
      textBlock =
          """
          angle,     2.5 deg,      2.5
          angle,     150 arcmin,   2.5
          angle,     9000 arcsec,  2.5
          angle,     -.5deg,       -0.5
          time,      20 min,       1200
          time,      1.5 d,        129600
          time,      0.5 min,      30
          volume,    48 Gbit,      48000000000
          volume,    6 Gbyte,      48000000000
          rate,      180 kbit/s,   180000
          rate,      0.18 Mbit/s,  180000
          length,    1.6e6 km,     1600000000
          length,    1 au,         149597870700
          frequency, 8.42 GHz,     8420000000
          power,     49.2 dBW,     49.2
          merit,     50.4 dB/K,    50.4
          ratio,     3 dB,         3
          share,     80 %,         0.8
          share,     15 percent,   0.15
          """)
  void aNumberWithItsUnitIsRead(String kind, String text, double value) throws Refusal {
    assertThat(number(kind, text)).isEqualTo(value);
  }

  @Test
  void halfACircleIsPiRadians() throws Refusal {
    assertThat(Quantity.ANGLE.parse("3.14159265358979324 rad").radians()).isEqualTo(Math.PI);
  }

  @ParameterizedTest(name = "{0} {1}")
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '`',
      textBlock =
          """
          angle  | 2.5         | "2.5" has no unit | write the unit, such as 2.5 deg
          share  | 0.8         | "0.8" has no unit | write the unit, such as 80 %
          time   | 20 minutes  | the unit in "20 minutes" is none of a length of time | one of s, min, h, d; such as 20 min
          rate   | 180 kbps    | the unit in "180 kbps" is none of a data rate | one of bit/s, kbit/s, Mbit/s, Gbit/s; such as 180 kbit/s
          rate   | 180 KBIT/S  | the unit in "180 KBIT/S" is none of a data rate | one of bit/s, kbit/s, Mbit/s, Gbit/s; such as 180 kbit/s
          angle  | 2,5 deg     | "2,5 deg" has a decimal comma | a decimal point, such as 2.5 deg
          angle  | wide        | "wide" is not an angle | an angle such as 2.5 deg
          angle  | NaN deg     | "NaN deg" is not an angle | an angle such as 2.5 deg
          angle  | ``          | "" is not an angle | an angle such as 2.5 deg
          time   | 0.5 s       | "0.5 s" is not a whole number of s | a whole number of s
          volume | 0.1 bit     | "0.1 bit" is not a whole number of bit | a whole number of bit
          time   | -1 s        | "-1 s" is below 0 s | at least 0 s, at most 10000 d
          rate   | 2e12 kbit/s | "2e12 kbit/s" is above 1000 Gbit/s | at least 0 bit/s, at most 1000 Gbit/s
          length | 1e99 km     | "1e99" is too long or too large a number | at most 40 characters and an exponent of at most 30
          length | 1e999999999 km | "1e999999999" is too long or too large a number | at most 40 characters and an exponent of at most 30
          """)
  void whatIsWrongIsSaidWithWhatWouldBeRight(String kind, String text, String what, String right) {
    Refusal refusal =
        catchThrowableOfType(Refusal.class, () -> KINDS.get(kind).parse(text == null ? "" : text));
    assertThat(refusal.what()).isEqualTo(what);
    assertThat(refusal.right()).isEqualTo(right);
  }

  @Test
  void aLimitIsAllowedUnlessItIsOpen() throws Refusal {
    Quantity<Double> share = Quantity.SHARE.above("0 %").atMost("100 %");
    assertThat(share.parse("100 %")).isEqualTo(1.0);
    Refusal low = catchThrowableOfType(Refusal.class, () -> share.parse("0 %"));
    assertThat(low.what()).isEqualTo("\"0 %\" is not above 0 %");
    Refusal high = catchThrowableOfType(Refusal.class, () -> share.parse("100.001 %"));
    assertThat(high.what()).isEqualTo("\"100.001 %\" is above 100 %");
    assertThat(high.right()).isEqualTo("above 0 %, at most 100 %");
  }

  /** Bits and seconds written in any unit come back exactly. */
  @Seeds(count = 200)
  void wholeQuantitiesSurviveEveryUnit(SplittableRandom random) throws Refusal {
    long bits = random.nextLong(1_000_000_000_000L);
    String volume = written(bits, random, List.of("bit", "kbit", "Mbit", "Gbit", "Tbit"), 3);
    assertThat(Quantity.VOLUME.parse(volume).bits()).as(volume).isEqualTo(bits);
    String rate = written(bits / 1000, random, List.of("bit/s", "kbit/s", "Mbit/s"), 3);
    assertThat(Quantity.RATE.parse(rate).bitsPerSecond()).as(rate).isEqualTo(bits / 1000);
    long hours = random.nextLong(100_000);
    assertThat(Quantity.DURATION.parse(hours + " h")).isEqualTo(Duration.ofHours(hours));
    assertThat(Quantity.DURATION.parse(hours * 60 + " min")).isEqualTo(Duration.ofHours(hours));
  }

  private static String written(
      long amount, SplittableRandom random, List<String> units, int powerStep) {
    int unit = random.nextInt(units.size());
    BigDecimal number = BigDecimal.valueOf(amount).movePointLeft(powerStep * unit);
    return (random.nextBoolean() ? number.toPlainString() : number.toString())
        + (random.nextBoolean() ? " " : "")
        + units.get(unit);
  }

  /** The decimal that a double prints as is the one that is read. */
  @Seeds(count = 200)
  void degreesAreReadAsTheyPrint(SplittableRandom random) throws Refusal {
    double degrees = random.nextDouble(-360, 360);
    assertThat(Quantity.ANGLE.parse(degrees + " deg").radians()).isEqualTo(Math.toRadians(degrees));
    assertThat(Quantity.POWER.parse(degrees + " dBW")).isEqualTo(degrees);
  }
}
