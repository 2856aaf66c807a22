package quietspan.model;

import java.util.OptionalDouble;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.DataVolume;

/**
 * What becomes of a contact.
 *
 * @param onboard its image on board: begin rounded up and end rounded down to the second
 * @param capacity what could be sent after locks, overhead and the usable share
 * @param delivered what was sent
 * @param longestLatencySeconds of the bits delivered in it; absent when none were, or not measured
 */
public record ContactOutcome(
    String contact,
    Interval<OnboardInstant> onboard,
    DataVolume capacity,
    DataVolume delivered,
    OptionalDouble longestLatencySeconds) {

  public ContactOutcome(
      String contact, Interval<OnboardInstant> onboard, DataVolume capacity, DataVolume delivered) {
    this(contact, onboard, capacity, delivered, OptionalDouble.empty());
  }
}
