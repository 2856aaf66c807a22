package quietspan.check;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import quietspan.model.Bound;
import quietspan.model.InputFile;
import quietspan.model.Outcome;
import quietspan.model.Plan;
import quietspan.model.Provenance;
import quietspan.model.RuleId;
import quietspan.model.Waiver;

final class StaleTest {

  private static final List<InputFile> INPUTS =
      List.of(new InputFile("mission.yaml", "aa"), new InputFile("stations.yaml", "bb"));
  private static final Waiver WAIVER =
      new Waiver(
          RuleId.GAP,
          "",
          "",
          World.ground(0).utc(),
          World.ground(86_400).utc(),
          Duration.ofHours(40),
          "no pass");
  private static final World WORLD = World.three();
  private static final Outcome OUTCOME = WORLD.check().recount();

  private static Plan plan(Outcome outcome, Optional<Bound> bound, List<Waiver> waivers) {
    return new Plan(
        "Test formation",
        WORLD.decisions(),
        outcome,
        bound,
        new Provenance("1.0", INPUTS, List.of(), 1, 10, 10, false, waivers));
  }

  private static Plan plan(List<Waiver> waivers) {
    return plan(OUTCOME, Optional.empty(), waivers);
  }

  @Test
  void aPlanThatSaysWhatFollowsIsFresh() {
    Stale stale = Stale.compare(plan(List.of(WAIVER)), OUTCOME, INPUTS, List.of(WAIVER));
    assertThat(stale.differences()).isEmpty();
    assertThat(stale.verdict()).isEqualTo(Stale.Verdict.FRESH);
  }

  @Test
  void aPlanEditedByHandIsStale() {
    World edited = World.three(world -> world.evening("c2", 2, 20 * 3600));
    Stale stale = Stale.compare(plan(List.of()), edited.check().recount(), INPUTS, List.of());
    assertThat(stale.verdict()).isEqualTo(Stale.Verdict.STALE);
    assertThat(stale.differences())
        .extracting(Stale.Difference::what)
        .contains("contact c2 on board", "contact c2 capacity in bit", "contact hours");
    assertThat(stale.differences().get(0).toString()).contains("stored", "now");
  }

  @Test
  void aContactThatTheStoredPlanDoesNotKnowIsNamed() {
    World edited =
        World.three(world -> world.contact("new", "Corrin Downs", "Hask", 43_200, 46_800, 32_000));
    Stale stale = Stale.compare(plan(List.of()), edited.check().recount(), INPUTS, List.of());
    assertThat(stale.differences())
        .contains(new Stale.Difference(Stale.Kind.DERIVED, "contact new", "absent", "present"));
  }

  @Test
  void aChangedInputIsMoreThanStale() {
    List<InputFile> changed =
        List.of(new InputFile("mission.yaml", "aa"), new InputFile("stations.yaml", "cc"));
    Stale stale = Stale.compare(plan(List.of()), OUTCOME, changed, List.of());
    assertThat(stale.verdict()).isEqualTo(Stale.Verdict.ALTERED);
    assertThat(stale.differences())
        .containsExactly(new Stale.Difference(Stale.Kind.INPUT, "input stations.yaml", "bb", "cc"));
  }

  @Test
  void aWaiverListEnlargedByHandIsMoreThanStale() {
    Stale added = Stale.compare(plan(List.of(WAIVER)), OUTCOME, INPUTS, List.of());
    assertThat(added.verdict()).isEqualTo(Stale.Verdict.ALTERED);
    assertThat(added.differences().get(0).now()).isEqualTo("absent");

    Waiver longer =
        new Waiver(
            WAIVER.rule(),
            "",
            "",
            WAIVER.begin(),
            WAIVER.end(),
            WAIVER.relaxedLimit().plusHours(1),
            WAIVER.reason());
    Stale stretched = Stale.compare(plan(List.of(longer)), OUTCOME, INPUTS, List.of(WAIVER));
    assertThat(stretched.differences()).hasSize(2);
  }

  @Test
  void aLegalPlanAboveItsBoundIsADifference() {
    Bound bound = new Bound(Optional.of(10L), Optional.of(0), List.of(), "none");
    Stale stale =
        Stale.compare(plan(OUTCOME, Optional.of(bound), List.of()), OUTCOME, INPUTS, List.of());
    assertThat(stale.differences()).extracting(Stale.Difference::stored).containsExactly("10");
  }
}
