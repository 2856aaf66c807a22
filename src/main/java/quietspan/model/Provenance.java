package quietspan.model;

import java.util.List;

/**
 * Where a plan comes from.
 *
 * @param version of the program
 * @param stepsDone search steps that led to these decisions; {@code --effort} with this number
 *     gives the same decisions
 */
public record Provenance(
    String version,
    List<InputFile> inputs,
    List<String> sources,
    long seed,
    long effort,
    long stepsDone,
    boolean interrupted,
    List<Waiver> waivers) {

  public Provenance {
    inputs = List.copyOf(inputs);
    sources = List.copyOf(sources);
    waivers = List.copyOf(waivers);
  }
}
