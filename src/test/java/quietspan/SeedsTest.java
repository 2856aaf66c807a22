package quietspan;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.platform.engine.discovery.DiscoverySelectors.selectClass;
import static org.junit.platform.testkit.engine.EventConditions.displayName;
import static org.junit.platform.testkit.engine.EventConditions.event;
import static org.junit.platform.testkit.engine.EventConditions.finishedWithFailure;
import static org.junit.platform.testkit.engine.EventConditions.test;
import static org.junit.platform.testkit.engine.TestExecutionResultConditions.instanceOf;
import static org.junit.platform.testkit.engine.TestExecutionResultConditions.message;
import static org.junit.platform.testkit.engine.TestExecutionResultConditions.suppressed;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.SplittableRandom;
import java.util.random.RandomGenerator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.extension.ExtensionConfigurationException;
import org.junit.platform.testkit.engine.EngineExecutionResults;
import org.junit.platform.testkit.engine.EngineTestKit;

final class SeedsTest {
  private static final List<Long> SEEN = new ArrayList<>();

  @Test
  void runsOncePerSeedAndCountsUp() {
    SEEN.clear();
    run(CountsUp.class).testEvents().assertStatistics(runs -> runs.started(3).succeeded(3));
    assertThat(SEEN).containsExactly(7L, 8L, 9L);
  }

  @Test
  void onlyTheFailingSeedFailsAndIsNamed() {
    EngineExecutionResults results = run(FailsAtTwo.class);
    results.testEvents().assertStatistics(runs -> runs.succeeded(2).failed(1));
    results
        .testEvents()
        .assertThatEvents()
        .haveExactly(
            1,
            event(
                test(),
                displayName("neverTwo seed=2"),
                finishedWithFailure(
                    instanceOf(AssertionError.class),
                    suppressed(0, message("run this seed alone with -Dseed=2")))));
  }

  @Test
  void oneSeedCanBeAskedForAlone() {
    SEEN.clear();
    EngineTestKit.engine("junit-jupiter")
        .selectors(selectClass(CountsUp.class))
        .configurationParameter("seed", "1234")
        .execute()
        .testEvents()
        .assertStatistics(runs -> runs.started(1).succeeded(1));
    assertThat(SEEN).containsExactly(1234L);
  }

  @Test
  void equalSeedsGiveEqualNumbersAndOtherSeedsOthers() {
    SEEN.clear();
    run(Draws.class).testEvents().assertStatistics(runs -> runs.succeeded(6));
    List<Long> first = List.copyOf(SEEN);
    SEEN.clear();
    run(Draws.class);
    assertThat(SEEN).isEqualTo(first);
    assertThat(first.subList(0, 2)).doesNotHaveDuplicates();
    assertThat(first.subList(2, 4)).doesNotHaveDuplicates();
    assertThat(first.subList(4, 6)).doesNotHaveDuplicates();
  }

  @Test
  void noSeedsAtAllIsRefused() {
    assertRefused(NoSeeds.class, "a seeded test needs at least one seed");
  }

  @Test
  void noPlaceForTheSeedIsRefused() {
    assertRefused(NoParameter.class, "a seeded test needs a parameter for its seed");
  }

  private static void assertRefused(Class<?> tests, String message) {
    run(tests)
        .containerEvents()
        .assertThatEvents()
        .haveExactly(
            1,
            event(
                finishedWithFailure(
                    instanceOf(ExtensionConfigurationException.class), message(message))));
  }

  private static EngineExecutionResults run(Class<?> tests) {
    return EngineTestKit.engine("junit-jupiter").selectors(selectClass(tests)).execute();
  }

  static final class CountsUp {
    @Seeds(count = 3, from = 7)
    void remembers(long seed) {
      SEEN.add(seed);
    }
  }

  static final class FailsAtTwo {
    @Seeds(count = 3)
    void neverTwo(long seed) {
      assertThat(seed).isNotEqualTo(2);
    }
  }

  static final class Draws {
    @Seeds(count = 2)
    void a(Random random) {
      SEEN.add(random.nextLong());
    }

    @Seeds(count = 2)
    void b(SplittableRandom random) {
      SEEN.add(random.nextLong());
    }

    @Seeds(count = 2)
    void c(RandomGenerator random) {
      SEEN.add(random.nextLong());
    }
  }

  static final class NoSeeds {
    @Seeds(count = 0)
    void neverRuns(long seed) {
      SEEN.add(seed);
    }
  }

  static final class NoParameter {
    @Seeds
    void neverRuns() {
      SEEN.clear();
    }
  }
}
