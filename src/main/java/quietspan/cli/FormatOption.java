package quietspan.cli;

import java.io.PrintWriter;
import picocli.CommandLine.Option;
import quietspan.export.Table;

/** How a table is printed. */
final class FormatOption {

  /** Kinds of output. */
  enum Format {
    TABLE,
    CSV,
    JSON
  }

  @Option(
      names = "--format",
      paramLabel = "FORMAT",
      defaultValue = "table",
      description = "table, csv or json. Default: ${DEFAULT-VALUE}.")
  private Format format;

  @Option(names = "--json", description = "The same as --format json.")
  private boolean json;

  boolean isTable() {
    return !json && format == Format.TABLE;
  }

  void print(Table table, PrintWriter results) {
    results.print(
        switch (json ? Format.JSON : format) {
          case TABLE -> table.text();
          case CSV -> table.csv();
          case JSON -> table.json();
        });
    results.flush();
  }
}
