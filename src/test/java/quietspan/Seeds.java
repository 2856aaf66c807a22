package quietspan;

import java.lang.annotation.Documented;
import java.lang.annotation.ElementType;
import java.lang.annotation.Retention;
import java.lang.annotation.RetentionPolicy;
import java.lang.annotation.Target;
import org.junit.jupiter.api.TestTemplate;
import org.junit.jupiter.api.extension.ExtendWith;

/**
 * A seeded random test: the method runs once for each of {@link #count} seeds, counted up from
 * {@link #from}, and the seed stands in the name of the run and in its failure.
 *
 * <p>The method takes one parameter that carries the seed: a {@code long}, or a {@link
 * java.util.Random}, {@link java.util.SplittableRandom} or {@link java.util.random.RandomGenerator}
 * that starts from it. {@code -Dseed=17} runs seed 17 alone.
 */
@Documented
@Target(ElementType.METHOD)
@Retention(RetentionPolicy.RUNTIME)
@TestTemplate
@ExtendWith(SeedsExtension.class)
public @interface Seeds {
  /** How many seeds, at least one. */
  int count() default 50;

  /** The first seed. */
  long from() default 1;
}
