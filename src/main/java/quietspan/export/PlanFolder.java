package quietspan.export;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.function.Consumer;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import quietspan.problem.InputException;
import quietspan.problem.Place;
import quietspan.problem.Problem;

/**
 * The folder of a plan, replaced as a whole. The new files are written beside it; then a journal
 * says that they are complete; two renames put them in place; what was there before goes last. A
 * process may end between any two steps: {@link #recover}, with which every command begins, then
 * leaves either the old plan or the new one, each complete.
 *
 * <p>Beside the folder {@code NAME} stand, only meanwhile, {@code .NAME.new}, {@code .NAME.old} and
 * {@code .NAME.journal}. Two processes that replace one folder at the same time are not kept apart.
 */
public final class PlanFolder {

  /** Where a replacement can be cut off, in the order in which it gets there. */
  enum Step {
    BEFORE_FILE,
    BEFORE_JOURNAL,
    BEFORE_MOVING_OLD_AWAY,
    BEFORE_MOVING_NEW_IN,
    BEFORE_DELETING_OLD,
    BEFORE_DELETING_JOURNAL
  }

  /** What a plan folder may hold; anything else is somebody else's and is never deleted. */
  private static final Pattern OURS =
      Pattern.compile("plan\\.json|csv|csv/[^/]+\\.csv|calendars|calendars/[^/]+\\.ics");

  private static final int MOST_LINKS = 20;

  private final Path folder;
  private final Path fresh;
  private final Path old;
  private final Path journal;
  private final Consumer<Step> onStep;

  private PlanFolder(Path folder, Consumer<Step> onStep) {
    this.folder = real(folder);
    String name = this.folder.getFileName() == null ? "" : this.folder.getFileName().toString();
    this.fresh = this.folder.resolveSibling("." + name + ".new");
    this.old = this.folder.resolveSibling("." + name + ".old");
    this.journal = this.folder.resolveSibling("." + name + ".journal");
    this.onStep = onStep;
  }

