package quietspan.input;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import quietspan.model.Scenario;
import quietspan.problem.InputException;
import quietspan.problem.Problem;

/** A small invented scenario as texts that a test can bend before they are written and read. */
final class FolderOfTexts {

  private final Map<String, byte[]> files = new TreeMap<>();
  private final Path folder;

  /** Two craft, one station with two antennas, one calendar of each meaning. */
  FolderOfTexts(Path folder) {
    this.folder = folder;
    put("mission.yaml", MISSION);
    put("stations.yaml", STATIONS);
    put("state.yaml", STATE);
    put("outage.ics", calendar(event("o1", "20310902T000000Z", "20310902T060000Z", "")));
    put("guard.ics", calendar(event("p1", "20310905T000000Z", "20310906T000000Z", "")));
    put(
        "booked.ics",
        calendar(event("c1", "20310903T100000Z", "20310903T120000Z", "CATEGORIES:Reed\n")));
  }

  static final String MISSION =
      """
      mission: Small
      issued: 2031-08-20T12:00:00Z
      period:
        begin_onboard_utc: 2031-09-01T00:00:00Z
        end_onboard_utc: 2031-09-15T00:00:00Z
      formation:
        epoch_tdb: 2031-09-01T00:00:00
        arm: 1.6e6 km
        trailing: 31 deg
      craft:
        - name: Reed
          orbit: {corner: 1}
          antenna:
            half_cone: 2.1 deg
            half_power_width: 4.6 deg
            move: 20 min
            settle: 4 h
            two_axes: {elevation_from: 0 deg, elevation_to: 40 deg, step: 0.5 deg}
          rates:
            eirp: 49.2 dBW
            ladder: [12 kbit/s, 24 kbit/s]
          store: 12 Gbit
          generation:
            - {data_class: bulk, rate: 17 kbit/s}
        - name: Tern
          orbit: {corner: 2}
          antenna:
            half_cone: 1.7 deg
            move: 30 min
            settle: 5 h
            azimuth_only: {azimuth_from: 300 deg, azimuth_to: 60 deg, elevation: 12.9 deg}
          rates:
            by_off_pointing:
              - {up_to: 1 deg, rate: 80 kbit/s}
              - {up_to: 2 deg, rate: 40 kbit/s}
          store: 10 Gbit
          generation:
            - data_class: bulk
              phases:
                - {from_onboard_utc: 2031-09-01T00:00:00Z, rate: 5 kbit/s}
                - {from_onboard_utc: 2031-09-08T00:00:00Z, rate: 6 kbit/s}
      link: {frequency: 8.42 GHz, required_eb_n0: 1.5 dB, margin: 3 dB}
      science: {minimum_quiet_span: 48 h, warm_up: 2 h}
      data:
        classes:
          - {name: bulk, priority: 2, latency_limit: 36 h}
          - {name: quick-look, priority: 1, latency_limit: 12 h}
      margins: {pointing_allowance: 0.1 deg}
      calendars:
        - {file: outage.ics, meaning: outage, clock: ground, station: Fell, antenna: north}
        - {file: guard.ics, meaning: protected, clock: onboard}
        - {file: booked.ics, meaning: confirmed, clock: ground, station: Fell, antenna: south}
      """;

  static final String STATIONS =
      """
      stations:
        - name: Fell
          latitude: 38.3 deg
          longitude: 33.2 deg
          mask_by_azimuth:
            - {azimuth: 0 deg, elevation: 10 deg}
            - {azimuth: 120 deg, elevation: 14 deg}
            - {azimuth: 360 deg, elevation: 10 deg}
          antennas:
            - name: north
              g_over_t: 50.1 dB/K
              setup: 45 min
              teardown: 15 min
              minimum_contact: 40 min
              maximum_contact: 10 h
            - name: south
              g_over_t_by_elevation:
                - {elevation: 10 deg, g_over_t: 47 dB/K}
                - {elevation: 30 deg, g_over_t: 48 dB/K}
              dead_zones:
                - {azimuth_from: 350 deg, azimuth_to: 10 deg, up_to_elevation: 20 deg}
              lowest_elevation: 5 deg
              highest_elevation: 85 deg
              setup: 30 min
              teardown: 10 min
              changeover: 20 min
              minimum_contact: 40 min
              maximum_contact: 8 h
      """;

  static final String STATE =
      """
      quiet_since_onboard_utc: 2031-08-30T00:00:00Z
      last_contact_end_ground_utc: 2031-08-31T20:00:00Z
      craft:
        - name: Reed
          aim: {azimuth: 190.5 deg, elevation: 12 deg}
          fill:
            - {data_class: bulk, volume: 3 Gbit, oldest_onboard_utc: 2031-08-31T00:00:00Z}
            - {data_class: quick-look, volume: 1 Gbit}
          last_repoint_onboard_utc: 2031-08-29T10:30:00Z
        - name: Tern
          aim: {azimuth: 310.25 deg, elevation: 12.9 deg}
      """;

  static String calendar(String body) {
    return ("BEGIN:VCALENDAR\nVERSION:2.0\nPRODID:-//Test//EN\n" + body + "END:VCALENDAR\n")
        .replace("\n", "\r\n");
  }

  static String event(String uid, String begin, String end, String more) {
    return "BEGIN:VEVENT\nUID:"
        + uid
        + "\nDTSTAMP:20310101T000000Z\nDTSTART:"
        + begin
        + "\nDTEND:"
        + end
        + "\n"
        + more
        + "END:VEVENT\n";
  }

  void put(String file, String text) {
    put(file, text.getBytes(StandardCharsets.UTF_8));
  }

  void put(String file, byte[] bytes) {
    files.put(file, bytes);
  }

  void remove(String file) {
    files.remove(file);
  }

  String text(String file) {
    return new String(files.get(file), StandardCharsets.UTF_8);
  }

  /** Replaces what must stand there exactly once. */
  void replace(String file, String from, String to) {
    String text = text(file);
    assertThat(text.split(java.util.regex.Pattern.quote(from), -1))
        .as("\"%s\" stands once in %s", from, file)
        .hasSize(2);
    put(file, text.replace(from, to));
  }

  ScenarioReading read() {
    try {
      for (Map.Entry<String, byte[]> file : files.entrySet()) {
        Path path = folder.resolve(file.getKey());
        Files.createDirectories(path.getParent());
        Files.write(path, file.getValue());
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return ScenarioReader.read(folder, Optional.empty());
  }

  Scenario scenario() {
    return read().scenario();
  }

  /** The complaints, or none when the folder can be read. */
  List<String> complaints() {
    try {
      read();
      return List.of();
    } catch (InputException e) {
      return e.problems().stream()
          .filter(problem -> problem.level() == Problem.Level.ERROR)
          .map(Problem::toString)
          .toList();
    }
  }

  List<String> warnings() {
    return read().warnings().stream().map(Problem::toString).toList();
  }
}
