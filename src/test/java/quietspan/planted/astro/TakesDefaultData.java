package quietspan.planted.astro;

import org.orekit.time.TimeScale;
import org.orekit.time.TimeScalesFactory;

/** Takes whatever data the library finds by itself. */
public final class TakesDefaultData {
  public TimeScale scale() {
    return TimeScalesFactory.getUTC();
  }
}
