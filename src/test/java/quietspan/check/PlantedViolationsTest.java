package quietspan.check;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.assertj.core.api.Assertions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import quietspan.model.Finding;
import quietspan.model.RuleId;

/** Every rule is caught when it alone is broken, and keeps silent just inside its limit. */
final class PlantedViolationsTest {

  private static final List<Planted> ALL =
      Stream.of(PlantedInSight.cases(), PlantedInTurn.cases(), PlantedInData.cases())
          .flatMap(List::stream)
          .toList();

  static List<Planted> all() {
    return ALL;
  }

  @Test
  void everyRuleHasAPlantedViolation() {
    Set<RuleId> planted = ALL.stream().map(Planted::rule).collect(Collectors.toSet());
    assertThat(planted).containsExactlyInAnyOrderElementsOf(Arrays.asList(RuleId.values()));
  }

  @Test
  void everyRuleHasAJudgeThatIsContentWithALegalWorld() {
    World world = World.three();
    Evidence evidence =
        Evidence.gather(world.build(), world.sky(), world.decisions(), world.waivers, world.frozen);
    for (RuleId rule : RuleId.values()) {
      assertThat(Judges.of(rule).findings(evidence)).as(rule.name()).isEmpty();
    }
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("all")
  void plantedViolationIsTheOnlyFinding(Planted planted) {
    List<Finding> findings = planted.breach().check().findings();
    assertThat(findings).as("%s", findings).hasSize(1);
    Finding finding = findings.get(0);
    assertThat(finding.rule()).isEqualTo(planted.rule());
    assertThat(finding.amount())
        .isPositive()
        .isCloseTo(planted.amount(), Assertions.within(planted.tolerance()));
    assertThat(finding.detail()).matches(".*\\d.*\\.");
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("all")
  void justInsideNothingIsFound(Planted planted) {
    assertThat(planted.justInside().check().findings()).isEmpty();
  }

  @Test
  void theWorldsAreLegalBeforeTheyAreBent() {
    assertThat(World.three().check().findings()).isEmpty();
    assertThat(World.one().check().findings()).isEmpty();
  }
}
