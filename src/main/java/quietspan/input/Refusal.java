package quietspan.input;

/**
 * A value cannot be taken; the reader of the field adds where it stands. Never leaves the package.
 */
final class Refusal extends Exception {

  private static final long serialVersionUID = 1L;

  private final String right;

  /**
   * @param what what was read and why it is wrong
   * @param right what would be right
   */
  Refusal(String what, String right) {
    super(what);
    this.right = right;
  }

  String what() {
    return getMessage();
  }

  String right() {
    return right;
  }

  /** The text as it is shown in complaints: on one line, not too long, in quotation marks. */
  static String quoted(String text) {
    StringBuilder shown = new StringBuilder("\"");
    int length = Math.min(text.length(), 60);
    for (int i = 0; i < length; i++) {
      char c = text.charAt(i);
      shown.append(Character.isISOControl(c) ? ' ' : c);
    }
    return shown.append(length < text.length() ? "...\"" : "\"").toString();
  }
}
