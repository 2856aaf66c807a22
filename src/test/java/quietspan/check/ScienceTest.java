package quietspan.check;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Optional;
import org.junit.jupiter.api.Test;
import quietspan.model.Interruption;
import quietspan.model.QuietSpan;

/** Worlds of three days, minimum span 48 h, warm-up 2 h, repoints of Merle of 4 h 20 min. */
final class ScienceTest {

  private static final long HOUR = 3600;
  private static final long REPOINT = 4 * HOUR + 1200;
  private static final long PERIOD = World.PERIOD_SECONDS;

  private static Science science(World world) {
    return Science.of(world.build(), world.repoints);
  }

  private static long[] values(Science science) {
    return science.spans().stream().mapToLong(QuietSpan::valueSeconds).toArray();
  }

  @Test
  void aSpanOpenAtBothEndsLosesOnlyItsWarmUp() {
    Science science = science(World.three());
    assertThat(science.pauses()).isEmpty();
    assertThat(science.seconds()).isEqualTo(PERIOD - 2 * HOUR);
    assertThat(science.spans().get(0).openBefore()).isTrue();
    assertThat(science.spans().get(0).openAfter()).isTrue();
  }

  @Test
  void aFirstSpanBelowTheMinimumCountsNothingButTheOpenLastOneDoes() {
    World world = World.three(w -> w.repoint("r0", "Merle", 47 * HOUR));
    assertThat(values(science(world))).containsExactly(0, PERIOD - 47 * HOUR - REPOINT - 2 * HOUR);
  }

  @Test
  void aSpanThatBeganBeforeThePeriodCountsFromThereAndIsWarm() {
    World world = World.three(w -> w.repoint("r0", "Merle", 47 * HOUR));
    world.scenario.quietSince = Optional.of(World.onboard(-90 * 60));
    assertThat(values(science(world))[0]).isEqualTo(47 * HOUR - 30 * 60);
    assertThat(science(world).spans().get(0).lengthSeconds()).isEqualTo(48 * HOUR + 30 * 60);
  }

  @Test
  void touchingStopsAreOnePauseAndSeparateOnesTwo() {
    World touching =
        World.three(
            w -> {
              w.repoint("r0", "Merle", 10 * HOUR);
              w.repoint("r1", "Hask", 10 * HOUR + REPOINT);
              w.interruptions.add(
                  new Interruption(
                      World.onboard(10 * HOUR + 2 * REPOINT, 10 * HOUR + 3 * REPOINT), "cal"));
            });
    Science one = science(touching);
    assertThat(one.pauses()).hasSize(1);
    assertThat(one.pauses().get(0).repoints()).containsExactly("r0", "r1");
    assertThat(one.pauses().get(0).interruptions()).containsExactly("cal");

    World apart =
        World.three(
            w -> {
              w.repoint("r0", "Merle", 10 * HOUR);
              w.repoint("r1", "Hask", 10 * HOUR + REPOINT + 1);
            });
    assertThat(science(apart).pauses()).hasSize(2);
    assertThat(science(apart).spans()).hasSize(3);
  }

  @Test
  void aPauseFromTheBeginLeavesNoFirstSpan() {
    World world = World.three(w -> w.repoint("r0", "Merle", 0));
    Science science = science(world);
    assertThat(science.spans()).hasSize(1);
    assertThat(science.spans().get(0).openBefore()).isFalse();
    assertThat(science.seconds()).isEqualTo(PERIOD - REPOINT - 2 * HOUR);
  }

  @Test
  void interruptionsAreCutToThePeriod() {
    World world =
        World.three(
            w -> w.interruptions.add(new Interruption(World.onboard(-HOUR, HOUR), "before")));
    assertThat(science(world).pauses().get(0).during()).isEqualTo(World.onboard(0, HOUR));
  }
}
