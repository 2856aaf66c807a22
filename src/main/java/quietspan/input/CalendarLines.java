package quietspan.input;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * Finds the content lines and components of a calendar file and the lines on which they stand,
 * because the calendar library forgets them. Lines end with CR LF or LF alone.
 */
final class CalendarLines {

  private static final int DEEPEST = 10;

  private final Source source;

  private CalendarLines(Source source) {
    this.source = source;
  }

  /** The one VCALENDAR of a file; complains and gives nothing when there is none. */
  static Optional<CalendarPart> read(String text, Source source) {
    return new CalendarLines(source).calendar(text);
  }

  private static final class Open {
    final String name;
    final int line;
    final List<CalendarLine> properties = new ArrayList<>();
    final List<CalendarPart> parts = new ArrayList<>();

    Open(String name, int line) {
      this.name = name;
      this.line = line;
    }

    CalendarPart closed() {
      return new CalendarPart(name, line, List.copyOf(properties), List.copyOf(parts));
    }
  }

  private Optional<CalendarPart> calendar(String text) {
    Optional<List<CalendarLine>> lines = contentLines(text);
    if (lines.isEmpty()) {
      return Optional.empty();
    }
    if (lines.get().isEmpty()) {
      source.problems().error(source.whole(), "", "is empty", "a calendar, BEGIN:VCALENDAR");
      return Optional.empty();
    }
    Deque<Open> open = new ArrayDeque<>();
    CalendarPart calendar = null;
    for (CalendarLine line : lines.get()) {
      String value = line.value().strip().toUpperCase(Locale.ROOT);
      if (calendar != null) {
        return refused(line.line(), "something follows END:VCALENDAR", "one calendar in a file");
      }
      if (open.isEmpty() && !(line.name().equals("BEGIN") && value.equals("VCALENDAR"))) {
        return refused(line.line(), "the file does not begin with BEGIN:VCALENDAR", "RFC 5545");
      }
      if (line.name().equals("BEGIN")) {
        if (open.size() >= DEEPEST) {
          return refused(line.line(), "components are nested too deep", "RFC 5545");
        }
        open.push(new Open(value, line.line()));
      } else if (line.name().equals("END")) {
        Open last = open.pop();
        if (!last.name.equals(value)) {
          return refused(
              line.line(),
              "END:" + shown(value) + " closes " + shown(last.name) + " of line " + last.line,
              "END:" + shown(last.name));
        }
        if (open.isEmpty()) {
          calendar = last.closed();
        } else {
          open.peek().parts.add(last.closed());
        }
      } else {
        open.peek().properties.add(line);
      }
    }
    if (calendar == null) {
      Open last = open.peek();
      return refused(last.line, shown(last.name) + " is never closed", "END:" + shown(last.name));
    }
    return Optional.of(calendar);
  }

  private static String shown(String name) {
    return name.length() > 30 ? name.substring(0, 30) + "..." : name;
  }

  private Optional<CalendarPart> refused(int line, String what, String right) {
    source.problems().error(source.at(line, 1), "", what, right);
    return Optional.empty();
  }

  private Optional<List<CalendarLine>> contentLines(String text) {
    List<CalendarLine> lines = new ArrayList<>();
    StringBuilder unfolded = new StringBuilder();
    int begin = 0;
    int number = 0;
    boolean good = true;
    for (String line : text.split("\r\n|\n", -1)) {
      number++;
      if (line.startsWith(" ") || line.startsWith("\t")) {
        if (begin == 0) {
          good = bad(number, "a continued line has nothing before it");
        } else {
          unfolded.append(line, 1, line.length());
        }
        continue;
      }
      good &= begin == 0 || add(unfolded.toString(), begin, lines);
      unfolded.setLength(0);
      begin = line.isEmpty() ? 0 : number;
      unfolded.append(line);
    }
    good &= begin == 0 || add(unfolded.toString(), begin, lines);
    return good ? Optional.of(lines) : Optional.empty();
  }

  private boolean bad(int line, String what) {
    source.problems().error(source.at(line, 1), "", what, "NAME;PARAMETER=value:value, RFC 5545");
    return false;
  }

  /** Splits a content line; a colon or semicolon inside quotation marks belongs to the value. */
  private boolean add(String text, int line, List<CalendarLine> lines) {
    if (text.codePoints().anyMatch(c -> Character.isISOControl(c) && c != '\t')) {
      return bad(line, "the line holds a control character");
    }
    List<String> parts = new ArrayList<>();
    int from = 0;
    boolean quoted = false;
    int colon = -1;
    for (int i = 0; i < text.length() && colon < 0; i++) {
      char c = text.charAt(i);
      quoted ^= c == '"';
      if (!quoted && (c == ';' || c == ':')) {
        parts.add(text.substring(from, i));
        from = i + 1;
        colon = c == ':' ? i : -1;
      }
    }
    if (colon < 0 || !parts.get(0).matches("[A-Za-z0-9-]+")) {
      return bad(line, Refusal.quoted(text) + " is not a content line");
    }
    Map<String, String> parameters = new LinkedHashMap<>();
    for (String part : parts.subList(1, parts.size())) {
      int equals = part.indexOf('=');
      if (equals < 1) {
        return bad(line, Refusal.quoted(part) + " is not a parameter");
      }
      parameters.put(
          part.substring(0, equals).toUpperCase(Locale.ROOT),
          part.substring(equals + 1).replace("\"", ""));
    }
    lines.add(
        new CalendarLine(
            line,
            parts.get(0).toUpperCase(Locale.ROOT),
            parameters,
            text.substring(colon + 1),
            text));
    return true;
  }
}
