package quietspan.cli;

import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.ScopeType;
import picocli.CommandLine.Spec;

/** The root of the command line: it does nothing itself and names the commands that do. */
@Command(
    name = "quietspan",
    description =
        "Plans contacts and antenna repointings so that science stays undisturbed for long spans.",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    subcommands = {
      PlanCommand.class,
      CheckCommand.class,
      StrategiesCommand.class,
      LintCommand.class,
      PassesCommand.class,
      GeometryCommand.class,
      CoverageCommand.class,
      RulesCommand.class
    },
    footer = {
      "",
      "Exit codes: 0 done, 1 our own fault, 2 usage or input, 3 shortfall or findings,",
      "130 interrupted with nothing to deliver."
    })
public final class QuietspanCommand implements Runnable {
  @Spec private CommandSpec spec;

  @Option(
      names = "--verbose",
      scope = ScopeType.INHERIT,
      description = "Where something went wrong inside the program.")
  private boolean verbose;

  private QuietspanCommand() {}

  /** Runs one command line, writing results to stdout and remarks to stderr, both as UTF-8. */
  public static int run(String... arguments) {
    return run(
        new PrintWriter(System.out, true, StandardCharsets.UTF_8),
        new PrintWriter(System.err, true, StandardCharsets.UTF_8),
        arguments);
  }

  static int run(PrintWriter results, PrintWriter remarks, String... arguments) {
    QuietspanCommand root = new QuietspanCommand();
    Faults faults = new Faults();
    CommandLine command =
        new CommandLine(root)
            .setCaseInsensitiveEnumValuesAllowed(true)
            .setExecutionExceptionHandler(faults)
            .setParameterExceptionHandler(faults)
            .setOut(results)
            .setErr(remarks);
    try {
      return command.execute(arguments);
    } catch (Error fault) {
      // Memory or stack used up: one line, like any other fault of ours.
      return Faults.handle(fault, command, root.verbose);
    }
  }

  /** Without a command there is nothing to do, which is a usage error. */
  @Override
  public void run() {
    throw new ParameterException(spec.commandLine(), "Missing command");
  }
}
