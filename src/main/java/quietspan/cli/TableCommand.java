package quietspan.cli;

import java.io.PrintWriter;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;
import quietspan.run.GeometryRun.Answer;
import quietspan.run.GeometryRun.Question;

/** What the commands that print geometry have in common. */
@Command(mixinStandardHelpOptions = true, versionProvider = Version.class)
abstract class TableCommand implements Callable<Integer> {
  @Spec private CommandSpec spec;
  @Mixin private SourceOptions source;
  @Mixin private SpanOptions span;
  @Mixin private FormatOption format;

  @Option(names = "--craft", paramLabel = "NAME", description = "Only this craft.")
  private String craft;

  abstract Answer answer(Question question);

  /** The station that is asked for, if any. */
  abstract Optional<String> station();

  @Override
  public final Integer call() {
    Answer answer =
        answer(
            new Question(
                source.source(), span.from(), span.to(), Optional.ofNullable(craft), station()));
    format.print(answer.table(), spec.commandLine().getOut());
    PrintWriter remarks = spec.commandLine().getErr();
    answer.warnings().forEach(remarks::println);
    answer.sources().forEach(source -> remarks.println("# " + source));
    remarks.flush();
    return Exit.DONE;
  }
}
