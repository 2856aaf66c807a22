package quietspan.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.Duration;
import java.time.Instant;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import picocli.CommandLine.TypeConversionException;

final class ConvertersTest {

  @ParameterizedTest
  @CsvSource({
    "30s, PT30S",
    "10min, PT10M",
    "10 min, PT10M",
    "1.5h, PT1H30M",
    "1d, PT24H",
    "0.001s, PT0.001S"
  })
  void durationsAreANumberAndItsUnit(String text, Duration duration) {
    assertThat(new DurationConverter().convert(text)).isEqualTo(duration);
  }

  @ParameterizedTest
  @ValueSource(strings = {"10", "h", "0s", "0.0min", "-1h", "1 hour", "1h30min", "9999999999s"})
  void whatIsNoDurationIsRefused(String text) {
    assertThatThrownBy(() -> new DurationConverter().convert(text))
        .isInstanceOf(TypeConversionException.class);
  }

  @ParameterizedTest
  @CsvSource({
    "2031-09-01, 2031-09-01T00:00:00Z",
    "2031-09-01T06:00:00Z, 2031-09-01T06:00:00Z",
    "2031-09-01T06:00:00.25Z, 2031-09-01T06:00:00.25Z"
  })
  void instantsAreUtcOrDates(String text, Instant instant) {
    assertThat(new InstantConverter().convert(text)).isEqualTo(instant);
  }

  @ParameterizedTest
  @ValueSource(strings = {"2031-09-01T06:00:00", "2031-02-30", "2031", "now", "2031-09-01 06:00"})
  void whatIsNoInstantIsRefused(String text) {
    assertThatThrownBy(() -> new InstantConverter().convert(text))
        .isInstanceOf(TypeConversionException.class);
  }
}
