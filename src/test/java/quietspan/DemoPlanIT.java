package quietspan;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import quietspan.fixture.PackagedProgram;

/** The committed demo plan is what the packaged program makes of the demo, byte for byte. */
final class DemoPlanIT {

  private static final Path DEMO = Path.of("stations-demo").toAbsolutePath();
  private static final Path COMMITTED = Path.of("plans", "sallow-triad").toAbsolutePath();

  @TempDir private Path folder;

  private static Map<String, String> contents(Path plan) throws IOException {
    Map<String, String> all = new TreeMap<>();
    try (Stream<Path> entries = Files.walk(plan)) {
      for (Path entry : entries.filter(Files::isRegularFile).toList()) {
        all.put(
            plan.relativize(entry).toString(), HexFormat.of().formatHex(Files.readAllBytes(entry)));
      }
    }
    return all;
  }

  private void isReproduced(Path from, Path scenario, List<String> options) throws Exception {
    Path plan = folder.resolve("plan");
    PackagedProgram.Outcome outcome =
        PackagedProgram.run(from, options, "plan", scenario.toString(), "--out", plan.toString());
    assertThat(outcome.remarks()).isEmpty();
    assertThat(outcome.exitCode()).isZero();
    Map<String, String> made = contents(plan);
    Map<String, String> committed = contents(COMMITTED);
    assertThat(made.keySet()).isEqualTo(committed.keySet()).contains("plan.json");
    for (String file : committed.keySet()) {
      assertThat(made.get(file).equals(committed.get(file))).as("%s is the same", file).isTrue();
    }
  }

  @Test
  void fromTheTopOfTheRepository() throws Exception {
    isReproduced(Path.of("").toAbsolutePath(), Path.of("stations-demo"), List.of());
  }

  /** Turkish upper case, a zone half an hour off the hour, and no second processor to run ahead. */
  @Test
  void fromAnotherFolderWithAnotherLocaleAndZoneOnOneProcessor() throws Exception {
    Path copy = Files.createDirectory(folder.resolve("copy of the demo"));
    try (Stream<Path> entries = Files.walk(DEMO)) {
      for (Path entry : entries.toList()) {
        Path there = copy.resolve(DEMO.relativize(entry).toString());
        if (Files.isDirectory(entry)) {
          Files.createDirectories(there);
        } else {
          Files.copy(entry, there);
        }
      }
    }
    isReproduced(
        folder,
        copy,
        List.of(
            "-Duser.language=tr",
            "-Duser.country=TR",
            "-Duser.timezone=Asia/Kolkata",
            "-XX:ActiveProcessorCount=1"));
  }
}
