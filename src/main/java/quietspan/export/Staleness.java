package quietspan.export;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.DeserializationFeature;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.json.JsonMapper;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Iterator;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;

/**
 * Where the summary and the derived values of a {@code plan.json} are not those that follow from
 * its decisions, as after an edit by hand. The bound is a matter of planning and is left out.
 */
public final class Staleness {

  private static final Set<String> OF_THE_BOUND =
      Set.of(
          "derived.bound",
          "summary.boundScienceHours",
          "summary.boundPauses",
          "summary.gapHours",
          "summary.gapPercent");

  private static final JsonMapper JSON =
      JsonMapper.builder().enable(DeserializationFeature.USE_BIG_DECIMAL_FOR_FLOATS).build();

  private static final int LONGEST_SHOWN = 60;

  private final List<String> differences = new ArrayList<>();

  private Staleness() {}

  /**
   * One line for each difference, in the order of the file.
   *
   * @param file the plan as it was found, readable as a plan
   * @param recomputed the plan as it would be written now
   */
  public static List<String> between(byte[] file, String recomputed) {
    Staleness staleness = new Staleness();
    try {
      JsonNode was = JSON.readTree(new String(file, StandardCharsets.UTF_8).replace("\uFEFF", ""));
      JsonNode is = JSON.readTree(recomputed);
      for (String part : List.of("summary", "derived")) {
        staleness.compare(part, was.path(part), is.path(part));
      }
    } catch (JsonProcessingException e) {
      throw new IllegalArgumentException("a plan that was read is no JSON", e);
    }
    return List.copyOf(staleness.differences);
  }

  private void compare(String path, JsonNode was, JsonNode is) {
    if (OF_THE_BOUND.contains(path) || was.equals(is)) {
      return;
    }
    if (was.isObject() && is.isObject()) {
      Set<String> keys = new TreeSet<>();
      was.fieldNames().forEachRemaining(keys::add);
      is.fieldNames().forEachRemaining(keys::add);
      keys.forEach(key -> compare(path + "." + key, was.path(key), is.path(key)));
    } else if (was.isArray() && is.isArray() && was.size() == is.size()) {
      Iterator<JsonNode> now = is.iterator();
      int i = 0;
      for (JsonNode each : was) {
        compare(path + "[" + i++ + "]", each, now.next());
      }
    } else if (!sameNumber(was, is)) {
      differences.add(path + ": " + shown(was) + ", recomputed " + shown(is));
    }
  }

  private static boolean sameNumber(JsonNode was, JsonNode is) {
    return was.isNumber() && is.isNumber() && was.decimalValue().compareTo(is.decimalValue()) == 0;
  }

  private static String shown(JsonNode node) {
    if (node.isMissingNode()) {
      return "missing";
    }
    if (node.isArray()) {
      return node.size() + (node.size() == 1 ? " entry" : " entries");
    }
    String text = node.toString();
    return text.length() > LONGEST_SHOWN ? text.substring(0, LONGEST_SHOWN) + "..." : text;
  }
}
