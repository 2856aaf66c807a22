package quietspan.planning;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import quietspan.Seeds;

/** A roster that was changed many times says what a fresh one with the same contacts says. */
final class RosterTest {

  private final DemoDays demo = DemoDays.get();

  @Seeds(count = 4)
  void changesAddUpToTheSameAsAFreshStart(Random random) {
    Roster roster = demo.full();
    List<Use> all = new ArrayList<>(roster.uses());
    int broken = 0;
    for (int i = 0; i < 200; i++) {
      List<Use> drawn = new ArrayList<>();
      for (int j = random.nextInt(3); j >= 0; j--) {
        drawn.add(all.get(random.nextInt(all.size())));
      }
      drawn.forEach(use -> flip(roster, use));
      boolean first = random.nextBoolean();
      long found = first ? roster.firstBreach() : roster.shortfall().weight();
      broken += found > 0 ? 1 : 0;
      if (i % 10 == 0) {
        Roster fresh = roster.under(Seed.FIRST_GUARD);
        assertThat(found).isEqualTo(first ? fresh.firstBreach() : fresh.shortfall().weight());
      }
      if (random.nextBoolean()) {
        drawn.forEach(use -> flip(roster, use));
      }
    }
    assertThat(broken).as("changes that broke a rule").isBetween(20, 199);
  }

  private static void flip(Roster roster, Use use) {
    if (roster.uses().contains(use)) {
      roster.remove(use);
    } else {
      roster.add(use);
    }
  }

  @Test
  void bothWaysToAskAgreeOnWhetherRulesAreKept() {
    Roster roster = demo.trimmed();
    assertThat(roster.shortfall().none()).isTrue();
    assertThat(roster.firstBreach()).isZero();
    for (Use use : roster.uses()) {
      roster.remove(use);
      assertThat(roster.firstBreach() == 0).isEqualTo(roster.shortfall().none());
      roster.add(use);
    }
  }
}
