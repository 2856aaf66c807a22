package quietspan.planted.astro;

import java.time.Instant;
import org.orekit.time.AbsoluteDate;

/** Takes whatever leap seconds the library finds by itself. */
public final class MakesDefaultDate {
  public AbsoluteDate date(Instant instant) {
    return new AbsoluteDate(instant);
  }
}
