package quietspan.input;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * The input files as JSON Schema (draft 7), by which editors complete and check while one writes.
 * The schemas ship as resources beside this class, under the name of the file with {@code
 * .schema.json} in place of {@code .yaml}; a schema knows single fields only, not what must go
 * together.
 */
public final class ScenarioSchema {

  private ScenarioSchema() {}

  /** The schema of each input file, by the name of its resource. */
  public static Map<String, String> texts() {
    Map<String, String> texts = new LinkedHashMap<>();
    ScenarioFiles.tables().forEach((file, table) -> texts.put(resource(file), text(file, table)));
    return texts;
  }

  private static String resource(String file) {
    return file.replace(".yaml", ".schema.json");
  }

  private static String text(String file, Block table) {
    Map<String, Object> schema = new LinkedHashMap<>();
    schema.put("$schema", "http://json-schema.org/draft-07/schema#");
    schema.put("title", file);
    schema.put("description", "Scenario file " + file + ": " + table.noun() + ".");
    schema.putAll(table.schema());
    DefaultIndenter indenter = new DefaultIndenter("  ", "\n");
    DefaultPrettyPrinter printer =
        new DefaultPrettyPrinter().withObjectIndenter(indenter).withArrayIndenter(indenter);
    try {
      return new ObjectMapper().writer(printer).writeValueAsString(schema) + "\n";
    } catch (JsonProcessingException e) {
      throw new IllegalStateException("a schema is made of texts, numbers, lists and maps", e);
    }
  }
}
