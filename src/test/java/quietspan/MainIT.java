package quietspan;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import quietspan.fixture.PackagedProgram;
import quietspan.fixture.PackagedProgram.Outcome;

final class MainIT {
  @Test
  void versionIsOneLineAndNothingElse() throws Exception {
    Outcome outcome = PackagedProgram.run("--version");
    assertThat(outcome.exitCode()).isZero();
    assertThat(outcome.results()).matches("quietspan \\d+\\.\\d+\\.\\d+\\R");
    assertThat(outcome.remarks()).isEmpty();
  }

  @Test
  void usageErrorEndsWithTwoAndLeavesTheResultsEmpty() throws Exception {
    Outcome outcome = PackagedProgram.run("--no-such-option");
    assertThat(outcome.exitCode()).isEqualTo(2);
    assertThat(outcome.results()).isEmpty();
    assertThat(outcome.remarks()).contains("--no-such-option");
  }
}
