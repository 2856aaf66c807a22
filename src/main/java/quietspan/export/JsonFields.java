package quietspan.export;

import java.math.BigDecimal;
import java.time.Instant;
import java.time.format.DateTimeParseException;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;
import quietspan.problem.Nearest;
import quietspan.problem.Place;
import quietspan.problem.Problems;

/**
 * The fields of one object of a JSON file. A field that is missing or wrong is complained of and
 * read as something harmless; {@link #sound} then says no, and nothing is built from the object.
 */
final class JsonFields {

  private static final int LONGEST_SHOWN = 60;

  private static final int LARGEST_SCALE = 30;

  /** Four-digit years, and the zone named. */
  private static final Pattern STAMP =
      Pattern.compile("\\d{4}-\\d\\d-\\d\\dT\\d\\d:\\d\\d:\\d\\d(\\.\\d{1,9})?Z");

  private final JsonValue.Members object;
  private final String path;
  private final Problems problems;
  private final Optional<JsonFields> parent;
  private boolean sound = true;

  private JsonFields(
      JsonValue.Members object, String path, Problems problems, Optional<JsonFields> parent) {
    this.object = object;
    this.path = path;
    this.problems = problems;
    this.parent = parent;
  }

  /** The file's own object; absent, with a complaint, when the value is none. */
  static Optional<JsonFields> of(JsonValue value, Problems problems, List<String> known) {
    return of(value, "", problems, known, Optional.empty());
  }

  /** Unknown keys are complained of. */
  private static Optional<JsonFields> of(
      JsonValue value,
      String path,
      Problems problems,
      List<String> known,
      Optional<JsonFields> parent) {
    if (!(value instanceof JsonValue.Members object)) {
      problems.error(
          value.place(),
          path,
          "is " + value.noun() + " where an object is due",
          "the keys " + String.join(", ", known));
      return Optional.empty();
    }
    object
        .members()
        .forEach(
            (key, member) -> {
              if (!known.contains(key)) {
                problems.error(
                    member.keyPlace(),
                    join(path, shown(key)),
                    "is not known here" + Nearest.hint(key, known),
                    "one of " + String.join(", ", known));
              }
            });
    return Optional.of(new JsonFields(object, path, problems, parent));
  }

  static String join(String path, String key) {
    return path.isEmpty() ? key : path + "." + key;
  }

  /** Whether everything asked for so far was there and right, in the objects inside as well. */
  boolean sound() {
    return sound;
  }

  boolean has(String key) {
    return object.members().containsKey(key);
  }

  /** Where the value of this key stands; the object itself when the key is missing. */
  Place place(String key) {
    JsonValue.Member member = object.members().get(key);
    return member == null ? object.place() : member.value().place();
  }

  void refuse(String key, String what, String right) {
    problems.error(place(key), join(path, key), what, right);
    spoil();
  }

  private void spoil() {
    sound = false;
    parent.ifPresent(JsonFields::spoil);
  }

  private Optional<JsonValue> value(String key, String right) {
    JsonValue.Member member = object.members().get(key);
    if (member == null) {
      problems.error(object.place(), path, "lacks " + key, key + ": " + right);
      spoil();
      return Optional.empty();
    }
    return Optional.of(member.value());
  }

  private static String shown(String text) {
    String cut = text.length() > LONGEST_SHOWN ? text.substring(0, LONGEST_SHOWN) + "..." : text;
    return cut.replaceAll("\\p{Cntrl}", "?");
  }

  private void refuseValue(String key, JsonValue value, String right) {
    String read =
        value instanceof JsonValue.Text text
            ? "\"" + shown(text.text()) + "\""
            : value instanceof JsonValue.Digits digits ? shown(digits.digits()) : value.noun();
    refuse(key, "is " + read, right);
  }

  String text(String key) {
    return read(key, "a text").orElse("");
  }

  private Optional<String> read(String key, String right) {
    Optional<JsonValue> value = value(key, right);
    if (value.isPresent() && value.get() instanceof JsonValue.Text text) {
      return Optional.of(text.text());
    }
    value.ifPresent(other -> refuseValue(key, other, right));
    return Optional.empty();
  }

  /** A text that is not blank and holds no control characters. */
  String name(String key) {
    Optional<String> name = read(key, "a name");
    if (name.isPresent()
        && (name.get().isBlank() || name.get().codePoints().anyMatch(Character::isISOControl))) {
      refuse(key, "is \"" + shown(name.get()) + "\"", "a name");
    }
    return name.orElse("");
  }

  /** A text out of a list. */
  String word(String key, List<String> known) {
    String right = "one of " + String.join(", ", known);
    Optional<String> word = read(key, right);
    if (word.isPresent() && !known.contains(word.get())) {
      refuse(key, unknown(word.get(), known), right);
    }
    return word.orElse("");
  }

