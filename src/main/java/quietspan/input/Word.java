package quietspan.input;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import quietspan.problem.Nearest;

/** One of a few words, each of which stands for a value. */
final class Word<T> extends Scalar<T> {

  private final Map<String, T> choices;

  private Word(Map<String, T> choices) {
    super("one of " + String.join(", ", choices.keySet()), choices.keySet().iterator().next());
    this.choices = choices;
  }

  static <T> Word<T> of(String first, T firstValue, String second, T secondValue) {
    Map<String, T> choices = new LinkedHashMap<>();
    choices.put(first, firstValue);
    choices.put(second, secondValue);
    return new Word<>(choices);
  }

  /** The constants of an enumeration in lower case. */
  static <E extends Enum<E>> Word<E> of(Class<E> type) {
    Map<String, E> choices = new LinkedHashMap<>();
    for (E constant : type.getEnumConstants()) {
      choices.put(constant.name().toLowerCase(java.util.Locale.ROOT), constant);
    }
    return new Word<>(choices);
  }

  @Override
  T parse(String text) throws Refusal {
    T value = choices.get(text);
    if (value == null) {
      throw new Refusal(
          Refusal.quoted(text) + " is not known here" + Nearest.hint(text, choices.keySet()),
          noun());
    }
    return value;
  }

  @Override
  public Map<String, Object> schema() {
    return Map.of("enum", List.copyOf(choices.keySet()));
  }
}
