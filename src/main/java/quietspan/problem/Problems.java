package quietspan.problem;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/** Gathers complaints while input is read, so that all of them can be shown at once. */
public final class Problems {

  private final List<Problem> found = new ArrayList<>();

  public void add(Problem problem) {
    found.add(problem);
  }

  public void error(Place place, String field, String what, String right) {
    add(Problem.error(place, field, what, right));
  }

  public void warning(Place place, String field, String what, String right) {
    add(Problem.warning(place, field, what, right));
  }

  public boolean hasErrors() {
    return found.stream().anyMatch(problem -> problem.level() == Problem.Level.ERROR);
  }

  /** Everything gathered so far, sorted by file, line and column. */
  public List<Problem> sorted() {
    return found.stream().sorted(Comparator.comparing(Problem::place)).toList();
  }

  public List<Problem> warnings() {
    return sorted().stream().filter(problem -> problem.level() == Problem.Level.WARNING).toList();
  }

  /** Throws all complaints when at least one of them is an error. */
  public void throwIfErrors() {
    if (hasErrors()) {
      throw new InputException(sorted());
    }
  }
}
