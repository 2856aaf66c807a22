package quietspan.input;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.SequenceNode;
import org.snakeyaml.engine.v2.nodes.Tag;

/** A list whose elements are all of one kind. Elements that cannot be taken are left out. */
final class Items<T> implements Kind<List<Located<T>>> {

  private final Kind<T> element;
  private final int least;

  private Items(Kind<T> element, int least) {
    this.element = element;
    this.least = least;
  }

  static <T> Items<T> of(Kind<T> element) {
    return new Items<>(element, 0);
  }

  static <T> Items<T> atLeastOne(Kind<T> element) {
    return new Items<>(element, 1);
  }

  Kind<T> element() {
    return element;
  }

  @Override
  public String noun() {
    return "a list, each " + element.noun();
  }

  @Override
  public Optional<List<Located<T>>> read(Spot spot) {
    if (!(spot.node() instanceof SequenceNode sequence) || !spot.node().getTag().equals(Tag.SEQ)) {
      spot.refuse("is " + YamlFile.shape(spot.node()) + " where a list is due", noun());
      return Optional.empty();
    }
    if (sequence.getValue().size() < least) {
      spot.refuse("is empty", "at least one element");
      return Optional.empty();
    }
    List<Located<T>> elements = new ArrayList<>();
    for (int i = 0; i < sequence.getValue().size(); i++) {
      Node node = sequence.getValue().get(i);
      Spot inner = spot.child(node, spot.path() + "[" + i + "]");
      element
          .read(inner)
          .ifPresent(
              value ->
                  elements.add(new Located<>(value, inner.place(), inner.path(), spot.source())));
    }
    return Optional.of(List.copyOf(elements));
  }

  @Override
  public Map<String, Object> schema() {
    Map<String, Object> schema = new LinkedHashMap<>();
    schema.put("type", "array");
    schema.put("items", element.schema());
    if (least > 0) {
      schema.put("minItems", least);
    }
    return schema;
  }
}
