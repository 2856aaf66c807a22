package quietspan.export;

import quietspan.model.Contact;
import quietspan.model.Dish;
import quietspan.model.Look;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * Every clock of a contact, as the people on both ends need them.
 *
 * @param busy ground, from the begin of setup to the end of teardown
 * @param onboard the craft's transmitter on and off: begin rounded up and end rounded down to the
 *     second, so that the station hears all of it
 * @param uplinkBegin on-board arrival of what the station transmits at the contact's begin, rounded
 *     to the second
 * @param uplinkEnd the same of its end
 * @param owltSeconds downlink one-way light time at the begin, to the Earth's centre (s)
 */
record ContactClocks(
    Contact contact,
    Interval<GroundInstant> busy,
    Interval<OnboardInstant> onboard,
    OnboardInstant uplinkBegin,
    OnboardInstant uplinkEnd,
    double owltSeconds,
    Look begin,
    Look end) {

  static ContactClocks of(Scenario scenario, SightLines sightLines, Contact contact) {
    String craft = contact.craft();
    GroundInstant begin = contact.during().begin();
    GroundInstant end = contact.during().end();
    Dish dish =
        scenario
            .station(contact.station())
            .dish(contact.antenna())
            .orElseThrow(
                () ->
                    new IllegalArgumentException(
                        "no antenna " + contact.antenna() + " at " + contact.station()));
    return new ContactClocks(
        contact,
        contact.during().widened(dish.setup(), dish.teardown()),
        Interval.of(
            sightLines.onboard(craft, begin).ceilToSecond(),
            sightLines.onboard(craft, end).floorToSecond()),
        uplink(sightLines, craft, begin),
        uplink(sightLines, craft, end),
        sightLines.downlinkSeconds(craft, begin),
        sightLines.look(contact.station(), craft, begin),
        sightLines.look(contact.station(), craft, end));
  }

  private static OnboardInstant uplink(
      SightLines sightLines, String craft, GroundInstant transmit) {
    return new OnboardInstant(
        Words.second(
            new OnboardInstant(transmit.utc())
                .plusSeconds(sightLines.uplinkSeconds(craft, transmit))
                .utc()));
  }
}
