package quietspan.export;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import quietspan.Seeds;
import quietspan.fixture.PlanFixture;
import quietspan.model.Plan;

final class StalenessTest {

  private static String write(Plan plan) {
    return PlanJson.write(PlanFixture.SCENARIO, PlanFixture.SKY, plan);
  }

  private static List<String> between(String file, String recomputed) {
    return Staleness.between(file.getBytes(StandardCharsets.UTF_8), recomputed);
  }

  @Seeds(count = 5)
  void aPlanAsWrittenIsNotStale(long seed) {
    String text = write(PlanFixture.shortfall(seed));
    assertThat(between(text, text)).isEmpty();
  }

  @Test
  void layoutAndTheWayANumberIsWrittenDoNotMatter() {
    String text = write(PlanFixture.legal(1));
    String other =
        text.replace("\n", " ").replace("\"contactHours\": 9,", "\"contactHours\": 9.00,");
    assertThat(other).contains("9.00");
    assertThat(between(other, text)).isEmpty();
  }

  @Test
  void changedAndMissingValuesAreNamed() {
    String text = write(PlanFixture.legal(1));
    String edited =
        text.replace("\"status\": \"legal\"", "\"status\": \"perfect\"")
            .replaceFirst("\"craft\": \"Hask\", \"start_bit\": \\d+", "\"craft\": \"Hask\"");
    assertThat(between(edited, text))
        .containsExactly(
            "summary.status: \"perfect\", recomputed \"legal\"",
            "derived.stores[0].start_bit: missing, recomputed 1000000000");
  }

  @Test
  void listsOfOtherLengthAreNamedOnce() {
    assertThat(between(write(PlanFixture.shortfall(1)), write(PlanFixture.legal(1))))
        .containsExactly(
            "summary.status: \"shortfall\", recomputed \"legal\"",
            "derived.findings: 1 entry, recomputed 0 entries");
  }

  @Test
  void theBoundIsNotRecomputed() {
    Plan plan = PlanFixture.legal(1);
    Plan without =
        new Plan(
            plan.mission(), plan.decisions(), plan.outcome(), Optional.empty(), plan.provenance());
    assertThat(between(write(plan), write(without))).isEmpty();
  }

  @Test
  void aPlanWithoutDerivedValuesSaysSo() {
    assertThat(between("{\"format\": 1}", write(PlanFixture.legal(1))))
        .hasSize(2)
        .allMatch(line -> line.contains(": missing, recomputed {"));
  }
}
