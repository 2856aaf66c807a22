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

  /** Complains about a line. */
  void refuse(int line, String field, String what, String right) {
    problems.error(at(line, 1), field, what, right);
  }

  /** Says which choice was made at a line. */
  void remark(int line, String field, String what, String right) {
    problems.warning(at(line, 1), field, what, right);
  }
}
