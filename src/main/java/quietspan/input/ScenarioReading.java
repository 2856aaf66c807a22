package quietspan.input;

import java.util.List;
import quietspan.model.Scenario;
import quietspan.problem.Problem;

/**
 * What came of reading a scenario folder.
 *
 * @param warnings remarks that do not stand in the way, by file and line
 */
public record ScenarioReading(Scenario scenario, List<Problem> warnings) {

  public ScenarioReading {
    warnings = List.copyOf(warnings);
  }
}
