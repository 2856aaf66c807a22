package quietspan.export;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.time.Instant;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.time.temporal.ChronoUnit;
import java.util.Locale;
import quietspan.model.RuleId;
import quietspan.model.Waiver;

/** Phrases and stamps that several kinds of files share. */
public final class Words {

  private static final DateTimeFormatter MILLISECONDS =
      DateTimeFormatter.ofPattern("uuuu-MM-dd'T'HH:mm:ss.SSS'Z'", Locale.ROOT)
          .withZone(ZoneOffset.UTC);

  private Words() {}

  /** {@code ground} or {@code onboard}: the clock of a rule, as it stands in field names. */
  static String clock(RuleId rule) {
    return rule.clock().name().toLowerCase(Locale.ROOT);
  }

  /** The clock of a waiver's stretch: latency is waived by generation, on board. */
  static String waiverClock(RuleId rule) {
    return rule == RuleId.LATENCY ? "onboard" : "ground";
  }

  /** Hundredths of a degree as degrees with two decimals. */
  static BigDecimal degrees(int centidegrees) {
    return BigDecimal.valueOf(centidegrees, 2);
  }

  /** Degrees with two decimals. */
  static String degrees(double radians) {
    return degrees(radians, 2);
  }

  /** Degrees; an azimuth that rounds to 360 deg is printed as zero. */
  static String degrees(double radians, int places) {
    double degrees = Math.toDegrees(radians);
    String text = Decimal.fixed(degrees, places);
    return text.startsWith("360.") ? Decimal.fixed(0, places) : text;
  }

  /** Always three decimals, rounded half up. */
  static String milliseconds(Instant instant) {
    return MILLISECONDS.format(instant.plusNanos(500_000));
  }

  /** To the nearest second. */
  static Instant second(Instant instant) {
    return instant.plusMillis(500).truncatedTo(ChronoUnit.SECONDS);
  }

  /** Day of the year in UTC, three digits. */
  static String dayOfYear(Instant instant) {
    return String.format(Locale.ROOT, "%03d", instant.atOffset(ZoneOffset.UTC).getDayOfYear());
  }

  /** Kilobits per second without trailing zeros, such as {@code 160 kbit/s}. */
  static String kilobits(long bitsPerSecond) {
    BigDecimal value = BigDecimal.valueOf(bitsPerSecond, 3).stripTrailingZeros();
    return value.setScale(Math.max(0, value.scale()), RoundingMode.UNNECESSARY).toPlainString()
        + " kbit/s";
  }

  /** One line that says what is waived, where, by how much and why. */
  public static String sentence(Waiver waiver) {
    StringBuilder text = new StringBuilder(waiver.rule().name());
    if (!waiver.dataClass().isEmpty()) {
      text.append(' ').append(waiver.dataClass());
    }
    if (!waiver.craft().isEmpty()) {
      text.append(' ').append(waiver.craft());
    }
    return text.append(" from ")
        .append(second(waiver.begin()))
        .append(" to ")
        .append(second(waiver.end()))
        .append(waiverClock(waiver.rule()).equals("onboard") ? " on board" : " ground")
        .append(": limit ")
        .append(Decimal.hours(waiver.relaxedLimit().toSeconds()).toPlainString())
        .append(" h (")
        .append(waiver.reason())
        .append(')')
        .toString();
  }
}
