package quietspan.export;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import java.io.IOException;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.List;

/**
 * Columns and rows, written as CSV (RFC 4180 with line feeds), as JSON, or as text for a screen.
 * Cells hold what is written; an empty cell is a value that does not exist.
 */
public final class Table {

  /** How the cells of a column are read. */
  public enum Kind {
    TEXT,
    NUMBER,
    FLAG
  }

  private record Column(String name, Kind kind) {}

  private final List<Column> columns;
  private final List<List<String>> rows = new ArrayList<>();

  private Table(List<Column> columns) {
    this.columns = columns;
  }

  /** Columns of texts. */
  static Table of(String... names) {
    return new Table(new ArrayList<>()).and(Kind.TEXT, names);
  }

  /** More columns, to the right. */
  Table and(Kind kind, String... names) {
    for (String name : names) {
      columns.add(new Column(name, kind));
    }
    return this;
  }

  /** Adds a row; cells are written by {@link Object#toString}, so numbers come as text. */
  void row(Object... cells) {
    if (cells.length != columns.size()) {
      throw new IllegalArgumentException(
          cells.length + " cells for the " + columns.size() + " columns of " + columns);
    }
    List<String> row = new ArrayList<>(cells.length);
    for (Object cell : cells) {
      row.add(cell.toString());
    }
    rows.add(List.copyOf(row));
  }

  public int size() {
    return rows.size();
  }

  /** A header line and one line per row, each ended by a line feed. */
  public String csv() {
    StringBuilder text = new StringBuilder();
    csvLine(text, names());
    for (List<String> row : rows) {
      csvLine(text, row);
    }
    return text.toString();
  }

  private List<String> names() {
    return columns.stream().map(Column::name).toList();
  }

  private static void csvLine(StringBuilder text, List<String> cells) {
    for (int i = 0; i < cells.size(); i++) {
      if (i > 0) {
        text.append(',');
      }
      text.append(quoted(cells.get(i)));
    }
    text.append('\n');
  }

  private static String quoted(String cell) {
    boolean plain = cell.chars().noneMatch(c -> c == ',' || c == '"' || c == '\n' || c == '\r');
    return plain ? cell : '"' + cell.replace("\"", "\"\"") + '"';
  }

  /** A list of objects, one on a line. */
  public String json() {
    StringWriter text = new StringWriter();
    try (JsonGenerator json = new JsonFactory().createGenerator(text)) {
      json.setPrettyPrinter(new LinePerEntry(1));
      json.writeStartArray();
      for (List<String> row : rows) {
        json.writeStartObject();
        for (int i = 0; i < row.size(); i++) {
          json.writeFieldName(columns.get(i).name());
          cell(json, columns.get(i).kind(), row.get(i));
        }
        json.writeEndObject();
      }
      json.writeEndArray();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return text.append('\n').toString();
  }

  private static void cell(JsonGenerator json, Kind kind, String cell) throws IOException {
    if (cell.isEmpty() && kind != Kind.TEXT) {
      json.writeNull();
      return;
    }
    switch (kind) {
      case TEXT -> json.writeString(cell);
      case NUMBER -> json.writeNumber(cell);
      case FLAG -> json.writeBoolean(Boolean.parseBoolean(cell));
    }
  }

  /** Aligned columns, numbers to the right, two blanks between; no blanks at the ends of lines. */
  public String text() {
    int[] widths = new int[columns.size()];
    for (int i = 0; i < widths.length; i++) {
      widths[i] = width(columns.get(i).name());
      for (List<String> row : rows) {
        widths[i] = Math.max(widths[i], width(row.get(i)));
      }
    }
    StringBuilder text = new StringBuilder();
    textLine(text, widths, names());
    for (List<String> row : rows) {
      textLine(text, widths, row);
    }
    return text.toString();
  }

  private static int width(String cell) {
    return cell.codePointCount(0, cell.length());
  }

  private void textLine(StringBuilder text, int[] widths, List<String> cells) {
    StringBuilder line = new StringBuilder();
    for (int i = 0; i < widths.length; i++) {
      String blanks = " ".repeat(widths[i] - width(cells.get(i)));
      line.append(i == 0 ? "" : "  ");
      line.append(
          columns.get(i).kind() == Kind.NUMBER ? blanks + cells.get(i) : cells.get(i) + blanks);
    }
    text.append(line.toString().stripTrailing()).append('\n');
  }
}
