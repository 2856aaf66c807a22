package quietspan.time;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.List;

/**
 * An immutable set of instants of one clock, kept as sorted intervals that neither overlap nor
 * touch.
 *
 * @param <T> the clock
 */
public record IntervalSet<T extends ClockInstant<T>>(List<Interval<T>> parts) {

  public IntervalSet {
    parts = List.copyOf(parts);
    for (int i = 1; i < parts.size(); i++) {
      if (!parts.get(i - 1).end().isBefore(parts.get(i).begin())) {
        throw new IllegalArgumentException("parts overlap, touch or are out of order: " + parts);
      }
    }
  }

  public static <T extends ClockInstant<T>> IntervalSet<T> empty() {
    return new IntervalSet<>(List.of());
  }

  /** The union of any intervals, in any order; touching ones become one. */
  public static <T extends ClockInstant<T>> IntervalSet<T> of(Collection<Interval<T>> intervals) {
    List<Interval<T>> sorted = new ArrayList<>(intervals);
    sorted.sort(Comparator.comparing(Interval<T>::begin));
    List<Interval<T>> merged = new ArrayList<>();
    for (Interval<T> next : sorted) {
      int last = merged.size() - 1;
      if (last >= 0 && !next.begin().isAfter(merged.get(last).end())) {
        merged.set(last, merged.get(last).hull(next));
      } else {
        merged.add(next);
      }
    }
    return new IntervalSet<>(merged);
  }

  public boolean isEmpty() {
    return parts.isEmpty();
  }

  public boolean contains(T instant) {
    return parts.stream().anyMatch(part -> part.contains(instant));
  }

  public boolean overlaps(Interval<T> interval) {
    return parts.stream().anyMatch(part -> part.overlaps(interval));
  }

  public IntervalSet<T> union(IntervalSet<T> other) {
    List<Interval<T>> all = new ArrayList<>(parts);
    all.addAll(other.parts);
    return of(all);
  }

  public IntervalSet<T> intersection(IntervalSet<T> other) {
    List<Interval<T>> common = new ArrayList<>();
    int i = 0;
    int j = 0;
    while (i < parts.size() && j < other.parts.size()) {
      parts.get(i).intersection(other.parts.get(j)).ifPresent(common::add);
      if (parts.get(i).end().isBefore(other.parts.get(j).end())) {
        i++;
      } else {
        j++;
      }
    }
    return of(common);
  }

  /** The instants of this set that are not in the other. */
  public IntervalSet<T> minus(IntervalSet<T> other) {
    List<Interval<T>> left = new ArrayList<>();
    for (Interval<T> part : parts) {
      T from = part.begin();
      for (Interval<T> hole : other.parts) {
        if (!hole.overlaps(part)) {
          continue;
        }
        if (from.isBefore(hole.begin())) {
          left.add(new Interval<>(from, hole.begin()));
        }
        from = hole.end();
      }
      if (from.isBefore(part.end())) {
        left.add(new Interval<>(from, part.end()));
      }
    }
    return new IntervalSet<>(left);
  }
}
