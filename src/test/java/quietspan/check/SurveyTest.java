package quietspan.check;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.function.ToDoubleFunction;
import org.junit.jupiter.api.Test;
import quietspan.time.GroundInstant;

final class SurveyTest {

  private static final List<GroundInstant> INSTANTS =
      List.of(World.ground(0), World.ground(30), World.ground(60), World.ground(90));

  /** A margin that is this high at a second and falls by one a second to both sides. */
  private static ToDoubleFunction<GroundInstant> roof(double second, double height) {
    return t -> height - Math.abs(t.secondsSince(World.ground(0)) - second);
  }

  @Test
  void bothCrossingsAreRefined() {
    Survey survey = Survey.of(INSTANTS, roof(50, 25));
    assertThat(survey.brokenFrom()).contains(World.ground(0));
    assertThat(survey.brokenSeconds()).isCloseTo(25 + 15, within(0.02));
    assertThat(survey.least()).isEqualTo(-25);
    assertThat(survey.largestStep()).isEqualTo(30);
  }

  @Test
  void theFirstBreachIsFoundToAHundredthOfASecond() {
    Survey survey = Survey.of(INSTANTS, roof(20, 51.5));
    assertThat(survey.brokenFrom().orElseThrow().secondsSince(World.ground(71)))
        .isCloseTo(0.5, within(0.01));
  }

  @Test
  void aBreachBetweenTwoSamplesIsMissedAndNoDeeperThanHalfTheLargestStep() {
    ToDoubleFunction<GroundInstant> dip =
        t -> Math.abs(t.secondsSince(World.ground(0)) - 45) - 14.9;
    Survey survey = Survey.of(INSTANTS, dip);
    assertThat(survey.broken()).isFalse();
    assertThat(survey.largestStep() / 2).isGreaterThanOrEqualTo(14.9);
  }

  @Test
  void aMarginThatDoesNotApplyIsNoMargin() {
    Survey survey = Survey.of(INSTANTS, t -> Double.POSITIVE_INFINITY);
    assertThat(survey.broken()).isFalse();
    assertThat(survey.least()).isInfinite();
    assertThat(survey.largestStep()).isZero();
  }
}
