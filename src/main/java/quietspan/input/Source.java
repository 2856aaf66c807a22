package quietspan.input;

import quietspan.problem.Place;
import quietspan.problem.Problems;

/** A file under reading, and where its complaints are gathered. */
record Source(String file, Problems problems) {

  Place at(int line, int column) {
    return new Place(file, line, column);
  }

  Place whole() {
    return Place.wholeFile(file);
  }
}
