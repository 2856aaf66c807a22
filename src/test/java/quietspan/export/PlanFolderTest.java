package quietspan.export;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.function.Consumer;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import quietspan.problem.InputException;

final class PlanFolderTest {

  /** Stands for the end of the process: nothing after it runs. */
  private static final class Killed extends Error {
    private static final long serialVersionUID = 1L;
  }

  @TempDir private Path parent;

  private Path folder() {
    return parent.resolve("plan");
  }

  private static SortedMap<String, byte[]> files(String content, int tables) {
    SortedMap<String, byte[]> files = new TreeMap<>();
    files.put("plan.json", content.getBytes(StandardCharsets.UTF_8));
    for (int i = 0; i < tables; i++) {
      files.put("csv/" + content + i + ".csv", content.getBytes(StandardCharsets.UTF_8));
    }
    return files;
  }

  private static final SortedMap<String, byte[]> OLD = files("old", 3);
  private static final SortedMap<String, byte[]> NEW = files("new", 2);

  private static Map<String, String> content(Path folder) throws IOException {
    Map<String, String> content = new TreeMap<>();
    try (Stream<Path> entries = Files.walk(folder)) {
      for (Path entry : entries.filter(Files::isRegularFile).toList()) {
        content.put(folder.relativize(entry).toString(), Files.readString(entry));
      }
    }
    return content;
  }

  private static Map<String, String> text(SortedMap<String, byte[]> files) {
    Map<String, String> text = new TreeMap<>();
    files.forEach((name, bytes) -> text.put(name, new String(bytes, StandardCharsets.UTF_8)));
    return text;
  }

  private void assertNothingBeside() throws IOException {
    try (Stream<Path> entries = Files.list(parent)) {
      assertThat(entries.map(entry -> entry.getFileName().toString()).toList()).isSubsetOf("plan");
    }
  }

  /** Ends at the nth step that is reached. */
  private static Consumer<PlanFolder.Step> killAt(int nth) {
    int[] reached = {0};
    return step -> {
      if (reached[0]++ == nth) {
        throw new Killed();
      }
    };
  }

  /** Returns how many steps a replacement takes. */
  private int steps(Path anywhere) {
    int[] steps = {0};
    PlanFolder.replace(anywhere, OLD);
    PlanFolder.replace(anywhere, NEW, step -> steps[0]++);
    return steps[0];
  }

  @Test
  void oldOrNewIsWholeWhereverTheProcessEnds(@TempDir Path elsewhere) throws IOException {
    int steps = steps(elsewhere.resolve("count"));
    int kept = 0;
    for (int nth = 0; nth < steps; nth++) {
      PlanFolder.replace(folder(), OLD);
      int at = nth;
      assertThatThrownBy(() -> PlanFolder.replace(folder(), NEW, killAt(at)))
          .isInstanceOf(Killed.class);
      PlanFolder.recover(folder());
      Map<String, String> content = content(folder());
      assertThat(content).isIn(text(OLD), text(NEW));
      kept += content.equals(text(OLD)) ? 1 : 0;
      assertNothingBeside();
    }
    // Three files and the journal are announced before the point of no return.
    assertThat(kept).isEqualTo(4);
  }

  /** Recovery may itself be cut off: at any step, and again, until one gets through. */
  @Test
  void aReplacementAfterACutOffOneSucceeds(@TempDir Path elsewhere) throws IOException {
    int steps = steps(elsewhere.resolve("count"));
    for (int first = 0; first < steps; first++) {
      for (int second = 0; second < steps; second++) {
        PlanFolder.replace(folder(), OLD);
        kill(first);
        kill(second);
        PlanFolder.recover(folder());
        assertThat(content(folder())).isIn(text(OLD), text(NEW));
        PlanFolder.replace(folder(), NEW);
        assertThat(content(folder())).isEqualTo(text(NEW));
        assertNothingBeside();
      }
    }
  }

  private void kill(int nth) {
    try {
      PlanFolder.replace(folder(), NEW, killAt(nth));
    } catch (Killed e) {
      // As asked; after a recovery there may be fewer steps left than that.
    }
  }

  @Test
  void aFirstPlanThatIsCutOffLeavesNothingOrAll() throws IOException {
    for (int nth = 0; nth < 8; nth++) {
      kill(nth);
      PlanFolder.recover(folder());
      if (Files.exists(folder())) {
        assertThat(content(folder())).isEqualTo(text(NEW));
      }
      assertNothingBeside();
      Files.deleteIfExists(folder().resolve("x"));
    }
  }

  @Test
  void whatIsSomebodyElsesIsNeverReplaced() throws IOException {
    Files.createDirectories(folder());
    Files.writeString(folder().resolve("notes.txt"), "mine");
    assertThatThrownBy(() -> PlanFolder.replace(folder(), NEW))
        .isInstanceOf(InputException.class)
        .hasMessageContaining("notes.txt");
    assertThat(content(folder())).isEqualTo(Map.of("notes.txt", "mine"));
    assertNothingBeside();
  }

  @Test
  void aFileIsNoFolder() throws IOException {
    Files.writeString(folder(), "mine");
    assertThatThrownBy(() -> PlanFolder.replace(folder(), NEW))
        .isInstanceOf(InputException.class)
        .hasMessageContaining("is no folder");
    assertThat(Files.readString(folder())).isEqualTo("mine");
  }

  @Test
  void anEmptyFolderAndMissingParentsWillDo() throws IOException {
    Path deep = parent.resolve("plan").resolve("a").resolve("b");
    PlanFolder.replace(deep, NEW);
    assertThat(content(deep)).isEqualTo(text(NEW));
    Path empty = Files.createDirectory(parent.resolve("plan").resolve("empty"));
    PlanFolder.replace(empty, NEW);
    assertThat(content(empty)).isEqualTo(text(NEW));
  }

  @Test
  void aLinkStaysALink() throws IOException {
    Path target = Files.createDirectory(parent.resolve("plan")).resolve("real");
    Path link = parent.resolve("plan").resolve("link");
    PlanFolder.replace(target, OLD);
    Files.createSymbolicLink(link, Path.of("real"));
    PlanFolder.replace(link, NEW);
    assertThat(link).isSymbolicLink();
    assertThat(content(target)).isEqualTo(text(NEW));
  }
}
