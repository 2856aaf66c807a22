package quietspan.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.PrintWriter;
import java.io.StringWriter;
import org.junit.jupiter.api.Test;

final class QuietspanCommandTest {
  private final StringWriter results = new StringWriter();
  private final StringWriter remarks = new StringWriter();

  @Test
  void versionIsTheBuildsOwn() {
    assertThat(run("--version")).isZero();
    assertThat(results.toString()).matches("quietspan \\d+\\.\\d+\\.\\d+\\R");
    assertThat(remarks.toString()).isEmpty();
  }

  @Test
  void helpGoesToTheResults() {
    assertThat(run("--help")).isZero();
    assertThat(results.toString()).startsWith("Usage: quietspan");
    assertThat(remarks.toString()).isEmpty();
  }

  @Test
  void noCommandIsAUsageError() {
    assertThat(run()).isEqualTo(2);
    assertThat(results.toString()).isEmpty();
    assertThat(remarks.toString()).startsWith("Missing command");
  }

  @Test
  void unknownOptionIsAUsageError() {
    assertThat(run("--no-such-option")).isEqualTo(2);
    assertThat(results.toString()).isEmpty();
    assertThat(remarks.toString()).contains("--no-such-option");
  }

  private int run(String... arguments) {
    return QuietspanCommand.run(new PrintWriter(results), new PrintWriter(remarks), arguments);
  }
}
