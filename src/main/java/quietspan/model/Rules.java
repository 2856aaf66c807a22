package quietspan.model;

import java.util.List;
import java.util.Optional;

/**
 * Everything a scenario asks of its plans besides the calendars.
 *
 * @param link absent when every craft has a plain rate table
 * @param classes data classes in order of priority
 */
public record Rules(
    ScienceRules science,
    ContactRules contacts,
    DataRules data,
    Margins margins,
    Optional<LinkBudget> link,
    List<DataClass> classes) {

  public Rules {
    classes = List.copyOf(classes);
  }

  public DataClass dataClass(String name) {
    return classes.stream()
        .filter(candidate -> candidate.name().equals(name))
        .findFirst()
        .orElseThrow(() -> new IllegalArgumentException("no data class " + name));
  }
}
