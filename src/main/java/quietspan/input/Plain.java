package quietspan.input;

import java.time.DateTimeException;
import java.time.ZoneId;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** The kinds of value that carry no unit. */
final class Plain {

  /** A name of something of the mission, unique among its like. */
  static final Scalar<String> NAME =
      new Scalar<>("a name", "Hask") {
        @Override
        String parse(String text) throws Refusal {
          if (text.isEmpty() || text.length() > 40) {
            throw new Refusal(Refusal.quoted(text) + " is no name", "1 to 40 characters");
          }
          if (!text.codePoints().allMatch(Plain::belongsInName)) {
            throw new Refusal(
                Refusal.quoted(text) + " holds a character that names do not have",
                "letters, digits, space, - . _ '");
          }
          return text;
        }

        @Override
        public Map<String, Object> schema() {
          Map<String, Object> schema = new LinkedHashMap<>();
          schema.put("type", "string");
          schema.put("minLength", 1);
          schema.put("maxLength", 40);
          return schema;
        }
      };

  /** Any text on one line. */
  static final Scalar<String> TEXT =
      new Scalar<>("a text", "Sallow Triad") {
        @Override
        String parse(String text) throws Refusal {
          if (text.isEmpty() || text.length() > 200) {
            throw new Refusal(Refusal.quoted(text) + " is no text", "1 to 200 characters");
          }
          if (text.codePoints().anyMatch(Character::isISOControl)) {
            throw new Refusal(Refusal.quoted(text) + " holds a control character", "one line");
          }
          return text;
        }

        @Override
        public Map<String, Object> schema() {
          Map<String, Object> schema = new LinkedHashMap<>();
          schema.put("type", "string");
          schema.put("minLength", 1);
          schema.put("maxLength", 200);
          return schema;
        }
      };

  /** A file of the scenario folder, with forward slashes. */
  static final Scalar<String> FILE =
      new Scalar<>("a file of the scenario folder", "calendars/outages.ics") {
        @Override
        String parse(String text) throws Refusal {
          if (!text.matches("[A-Za-z0-9_.-]+(/[A-Za-z0-9_.-]+)*")
              || text.matches("(.*/)?\\.\\.?(/.*)?")
              || text.length() > 200) {
            throw new Refusal(
                Refusal.quoted(text) + " is not the path of a file inside the scenario folder",
                "letters, digits, . _ - and forward slashes, such as " + example());
          }
          return text;
        }

        @Override
        public Map<String, Object> schema() {
          Map<String, Object> schema = new LinkedHashMap<>();
          schema.put("type", "string");
          schema.put("pattern", "^[A-Za-z0-9_.-]+(?:\\/[A-Za-z0-9_.-]+)*$");
          schema.put("examples", List.of(example()));
          return schema;
        }
      };

  /** The IANA name of a time zone. */
  static final Scalar<String> ZONE =
      new Scalar<>("a time zone by its IANA name", "UTC") {
        @Override
        String parse(String text) throws Refusal {
          try {
            return ZoneId.of(text).getId();
          } catch (DateTimeException e) {
            throw new Refusal(Refusal.quoted(text) + " is not a known time zone", right());
          }
        }

        @Override
        public Map<String, Object> schema() {
          return Map.of("type", "string");
        }
      };

  static final Scalar<Boolean> FLAG =
      new Scalar<>("true or false", "true") {
        @Override
        Boolean parse(String text) throws Refusal {
          return switch (text) {
            case "true" -> true;
            case "false" -> false;
            default -> throw new Refusal(Refusal.quoted(text) + " is neither", noun());
          };
        }

        @Override
        public Map<String, Object> schema() {
          return Map.of("type", "boolean");
        }
      };

  private Plain() {}

  private static boolean belongsInName(int c) {
    return Character.isLetterOrDigit(c) || " -._'".indexOf(c) >= 0;
  }

  /** A whole number between two limits, both allowed. */
  static Scalar<Integer> count(int least, int most) {
    return new Scalar<>("a whole number from " + least + " to " + most, Integer.toString(least)) {
      @Override
      Integer parse(String text) throws Refusal {
        if (!text.matches("[+-]?[0-9]{1,9}")
            || Integer.parseInt(text) < least
            || Integer.parseInt(text) > most) {
          throw new Refusal(Refusal.quoted(text) + " is not " + noun(), noun());
        }
        return Integer.parseInt(text);
      }

      @Override
      public Map<String, Object> schema() {
        Map<String, Object> schema = new LinkedHashMap<>();
        schema.put("type", "integer");
        schema.put("minimum", least);
        schema.put("maximum", most);
        return schema;
      }
    };
  }

  /** A number that has no unit, at least zero and below a limit. */
  static Scalar<Double> number(String noun, String example, double below) {
    return new Scalar<>(noun, example) {
      @Override
      Double parse(String text) throws Refusal {
        if (!Quantity.isNumber(text)) {
          throw new Refusal(
              Refusal.quoted(text) + " is not a number",
              "a number without unit such as " + example);
        }
        double number = Quantity.number(text).doubleValue();
        if (number < 0 || number >= below) {
          throw new Refusal(
              Refusal.quoted(text) + " is out of its range",
              "at least 0 and below " + java.math.BigDecimal.valueOf(below).toPlainString());
        }
        return number;
      }

      @Override
      public Map<String, Object> schema() {
        Map<String, Object> schema = new LinkedHashMap<>();
        schema.put("type", "number");
        schema.put("minimum", 0);
        schema.put("exclusiveMaximum", below);
        return schema;
      }
    };
  }
}
