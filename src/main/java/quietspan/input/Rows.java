package quietspan.input;

import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import quietspan.problem.Nearest;

/** Checks of the blocks of a list against each other, and of names against those that are known. */
final class Rows {

  private Rows() {}

  /** The values of a field; a value that stands twice is complained about at its second place. */
  static <T> List<T> distinct(List<Values> rows, Field<T> field) {
    List<T> seen = new ArrayList<>();
    for (Values row : rows) {
      Optional<T> value = row.maybe(field);
      if (value.isPresent() && seen.contains(value.get())) {
        row.refuse(
            field, Refusal.quoted(value.get().toString()) + " stands here a second time", "once");
      } else {
        value.ifPresent(seen::add);
      }
    }
    return seen;
  }

  /** Complains about each value that is not above the one before. */
  static <T extends Comparable<? super T>> void rising(List<Values> rows, Field<T> field) {
    T before = null;
    for (Values row : rows) {
      Optional<T> value = row.maybe(field);
      if (value.isPresent() && before != null && before.compareTo(value.get()) >= 0) {
        row.refuse(field, "is not above the one before", "rising order");
      }
      before = value.orElse(before);
    }
  }

  /** Complains about each value that is not below the one before. */
  static <T extends Comparable<? super T>> void falling(List<Values> rows, Field<T> field) {
    T before = null;
    for (Values row : rows) {
      Optional<T> value = row.maybe(field);
      if (value.isPresent() && before != null && before.compareTo(value.get()) <= 0) {
        row.refuse(field, "is not below the one before", "falling order");
      }
      before = value.orElse(before);
    }
  }

  /** Complains when a name is not among the known ones, with the nearest of them. */
  static boolean known(Values where, Field<String> field, String name, Collection<String> names) {
    if (names.contains(name)) {
      return true;
    }
    where.refuse(
        field, Refusal.quoted(name) + " is not known" + Nearest.hint(name, names), words(names));
    return false;
  }

  /** The known names, for complaints. */
  static String words(Collection<String> names) {
    return names.isEmpty() ? "no name is known" : "one of " + String.join(", ", names);
  }
}
