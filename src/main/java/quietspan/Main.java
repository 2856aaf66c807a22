package quietspan;

import quietspan.cli.QuietspanCommand;

/** Where the program starts. */
public final class Main {
  private Main() {}

  /** Runs the command that the arguments name and ends the process with its exit code. */
  public static void main(String[] arguments) {
    System.exit(QuietspanCommand.run(arguments));
  }
}
