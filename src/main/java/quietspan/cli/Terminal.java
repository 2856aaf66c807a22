package quietspan.cli;

import java.io.Console;

/** Whether somebody is watching. */
final class Terminal {

  private Terminal() {}

  /** Whether the process was started from a terminal and writes to it. */
  @SuppressWarnings("SystemConsoleNull") // Asked below, where the answer has changed.
  static boolean present() {
    Console console = System.console();
    if (console == null) {
      return false;
    }
    try {
      // From Java 22 on there is a console even without a terminal.
      return (boolean) Console.class.getMethod("isTerminal").invoke(console);
    } catch (ReflectiveOperationException e) {
      return true;
    }
  }
}
