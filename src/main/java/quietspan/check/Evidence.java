package quietspan.check;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import quietspan.model.Contact;
import quietspan.model.Decisions;
import quietspan.model.Dish;
import quietspan.model.Frozen;
import quietspan.model.Repoint;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.Waiver;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * Everything the judges look at, gathered once.
 *
 * @param contacts those that were not cancelled, by begin
 * @param watches the same contacts, sampled
 */
record Evidence(
    Scenario scenario,
    Sight sight,
    Decisions decisions,
    List<Waiver> waivers,
    Optional<Frozen> frozen,
    List<Contact> contacts,
    List<Watch> watches,
    Science science,
    StoreRecord stores) {

  static Evidence gather(
      Scenario scenario,
      SightLines lines,
      Decisions decisions,
      List<Waiver> waivers,
      Optional<Frozen> frozen) {
    Sight sight = new Sight(lines);
    List<Contact> contacts =
        decisions.contacts().stream()
            .filter(contact -> contact.status() != Contact.Status.CANCELLED)
            .toList();
    List<Watch> watches =
        contacts.stream().map(each -> Watch.of(scenario, sight, decisions, each)).toList();
    Science science = Science.of(scenario, decisions.repoints());
    List<Image> images = new ArrayList<>();
    for (Contact contact : contacts) {
      images.add(Image.of(scenario, sight, contact, images.size()));
    }
    StoreRecord stores =
        new StoreLoops(
                scenario,
                new Timeline(scenario, science.pauses(), images),
                images,
                new LateBook(scenario, sight, waivers))
            .run();
    return new Evidence(
        scenario, sight, decisions, waivers, frozen, contacts, watches, science, stores);
  }

  Dish dish(Contact contact) {
    return scenario.station(contact.station()).dish(contact.antenna()).orElseThrow();
  }

  Interval<OnboardInstant> during(Repoint repoint) {
    return Science.during(scenario, repoint);
  }

  List<Repoint> repoints(String craft) {
    return decisions.repoints().stream().filter(repoint -> repoint.craft().equals(craft)).toList();
  }
}
