package quietspan.planning.simulation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.tuple;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import quietspan.Seeds;
import quietspan.fixture.TestScenario;
import quietspan.model.Aim;
import quietspan.model.Calendars;
import quietspan.model.Interruption;
import quietspan.model.Pause;
import quietspan.model.QuietSpan;
import quietspan.model.Repoint;
import quietspan.model.ScienceRules;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/** Ten days; Hask and Merle move and settle for 4 h 20 min, Tovin for 5 h 30 min. */
final class SpansTest {

  private static final long HOUR = 3_600;
  private static final long HASK = 4 * HOUR + 20 * 60;
  private static final long TOVIN = 5 * HOUR + 30 * 60;

  private final TestScenario world = TestScenario.three();
  private final List<Repoint> repoints = new ArrayList<>();
  private final List<Interruption> interruptions = new ArrayList<>();

  SpansTest() {
    world.days = 10;
    world.science = new ScienceRules(Duration.ofHours(48), Duration.ofHours(2));
  }

  private OnboardInstant at(long seconds) {
    return new OnboardInstant(world.begin).plusSeconds(seconds);
  }

  private void repoint(String craft, long second) {
    repoints.add(new Repoint("r" + repoints.size(), craft, at(second), new Aim(0, 0)));
  }

  private void interrupt(long from, long to) {
    interruptions.add(new Interruption(Interval.of(at(from), at(to)), "i" + interruptions.size()));
  }

  private Spans spans() {
    world.calendars = new Calendars(List.of(), List.of(), interruptions, List.of());
    return Spans.of(world.build(), repoints);
  }

  private List<Long> values() {
    return spans().quietSpans().stream().map(QuietSpan::valueSeconds).toList();
  }

  @Test
  void repointsThatTouchAreOnePause() {
    repoint("Hask", 100 * HOUR);
    repoint("Merle", 100 * HOUR + HASK);
    assertThat(spans().pauses())
        .containsExactly(
            new Pause(
                Interval.of(at(100 * HOUR), at(100 * HOUR + 2 * HASK)),
                List.of("r0", "r1"),
                List.of()));
  }

  @Test
  void repointsASecondApartAreTwoPauses() {
    repoint("Hask", 100 * HOUR);
    repoint("Merle", 100 * HOUR + HASK + 1);
    assertThat(spans().pauses()).hasSize(2);
  }

  @Test
  void aPauseLastsUntilTheLastCraftHasSettled() {
    repoint("Hask", 100 * HOUR);
    repoint("Tovin", 100 * HOUR);
    interrupt(101 * HOUR, 102 * HOUR);
    assertThat(spans().pauses())
        .containsExactly(
            new Pause(
                Interval.of(at(100 * HOUR), at(100 * HOUR + TOVIN)),
                List.of("r0", "r1"),
                List.of("i0")));
  }

  @Test
  void whatReachesOutOfThePeriodIsClipped() {
    interrupt(-HOUR, HOUR);
    repoint("Hask", 239 * HOUR);
    interrupt(300 * HOUR, 301 * HOUR);
    assertThat(spans().pauses())
        .extracting(Pause::during)
        .containsExactly(Interval.of(at(0), at(HOUR)), Interval.of(at(239 * HOUR), at(240 * HOUR)));
    assertThat(spans().quietSpans())
        .extracting(QuietSpan::openBefore, QuietSpan::openAfter)
        .containsExactly(tuple(false, false));
  }

  @Test
  void withoutPausesThePeriodIsOneSpanLessWarmUp() {
    assertThat(spans().quietSpans())
        .containsExactly(
            new QuietSpan(Interval.of(at(0), at(240 * HOUR)), 240 * HOUR, 238 * HOUR, true, true));
  }

