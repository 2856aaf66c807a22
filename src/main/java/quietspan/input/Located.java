package quietspan.input;

import quietspan.problem.Place;

/** A value that keeps where it was read until everything that could be wrong with it is checked. */
record Located<T>(T value, Place place, String path, Source source) {

  void refuse(String what, String right) {
    source.problems().error(place, path, what, right);
  }

  void remark(String what, String right) {
    source.problems().warning(place, path, what, right);
  }
}
