package quietspan.export;

import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;
import quietspan.model.Plan;
import quietspan.model.Scenario;
import quietspan.model.SightLines;

/** Everything that belongs into the folder of a plan. */
public final class PlanFiles {

  /** The file that makes a folder a plan. */
  public static final String PLAN = "plan.json";

  private PlanFiles() {}

  /**
   * The bytes of every file by its path in the folder, with forward slashes: {@code plan.json},
   * tables under {@code csv} and calendars under {@code calendars}. The same arguments give the
   * same bytes everywhere.
   */
  public static SortedMap<String, byte[]> of(Scenario scenario, SightLines sightLines, Plan plan) {
    List<ContactClocks> clocks =
        plan.decisions().contacts().stream()
            .map(contact -> ContactClocks.of(scenario, sightLines, contact))
            .toList();
    SortedMap<String, byte[]> files = new TreeMap<>();
    files.put(PLAN, utf8(PlanJson.write(scenario, sightLines, plan)));
    PlanTables.of(scenario, plan, clocks)
        .forEach((name, table) -> files.put("csv/" + name + ".csv", utf8(table.csv())));
    PlanCalendars.of(scenario, plan, clocks)
        .forEach((name, sheet) -> files.put("calendars/" + name + ".ics", sheet.write()));
    return files;
  }

  private static byte[] utf8(String text) {
    return text.getBytes(StandardCharsets.UTF_8);
  }
}
