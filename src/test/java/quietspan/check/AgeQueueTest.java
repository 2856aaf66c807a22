package quietspan.check;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
import org.assertj.core.api.Assertions;
import org.junit.jupiter.api.Test;
import quietspan.Seeds;

final class AgeQueueTest {

  /** The same by a sorted map. */
  private static final class Plain {

    private final TreeMap<Long, Long> bits = new TreeMap<>();

    void add(long generated, long amount) {
      if (amount > 0) {
        bits.merge(generated, amount, Long::sum);
      }
    }

    Map<Long, Long> take(long amount, boolean oldest) {
      TreeMap<Long, Long> taken = new TreeMap<>();
      long left = amount;
      while (left > 0 && !bits.isEmpty()) {
        Map.Entry<Long, Long> entry = oldest ? bits.firstEntry() : bits.lastEntry();
        long part = Math.min(left, entry.getValue());
        taken.merge(entry.getKey(), part, Long::sum);
        left -= part;
        if (part == entry.getValue()) {
          bits.remove(entry.getKey());
        } else {
          bits.put(entry.getKey(), entry.getValue() - part);
        }
      }
      return taken;
    }
  }

  @Seeds(count = 60)
  void agreesWithASortedMap(Random random) {
    AgeQueue queue = new AgeQueue();
    Plain plain = new Plain();
    long now = random.nextInt(2_000_000) - 1_000_000L;
    int reach = 1 << (4 + random.nextInt(19));
    for (int step = 0; step < 3_000; step++) {
      now += random.nextInt(1 + reach / 200);
      int kind = random.nextInt(10);
      long amount = random.nextInt(50);
      if (kind < 5) {
        queue.add(now, amount);
        plain.add(now, amount);
      } else if (kind < 6) {
        long old = now - random.nextInt(reach);
        queue.add(old, amount);
        plain.add(old, amount);
      } else if (kind < 8) {
        TreeMap<Long, Long> taken = new TreeMap<>();
        queue.takeOldest(3 * amount, (generated, bits) -> taken.merge(generated, bits, Long::sum));
        assertThat(taken).isEqualTo(plain.take(3 * amount, true));
      } else if (kind < 9) {
        long dropped = queue.dropNewest(amount);
        assertThat(dropped)
            .isEqualTo(plain.take(amount, false).values().stream().mapToLong(each -> each).sum());
      } else if (random.nextInt(100) == 0) {
        long all = queue.total();
        assertThat(queue.dropNewest(all)).isEqualTo(all);
        plain.take(all, false);
      }
    }
    TreeMap<Long, Long> left = new TreeMap<>();
    queue.forEach(left::put);
    assertThat(left).isEqualTo(plain.bits);
    assertThat(queue.total()).isEqualTo(plain.bits.values().stream().mapToLong(b -> b).sum());
  }

  @Test
  void dataOfManyYearsAreRefusedWithTheirSpan() {
    AgeQueue queue = new AgeQueue();
    queue.add(0, 1);
    Assertions.assertThatThrownBy(() -> queue.add(600_000_000, 1))
        .isInstanceOf(IllegalStateException.class)
        .hasMessageContaining("600000001 s");
  }
}
