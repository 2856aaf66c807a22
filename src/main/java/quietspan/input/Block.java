package quietspan.input;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.NodeTuple;
import org.snakeyaml.engine.v2.nodes.ScalarNode;
import org.snakeyaml.engine.v2.nodes.Tag;
import quietspan.problem.Nearest;
import quietspan.problem.Place;

/** A mapping with known keys: the field table of a file, or of a part of it. */
final class Block implements Kind<Values> {

  /** Fields of which exactly one must stand in the file. */
  private record Choice(List<Field<?>> fields, boolean needed) {}

  private final String noun;
  private final List<Field<?>> fields;
  private final List<Choice> choices;

  private Block(String noun, List<Field<?>> fields, List<Choice> choices) {
    this.noun = noun;
    this.fields = List.copyOf(fields);
    this.choices = List.copyOf(choices);
  }

  /**
   * @param noun what it describes, with its article
   */
  static Block of(String noun, Field<?>... fields) {
    return new Block(noun, List.of(fields), List.of());
  }

  /** The same block, in which exactly one of the fields must be given. */
  Block exactlyOne(Field<?>... alternatives) {
    return with(new Choice(List.of(alternatives), true));
  }

  /** The same block, in which at most one of the fields may be given. */
  Block atMostOne(Field<?>... alternatives) {
    return with(new Choice(List.of(alternatives), false));
  }

  private Block with(Choice choice) {
    List<Choice> more = new ArrayList<>(choices);
    more.add(choice);
    return new Block(noun, fields, more);
  }

  List<Field<?>> fields() {
    return fields;
  }

  /** Whether every field that must be there, or has a default, could be read. */
  boolean isWhole(Values values) {
    return fields.stream()
        .filter(field -> field.isRequired() || field.standard().isPresent())
        .allMatch(field -> values.maybe(field).isPresent());
  }

  /**
   * The choices that a field takes part in, such as {@code exactly one of mask, mask_by_azimuth}.
   */
  List<String> choicesWith(Field<?> field) {
    return choices.stream()
        .filter(choice -> choice.fields().contains(field))
        .map(Block::words)
        .toList();
  }

  private static String words(Choice choice) {
    return (choice.needed() ? "exactly one of " : "at most one of ")
        + String.join(", ", choice.fields().stream().map(Field::key).toList());
  }

  @Override
  public String noun() {
    return noun;
  }

  static String join(String path, String key) {
    return path.isEmpty() ? key : path + "." + key;
  }

  @Override
  public Optional<Values> read(Spot spot) {
    if (!(spot.node() instanceof MappingNode mapping) || !spot.node().getTag().equals(Tag.MAP)) {
      spot.refuse(
          "is " + YamlFile.shape(spot.node()) + " where " + noun + " is due", keysInWords());
      return Optional.empty();
    }
    Map<String, Node> given = new LinkedHashMap<>();
    for (NodeTuple tuple : mapping.getValue()) {
      take(tuple, given, spot);
    }
    Map<Field<?>, Located<?>> read = new LinkedHashMap<>();
    Map<Field<?>, Place> places = new LinkedHashMap<>();
    for (Field<?> field : fields) {
      Node node = given.get(field.key());
      if (node != null) {
        places.put(field, Spot.place(node, spot.source()));
      }
      read(field, node, spot).ifPresent(value -> read.put(field, value));
    }
    for (Choice choice : choices) {
      long count = choice.fields().stream().filter(field -> given.containsKey(field.key())).count();
      if (count > 1 || (choice.needed() && count == 0)) {
        spot.refuse(count == 0 ? "lacks a choice" : "has too many choices", words(choice));
      }
    }
    return Optional.of(new Values(spot, read, places));
  }

  private String keysInWords() {
    return "the keys " + String.join(", ", fields.stream().map(Field::key).toList());
  }

  private void take(NodeTuple tuple, Map<String, Node> given, Spot spot) {
    Node keyNode = tuple.getKeyNode();
    if (!(keyNode instanceof ScalarNode scalar)) {
      spot.child(keyNode, spot.path())
          .refuse("has " + YamlFile.shape(keyNode) + " for a key", "a key is a word");
      return;
    }
    String key = scalar.getValue();
    Spot at = spot.child(keyNode, join(spot.path(), shown(key)));
    List<String> known = fields.stream().map(Field::key).toList();
    if (!known.contains(key)) {
      at.refuse(
          "is not known here" + Nearest.hint(key, known), "one of " + String.join(", ", known));
    } else if (given.putIfAbsent(key, tuple.getValueNode()) != null) {
      at.refuse("stands here a second time", "each key once");
    }
  }

  /** A key as it may stand in a complaint. */
  private static String shown(String key) {
    String quoted = Refusal.quoted(key);
    return quoted.substring(1, quoted.length() - 1);
  }

  private <T> Optional<Located<T>> read(Field<T> field, Node node, Spot spot) {
    String path = join(spot.path(), field.key());
    if (node != null) {
      Spot inner = spot.child(node, path);
      return field
          .kind()
          .read(inner)
          .map(value -> new Located<>(value, inner.place(), path, spot.source()));
    }
    if (field.isRequired()) {
      spot.refuse("lacks " + field.key(), field.key() + ": " + needed(field));
      return Optional.empty();
    }
    return field
        .standard()
        .flatMap(
            text ->
                field
                    .kind()
                    .read(new Spot(YamlFile.parsed(text), spot.place(), path, spot.source())))
        .map(value -> new Located<>(value, spot.place(), path, spot.source()));
  }

  private static String needed(Field<?> field) {
    return field.kind() instanceof Scalar<?> scalar ? scalar.right() : field.kind().noun();
  }

  @Override
  public Map<String, Object> schema() {
    Map<String, Object> properties = new LinkedHashMap<>();
    List<String> required = new ArrayList<>();
    for (Field<?> field : fields) {
      Map<String, Object> schema = new LinkedHashMap<>();
      schema.put("description", description(field));
      schema.putAll(field.kind().schema());
      properties.put(field.key(), schema);
      if (field.isRequired()) {
        required.add(field.key());
      }
    }
    Map<String, Object> schema = new LinkedHashMap<>();
    schema.put("type", "object");
    schema.put("additionalProperties", false);
    if (!required.isEmpty()) {
      schema.put("required", required);
    }
    if (!choices.isEmpty()) {
      schema.put("allOf", choices.stream().map(Block::schema).toList());
    }
    schema.put("properties", properties);
    return schema;
  }

  private static String description(Field<?> field) {
    String limits = field.kind() instanceof Quantity<?> quantity ? quantity.limits() : "";
    return field.sentence()
        + (limits.isEmpty() ? "" : " Limits: " + limits + ".")
        + field.standard().map(text -> " Default: " + text + ".").orElse("");
  }

  private static Map<String, Object> schema(Choice choice) {
    List<Map<String, Object>> alternatives = new ArrayList<>();
    for (Field<?> field : choice.fields()) {
      alternatives.add(Map.of("required", List.of(field.key())));
    }
    if (!choice.needed()) {
      alternatives.add(Map.of("not", Map.of("anyOf", List.copyOf(alternatives))));
    }
    return Map.of("oneOf", alternatives);
  }
}
