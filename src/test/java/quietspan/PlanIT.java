package quietspan;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import quietspan.fixture.PackagedProgram;
import quietspan.fixture.SmallScenario;

/** The packaged program plans and checks as a user would have it do. */
final class PlanIT {

  @Test
  void thePackagedProgramPlansAndChecks(@TempDir Path folder) throws Exception {
    Path scenario = SmallScenario.write(folder.resolve("small"));
    Path plan = folder.resolve("plan");
    PackagedProgram.Outcome planned =
        PackagedProgram.run("plan", scenario.toString(), "--out", plan.toString(), "--effort", "0");
    assertThat(planned.remarks()).isEmpty();
    assertThat(planned.exitCode()).isZero();
    assertThat(planned.results()).startsWith("LEGAL plan for Sallow Triad");
    // The scenario lies beside the plan, where the check looks for it.
    PackagedProgram.Outcome checked = PackagedProgram.run("check", plan.toString());
    assertThat(checked.remarks()).isEmpty();
    assertThat(checked.exitCode()).isZero();
    assertThat(checked.results()).startsWith("LEGAL plan ");
  }
}