  /** 48 h count 46 h; a second less counts nothing. */
  @Test
  void anInnerSpanBelowTheMinimumCountsNothing() {
    interrupt(10 * HOUR, 20 * HOUR);
    interrupt(68 * HOUR, 70 * HOUR);
    assertThat(values()).containsExactly(0L, 46 * HOUR, 168 * HOUR);
    interruptions.clear();
    interrupt(10 * HOUR, 20 * HOUR + 1);
    interrupt(68 * HOUR, 70 * HOUR);
    assertThat(values()).containsExactly(0L, 0L, 168 * HOUR);
  }

  @Test
  void theLastSpanNeedsNoMinimumButItsWarmUp() {
    interrupt(60 * HOUR, 230 * HOUR);
    assertThat(values()).containsExactly(58 * HOUR, 8 * HOUR);
    interruptions.clear();
    interrupt(60 * HOUR, 239 * HOUR);
    assertThat(values()).containsExactly(58 * HOUR, 0L);
  }

  /** 40 h before the period and 8 h in it make 48 h; the warm-up is long over. */
  @Test
  void theFirstSpanCountsFromWhenQuietBegan() {
    world.quietSince = Optional.of(at(-40 * HOUR));
    interrupt(8 * HOUR, 9 * HOUR);
    assertThat(spans().quietSpans().get(0))
        .isEqualTo(
            new QuietSpan(Interval.of(at(0), at(8 * HOUR)), 48 * HOUR, 8 * HOUR, true, false));
    world.quietSince = Optional.of(at(-40 * HOUR + 1));
    assertThat(values()).containsExactly(0L, 229 * HOUR);
  }

  @Test
  void whatIsLeftOfTheWarmUpIsDeducted() {
    world.quietSince = Optional.of(at(-HOUR / 2));
    interrupt(60 * HOUR, 61 * HOUR);
    assertThat(values()).containsExactly(58 * HOUR + HOUR / 2, 177 * HOUR);
  }

  @Test
  void aSpanThatOpensLaterBeginsThen() {
    world.quietSince = Optional.of(at(3 * HOUR));
    interrupt(60 * HOUR, 61 * HOUR);
    assertThat(spans().quietSpans().get(0))
        .isEqualTo(
            new QuietSpan(
                Interval.of(at(3 * HOUR), at(60 * HOUR)), 57 * HOUR, 55 * HOUR, false, false));
  }

  /** Against every second of a period, marked one by one. */
  @Seeds(count = 30)
  void pausesAndSpansAreTheRunsOfMarkedSeconds(SplittableRandom random) {
    world.days = 2;
    world.science = new ScienceRules(Duration.ofHours(6), Duration.ofHours(1));
    int length = 2 * 86_400;
    boolean[] marked = new boolean[length];
    String[] craft = {"Hask", "Merle", "Tovin"};
    for (int i = random.nextInt(5); i > 0; i--) {
      int who = random.nextInt(3);
      int from = random.nextInt(length);
      repoint(craft[who], from);
      mark(marked, from, from + (int) (who == 2 ? TOVIN : HASK));
    }
    for (int i = random.nextInt(3); i > 0; i--) {
      int from = random.nextInt(length);
      int to = from + 1 + random.nextInt(20_000);
      interrupt(from, to);
      mark(marked, from, to);
    }
    long science = 0;
    int pauses = 0;
    int begin = 0;
    for (int s = 0; s <= length; s++) {
      if (s == length || marked[s]) {
        boolean counts = s == length || s - begin >= 6 * HOUR;
        science += counts ? Math.max(0, s - begin - HOUR) : 0;
        begin = s + 1;
      }
      pauses += s < length && marked[s] && (s == 0 || !marked[s - 1]) ? 1 : 0;
    }

    assertThat(spans().scienceSeconds()).isEqualTo(science);
    assertThat(spans().pauses()).hasSize(pauses);
  }

  private static void mark(boolean[] marked, int from, int to) {
    for (int s = from; s < Math.min(to, marked.length); s++) {
      marked[s] = true;
    }
  }
}
