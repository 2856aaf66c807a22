package quietspan.planted.link;

import java.util.Collections;
import java.util.List;
import java.util.Random;
import java.util.SplittableRandom;
import java.util.UUID;
import java.util.concurrent.ThreadLocalRandom;

/** Draws without a seed in each way. */
public final class ThrowsDice {
  public Random random() {
    return new Random();
  }

  public SplittableRandom splittable() {
    return new SplittableRandom();
  }

  public int local() {
    return ThreadLocalRandom.current().nextInt(6);
  }

  public double math() {
    return Math.random();
  }

  public UUID uuid() {
    return UUID.randomUUID();
  }

  public void shuffle(List<String> cards) {
    Collections.shuffle(cards);
  }
}
