package quietspan.export;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Instant;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

final class WordsTest {

  @ParameterizedTest
  @CsvSource({
    "2031-09-01T00:00:00Z,           2031-09-01T00:00:00.000Z",
    "2031-09-01T00:00:00.0494Z,      2031-09-01T00:00:00.049Z",
    "2031-12-31T23:59:59.999500000Z, 2032-01-01T00:00:00.000Z"
  })
  void millisecondsAreRounded(Instant instant, String text) {
    assertThat(Words.milliseconds(instant)).isEqualTo(text);
  }

  @ParameterizedTest
  @CsvSource({"0, 0.00", "6.283185, 0.00", "-0.5, -28.65", "-0.00001, 0.00", "6.2830, 359.99"})
  void anAzimuthStaysBelowAWholeTurn(double radians, String text) {
    assertThat(Words.degrees(radians)).isEqualTo(text);
  }

  /** Day 244 of 2031 is 1 September (no leap year: 243 days before it). */
  @Test
  void theYearIsCountedInDays() {
    assertThat(Words.dayOfYear(Instant.parse("2031-09-01T00:00:00Z"))).isEqualTo("244");
    assertThat(Words.dayOfYear(Instant.parse("2031-01-01T23:59:59Z"))).isEqualTo("001");
  }

  @ParameterizedTest
  @CsvSource({"160000, 160 kbit/s", "180, 0.18 kbit/s", "1234567, 1234.567 kbit/s"})
  void ratesAreInKilobits(long bitsPerSecond, String text) {
    assertThat(Words.kilobits(bitsPerSecond)).isEqualTo(text);
  }

  @ParameterizedTest
  @CsvSource({"Corrin Downs, corrin-downs", "ABC 3/4, abc-3-4", "\u00c9\u00e9, x", "I, i"})
  void fileNamesArePlain(String name, String file) {
    assertThat(FileNames.plain(name)).isEqualTo(file);
  }
}
