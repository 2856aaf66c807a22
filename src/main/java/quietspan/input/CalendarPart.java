package quietspan.input;

import java.util.List;
import java.util.Optional;

/**
 * A component of a calendar file with the lines it came from.
 *
 * @param line of its BEGIN, from 1
 */
record CalendarPart(
    String name, int line, List<CalendarLine> properties, List<CalendarPart> parts) {

  List<CalendarLine> all(String property) {
    return properties.stream().filter(line -> line.name().equals(property)).toList();
  }

  Optional<CalendarLine> first(String property) {
    return all(property).stream().findFirst();
  }

  /** The component as a calendar file would hold it, unfolded. */
  String text() {
    StringBuilder text = new StringBuilder("BEGIN:").append(name).append("\r\n");
    properties.forEach(property -> text.append(property.text()).append("\r\n"));
    parts.forEach(part -> text.append(part.text()));
    return text.append("END:").append(name).append("\r\n").toString();
  }
}
