package quietspan.model;

import java.util.List;

/**
 * A store at an on-board instant where its slope changes.
 *
 * @param onboardEpochSecond on-board UTC, whole seconds since 1970
 * @param fillBits total fill
 * @param bitsByClass fill by data class in order of priority
 */
public record StorePoint(long onboardEpochSecond, long fillBits, List<Long> bitsByClass) {

  public StorePoint {
    bitsByClass = List.copyOf(bitsByClass);
  }
}
