package quietspan.planted.link;

import java.time.Clock;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.Date;
import java.util.function.Supplier;

/** Reads the machine's clock in each way. */
public final class ReadsClock {
  public Instant instant() {
    return Instant.now();
  }

  public LocalDate day() {
    return LocalDate.now(ZoneOffset.UTC);
  }

  public Supplier<Instant> reference() {
    return Instant::now;
  }

  public long millis() {
    return System.currentTimeMillis();
  }

  public long nanos() {
    return System.nanoTime();
  }

  public Clock clock() {
    return Clock.systemUTC();
  }

  @SuppressWarnings("JavaUtilDate")
  public Date date() {
    return new Date();
  }
}
