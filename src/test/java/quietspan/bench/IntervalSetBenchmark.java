package quietspan.bench;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.IntervalSet;

/** How long the union of many intervals takes: passes and outages of a quarter of a year. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 3, time = 1)
public class IntervalSetBenchmark {
  @Param({"100", "2000"})
  private int count;

  private List<Interval<GroundInstant>> intervals;

  @Setup
  public void draw() {
    SplittableRandom random = new SplittableRandom(1);
    GroundInstant start = GroundInstant.parse("2031-01-01T00:00:00Z");
    intervals = new ArrayList<>();
    for (int i = 0; i < count; i++) {
      GroundInstant begin = start.plus(Duration.ofSeconds(random.nextInt(91 * 86_400)));
      intervals.add(Interval.of(begin, Duration.ofSeconds(1 + random.nextInt(36_000))));
    }
  }

  @Benchmark
  public IntervalSet<GroundInstant> union() {
    return IntervalSet.of(intervals);
  }
}