  static String unknown(String word, List<String> known) {
    return "is \"" + shown(word) + "\"" + Nearest.hint(word, known);
  }

  /** A list of texts, each out of a list. */
  List<String> words(String key, List<String> known) {
    String right = "a list of " + String.join(", ", known);
    List<String> words = texts(key, right);
    for (String word : words) {
      if (!known.contains(word)) {
        refuse(key, "holds \"" + shown(word) + "\"" + Nearest.hint(word, known), right);
      }
    }
    return words;
  }

  List<String> texts(String key) {
    return texts(key, "a list of texts");
  }

  private List<String> texts(String key, String right) {
    List<String> texts = new ArrayList<>();
    for (JsonValue item : items(key, right)) {
      if (item instanceof JsonValue.Text text) {
        texts.add(text.text());
      } else {
        refuse(key, "holds " + item.noun(), right);
      }
    }
    return texts;
  }

  private List<JsonValue> items(String key, String right) {
    Optional<JsonValue> value = value(key, right);
    if (value.isPresent() && value.get() instanceof JsonValue.Items list) {
      return list.items();
    }
    value.ifPresent(other -> refuseValue(key, other, right));
    return List.of();
  }

  /** A decimal number; its exponent must be small enough to write it out. */
  Optional<BigDecimal> decimal(String key, String right) {
    Optional<JsonValue> value = value(key, right);
    if (value.isPresent() && value.get() instanceof JsonValue.Digits digits) {
      BigDecimal number = new BigDecimal(digits.digits());
      if (Math.abs((long) number.scale()) <= LARGEST_SCALE) {
        return Optional.of(number);
      }
    }
    value.ifPresent(other -> refuseValue(key, other, right));
    return Optional.empty();
  }

  /** A whole number from {@code least} to {@code most}, both included. */
  long whole(String key, long least, long most) {
    String right =
        "a whole number"
            + (least == Long.MIN_VALUE ? "" : " from " + least)
            + (most == Long.MAX_VALUE ? "" : " to " + most);
    Optional<BigDecimal> number = decimal(key, right);
    if (number.isEmpty()) {
      return least;
    }
    BigDecimal read = number.get();
    if (read.stripTrailingZeros().scale() > 0
        || read.compareTo(BigDecimal.valueOf(least)) < 0
        || read.compareTo(BigDecimal.valueOf(most)) > 0) {
      refuse(key, "is " + shown(read.toPlainString()), right);
      return least;
    }
    return read.longValueExact();
  }

  boolean flag(String key) {
    JsonValue value = value(key, "true or false").orElse(null);
    if (value instanceof JsonValue.Literal literal && !literal.word().equals("null")) {
      return literal.word().equals("true");
    }
    if (value != null) {
      refuseValue(key, value, "true or false");
    }
    return false;
  }

  /** An instant with its {@code Z}. */
  Instant instant(String key) {
    return stamp(key).orElse(Instant.EPOCH);
  }

  private Optional<Instant> stamp(String key) {
    String right = "UTC, such as 2031-09-01T00:00:00Z";
    Optional<String> text = read(key, right);
    if (text.isEmpty()) {
      return Optional.empty();
    }
    try {
      if (STAMP.matcher(text.get()).matches()) {
        return Optional.of(Instant.parse(text.get()));
      }
    } catch (DateTimeParseException e) {
      // Complained of below, like any other text that is no instant.
    }
    refuse(key, "is \"" + shown(text.get()) + "\"", right);
    return Optional.empty();
  }

  /** An instant on a whole second. */
  Instant second(String key) {
    Optional<Instant> instant = stamp(key);
    if (instant.isPresent()
        && !instant.get().equals(instant.get().truncatedTo(ChronoUnit.SECONDS))) {
      refuse(key, "is " + instant.get(), "a whole second: decisions are whole seconds");
    }
    return instant.orElse(Instant.EPOCH);
  }

  Optional<JsonFields> object(String key, List<String> known) {
    return value(key, "an object").flatMap(value -> inner(value, join(path, key), known));
  }

  private Optional<JsonFields> inner(JsonValue value, String innerPath, List<String> known) {
    Optional<JsonFields> fields = of(value, innerPath, problems, known, Optional.of(this));
    if (fields.isEmpty()) {
      spoil();
    }
    return fields;
  }

  /** The objects of a list; those that are none are complained of and left out. */
  List<JsonFields> objects(String key, List<String> known) {
    List<JsonValue> items = items(key, "a list");
    List<JsonFields> objects = new ArrayList<>();
    for (int i = 0; i < items.size(); i++) {
      Optional<JsonFields> fields = inner(items.get(i), join(path, key) + "[" + i + "]", known);
      fields.ifPresent(objects::add);
    }
    return objects;
  }
}
