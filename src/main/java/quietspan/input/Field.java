package quietspan.input;

import java.util.Optional;

/**
 * One row of the field table of an input file, and the key to its value in {@link Values}.
 *
 * @param <T> what the value becomes
 */
final class Field<T> {

  private final String key;
  private final Kind<T> kind;
  private final boolean required;
  private final Optional<String> standard;
  private final String sentence;

  private Field(
      String key, Kind<T> kind, boolean required, Optional<String> standard, String sentence) {
    this.key = key;
    this.kind = kind;
    this.required = required;
    this.standard = standard;
    this.sentence = sentence;
  }

  static <T> Field<T> required(String key, Kind<T> kind, String sentence) {
    return new Field<>(key, kind, true, Optional.empty(), sentence);
  }

  static <T> Field<T> optional(String key, Kind<T> kind, String sentence) {
    return new Field<>(key, kind, false, Optional.empty(), sentence);
  }

  /**
   * @param standard the value when the field is absent, written as it would be in the file
   */
  static <T> Field<T> standard(String key, Kind<T> kind, String standard, String sentence) {
    return new Field<>(key, kind, false, Optional.of(standard), sentence);
  }

  String key() {
    return key;
  }

  Kind<T> kind() {
    return kind;
  }

  boolean isRequired() {
    return required;
  }

  /** The value when the field is absent, as it would be written. */
  Optional<String> standard() {
    return standard;
  }

  /** What it means, in one sentence. */
  String sentence() {
    return sentence;
  }

  @Override
  public String toString() {
    return key;
  }
}
