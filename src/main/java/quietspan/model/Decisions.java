package quietspan.model;

import java.util.Comparator;
import java.util.List;

/**
 * What a plan decides; everything else follows from it.
 *
 * @param repoints by start, then craft
 * @param contacts by begin, then station, antenna and craft
 */
public record Decisions(List<Repoint> repoints, List<Contact> contacts) {

  public Decisions {
    repoints =
        repoints.stream()
            .sorted(Comparator.comparing(Repoint::start).thenComparing(Repoint::craft))
            .toList();
    contacts =
        contacts.stream()
            .sorted(
                Comparator.comparing((Contact contact) -> contact.during().begin())
                    .thenComparing(Contact::station)
                    .thenComparing(Contact::antenna)
                    .thenComparing(Contact::craft))
            .toList();
  }
}
