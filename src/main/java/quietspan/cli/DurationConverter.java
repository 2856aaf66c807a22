package quietspan.cli;

import java.math.BigDecimal;
import java.time.Duration;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.TypeConversionException;

/** Reads durations as in the scenario files: a number and its unit. */
final class DurationConverter implements ITypeConverter<Duration> {

  private static final Pattern FORM = Pattern.compile("(\\d{1,9}(?:\\.\\d{1,9})?) ?(s|min|h|d)");

  private static final Map<String, Long> SECONDS =
      Map.of("s", 1L, "min", 60L, "h", 3_600L, "d", 86_400L);

  @Override
  public Duration convert(String text) {
    Matcher form = FORM.matcher(text);
    if (form.matches()) {
      BigDecimal nanoseconds =
          new BigDecimal(form.group(1))
              .multiply(BigDecimal.valueOf(SECONDS.get(form.group(2))))
              .movePointRight(9);
      Duration duration =
          Duration.ofSeconds(nanoseconds.movePointLeft(9).longValue())
              .plusNanos(nanoseconds.remainder(BigDecimal.TEN.pow(9)).longValue());
      if (duration.compareTo(Duration.ZERO) > 0) {
        return duration;
      }
    }
    throw new TypeConversionException(
        "'" + text + "' is no duration (such as 30s, 10min, 6h or 1d)");
  }
}
