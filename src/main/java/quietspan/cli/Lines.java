package quietspan.cli;

import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.List;
import java.util.Locale;

/** Lines of a screen that is 80 columns wide, in one language whatever the machine's. */
final class Lines {

  static final int WIDTH = 80;

  private static final DateTimeFormatter SECOND =
      DateTimeFormatter.ofPattern("uuuu-MM-dd HH:mm:ss", Locale.ROOT).withZone(ZoneOffset.UTC);

  private static final DateTimeFormatter MINUTE =
      DateTimeFormatter.ofPattern("uuuu-MM-dd HH:mm", Locale.ROOT).withZone(ZoneOffset.UTC);

  private static final DateTimeFormatter MINUTE_OF_YEAR =
      DateTimeFormatter.ofPattern("MM-dd HH:mm", Locale.ROOT).withZone(ZoneOffset.UTC);

  private final StringBuilder text = new StringBuilder();

  void add(String line) {
    text.append(line.stripTrailing()).append('\n');
  }

  void row(String format, Object... cells) {
    add(String.format(Locale.ROOT, format, cells));
  }

  /** Breaks at blanks; what follows the first line is indented by two more. */
  void wrapped(String words, int indent) {
    StringBuilder line = new StringBuilder(" ".repeat(indent));
    boolean fresh = true;
    for (String word : words.split(" ")) {
      if (!fresh && line.length() + 1 + word.length() > WIDTH) {
        add(line.toString());
        line.setLength(0);
        line.append(" ".repeat(indent + 2));
        fresh = true;
      }
      line.append(fresh ? "" : " ").append(word);
      fresh = false;
    }
    add(line.toString());
  }

  /** A title and at most so many entries below it; nothing when there are none. */
  void list(String title, List<String> entries, int most) {
    if (entries.isEmpty()) {
      return;
    }
    add("");
    add(title + ":");
    entries.stream().limit(most).forEach(entry -> wrapped(entry, 2));
    if (entries.size() > most) {
      add("  ... and " + (entries.size() - most) + " more");
    }
  }

  static String shortened(String text, int width) {
    return text.length() <= width ? text : text.substring(0, width - 3) + "...";
  }

  /** At most two decimals, none that are zero. */
  static String trimmed(double value) {
    return String.format(Locale.ROOT, "%.2f", value).replaceAll("\\.?0+$", "");
  }

  static String second(Instant instant) {
    return SECOND.format(instant);
  }

  static String minute(Instant instant) {
    return MINUTE.format(instant);
  }

  /** Without the year. */
  static String minuteOfYear(Instant instant) {
    return MINUTE_OF_YEAR.format(instant);
  }

  static LocalDate date(Instant instant) {
    return LocalDate.ofInstant(instant, ZoneOffset.UTC);
  }

  @Override
  public String toString() {
    return text.toString();
  }
}
