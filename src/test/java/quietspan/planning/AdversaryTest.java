package quietspan.planning;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import quietspan.check.Check;
import quietspan.check.CheckReport;
import quietspan.model.Aim;
import quietspan.model.Contact;
import quietspan.model.Decisions;
import quietspan.model.RateStep;
import quietspan.model.Repoint;
import quietspan.planning.simulation.Spans;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;

/**
 * Tries to find a legal plan with more science than the bound allows: late acceptance over plans in
 * seconds and hundredths of a degree, judged by {@link Check} alone. It starts from the best plan
 * of the grid, which leaves all that lies between the grid's points to be gained.
 */
class AdversaryTest {

  private static final int PER_WORLD = 25;

  @Test
  void noSearchInSecondsFindsMoreThanTheBound() {
    assertThat(mostAboveTheBound(1_000, 400)).isLessThanOrEqualTo(0);
  }

  @Test
  @Tag("proof")
  void noLongSearchInSecondsFindsMoreThanTheBound() {
    assertThat(mostAboveTheBound(50_000, 100_000)).isLessThanOrEqualTo(0);
  }

  /** The greatest science above a bound (s) among so many plans judged. */
  private static long mostAboveTheBound(long firstSeed, int plans) {
    long most = Long.MIN_VALUE;
    int judged = 0;
    int legal = 0;
    int raised = 0;
    int worlds = 0;
    TinyWorld.Feature[] features = TinyWorld.Feature.values();
    for (long seed = firstSeed; judged < plans; seed++) {
      TinyWorld world = TinyWorld.about(features[(int) (seed % features.length)], seed);
      Tables tables = Tables.of(world.scenario(), world.geometry());
      TinySearch.Found found = new TinySearch(world, tables, 10).search();
      if (found.best().isEmpty()) {
        continue;
      }
      Optional<Long> loss = BoundMutant.NONE.search(world, 800).leastLoss(Long.MAX_VALUE / 16);
      assertThat(loss).as("seed %d has a legal plan", seed).isPresent();
      long bound = tables.length - loss.orElseThrow();
      Attack attack = new Attack(world, found.best().orElseThrow(), seed);
      attack.run(PER_WORLD);
      worlds++;
      judged += attack.judged;
      legal += attack.legal;
      raised += attack.best > found.science() ? 1 : 0;
      most = Math.max(most, attack.best - bound);
      assertThat(attack.best)
          .as("science of a legal plan, seed %d", seed)
          .isLessThanOrEqualTo(bound);
    }
    System.out.printf(
        Locale.ROOT,
        "%d plans judged in %d worlds, %d legal; the search gained on the grid in %d worlds;"
            + " nearest to the bound: %d s%n",
        judged,
        worlds,
        legal,
        raised,
        most);
    return most;
  }

  private static final class Attack {
    private final TinyWorld world;
    private final SplittableRandom random;
    private final long[] memory = new long[12];
    private Decisions current;
    private long science;
    private long best = Long.MIN_VALUE;
    private int judged;
    private int legal;

    Attack(TinyWorld world, Decisions start, long seed) {
      this.world = world;
      this.random = new SplittableRandom(seed);
      this.current = start;
      this.science = Long.MIN_VALUE;
    }

    void run(int plans) {
      if (!judge(current)) {
        return;
      }
      java.util.Arrays.fill(memory, science);
      for (int tries = 0; judged < plans && tries < 200 * plans; tries++) {
        Decisions next = move();
        long would = Spans.of(world.scenario(), next.repoints()).scienceSeconds();
        int slot = tries % memory.length;
        if (next.equals(current) || (would < memory[slot] && would < science)) {
          continue;
        }
        Decisions before = current;
        current = next;
        if (!judge(next)) {
          current = before;
        }
        memory[slot] = science;
      }
    }

    /** Keeps the plan's science when it is legal. */
    private boolean judge(Decisions plan) {
      judged++;
      CheckReport report =
          Check.check(world.scenario(), world.geometry().sightLines(), plan, world.waivers());
      if (!report.legal()) {
        return false;
      }
      legal++;
      science = report.recount().scienceSeconds();
      best = Math.max(best, science);
      return true;
    }

    private Decisions move() {
      List<Repoint> repoints = new ArrayList<>(current.repoints());
      List<Contact> contacts = new ArrayList<>(current.contacts());
      for (int i = 1 + random.nextInt(2); i > 0; i--) {
        int kind = random.nextInt(6);
        if (kind < 4 && !repoints.isEmpty()) {
          changeRepoint(repoints, kind);
        } else if (!contacts.isEmpty()) {
          changeContact(contacts);
        }
      }
      return new Decisions(repoints, contacts);
    }

    private void changeRepoint(List<Repoint> repoints, int kind) {
      int i = random.nextInt(repoints.size());
      Repoint one = repoints.get(i);
      if (kind == 0) {
        // All that start together move together.
        long by = offset();
        repoints.replaceAll(
            other ->
                other.start().equals(one.start())
                    ? new Repoint(
                        other.id(), other.craft(), other.start().plusSeconds(by), other.aim())
                    : other);
      } else if (kind == 1) {
        repoints.set(
            i, new Repoint(one.id(), one.craft(), one.start().plusSeconds(offset()), one.aim()));
      } else if (kind == 2) {
        Aim aim =
            new Aim(
                Math.floorMod(one.aim().azimuthCentidegrees() + random.nextInt(-120, 121), 36_000),
                one.aim().elevationCentidegrees() + random.nextInt(-20, 21));
        repoints.set(i, new Repoint(one.id(), one.craft(), one.start(), aim));
      } else {
        repoints.remove(i);
      }
    }

    private long offset() {
      int reach = random.nextInt(3);
      return reach == 0
          ? random.nextInt(-10, 11)
          : reach == 1 ? random.nextInt(-900, 901) : random.nextInt(-20_000, 20_001);
    }

    private void changeContact(List<Contact> contacts) {
      int i = random.nextInt(contacts.size());
      Contact one = contacts.get(i);
      GroundInstant begin = one.during().begin();
      GroundInstant end = one.during().end();
      if (random.nextBoolean()) {
        begin = begin.plusSeconds(offset());
      } else {
        end = end.plusSeconds(offset());
      }
      if (begin.plus(Duration.ofMinutes(1)).isBefore(end)) {
        contacts.set(
            i,
            new Contact(
                one.id(),
                one.station(),
                one.antenna(),
                one.craft(),
                Interval.of(begin, end),
                List.of(new RateStep(begin, one.steps().get(0).rate())),
                one.services(),
                one.status()));
      }
    }
  }
}
