package quietspan.planning;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Each wrong bound is caught by a world, named by its feature and seed, that the right one holds.
 */
class BoundMutantsTest {

  private static final long FAR = Long.MAX_VALUE / 16;

  @ParameterizedTest
  @CsvSource(
      textBlock =
          """
          COVERAGE_GAP_FORBIDDEN,      LONG_LATENCY,          2475
          HOLDS_CAPPED,                PHASED_RATES,          1425
          BEAMS_NOT_WIDENED,           PHASED_RATES,          2150
          WAIVERS_IGNORED,             WAIVER,                 871
          LONGEST_PAUSE_CHARGED,       PHASED_RATES,          1309
          EACH_CRAFT_ONCE_IN_SEQUENCE, PHASED_RATES,           892
          """)
  void aWrongBoundIsCaught(BoundMutant mutant, TinyWorld.Feature feature, long seed) {
    TinyWorld world = TinyWorld.about(feature, seed);
    TinySearch.Found found =
        new TinySearch(world, Tables.of(world.scenario(), world.geometry()), 15).search();
    assertThat(found.best()).isPresent();
    assertThat(science(mutant, world)).isLessThan(found.science());
    assertThat(science(BoundMutant.NONE, world)).isGreaterThanOrEqualTo(found.science());
  }

  private static long science(BoundMutant mutant, TinyWorld world) {
    long length = world.scenario().period().length().toSeconds();
    return mutant.search(world, 2_000).leastLoss(FAR).map(loss -> length - loss).orElse(-1L);
  }
}
