package quietspan.export;

import java.util.List;
import java.util.Map;
import quietspan.problem.Place;

/** A value in a JSON file, with the place where it was read. */
sealed interface JsonValue {

  Place place();

  /** What it is, with its article. */
  String noun();

  /** An object; the first of two equal keys counts. */
  record Members(Place place, Map<String, Member> members) implements JsonValue {
    @Override
    public String noun() {
      return "an object";
    }
  }

  /** A key, where it stands, and its value. */
  record Member(Place keyPlace, JsonValue value) {}

  record Items(Place place, List<JsonValue> items) implements JsonValue {
    @Override
    public String noun() {
      return "a list";
    }
  }

  record Text(Place place, String text) implements JsonValue {
    @Override
    public String noun() {
      return "a text";
    }
  }

  /** A number as it is written. */
  record Digits(Place place, String digits) implements JsonValue {
    @Override
    public String noun() {
      return "a number";
    }
  }

  /** {@code true}, {@code false} or {@code null}. */
  record Literal(Place place, String word) implements JsonValue {
    @Override
    public String noun() {
      return word;
    }
  }
}
