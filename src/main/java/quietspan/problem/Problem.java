package quietspan.problem;

/**
 * One complaint about the input.
 *
 * @param level whether the input is refused or only remarked upon
 * @param place where it stands
 * @param field the path of the field, such as {@code craft[0].antenna.half_cone}; may be empty
 * @param what what was read and why it is wrong
 * @param right what would be right; may be empty
 */
public record Problem(Level level, Place place, String field, String what, String right) {

  /** How bad it is. */
  public enum Level {
    ERROR,
    WARNING
  }

  public static Problem error(Place place, String field, String what, String right) {
    return new Problem(Level.ERROR, place, field, what, right);
  }

  public static Problem warning(Place place, String field, String what, String right) {
    return new Problem(Level.WARNING, place, field, what, right);
  }

  /** {@code file:line:column: field: what is wrong (what would be right)}. */
  @Override
  public String toString() {
    StringBuilder text = new StringBuilder(place.toString()).append(": ");
    if (level == Level.WARNING) {
      text.append("warning: ");
    }
    if (!field.isEmpty()) {
      text.append(field).append(": ");
    }
    text.append(what);
    if (!right.isEmpty()) {
      text.append(" (").append(right).append(')');
    }
    return text.toString();
  }
}
