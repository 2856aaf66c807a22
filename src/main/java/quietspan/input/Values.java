package quietspan.input;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import quietspan.problem.Place;

/** The values of one block. A field that was complained about, or is absent, has none. */
final class Values {

  private final Spot spot;
  private final Map<Field<?>, Located<?>> read;

  Values(Spot spot, Map<Field<?>, Located<?>> read) {
    this.spot = spot;
    this.read = Map.copyOf(read);
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

  Place place() {
    return spot.place();
  }

  String path(Field<?> field) {
    return Block.join(spot.path(), field.key());
  }

  /** Complains about the block as a whole. */
  void refuse(String what, String right) {
    spot.refuse(what, right);
  }

  /** Complains about a field: at its value where it has one, else at the block. */
  void refuse(Field<?> field, String what, String right) {
    Located<?> value = read.get(field);
    spot.source()
        .problems()
        .error(value == null ? place() : value.place(), path(field), what, right);
  }
}
