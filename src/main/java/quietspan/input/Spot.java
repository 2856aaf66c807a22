package quietspan.input;

import org.snakeyaml.engine.v2.nodes.Node;
import quietspan.problem.Place;

/**
 * One value in a YAML file before it is understood.
 *
 * @param place where to complain; for a default, where the field could have stood
 * @param path of the field, such as {@code craft[0].antenna.half_cone}
 */
record Spot(Node node, Place place, String path, Source source) {

  /** A value that stands in the file itself. */
  static Spot of(Node node, String path, Source source) {
    return new Spot(node, place(node, source), path, source);
  }

  static Place place(Node node, Source source) {
    return node.getStartMark()
        .map(mark -> source.at(mark.getLine() + 1, mark.getColumn() + 1))
        .orElse(source.whole());
  }

  /** A value inside this one. */
  Spot child(Node inner, String innerPath) {
    return of(inner, innerPath, source);
  }

  void refuse(String what, String right) {
    source.problems().error(place, path, what, right);
  }
}
