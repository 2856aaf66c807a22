package quietspan.input;

import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.snakeyaml.engine.v2.nodes.ScalarNode;
import org.snakeyaml.engine.v2.nodes.Tag;

/**
 * A value that is one word or phrase. What YAML would make of it is not asked: a name may read
 * {@code no}, and a number is read with all its digits.
 */
abstract non-sealed class Scalar<T> implements Kind<T> {

  private static final Set<Tag> PLAIN = Set.of(Tag.STR, Tag.INT, Tag.FLOAT, Tag.BOOL);

  private final String noun;
  private final String example;

  Scalar(String noun, String example) {
    this.noun = noun;
    this.example = example;
  }

  abstract T parse(String text) throws Refusal;

  @Override
  public final String noun() {
    return noun;
  }

  final String example() {
    return example;
  }

  /** What would be right, for complaints. */
  final String right() {
    return noun + " such as " + example;
  }

  @Override
  public abstract Map<String, Object> schema();

  @Override
  public final Optional<T> read(Spot spot) {
    if (!(spot.node() instanceof ScalarNode scalar)) {
      spot.refuse("is " + YamlFile.shape(spot.node()) + " where one value is due", right());
      return Optional.empty();
    }
    if (scalar.getTag().equals(Tag.NULL)) {
      spot.refuse("has no value", right());
      return Optional.empty();
    }
    if (!PLAIN.contains(scalar.getTag())) {
      spot.refuse("carries the tag " + scalar.getTag().getValue(), right() + ", without a tag");
      return Optional.empty();
    }
    try {
      return Optional.of(parse(scalar.getValue().strip()));
    } catch (Refusal refusal) {
      spot.refuse(refusal.what(), refusal.right());
      return Optional.empty();
    }
  }
}
