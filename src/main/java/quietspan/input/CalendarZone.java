package quietspan.input;

import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.TreeSet;

/**
 * The zone of a calendar's times: UTC, or what a VTIMEZONE of the same file says. The zone tables
 * of the machine are not asked, because they differ from one machine to the next.
 */
final class CalendarZone {

  static final CalendarZone UTC = new CalendarZone(ZoneOffset.UTC, List.of());

  /** From this instant on, this offset. */
  record Onset(Instant from, ZoneOffset offset) {}

  private final ZoneOffset before;
  private final List<Onset> onsets;

  /** Every offset that occurs, the most eastern first. */
  private final List<ZoneOffset> offsets;

  /**
   * @param before offset before the first onset
   * @param onsets in any order
   */
  CalendarZone(ZoneOffset before, List<Onset> onsets) {
    this.before = before;
    this.onsets = new ArrayList<>(onsets);
    this.onsets.sort(Comparator.comparing(Onset::from));
    TreeSet<ZoneOffset> all = new TreeSet<>(List.of(before));
    onsets.forEach(onset -> all.add(onset.offset()));
    this.offsets = List.copyOf(all);
  }

  private ZoneOffset at(Instant instant) {
    ZoneOffset offset = before;
    for (Onset onset : onsets) {
      if (onset.from().isAfter(instant)) {
        break;
      }
      offset = onset.offset();
    }
    return offset;
  }

  /**
   * The instant of local digits. Digits that occur twice are taken at their first occurrence, and
   * digits that a change of clocks leaves out with the offset before the change (RFC 5545, 3.3.5).
   */
  Instant instant(LocalDateTime local) {
    // A more eastern offset makes an earlier instant, so the first that fits is the first to occur.
    for (ZoneOffset offset : offsets) {
      Instant instant = local.toInstant(offset);
      if (at(instant).equals(offset)) {
        return instant;
      }
    }
    // The digits are left out: the most eastern offset puts them before the change.
    return local.toInstant(at(local.toInstant(offsets.get(0))));
  }
}
