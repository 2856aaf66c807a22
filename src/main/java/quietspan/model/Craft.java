package quietspan.model;

import java.util.List;
import quietspan.units.DataRate;
import quietspan.units.DataVolume;

/**
 * One spacecraft.
 *
 * @param store capacity of its memory
 * @param crossLink highest rate at which it sends to another craft; zero for none
 * @param generation what it makes, one entry per data class it makes
 */
public record Craft(
    String name,
    Orbit orbit,
    Attitude attitude,
    HighGainAntenna antenna,
    RateLadder rates,
    DataVolume store,
    DataRate crossLink,
    List<Generation> generation) {

  public Craft {
    generation = List.copyOf(generation);
  }
}
