package quietspan.input;

import java.nio.file.Path;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import quietspan.model.Identity;
import quietspan.model.Scenario;
import quietspan.problem.InputException;
import quietspan.problem.Place;
import quietspan.problem.Problem;
import quietspan.problem.Problems;

/** Reads a scenario folder. */
public final class ScenarioReader {

  private final Problems problems = new Problems();
  private final Folder folder;

  private ScenarioReader(Path folder) {
    this.folder = new Folder(folder, problems);
  }

  /**
   * Reads {@code mission.yaml}, {@code stations.yaml}, {@code state.yaml} and the files they name.
   * Ephemeris files are looked for and hashed, their content is left to who computes orbits.
   *
   * @param issuedOverride time stamp to use in place of the mission's own
   * @throws InputException with every complaint about every file when anything is wrong
   */
  public static ScenarioReading read(Path folder, Optional<Instant> issuedOverride) {
    ScenarioReader reader = new ScenarioReader(folder);
    if (!reader.folder.exists()) {
      throw new InputException(
          Problem.error(
              Place.wholeFile(folder.toString()), "", "there is no such folder", "a scenario"));
    }
    return reader.read(issuedOverride);
  }

  private ScenarioReading read(Optional<Instant> issuedOverride) {
    Optional<MissionFile> mission =
        values(MissionFields.FILE, MissionFields.TABLE)
            .map(values -> new MissionFile(values, folder));
    Optional<StationsFile> stations =
        values(StationFields.FILE, StationFields.TABLE).map(StationsFile::new);
    Optional<StateFile> state = values(StateFields.FILE, StateFields.TABLE).map(StateFile::new);
    mission.ifPresent(MissionFile::check);
    stations.ifPresent(file -> file.check(mission.filter(MissionFile::needsBudget).isPresent()));
    state.ifPresent(file -> file.check(mission));
    Optional<CalendarFiles> calendars =
        mission.map(file -> new CalendarFiles(file.values(), file.names(), stations, folder));
    calendars.ifPresent(CalendarFiles::read);
    problems.throwIfErrors();
    // Nothing was complained about, so every file is there.
    List<String> names = mission.get().names();
    Scenario scenario =
        new Scenario(
            new Identity(
                mission.get().mission(),
                issuedOverride.orElseGet(mission.get()::issued),
                folder.inputs()),
            mission.get().period(),
            mission.get().craft(),
            stations.get().model(),
            mission.get().rules(),
            calendars.get().model(),
            state.get().model(names));
    return new ScenarioReading(scenario, problems.warnings());
  }

  private Optional<Values> values(String file, Block table) {
    return folder
        .text(file, Place.wholeFile(file), "")
        .flatMap(text -> YamlFile.read(text, table, new Source(file, problems)));
  }
}
