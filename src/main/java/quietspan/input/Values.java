package quietspan.input;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import quietspan.problem.Place;

/** The values of one block. A field that was complained about, or is absent, has none. */
final class Values {

  private final Spot spot;
  private final Map<Field<?>, Located<?>> read;
  private final Map<Field<?>, Place> given;

  /**
   * @param read what could be read, defaults too
   * @param given where the fields stand that are in the file, readable or not
   */
  Values(Spot spot, Map<Field<?>, Located<?>> read, Map<Field<?>, Place> given) {
    this.spot = spot;
    this.read = Map.copyOf(read);
    this.given = Map.copyOf(given);
  }

  @SuppressWarnings("unchecked") // A field's value was read by the field's own kind.
  <T> Optional<Located<T>> located(Field<T> field) {
    return Optional.ofNullable((Located<T>) read.get(field));
  }

  <T> Optional<T> maybe(Field<T> field) {
    return located(field).map(Located::value);
  }

  /** A value that must be there once everything was read without complaint. */
  <T> T get(Field<T> field) {
    return maybe(field)
        .orElseThrow(
            () -> new IllegalStateException(path(field) + " was read before it was checked"));
  }

  /** The elements of a list that could be read; none when the list is absent. */
  <T> List<Located<T>> items(Field<List<Located<T>>> field) {
    return maybe(field).orElse(List.of());
  }

  /** The blocks of a list that could be read. */
  List<Values> blocks(Field<List<Located<Values>>> field) {
    return items(field).stream().map(Located::value).toList();
  }

  /** Whether the field stands in the file, even if it could not be read. */
  boolean has(Field<?> field) {
    return given.containsKey(field);
  }

  private Place place(Field<?> field) {
    return given.getOrDefault(field, spot.place());
  }

  private String path(Field<?> field) {
    return Block.join(spot.path(), field.key());
  }

  /** Complains about the block as a whole. */
  void refuse(String what, String right) {
    spot.refuse(what, right);
  }

  /** Complains about a field: at its value where it stands in the file, else at the block. */
  void refuse(Field<?> field, String what, String right) {
    spot.source().problems().error(place(field), path(field), what, right);
  }

  /** Remarks upon a field. */
  void remark(Field<?> field, String what, String right) {
    spot.source().problems().warning(place(field), path(field), what, right);
  }
}
