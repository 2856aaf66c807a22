package quietspan.input;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ScenarioSchemaTest {

  /** The shipped schemas are renewed with {@code -Dgolden=update}. */
  @ParameterizedTest
  @ValueSource(strings = {"mission", "stations", "state"})
  void theShippedSchemaIsTheOneOfTheFieldTable(String file) throws IOException {
    String name = file + ".schema.json";
    Map<String, String> texts = ScenarioSchema.texts();
    if ("update".equals(System.getProperty("golden"))) {
      Path folder = Path.of("src", "main", "resources", "quietspan", "input");
      Files.createDirectories(folder);
      Files.writeString(folder.resolve(name), texts.get(name));
      assertThat(Files.readString(folder.resolve(name))).isEqualTo(texts.get(name));
      return;
    }
    try (InputStream shipped = ScenarioSchema.class.getResourceAsStream(name)) {
      assertThat(shipped).as("the resource %s", name).isNotNull();
      assertThat(new String(shipped.readAllBytes(), StandardCharsets.UTF_8))
          .isEqualTo(texts.get(name));
    }
  }
}
