package quietspan.cli;

import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/**
 * The root of the command line: it does nothing itself and names the commands that do.
 *
 * <p>Exit codes: 0 done, 1 our own fault, 2 usage or input.
 */
@Command(
    name = "quietspan",
    description =
        "Plans contacts and antenna repointings so that science stays undisturbed for long spans.",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class)
public final class QuietspanCommand implements Runnable {
  @Spec private CommandSpec spec;

  private QuietspanCommand() {}

  /** Runs one command line, writing results to stdout and remarks to stderr, both as UTF-8. */
  public static int run(String... arguments) {
    return run(
        new PrintWriter(System.out, true, StandardCharsets.UTF_8),
        new PrintWriter(System.err, true, StandardCharsets.UTF_8),
        arguments);
  }

  static int run(PrintWriter results, PrintWriter remarks, String... arguments) {
    return new CommandLine(new QuietspanCommand())
        .setOut(results)
        .setErr(remarks)
        .execute(arguments);
  }

  /** Without a command there is nothing to do, which is a usage error. */
  @Override
  public void run() {
    throw new ParameterException(spec.commandLine(), "Missing command");
  }
}
