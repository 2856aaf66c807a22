package quietspan.cli;

import java.io.PrintWriter;
import java.io.UncheckedIOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.FileSystemException;
import java.nio.file.NoSuchFileException;
import java.nio.file.NotDirectoryException;
import java.util.concurrent.CancellationException;
import picocli.CommandLine;
import picocli.CommandLine.IExecutionExceptionHandler;
import picocli.CommandLine.IParameterExceptionHandler;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.ParseResult;
import picocli.CommandLine.UnmatchedArgumentException;
import quietspan.problem.InputException;

/** What is said when something goes wrong, and with which exit code it ends. */
final class Faults implements IExecutionExceptionHandler, IParameterExceptionHandler {

  /** A mistyped command line: the mistake, what may have been meant, where to read on. */
  @Override
  public int handleParseException(ParameterException mistake, String[] arguments) {
    CommandLine command = mistake.getCommandLine();
    PrintWriter remarks = command.getErr();
    remarks.println(mistake.getMessage());
    UnmatchedArgumentException.printSuggestions(mistake, remarks);
    remarks.println(
        "Try '" + command.getCommandSpec().qualifiedName() + " --help' for what it takes.");
    remarks.flush();
    return Exit.INPUT;
  }

  @Override
  public int handleExecutionException(Exception fault, CommandLine command, ParseResult parsed) {
    return handle(fault, command, parsed.hasMatchedOption("--verbose"));
  }

  static int handle(Throwable fault, CommandLine command, boolean verbose) {
    PrintWriter remarks = command.getErr();
    int exit = explain(fault, remarks, verbose);
    if (verbose) {
      fault.printStackTrace(remarks);
    }
    remarks.flush();
    return exit;
  }

  private static int explain(Throwable fault, PrintWriter remarks, boolean verbose) {
    if (fault instanceof InputException input) {
      input.problems().forEach(remarks::println);
      return Exit.INPUT;
    }
    if (fault instanceof CancellationException) {
      remarks.println("Interrupted before there was a plan; nothing is written.");
      return Exit.INTERRUPTED;
    }
    if (fault instanceof UncheckedIOException
        && fault.getCause() instanceof FileSystemException file) {
      remarks.println(file.getFile() + ": " + reason(file));
      return Exit.INPUT;
    }
    remarks.println(
        "quietspan: our own fault: "
            + fault.toString().lines().findFirst().orElse("")
            + (verbose ? "" : " (--verbose shows where)"));
    return Exit.FAULT;
  }

  private static String reason(FileSystemException fault) {
    if (fault instanceof AccessDeniedException) {
      return "access denied";
    }
    if (fault instanceof NoSuchFileException) {
      return "there is no such file or folder";
    }
    if (fault instanceof NotDirectoryException || fault instanceof FileAlreadyExistsException) {
      return "is no folder";
    }
    return fault.getReason() == null ? "cannot be used" : fault.getReason();
  }
}
