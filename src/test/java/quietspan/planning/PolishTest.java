package quietspan.planning;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.Test;
import org.optaplanner.core.config.solver.EnvironmentMode;
import quietspan.Seeds;

/** The polish on the demo. */
final class PolishTest {

  private final DemoDays demo = DemoDays.get();

  private Polish polish(EnvironmentMode mode) {
    return new Polish(demo.tables, demo.links, demo.waivers, demo.fixed, mode);
  }

  private Polish.Result polished(Roster start, long seed, long steps, AtomicBoolean stop) {
    return polish(EnvironmentMode.REPRODUCIBLE).polish(start, Seed.FIRST_GUARD, seed, steps, stop);
  }

  /** The solver scores every change from scratch, too, and stops at the first difference. */
  @Seeds(count = 2)
  void scoresAreThoseOfAFreshStart(long seed) {
    Polish.Result result =
        polish(EnvironmentMode.FULL_ASSERT)
            .polish(demo.trimmed(), Seed.FIRST_GUARD, seed, 6, new AtomicBoolean());
    assertThat(result.steps()).isEqualTo(6);
  }

  @Seeds(count = 3)
  void aPlanThatKeepsTheRulesGetsCheaperAndLosesNoScience(long seed) {
    Roster start = demo.trimmed();
    Roster end = polished(start, seed, 150, new AtomicBoolean()).roster();
    assertThat(end.shortfall().none()).isTrue();
    assertThat(end.draft().breaches()).isZero();
    assertThat(end.broken()).isEmpty();
    assertThat(end.draft().science()).isGreaterThanOrEqualTo(start.draft().science());
    assertThat(end.cost()).isLessThan(start.cost());
    for (Use use : end.uses()) {
      end.remove(use);
      assertThat(end.fits(use)).as("%s beside the others", use).isTrue();
      end.add(use);
    }
    assertThat(end.uses()).containsAll(demo.fixed);
  }

  @Test
  void stepsAndSeedDecideEverything() {
    Polish.Result one = polished(demo.trimmed(), 5, 60, new AtomicBoolean());
    Polish.Result same = polished(demo.trimmed(), 5, 60, new AtomicBoolean());
    Polish.Result other = polished(demo.trimmed(), 6, 60, new AtomicBoolean());
    assertThat(same.roster().uses()).isEqualTo(one.roster().uses());
    assertThat(same.roster().draft().moves).isEqualTo(one.roster().draft().moves);
    assertThat(other.roster().uses()).isNotEqualTo(one.roster().uses());
  }

  @Test
  void stoppedAfterSomeStepsItIsWhatSoManyStepsGive() throws InterruptedException {
    AtomicBoolean stop = new AtomicBoolean();
    AtomicLong steps = new AtomicLong();
    Roster[] stopped = new Roster[1];
    Thread worker =
        new Thread(
            () -> {
              Polish.Result result = polished(demo.trimmed(), 9, 1_000_000, stop);
              steps.set(result.steps());
              stopped[0] = result.roster();
            });
    worker.start();
    Thread.sleep(1_500);
    stop.set(true);
    worker.join();
    assertThat(steps.get()).isBetween(1L, 999_999L);
    Polish.Result again = polished(demo.trimmed(), 9, steps.get(), new AtomicBoolean());
    assertThat(again.steps()).isEqualTo(steps.get());
    assertThat(again.roster().uses()).isEqualTo(stopped[0].uses());
    assertThat(again.roster().draft().moves).isEqualTo(stopped[0].draft().moves);
  }
}
