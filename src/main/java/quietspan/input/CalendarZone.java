package quietspan.input;

import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Optional;
import java.util.TreeSet;
import net.fortuna.ical4j.model.component.Observance;
import net.fortuna.ical4j.model.component.VTimeZone;
import net.fortuna.ical4j.model.property.TzOffsetFrom;
import net.fortuna.ical4j.model.property.TzOffsetTo;

/**
 * The zone of a calendar's times: UTC, or what a VTIMEZONE of the same file says. The zone tables
 * of the machine are not asked, because they differ from one machine to the next.
 */
final class CalendarZone {

  static final CalendarZone UTC = new CalendarZone(Optional.empty(), List.of(ZoneOffset.UTC));

  private final Optional<VTimeZone> definition;

  /** Every offset that occurs, the most eastern first. */
  private final List<ZoneOffset> offsets;

  private CalendarZone(Optional<VTimeZone> definition, List<ZoneOffset> offsets) {
    this.definition = definition;
    this.offsets = offsets;
  }

  /** Fails with an unchecked exception of the library where the definition is broken. */
  static CalendarZone of(VTimeZone definition) {
    TreeSet<ZoneOffset> offsets = new TreeSet<>();
    for (Observance observance : definition.getObservances()) {
      offsets.add(to(observance));
      offsets.add(from(observance));
    }
    return new CalendarZone(Optional.of(definition), List.copyOf(offsets));
  }

  private static ZoneOffset to(Observance observance) {
    return observance.<TzOffsetTo>getRequiredProperty("TZOFFSETTO").getOffset();
  }

  private static ZoneOffset from(Observance observance) {
    return observance.<TzOffsetFrom>getRequiredProperty("TZOFFSETFROM").getOffset();
  }

  private ZoneOffset at(Instant instant) {
    Observance observance = definition.get().getApplicableObservance(instant);
    if (observance != null) {
      return to(observance);
    }
    // Before the first onset: what the earliest observance comes from.
    return definition.get().getObservances().stream()
        .min(java.util.Comparator.comparing(CalendarZone::onset))
        .map(CalendarZone::from)
        .orElse(ZoneOffset.UTC);
  }

  private static String onset(Observance observance) {
    return observance.getRequiredProperty("DTSTART").getValue();
  }

  /**
   * The instant of local digits. Digits that occur twice are taken at their first occurrence, and
   * digits that a change of clocks leaves out with the offset before the change (RFC 5545, 3.3.5).
   */
  Instant instant(LocalDateTime local) {
    if (definition.isEmpty()) {
      return local.toInstant(ZoneOffset.UTC);
    }
    // A more eastern offset makes an earlier instant, so the first that fits is the first to occur.
    for (ZoneOffset offset : offsets) {
      Instant instant = local.toInstant(offset);
      if (at(instant).equals(offset)) {
        return instant;
      }
    }
    return local.toInstant(at(local.toInstant(offsets.get(0))));
  }
}
