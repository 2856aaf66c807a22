package quietspan.planning.simulation;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Map;
import java.util.NavigableMap;
import java.util.SplittableRandom;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import quietspan.Seeds;

/** Ages in segments against ages in a sorted map. */
final class AgesTest {

  private final Ages ages = new Ages();
  private final Ages other = new Ages();
  private final NavigableMap<Long, Long> plain = new TreeMap<>();
  private final NavigableMap<Long, Long> plainOther = new TreeMap<>();

  /** Ten bits over four seconds: floor(10 j / 4) is 0, 2, 5, 7, 10. */
  @Test
  void aSpreadKeepsItsRoundingWhenItIsCut() {
    ages.addSpread(10, 4);
    assertThat(ages.before(-3)).isEqualTo(2);
    ages.moveOldest(3, other);
    assertThat(other.before(-2)).isEqualTo(3);
    assertThat(ages.before(-2)).isEqualTo(2);
    assertThat(ages.before(-1)).isEqualTo(4);
    assertThat(ages.before(0)).isEqualTo(7);
  }

  @Test
  void fewerBitsThanSecondsAreSpreadLate() {
    ages.addSpread(2, 5);
    assertThat(ages.oldest()).isEqualTo(-3);
  }

  @Seeds(count = 30)
  void anySequenceOfMovesIsThatOfTheSortedMap(SplittableRandom random) {
    for (int step = 0; step < 300; step++) {
      switch (random.nextInt(7)) {
        case 0 -> {
          long volume = random.nextLong(2_000);
          long seconds = 1 + random.nextLong(400);
          ages.addSpread(volume, seconds);
          for (long j = 0; j < seconds; j++) {
            put(plain, j - seconds, volume * (j + 1) / seconds - volume * j / seconds);
          }
        }
        case 1, 2 -> {
          long from = random.nextLong(300);
          long seconds = 1 + random.nextLong(60);
          long density = random.nextLong(4) * 5;
          ages.add(from, seconds, density);
          for (long g = from; g < from + seconds; g++) {
            put(plain, g, density);
          }
        }
        case 3 -> {
          long volume = random.nextLong(ages.bits() + 1);
          ages.moveOldest(volume, other);
          move(plain, plainOther, volume, true);
        }
        case 4 -> {
          long volume = random.nextLong(other.bits() + 1);
          other.moveOldest(volume, ages);
          move(plainOther, plain, volume, true);
        }
        case 5 -> {
          long volume = random.nextLong(ages.bits() / 2 + 1);
          ages.removeNewest(volume);
          move(plain, new TreeMap<>(), volume, false);
        }
        default -> {
          ages.addAll(other);
          plainOther.forEach((g, bits) -> put(plain, g, bits));
          plainOther.clear();
        }
      }
      compare(random);
    }
  }

  private void compare(SplittableRandom random) {
    long sum = plain.values().stream().mapToLong(Long::longValue).sum();
    assertThat(ages.bits()).isEqualTo(sum);
    if (sum > 0) {
      assertThat(ages.oldest()).isEqualTo(plain.firstKey());
    }
    for (int i = 0; i < 5; i++) {
      long second = random.nextLong(-400, 400);
      assertThat(ages.before(second)).as("before %s", second).isEqualTo(before(second));
    }
    long some = random.nextLong(sum + 1);
    Lane lane = new Lane();
    ages.copyOldest(some, lane);
    lane.rewind();
    lane.offer(Long.MAX_VALUE);
    long left = some;
    for (var entry : plain.entrySet()) {
      long expected = Math.min(left, entry.getValue());
      if (expected > 0) {
        assertThat(lane.head()).isEqualTo(entry.getKey());
        assertThat(lane.take(Long.MAX_VALUE)).isEqualTo(expected);
        left -= expected;
      }
    }
  }

  private long before(long second) {
    return plain.headMap(second).values().stream().mapToLong(Long::longValue).sum();
  }

  private static void put(Map<Long, Long> into, long second, long bits) {
    if (bits > 0) {
      into.merge(second, bits, Long::sum);
    }
  }

  private static void move(
      NavigableMap<Long, Long> from, Map<Long, Long> into, long volume, boolean oldest) {
    long left = volume;
    while (left > 0) {
      var entry = oldest ? from.firstEntry() : from.lastEntry();
      long part = Math.min(left, entry.getValue());
      put(into, entry.getKey(), part);
      from.remove(entry.getKey());
      put(from, entry.getKey(), entry.getValue() - part);
      left -= part;
    }
  }
}
