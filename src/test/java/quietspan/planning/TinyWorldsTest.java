package quietspan.planning;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.EnumMap;
import java.util.EnumSet;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import quietspan.check.Check;

/**
 * The bound against worlds that are searched through: no legal plan of the grid has more science
 * than the bound or fewer pauses. A feature counts as present only where dropping it changes the
 * best plan.
 */
class TinyWorldsTest {

  private static final long FAR = Long.MAX_VALUE / 16;

  /** What came out over many worlds. */
  private static final class Tally {
    private final Map<TinyWorld.Feature, Integer> shown = new EnumMap<>(TinyWorld.Feature.class);
    private int worlds;
    private int solved;
    private int unsearched;
    private int scienceEqual;
    private int pausesEqual;
    private int impossible;
    private int provedImpossible;

    @Override
    public String toString() {
      StringBuilder table = new StringBuilder();
      table.append(
          String.format(
              Locale.ROOT,
              "%d worlds: %d with a legal plan on the grid, bound equal to it in science %d times,"
                  + " in pauses %d times; %d without any, %d of them proved impossible; %d too large"
                  + " to search%n",
              worlds,
              solved,
              scienceEqual,
              pausesEqual,
              impossible,
              provedImpossible,
              unsearched));
      shown.forEach(
          (feature, count) ->
              table.append(String.format(Locale.ROOT, "%5d  %s%n", count, feature)));
      return table.toString();
    }
  }

  @Test
  void noPlanOfTheGridBeatsTheBound() {
    Tally tally = new Tally();
    for (TinyWorld.Feature feature : TinyWorld.Feature.values()) {
      for (long seed : TinySeeds.showing(feature)) {
        judge(TinyWorld.about(feature, seed), EnumSet.of(feature), 15, 800, tally);
      }
    }
    // Worlds with little chance of a plan.
    for (long seed = 1; seed <= 25; seed++) {
      judge(TinyWorld.of(seed), EnumSet.noneOf(TinyWorld.Feature.class), 15, 800, tally);
    }
    System.out.println(tally);
    for (TinyWorld.Feature feature : TinyWorld.Feature.values()) {
      assertThat(tally.shown.getOrDefault(feature, 0))
          .as("worlds in which %s decides", feature)
          .isEqualTo(TinySeeds.showing(feature).length);
    }
  }

  @Test
  @Tag("proof")
  void noPlanOfTheGridBeatsTheBoundInThousandsOfWorlds() {
    Tally tally = new Tally();
    for (long seed = 1_000; seed < 4_000; seed++) {
      TinyWorld world = TinyWorld.of(seed);
      judge(world, world.features(), 300, 20_000, tally);
    }
    System.out.println(tally);
    assertThat(tally.solved).isGreaterThanOrEqualTo(1_000);
  }

  private static void judge(
      TinyWorld world, Iterable<TinyWorld.Feature> asked, int limit, long work, Tally tally) {
    tally.worlds++;
    Tables tables = Tables.of(world.scenario(), world.geometry());
    TinySearch.Found found = new TinySearch(world, tables, limit).search();
    if (!found.exhausted()) {
      tally.unsearched++;
      return;
    }
    BoundSearch search = BoundMutant.NONE.search(world, work);
    Optional<Long> loss = search.leastLoss(FAR);
    if (found.best().isEmpty()) {
      tally.impossible++;
      tally.provedImpossible += loss.isEmpty() ? 1 : 0;
    } else {
      // The planner's own numbers placed it; here the check alone says that it is legal.
      assertThat(
              Check.check(
                      world.scenario(),
                      world.geometry().sightLines(),
                      found.best().orElseThrow(),
                      world.waivers())
                  .findings())
          .as("seed %d %s", world.seed(), world.features())
          .isEmpty();
      assertThat(loss).as("seed %d %s", world.seed(), world.features()).isPresent();
      long bound = tables.length - loss.orElseThrow();
      assertThat(bound)
          .as("bound on science, seed %d %s", world.seed(), world.features())
          .isGreaterThanOrEqualTo(found.science());
      Optional<Long> pauses = search.fewestPauses(FAR);
      assertThat(pauses.orElse(FAR))
          .as("bound on pauses, seed %d %s", world.seed(), world.features())
          .isLessThanOrEqualTo(found.pauses());
      tally.solved++;
      tally.scienceEqual += bound == found.science() ? 1 : 0;
      tally.pausesEqual += pauses.orElseThrow() == found.pauses() ? 1 : 0;
    }
    for (TinyWorld.Feature feature : asked) {
      TinyWorld other = world.without(feature);
      TinySearch.Found without =
          new TinySearch(other, Tables.of(other.scenario(), other.geometry()), limit).search();
      boolean differs =
          without.exhausted()
              && (without.science() != found.science()
                  || without.best().isPresent() != found.best().isPresent());
      tally.shown.merge(feature, differs ? 1 : 0, Integer::sum);
    }
  }

  /** The same seed gives the same world, or a failure could not be looked at. */
  @Test
  void aSeedGivesItsWorldAgain() {
    long seed = new SplittableRandom(3).nextLong(1_000);
    assertThat(TinyWorld.of(seed).scenario()).isEqualTo(TinyWorld.of(seed).scenario());
    assertThat(TinyWorld.of(seed).waivers()).isEqualTo(TinyWorld.of(seed).waivers());
  }
}
