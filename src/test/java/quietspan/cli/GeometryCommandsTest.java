package quietspan.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import quietspan.fixture.SmallScenario;
import quietspan.model.RuleId;

/** The commands that print geometry, on the demo. */
final class GeometryCommandsTest {
  private final StringWriter results = new StringWriter();
  private final StringWriter remarks = new StringWriter();

  private int run(String... arguments) {
    return QuietspanCommand.run(new PrintWriter(results), new PrintWriter(remarks), arguments);
  }

  private List<String> lines() {
    return results.toString().lines().toList();
  }

  @Test
  void passesCoverThePeriodAndNameTheirSources() {
    assertThat(run("passes", "stations-demo", "--format", "csv")).isZero();
    assertThat(lines().get(0)).startsWith("station,craft,rise_ground_utc,");
    // Four stations see each of three craft about once a day in 91 days.
    assertThat(lines().size()).isBetween(1_080, 1_110);
    assertThat(remarks.toString()).contains("# Earth orientation: ", "# leap seconds: ");
  }

  /** Passes cut at the ends of the stretch are marked, and lie inside it. */
  @Test
  void passesOfADayAreClippedToIt() throws IOException {
    assertThat(
            run(
                "passes",
                "stations-demo",
                "--craft=Hask",
                "--from=2031-09-10T12:00:00Z",
                "--to=2031-09-11T12:00:00Z",
                "--json"))
        .isZero();
    JsonNode passes = new ObjectMapper().readTree(results.toString());
    assertThat(passes).hasSizeGreaterThanOrEqualTo(4);
    boolean cut = false;
    for (JsonNode pass : passes) {
      assertThat(pass.get("craft").asText()).isEqualTo("Hask");
      String rise = pass.get("rise_ground_utc").asText();
      String set = pass.get("set_ground_utc").asText();
      assertThat(rise).isGreaterThanOrEqualTo("2031-09-10T12:00:00.000Z");
      assertThat(set).isLessThanOrEqualTo("2031-09-11T12:00:00.000Z");
      boolean atEdge = rise.contains("10T12:00:00.000Z") || set.contains("11T12:00:00.000Z");
      assertThat(pass.get("clipped").asBoolean()).isEqualTo(atEdge);
      cut |= atEdge;
    }
    assertThat(cut).isTrue();
  }

  /** c = 299 792.458 km/s exactly, by definition of the metre. */
  @Test
  void rangeIsLightTimeTimesTheSpeedOfLight() throws IOException {
    assertThat(run("geometry", "stations-demo", "--station=Ostrand", "--step=20d", "--format=json"))
        .isZero();
    JsonNode rows = new ObjectMapper().readTree(results.toString());
    // Days 0, 20, 40, 60, 80 for three craft.
    assertThat(rows).hasSize(15);
    for (JsonNode row : rows) {
      assertThat(row.get("range_km").asDouble())
          .isCloseTo(row.get("owlt_s").asDouble() * 299_792.458, within(0.3));
      assertThat(row.get("elevation_deg").asDouble()).isBetween(-90.0, 90.0);
      assertThat(row.get("drift_deg_per_day").asDouble()).isBetween(0.9, 1.05);
    }
  }

  /** Usable half-cones of 1.99 and 1.59 deg at a drift of about 0.97 deg a day. */
  @Test
  void coverageIsSomeFourDays() throws IOException {
    assertThat(run("coverage", "stations-demo", "--step=30d", "--json")).isZero();
    JsonNode rows = new ObjectMapper().readTree(results.toString());
    // Days 0, 30, 60 and 90 for three craft.
    assertThat(rows).hasSize(12);
    for (JsonNode row : rows) {
      boolean narrow = row.get("craft").asText().equals("Tovin");
      assertThat(row.get("duration_days").asDouble())
          .isBetween(narrow ? 1.9 : 3.9, narrow ? 3.5 : 4.4);
    }
  }

  @Test
  void anUnknownStationIsRefusedWithAHint() {
    assertThat(run("passes", "stations-demo", "--station", "Ostrnd")).isEqualTo(2);
    assertThat(remarks.toString()).contains("did you mean \"Ostrand\"?");
    assertThat(results.toString()).isEmpty();
  }

  @Test
  void aStretchThatEndsBeforeItBeginsIsRefused() {
    assertThat(run("geometry", "stations-demo", "--from=2031-09-03", "--to=2031-09-02"))
        .isEqualTo(2);
    assertThat(remarks.toString()).contains("--to: is 2031-09-02T00:00:00Z");
  }

  @Test
  void tooManyRowsAreRefused() {
    assertThat(run("geometry", "stations-demo", "--step=1s")).isEqualTo(2);
    assertThat(remarks.toString()).contains("--step: gives 23587203 rows");
  }

  @Test
  void lintOfTheDemoEndsWithZero() {
    assertThat(run("lint", "stations-demo")).isZero();
    assertThat(lines().get(lines().size() - 1))
        .startsWith("Sallow Triad: 3 craft, 4 stations, 91 days: no errors, ");
  }

  @Test
  void lintComplainsOfEverythingAtOnce(@TempDir Path folder) throws IOException {
    for (String name : List.of("mission.yaml", "stations.yaml", "state.yaml")) {
      String text = Files.readString(Path.of("stations-demo", name));
      Files.writeString(folder.resolve(name), text.replaceFirst("deg", "degrees"));
    }
    assertThat(run("lint", folder.toString(), "--json")).isEqualTo(2);
    JsonNode problems = new ObjectMapper().readTree(results.toString());
    assertThat(problems.findValuesAsText("file"))
        .contains("mission.yaml", "stations.yaml", "state.yaml");
  }

  @Test
  void lintWarnsOfWaiversAndOfAnAntennaThatLosesTheEarth(@TempDir Path folder) throws IOException {
    Path small = SmallScenario.write(folder.resolve("small"));
    Path mission = small.resolve("mission.yaml");
    String text = Files.readString(mission);
    assertThat(text).contains("gap_limit: 30 h", "{elevation: 12.9 deg}");
    Files.writeString(
        mission,
        text.replace("gap_limit: 30 h", "gap_limit: 30 min")
            .replace("{elevation: 12.9 deg}", "{elevation: 20 deg}"));
    Path state = small.resolve("state.yaml");
    Files.writeString(
        state, Files.readString(state).replace("elevation: 12.90 deg", "elevation: 20 deg"));
    assertThat(run("lint", small.toString())).isZero();
    assertThat(results.toString().replaceAll("\\s+", " "))
        .contains("waived: GAP from 2031-08-31T22:10:00Z")
        .contains("craft Tovin: antenna: cannot be aimed at the Earth from 2031-09-01");
  }

  @Test
  void everyRuleStandsInTheReference() {
    assertThat(run("rules", "--format", "csv")).isZero();
    assertThat(lines()).hasSize(1 + RuleId.values().length);
  }

  @Test
  void theReferenceFitsEightyColumns() {
    assertThat(run("rules")).isZero();
    assertThat(lines())
        .allMatch(line -> line.length() <= 80)
        .anyMatch(line -> line.contains("GAP"));
  }

  @Test
  void everyCommandShowsExamples() {
    for (String command : List.of("lint", "passes", "geometry", "coverage", "rules")) {
      results.getBuffer().setLength(0);
      assertThat(run(command, "--help")).isZero();
      assertThat(results.toString()).contains("Examples:", "quietspan " + command);
      assertThat(results.toString().lines()).allMatch(line -> line.length() <= 80);
    }
  }
}
