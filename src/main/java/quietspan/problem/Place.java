package quietspan.problem;

import java.util.Comparator;

/**
 * A place in an input file. Line and column count from 1; 0 stands for the file as a whole. The
 * file is named relative to the scenario folder, with forward slashes.
 */
public record Place(String file, int line, int column) implements Comparable<Place> {

  private static final Comparator<Place> ORDER =
      Comparator.comparing(Place::file)
          .thenComparingInt(Place::line)
          .thenComparingInt(Place::column);

  public static Place wholeFile(String file) {
    return new Place(file, 0, 0);
  }

  @Override
  public int compareTo(Place other) {
    return ORDER.compare(this, other);
  }

  /** {@code file:line:column}, or the file alone. */
  @Override
  public String toString() {
    return line == 0 ? file : file + ":" + line + ":" + column;
  }
}
