package quietspan.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.nio.file.AccessDeniedException;
import java.util.List;
import java.util.concurrent.CancellationException;
import org.junit.jupiter.api.Test;
import picocli.CommandLine;
import quietspan.problem.InputException;
import quietspan.problem.Place;
import quietspan.problem.Problem;

final class FaultsTest {
  private final StringWriter remarks = new StringWriter();

  private int handle(Throwable fault, boolean verbose) {
    CommandLine command = new CommandLine(CommandLine.Model.CommandSpec.create());
    command.setErr(new PrintWriter(remarks));
    return Faults.handle(fault, command, verbose);
  }

  @Test
  void everyComplaintHasItsLine() {
    Problem first = Problem.error(new Place("a.yaml", 1, 2), "x", "is wrong", "right");
    Problem second = Problem.warning(new Place("b.yaml", 3, 4), "y", "is odd", "");
    assertThat(handle(new InputException(List.of(first, second)), false)).isEqualTo(2);
    assertThat(remarks.toString().lines())
        .containsExactly("a.yaml:1:2: x: is wrong (right)", "b.yaml:3:4: warning: y: is odd");
  }

  @Test
  void ourOwnFaultIsOneLineWithoutATrace() {
    assertThat(handle(new IllegalStateException("seven\nlines"), false)).isEqualTo(1);
    assertThat(remarks.toString().lines()).hasSize(1);
    assertThat(remarks.toString()).contains("our own fault", "seven").doesNotContain("\tat ");
  }

  @Test
  void verboseShowsTheTrace() {
    assertThat(handle(new IllegalStateException("seven"), true)).isEqualTo(1);
    assertThat(remarks.toString()).contains("\tat quietspan.cli.FaultsTest");
  }

  @Test
  void memoryThatRunsOutIsOurFaultToo() {
    assertThat(handle(new OutOfMemoryError("heap"), false)).isEqualTo(1);
  }

  @Test
  void aFileThatMayNotBeWrittenIsAnInputError() {
    assertThat(handle(new UncheckedIOException(new AccessDeniedException("/x/plan.json")), false))
        .isEqualTo(2);
    assertThat(remarks.toString()).isEqualToIgnoringNewLines("/x/plan.json: access denied");
  }

  @Test
  void beingStoppedWithNothingToDeliverIsSaid() {
    assertThat(handle(new CancellationException(), false)).isEqualTo(130);
  }
}
