package quietspan.export;

import java.util.List;
import java.util.Locale;
import quietspan.export.Table.Kind;
import quietspan.problem.Problem;

/** Complaints for programs that read them. */
public final class ProblemTable {

  private ProblemTable() {}

  /** One row for each; line and column do not exist where a file is meant as a whole. */
  public static Table of(List<Problem> problems) {
    Table table =
        Table.of("level", "file")
            .and(Kind.NUMBER, "line", "column")
            .and(Kind.TEXT, "field", "what", "right");
    for (Problem problem : problems) {
      boolean whole = problem.place().line() == 0;
      table.row(
          problem.level().name().toLowerCase(Locale.ROOT),
          problem.place().file(),
          whole ? "" : problem.place().line(),
          whole ? "" : problem.place().column(),
          problem.field(),
          problem.what(),
          problem.right());
    }
    return table;
  }
}
