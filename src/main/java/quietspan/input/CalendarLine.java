package quietspan.input;

import java.util.Map;

/**
 * One unfolded content line of a calendar file (RFC 5545, 3.1).
 *
 * @param line where it begins in the file, from 1
 * @param name in capitals
 * @param parameters by name in capitals, without quotation marks
 * @param text the whole line, unfolded
 */
record CalendarLine(
    int line, String name, Map<String, String> parameters, String value, String text) {}
