package quietspan.run;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;
import quietspan.model.InputFile;

/**
 * Finds the scenario of a plan by what was in its files, since a plan tells no path: the same
 * inputs give the same plan wherever they lie. Looked through are the folders above the plan and
 * their folders, then the working folder and its folders; the one with the most files unchanged is
 * taken, the nearest of equals.
 */
final class ScenarioSearch {

  private static final String MISSION = "mission.yaml";

  private ScenarioSearch() {}

  /** Absent when no folder holds a single file as the plan knows it. */
  static Optional<Path> find(Path plan, Path workingFolder, List<InputFile> inputs) {
    Path best = null;
    long most = 0;
    for (Path candidate : candidates(plan, workingFolder)) {
      long unchanged = inputs.stream().filter(input -> unchanged(candidate, input)).count();
      if (unchanged > most) {
        best = candidate;
        most = unchanged;
      }
    }
    return Optional.ofNullable(best);
  }

  private static Set<Path> candidates(Path plan, Path workingFolder) {
    Set<Path> folders = new LinkedHashSet<>();
    for (Path above = plan.toAbsolutePath().normalize().getParent();
        above != null;
        above = above.getParent()) {
      add(folders, above);
    }
    add(folders, workingFolder.toAbsolutePath().normalize());
    return folders;
  }

  private static void add(Set<Path> folders, Path folder) {
    List<Path> inside = new ArrayList<>();
    inside.add(folder);
    try (Stream<Path> entries = Files.list(folder)) {
      entries.filter(Files::isDirectory).sorted().forEach(inside::add);
    } catch (IOException | UncheckedIOException e) {
      // A folder that may not be listed holds no scenario of ours.
      return;
    }
    inside.stream()
        .filter(each -> Files.isRegularFile(each.resolve(MISSION)))
        .forEach(folders::add);
  }

  private static boolean unchanged(Path folder, InputFile input) {
    try {
      Path file = folder.resolve(input.path());
      return Files.isRegularFile(file) && sha256(Files.readAllBytes(file)).equals(input.sha256());
    } catch (IOException | RuntimeException e) {
      // What cannot be read, or is no path here, is not the file that was read then.
      return false;
    }
  }

  private static String sha256(byte[] bytes) {
    try {
      return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes));
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
    }
  }
}
