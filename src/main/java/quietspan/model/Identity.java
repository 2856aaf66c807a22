package quietspan.model;

import java.time.Instant;
import java.util.List;

/**
 * What identifies a scenario's reading.
 *
 * @param issued time stamp for everything that is written
 * @param inputs every file that was read, by path
 */
public record Identity(String mission, Instant issued, List<InputFile> inputs) {

  public Identity {
    inputs = List.copyOf(inputs);
  }
}