  /** The folder itself where it is a symbolic link to one, even to one that is missing just now. */
  private static Path real(Path folder) {
    try {
      Path path = folder.toAbsolutePath().normalize();
      for (int hops = 0; Files.isSymbolicLink(path) && hops < MOST_LINKS; hops++) {
        path = path.resolveSibling(Files.readSymbolicLink(path)).normalize();
      }
      return path;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /**
   * Puts these files, and no others, into the folder.
   *
   * @param files bytes by path in the folder, with forward slashes
   * @throws InputException when the folder holds what no plan holds
   */
  public static void replace(Path folder, Map<String, byte[]> files) {
    replace(folder, files, step -> {});
  }

  static void replace(Path folder, Map<String, byte[]> files, Consumer<Step> onStep) {
    try {
      PlanFolder place = new PlanFolder(folder, onStep);
      place.recover();
      place.refuseStrangers(folder);
      place.write(files);
      place.swap();
    } catch (IOException e) {
      throw new UncheckedIOException("the plan folder " + folder + " cannot be written", e);
    }
  }

  /** Completes or undoes a replacement that was cut off. */
  public static void recover(Path folder) {
    try {
      new PlanFolder(folder, step -> {}).recover();
    } catch (IOException e) {
      throw new UncheckedIOException("the plan folder " + folder + " cannot be recovered", e);
    }
  }

  /**
   * Refuses a folder that may not be replaced, before anything is computed for it.
   *
   * @throws InputException when the folder holds what no plan holds
   */
  public static void refuseUnlessReplaceable(Path folder) {
    try {
      PlanFolder place = new PlanFolder(folder, step -> {});
      place.recover();
      place.refuseStrangers(folder);
    } catch (IOException e) {
      throw new UncheckedIOException("the plan folder " + folder + " cannot be read", e);
    }
  }

  private void refuseStrangers(Path asGiven) throws IOException {
    if (folder.getFileName() == null) {
      throw refusal(asGiven, "is the root of a file system");
    }
    if (!Files.exists(folder, LinkOption.NOFOLLOW_LINKS)) {
      return;
    }
    if (!Files.isDirectory(folder)) {
      throw refusal(asGiven, "is no folder");
    }
    try (Stream<Path> entries = Files.walk(folder, 2)) {
      List<String> strangers =
          entries
              .filter(entry -> !entry.equals(folder))
              .map(entry -> folder.relativize(entry).toString().replace('\\', '/'))
              .filter(name -> !OURS.matcher(name).matches())
              .limit(3)
              .sorted()
              .toList();
      if (!strangers.isEmpty()) {
        throw refusal(
            asGiven, "holds " + String.join(", ", strangers) + ", which is no part of a plan");
      }
    }
  }

  private static InputException refusal(Path folder, String what) {
    return new InputException(
        Problem.error(
            Place.wholeFile(folder.toString()),
            "",
            what,
            "a new folder, or one that holds a plan"));
  }

  private void write(Map<String, byte[]> files) throws IOException {
    Files.createDirectories(folder.getParent());
    Files.createDirectory(fresh);
    for (Map.Entry<String, byte[]> file : files.entrySet()) {
      onStep.accept(Step.BEFORE_FILE);
      Path path = fresh.resolve(file.getKey());
      Files.createDirectories(path.getParent());
      try (FileChannel channel =
          FileChannel.open(path, StandardOpenOption.CREATE_NEW, StandardOpenOption.WRITE)) {
        ByteBuffer bytes = ByteBuffer.wrap(file.getValue());
        while (bytes.hasRemaining()) {
          channel.write(bytes);
        }
        channel.force(true);
      }
    }
    onStep.accept(Step.BEFORE_JOURNAL);
    Files.write(
        journal,
        ("The folder "
                + fresh.getFileName()
                + " is complete and takes the place of its"
                + " namesake.\n")
            .getBytes(StandardCharsets.UTF_8),
        StandardOpenOption.CREATE_NEW);
  }

  private void swap() throws IOException {
    if (Files.exists(folder)) {
      onStep.accept(Step.BEFORE_MOVING_OLD_AWAY);
      Files.move(folder, old, StandardCopyOption.ATOMIC_MOVE);
    }
    onStep.accept(Step.BEFORE_MOVING_NEW_IN);
    Files.move(fresh, folder, StandardCopyOption.ATOMIC_MOVE);
    clean();
  }

  private void clean() throws IOException {
    onStep.accept(Step.BEFORE_DELETING_OLD);
    delete(old);
    onStep.accept(Step.BEFORE_DELETING_JOURNAL);
    Files.deleteIfExists(journal);
  }

  private void recover() throws IOException {
    if (folder.getFileName() == null) {
      return;
    }
    if (!Files.exists(journal)) {
      delete(fresh);
      return;
    }
    if (!Files.exists(fresh)) {
      if (Files.exists(old) && !Files.exists(folder)) {
        // Somebody took the new plan away: the old one is better than none.
        Files.move(old, folder, StandardCopyOption.ATOMIC_MOVE);
      }
      clean();
      return;
    }
    if (Files.exists(old) && Files.exists(folder)) {
      throw new InputException(
          Problem.error(
              Place.wholeFile(folder.toString()),
              "",
              "appeared while a plan was being replaced; "
                  + old
                  + " holds the plan before and "
                  + fresh
                  + " the new one",
              "keep one of the three under this name and delete " + journal));
    }
    swap();
  }

  private static void delete(Path tree) throws IOException {
    if (!Files.exists(tree, LinkOption.NOFOLLOW_LINKS)) {
      return;
    }
    try (Stream<Path> entries = Files.walk(tree)) {
      for (Path entry : entries.sorted(Comparator.reverseOrder()).toList()) {
        Files.delete(entry);
      }
    }
  }
}
