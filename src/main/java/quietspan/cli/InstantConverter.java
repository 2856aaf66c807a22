package quietspan.cli;

import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.time.format.DateTimeParseException;
import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.TypeConversionException;

/** Reads UTC instants, or dates for their midnight. */
final class InstantConverter implements ITypeConverter<Instant> {
  @Override
  public Instant convert(String text) {
    try {
      return text.contains("T")
          ? Instant.parse(text)
          : LocalDate.parse(text).atStartOfDay(ZoneOffset.UTC).toInstant();
    } catch (DateTimeParseException e) {
      throw new TypeConversionException(
          "'" + text + "' is no instant (UTC, such as 2031-09-01T06:00:00Z or 2031-09-01)");
    }
  }
}
