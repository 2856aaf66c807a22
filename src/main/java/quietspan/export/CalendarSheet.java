package quietspan.export;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import net.fortuna.ical4j.model.Calendar;
import net.fortuna.ical4j.model.ComponentList;
import net.fortuna.ical4j.model.ParameterList;
import net.fortuna.ical4j.model.Property;
import net.fortuna.ical4j.model.PropertyList;
import net.fortuna.ical4j.model.component.CalendarComponent;
import net.fortuna.ical4j.model.component.VEvent;
import net.fortuna.ical4j.model.parameter.Value;
import net.fortuna.ical4j.model.property.Categories;
import net.fortuna.ical4j.model.property.Description;
import net.fortuna.ical4j.model.property.DtEnd;
import net.fortuna.ical4j.model.property.DtStamp;
import net.fortuna.ical4j.model.property.DtStart;
import net.fortuna.ical4j.model.property.Name;
import net.fortuna.ical4j.model.property.ProdId;
import net.fortuna.ical4j.model.property.RefreshInterval;
import net.fortuna.ical4j.model.property.Sequence;
import net.fortuna.ical4j.model.property.Status;
import net.fortuna.ical4j.model.property.Summary;
import net.fortuna.ical4j.model.property.Transp;
import net.fortuna.ical4j.model.property.Uid;
import net.fortuna.ical4j.model.property.XProperty;
import net.fortuna.ical4j.model.property.immutable.ImmutableVersion;
import quietspan.model.Contact;

/**
 * One calendar file to subscribe to, after RFC 5545 (iCalendar, 2009) and RFC 7986 (new properties,
 * 2016): no METHOD and no ORGANIZER, every instant with its {@code Z}.
 *
 * @param issued stamp of every event
 */
record CalendarSheet(
    String name, String description, String version, Instant issued, List<CalendarEntry> entries) {

  /** How often a subscriber should look again: twice a day. */
  private static final Duration REFRESH = Duration.ofHours(12);

  CalendarSheet {
    entries =
        entries.stream()
            .sorted(
                Comparator.comparing(CalendarEntry::begin)
                    .thenComparing(CalendarEntry::end)
                    .thenComparing(entry -> entry.uid().toString()))
            .toList();
  }

  /** The file, folded, in UTF-8. */
  byte[] write() {
    return Folding.fold(calendar().toString());
  }

  Calendar calendar() {
    List<CalendarComponent> events = new ArrayList<>();
    for (CalendarEntry entry : entries) {
      events.add(event(entry));
    }
    return new Calendar(
        new PropertyList(
            List.of(
                new ProdId("-//Quietspan//quietspan " + version + "//EN"),
                ImmutableVersion.VERSION_2_0,
                new Name(name),
                new XProperty("X-WR-CALNAME", name),
                new Description(description),
                new RefreshInterval(new ParameterList(List.of(Value.DURATION)), REFRESH),
                new XProperty("X-PUBLISHED-TTL", REFRESH.toString()))),
        new ComponentList<>(events));
  }

  private VEvent event(CalendarEntry entry) {
    boolean cancelled = entry.status() == Contact.Status.CANCELLED;
    List<Property> properties =
        List.of(
            new Uid(entry.uid().toString()),
            new DtStamp(issued),
            new DtStart<>(entry.begin()),
            new DtEnd<>(entry.end()),
            new Summary(entry.title()),
            new Description(entry.description()),
            new Categories(entry.category()),
            new Status(entry.status().name()),
            new Sequence(cancelled ? 1 : 0),
            new Transp(entry.free() ? Transp.VALUE_TRANSPARENT : Transp.VALUE_OPAQUE));
    return new VEvent(new PropertyList(properties));
  }
}
