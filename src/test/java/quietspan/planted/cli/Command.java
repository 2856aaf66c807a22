package quietspan.planted.cli;

import java.time.Clock;
import java.time.Instant;
import picocli.CommandLine;
import quietspan.planted.check.Verdict;

/** Rightly reads the clock, prints, and knows its library and all that lies below. */
public record Command(CommandLine line, Verdict verdict) {
  public Instant now() {
    return Clock.systemUTC().instant();
  }

  public void print() {
    System.out.println(verdict);
  }
}
