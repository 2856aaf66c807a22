package quietspan.cli;

import picocli.CommandLine.Help.Ansi;
import picocli.CommandLine.Model.CommandSpec;

/** The first word of a screen in colour, where the terminal and NO_COLOR allow it. */
final class Verdict {

  private Verdict() {}

  /**
   * The screen, unchanged but for the colour.
   *
   * @param word with which the screen begins
   */
  static String coloured(CommandSpec spec, String screen, boolean good, String word) {
    Ansi ansi = spec.commandLine().getColorScheme().ansi();
    String style = good ? "bold,green" : "bold,red";
    return ansi.string("@|" + style + " " + word + "|@") + screen.substring(word.length());
  }
}
