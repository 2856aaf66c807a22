package quietspan.export;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;
import quietspan.export.Table.Kind;

final class TableTest {

  private static Table table() {
    Table table = Table.of("name").and(Kind.NUMBER, "size").and(Kind.FLAG, "cut");
    table.row("plain", "1.50", true);
    table.row("a \"b\", c\nd", "", false);
    return table;
  }

  /** RFC 4180, section 2, rules 5 to 7. */
  @Test
  void cellsWithCommasQuotesAndBreaksAreQuoted() {
    assertThat(table().csv())
        .isEqualTo("name,size,cut\nplain,1.50,true\n\"a \"\"b\"\", c\nd\",,false\n");
  }

  @Test
  void jsonKeepsDigitsAndSaysNullForWhatDoesNotExist() {
    assertThat(table().json())
        .isEqualTo(
            """
            [
              {"name": "plain", "size": 1.50, "cut": true},
              {"name": "a \\"b\\", c\\nd", "size": null, "cut": false}
            ]
            """);
  }

  @Test
  void textAlignsNumbersToTheRight() {
    Table table = Table.of("name").and(Kind.NUMBER, "n").and(Kind.TEXT, "end");
    table.row("a", "5", "x");
    table.row("long", "1234", "");
    assertThat(table.text()).isEqualTo("name     n  end\na        5  x\nlong  1234\n");
  }

  @Test
  void aRowHasACellForEveryColumn() {
    assertThatThrownBy(() -> Table.of("a", "b").row("1"))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
