package quietspan.planted.link;

import java.time.ZoneId;
import java.util.Locale;
import java.util.TimeZone;

/** Asks for the machine's settings in each way. */
public final class AsksMachine {
  public Locale locale() {
    return Locale.getDefault();
  }

  public TimeZone oldZone() {
    return TimeZone.getDefault();
  }

  public ZoneId zone() {
    return ZoneId.systemDefault();
  }
}
