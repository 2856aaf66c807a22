package quietspan;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;

/** Starts the packaged program as a user would. */
final class MainIT {
  @Test
  void versionPrintsOneLineAndNothingElse() throws Exception {
    Outcome outcome = quietspan("--version");
    assertThat(outcome.exitCode()).isZero();
    assertThat(outcome.text()).matches("quietspan \\d+\\.\\d+\\.\\d+\\R");
  }

  @Test
  void usageErrorEndsWithTwo() throws Exception {
    assertThat(quietspan("--no-such-option").exitCode()).isEqualTo(2);
  }

  private record Outcome(int exitCode, String text) {}

  private static Outcome quietspan(String... arguments) throws IOException, InterruptedException {
    List<String> line = new ArrayList<>();
    line.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
    line.add("-jar");
    line.add(System.getProperty("quietspan.jar"));
    line.addAll(List.of(arguments));
    Process process = new ProcessBuilder(line).redirectErrorStream(true).start();
    process.getOutputStream().close();
    String text = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
    assertThat(process.waitFor(60, TimeUnit.SECONDS)).isTrue();
    return new Outcome(process.exitValue(), text);
  }
}
