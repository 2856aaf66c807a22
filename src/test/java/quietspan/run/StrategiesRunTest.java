package quietspan.run;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import quietspan.export.Strategy;
import quietspan.fixture.SmallScenario;

final class StrategiesRunTest {

  /** What the bound says of legal plans holds for every legal one, whoever made it. */
  @Test
  void legalStrategiesStayBelowTheBound(@TempDir Path folder) throws Exception {
    Source source =
        new Source(
            SmallScenario.write(folder.resolve("small")), Optional.empty(), Optional.empty());
    List<String> stages = new ArrayList<>();
    List<Strategy> strategies = StrategiesRun.compare(source, 1, 0, stages::add);
    assertThat(strategies)
        .extracting(Strategy::name)
        .containsExactly(
            "this program", "each on its own", "all together", "one in turn", "staggered");
    assertThat(strategies.get(0).findings()).isEmpty();
    for (Strategy strategy : strategies) {
      if (strategy.findings().isEmpty()) {
        assertThat(strategy.summary().gapSeconds().orElseThrow()).isNotNegative();
        assertThat(strategy.summary().pauses())
            .isGreaterThanOrEqualTo(strategy.summary().boundPauses().orElseThrow());
      }
    }
    assertThat(stages).contains("strategy: staggered");
    assertThat(Strategy.table(strategies).csv())
        .startsWith(
            "strategy,science_h,below_bound_h,pauses,contact_h,findings,rules_broken\n"
                + "this program,");
  }
}
