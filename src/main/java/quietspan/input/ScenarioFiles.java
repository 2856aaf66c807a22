package quietspan.input;

import java.util.LinkedHashMap;
import java.util.Map;

/** The YAML files of a scenario. */
final class ScenarioFiles {

  private ScenarioFiles() {}

  /** The field table of each file, by its name. */
  static Map<String, Block> tables() {
    Map<String, Block> tables = new LinkedHashMap<>();
    tables.put(MissionFields.FILE, MissionFields.TABLE);
    tables.put(StationFields.FILE, StationFields.TABLE);
    tables.put(StateFields.FILE, StateFields.TABLE);
    return tables;
  }
}
