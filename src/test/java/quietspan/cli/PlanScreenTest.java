package quietspan.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import quietspan.Seeds;
import quietspan.export.EndState;
import quietspan.fixture.Golden;
import quietspan.fixture.PlanFixture;
import quietspan.model.Bound;
import quietspan.model.Plan;

final class PlanScreenTest {

  private static String screen(Plan plan, List<String> warnings) {
    return PlanScreen.of(
        PlanFixture.SCENARIO,
        plan,
        EndState.of(PlanFixture.SCENARIO, PlanFixture.SKY, plan),
        warnings,
        List.of("No refraction."),
        Optional.of("plans/test"));
  }

  private static Plan with(Plan plan, Optional<Bound> bound) {
    return new Plan(plan.mission(), plan.decisions(), plan.outcome(), bound, plan.provenance());
  }

  @Test
  void aLegalPlanReadsAsAgreed() {
    Golden.assertSame("plan-screen-legal.txt", screen(PlanFixture.legal(4), List.of()));
  }

  @Test
  void aShortfallReadsAsAgreed() {
    Plan plan =
        with(
            PlanFixture.shortfall(7),
            Optional.of(new Bound(Optional.empty(), Optional.empty(), List.of(), "")));
    Golden.assertSame(
        "plan-screen-shortfall.txt",
        screen(plan, List.of("mission.yaml: warning: one thing", "mission.yaml: warning: more")));
  }

  @Seeds(count = 20)
  void linesFitEightyColumns(long seed) {
    String text =
        screen(PlanFixture.shortfall(seed), List.of("a remark of many words ".repeat(12)));
    assertThat(text.lines()).allMatch(line -> line.length() <= 80);
  }

  @Test
  void theLocaleDoesNotMatter() {
    String here = screen(PlanFixture.legal(4), List.of());
    Locale locale = Locale.getDefault();
    try {
      Locale.setDefault(Locale.GERMANY);
      assertThat(screen(PlanFixture.legal(4), List.of())).isEqualTo(here);
    } finally {
      Locale.setDefault(locale);
    }
  }

  @Test
  void aBoundThatIsReachedIsCalledOptimal() {
    Plan plan = PlanFixture.legal(4);
    Bound reached =
        new Bound(Optional.of(plan.outcome().scienceSeconds()), Optional.of(1), List.of(), "");
    assertThat(screen(with(plan, Optional.of(reached)), List.of())).contains("proved optimal");
  }

  @Test
  void withoutABoundNothingIsClaimed() {
    assertThat(screen(with(PlanFixture.legal(4), Optional.empty()), List.of()))
        .contains("no bound was computed", "no bound on them");
  }
}
