package quietspan.cli;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import quietspan.fixture.SmallScenario;

/** The commands that make and judge plans. */
final class PlanCommandsTest {

  @TempDir private static Path shared;

  private static Path scenario;
  private static Path plan;
  private static Ran planned;

  private record Ran(int exit, String results, String remarks) {}

  private static Ran run(Object... arguments) {
    StringWriter results = new StringWriter();
    StringWriter remarks = new StringWriter();
    String[] words = new String[arguments.length];
    for (int i = 0; i < words.length; i++) {
      words[i] = arguments[i].toString();
    }
    int exit = QuietspanCommand.run(new PrintWriter(results), new PrintWriter(remarks), words);
    return new Ran(exit, results.toString(), remarks.toString());
  }

  @BeforeAll
  static void planOnce() throws IOException {
    scenario = SmallScenario.write(shared.resolve("small"));
    plan = shared.resolve("plan");
    planned = run("plan", scenario, "--out", plan, "--effort", "0");
  }

  @Test
  void aLegalPlanEndsWithZeroAndOneScreen() {
    assertThat(planned.exit()).isZero();
    assertThat(planned.results())
        .startsWith("LEGAL plan for Sallow Triad, 2031-09-01 to 2031-09-05 on board (4 days)\n")
        .contains("Files in " + plan + ": plan.json, csv/, calendars/");
    assertThat(planned.results().lines()).hasSizeLessThan(50);
  }

  @Test
  void nothingIsRemarkedWithoutATerminal() {
    assertThat(planned.remarks()).isEmpty();
  }

  @Test
  void whatIsWrittenIsJudgedLegal() {
    Ran ran = run("check", plan, "--scenario", scenario);
    assertThat(ran.exit()).isZero();
    assertThat(ran.results())
        .startsWith("LEGAL plan " + plan + ", held against " + scenario)
        .contains("Nearest to the limits:", "off-pointing", "Sampled at least every 30 s");
  }

  @Test
  void aVerdictInJsonHasSummaryFindingsAndMargins() throws IOException {
    Ran ran = run("check", plan, "--scenario", scenario, "--json");
    assertThat(ran.exit()).isZero();
    JsonNode verdict = new ObjectMapper().readTree(ran.results());
    assertThat(verdict.get("passed").asBoolean()).isTrue();
    assertThat(verdict.at("/summary/status").asText()).isEqualTo("legal");
    assertThat(verdict.get("findings")).isEmpty();
    assertThat(verdict.at("/margins/off_pointing_deg/value").isNumber()).isTrue();
  }

  @Test
  void aPlanThatBreaksARuleEndsWithThree() throws IOException {
    Path edited = Files.createDirectory(shared.resolve("edited"));
    String text = Files.readString(plan.resolve("plan.json"));
    Files.writeString(
        edited.resolve("plan.json"), text.replaceFirst("\"rate_bit_s\": ", "\"rate_bit_s\": 1"));
    Ran ran = run("check", edited, "--scenario", scenario);
    assertThat(ran.exit()).isEqualTo(3);
    assertThat(ran.results()).startsWith("BROKEN plan ").contains("\nFindings:\n  ");
    assertThat(ran.results().lines()).allMatch(line -> line.length() <= 120);
  }

  @Test
  void aPlanThatIsNoneEndsWithTwoAndItsPlace() throws IOException {
    Path broken = Files.createDirectory(shared.resolve("broken"));
    String text = Files.readString(plan.resolve("plan.json"));
    Files.writeString(broken.resolve("plan.json"), text.replaceFirst("\"craft\"", "\"kraft\""));
    Ran ran = run("check", broken, "--scenario", scenario);
    assertThat(ran.exit()).isEqualTo(2);
    assertThat(ran.remarks())
        .contains("plan.json:", "kraft: is not known here; did you mean \"craft\"?")
        .doesNotContain("\tat ");
    assertThat(ran.results()).isEmpty();
  }

  @Test
  void aNegativeEffortIsAUsageError() {
    Ran ran = run("plan", scenario, "--out", shared.resolve("x"), "--effort=-1");
    assertThat(ran.exit()).isEqualTo(2);
    assertThat(shared.resolve("x")).doesNotExist();
  }

  @Test
  void withoutAFolderToWriteToNothingIsPlanned() {
    Ran ran = run("plan", scenario);
    assertThat(ran.exit()).isEqualTo(2);
    assertThat(ran.remarks()).contains("--out").contains("quietspan plan --help");
  }

  @Test
  void bothShowExamples() {
    for (String command : List.of("plan", "check")) {
      Ran ran = run(command, "--help");
      assertThat(ran.exit()).isZero();
      assertThat(ran.results()).contains("Examples:", "  quietspan " + command + " ");
      assertThat(ran.results().lines()).allMatch(line -> line.length() <= 80);
    }
  }
}
