package quietspan.check;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import quietspan.model.Contact;
import quietspan.model.RateStep;
import quietspan.model.Scenario;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.DataRate;

/**
 * A contact as its craft lives it, in whole seconds on board from the begin of the period: the
 * image's begin is rounded up, its end down. Both may lie outside the period.
 *
 * @param index among the images
 * @param craft index in the mission file
 * @param data when it sends, and how much
 * @param deliverySeconds from reception to delivery (s)
 */
record Image(
    int index,
    Contact contact,
    int craft,
    long begin,
    long end,
    List<Sending> data,
    double deliverySeconds) {

  /** A stretch with one effective rate, inside the period. */
  record Sending(long from, long to, long bitsPerSecond) {}

  Image {
    data = List.copyOf(data);
  }

  boolean holds(long second) {
    return begin <= second && second < end;
  }

  long rateAt(long second) {
    for (Sending sending : data) {
      if (sending.from <= second && second < sending.to) {
        return sending.bitsPerSecond;
      }
    }
    return 0;
  }

  long capacityBits() {
    return data.stream()
        .mapToLong(sending -> (sending.to - sending.from) * sending.bitsPerSecond)
        .sum();
  }

  static Image of(Scenario scenario, Sight sight, Contact contact, int index) {
    Interval<OnboardInstant> period = scenario.period();
    long periodSeconds = period.length().toSeconds();
    String craft = contact.craft();
    long begin = roundedUp(period, sight.onboard(craft, contact.during().begin()));
    long end = roundedDown(period, sight.onboard(craft, contact.during().end()));
    var rules = scenario.rules().contacts();
    long locked = begin + Seconds.roundedUp(rules.lockUp());
    List<Sending> data = new ArrayList<>();
    List<RateStep> steps = contact.steps();
    for (int i = 0; i < steps.size(); i++) {
      long from = Math.max(locked, 0);
      if (i > 0) {
        long change = changeOf(period, sight, contact, i);
        from = Math.max(from, change + Seconds.roundedUp(rules.relock()));
      }
      long to = i + 1 < steps.size() ? changeOf(period, sight, contact, i + 1) : end;
      to = Math.min(Math.min(to, end), periodSeconds);
      long rate = usable(scenario, steps.get(i).rate());
      if (from < to) {
        data.add(new Sending(from, to, rate));
      }
    }
    int craftIndex = scenario.craft().indexOf(scenario.craft(craft));
    double delivery = Seconds.of(scenario.station(contact.station()).deliveryDelay());
    return new Image(index, contact, craftIndex, begin, end, data, delivery);
  }

  /** Less frame overhead and the share of volume not counted on, each rounded down. */
  private static long usable(Scenario scenario, DataRate rate) {
    // 1 - 0.9 in binary is a little less than 0.1.
    BigDecimal payload =
        BigDecimal.ONE.subtract(BigDecimal.valueOf(scenario.rules().contacts().overheadShare()));
    return rate.share(payload.doubleValue())
        .share(scenario.rules().margins().usableVolumeShare())
        .bitsPerSecond();
  }

  private static long changeOf(
      Interval<OnboardInstant> period, Sight sight, Contact contact, int step) {
    GroundInstant from = contact.steps().get(step).from();
    return roundedUp(period, sight.onboard(contact.craft(), from));
  }

  private static long roundedUp(Interval<OnboardInstant> period, OnboardInstant instant) {
    return instant.ceilToSecond().epochSecond() - period.begin().epochSecond();
  }

  private static long roundedDown(Interval<OnboardInstant> period, OnboardInstant instant) {
    return instant.epochSecond() - period.begin().epochSecond();
  }
}
