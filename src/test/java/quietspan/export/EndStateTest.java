package quietspan.export;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import quietspan.fixture.PlanFixture;
import quietspan.model.Aim;
import quietspan.model.BodyDirection;
import quietspan.model.Decisions;
import quietspan.model.Plan;
import quietspan.model.Repoint;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;

final class EndStateTest {

  private static final OnboardInstant END = PlanFixture.SCENARIO.period().end();

  /** A plan whose last repoint of Hask aims so far ahead of the Earth at the end of the period. */
  private static EndState hask(double degreesAhead) {
    BodyDirection earth = PlanFixture.SKY.earth("Hask", PlanFixture.SKY.ground("Hask", END));
    Aim aim =
        Aim.nearest(
            Angle.ofDegrees(Math.toDegrees(earth.azimuthRadians()) + degreesAhead),
            Angle.ofRadians(earth.elevationRadians()));
    Plan plan = PlanFixture.legal(1);
    Decisions decisions =
        new Decisions(List.of(new Repoint("r", "Hask", END.plusSeconds(-86_400L), aim)), List.of());
    return EndState.of(
            PlanFixture.SCENARIO,
            PlanFixture.SKY,
            new Plan(plan.mission(), decisions, plan.outcome(), plan.bound(), plan.provenance()))
        .get(0);
  }

  /**
   * The usable half-cone is 2.1 - 0.1 - 0.01 = 1.99 deg; the synthetic Earth drifts by 0.98 deg a
   * day in azimuth at an elevation of some 8.6 deg, where a degree of azimuth is cos 8.6 deg wide.
   */
  @Test
  void anAimHoldsTheEarthUntilItHasDriftedThroughTheCone() {
    double wide = 1.99 / Math.cos(Math.toRadians(8.56));
    EndState centred = hask(0);
    assertThat(centred.earthHeldUntil().secondsSince(END) / 86_400)
        .isCloseTo(wide / 0.98, within(0.02));
    assertThat(hask(1).earthHeldUntil().secondsSince(END) / 86_400)
        .isCloseTo((wide + 1) / 0.98, within(0.03));
  }

  @Test
  void anAimThatHasLostTheEarthHoldsItNoLonger() {
    assertThat(hask(-3).earthHeldUntil()).isEqualTo(END);
  }

  @Test
  void fillIsThatOfTheStoresEnd() {
    EndState state = hask(0);
    assertThat(state.fillBits()).isEqualTo(2_000_000_000L);
    assertThat(state.fillShare()).isEqualTo(2.0 / 12);
  }
}
