package quietspan.input;

import java.util.LinkedHashMap;
import java.util.Map;

/** A name or identifier inside an ephemeris file; empty where the file holds one object. */
final class ObjectName extends Scalar<String> {

  ObjectName() {
    super("an object's name", "HASK");
  }

  @Override
  String parse(String text) throws Refusal {
    if (text.length() > 80 || text.codePoints().anyMatch(Character::isISOControl)) {
      throw new Refusal(Refusal.quoted(text) + " is no object's name", "at most 80 characters");
    }
    return text;
  }

  @Override
  public Map<String, Object> schema() {
    Map<String, Object> schema = new LinkedHashMap<>();
    schema.put("type", "string");
    schema.put("maxLength", 80);
    return schema;
  }
}
