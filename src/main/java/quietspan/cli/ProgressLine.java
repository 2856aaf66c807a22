package quietspan.cli;

import java.io.PrintWriter;

/** One line on a terminal that says what is going on, and is gone afterwards. */
final class ProgressLine implements AutoCloseable {

  private static final int WIDTH = 78;

  private final PrintWriter remarks;
  private final boolean shown;

  /**
   * Shows nothing where nobody looks.
   *
   * @param shown whether the remarks go to a terminal
   */
  ProgressLine(PrintWriter remarks, boolean shown) {
    this.remarks = remarks;
    this.shown = shown;
  }

  void show(String what) {
    if (shown) {
      String line = what.length() > WIDTH ? what.substring(0, WIDTH) : what;
      remarks.print("\r" + line + " ".repeat(WIDTH - line.length()));
      remarks.flush();
    }
  }

  @Override
  public void close() {
    if (shown) {
      remarks.print("\r" + " ".repeat(WIDTH) + "\r");
      remarks.flush();
    }
  }
}
