package quietspan.input;

import java.util.List;

/** The reference page of the input files, made from their field tables. */
public final class FieldReference {

  private final StringBuilder page = new StringBuilder();

  private FieldReference() {}

  /** The page as Markdown: a table for each file, one row for each field by its path. */
  public static String markdown() {
    FieldReference reference = new FieldReference();
    ScenarioFiles.tables().forEach(reference::file);
    return reference.page.toString();
  }

  private void file(String name, Block table) {
    if (!page.isEmpty()) {
      page.append('\n');
    }
    page.append("### ").append(name).append("\n\n");
    page.append("| field | value | needed | meaning |\n");
    page.append("| --- | --- | --- | --- |\n");
    rows("", table);
  }

  private void rows(String path, Block block) {
    for (Field<?> field : block.fields()) {
      String here = Block.join(path, field.key());
      page.append("| `").append(here).append("` | ");
      page.append(cell(value(field.kind()))).append(" | ");
      page.append(cell(needed(field, block))).append(" | ");
      page.append(cell(field.sentence())).append(" |\n");
      inner(here, field.kind());
    }
  }

  private void inner(String path, Kind<?> kind) {
    if (kind instanceof Block block) {
      rows(path, block);
    } else if (kind instanceof Items<?> items) {
      inner(path + "[]", items.element());
    }
  }

  private static String value(Kind<?> kind) {
    if (kind instanceof Quantity<?> quantity) {
      String limits = quantity.limits();
      return quantity.noun()
          + " such as `"
          + quantity.example()
          + "`"
          + (limits.isEmpty() ? "" : ", " + limits);
    }
    if (kind instanceof Moment<?> moment) {
      return moment.noun() + " such as `" + moment.example() + "`";
    }
    if (kind instanceof Items<?> items) {
      return items.element() instanceof Block ? "a list" : "a list, each " + value(items.element());
    }
    return kind instanceof Block ? "a block" : kind.noun();
  }

  private static String needed(Field<?> field, Block block) {
    if (field.isRequired()) {
      return "yes";
    }
    List<String> choices = block.choicesWith(field);
    String standard =
        field
            .standard()
            .filter(text -> !text.equals("{}") && !text.equals("[]"))
            .map(text -> "default `" + text + "`")
            .orElse("no");
    return choices.isEmpty() ? standard : String.join("; ", choices);
  }

  private static String cell(String text) {
    return text.replace("|", "\\|");
  }
}
