package quietspan.input;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import quietspan.problem.Problems;

/** Laws that every row of the field tables keeps. */
class FieldTablesTest {

  private record Row(String path, Field<?> field) {}

  private static List<Row> rows() {
    List<Row> rows = new ArrayList<>();
    ScenarioFiles.tables().forEach((file, table) -> add(file + " ", table, rows));
    return rows;
  }

  private static void add(String path, Kind<?> kind, List<Row> rows) {
    if (kind instanceof Items<?> items) {
      add(path + "[]", items.element(), rows);
    } else if (kind instanceof Block block) {
      for (Field<?> field : block.fields()) {
        String here = path + (path.endsWith(" ") ? "" : ".") + field.key();
        rows.add(new Row(here, field));
        add(here, field.kind(), rows);
      }
    }
  }

  @Test
  void aRowHasAPlainKeyAndASentence() {
    for (Row row : rows()) {
      assertThat(row.field().key()).as(row.path()).matches("[a-z]+[a-z0-9]*(_[a-z0-9]+)*");
      assertThat(row.field().sentence()).as(row.path()).matches("(?s)[A-Z1].*\\.");
    }
  }

  @Test
  void aDefaultIsItselfARightValue() {
    Problems problems = new Problems();
    Source source = new Source("defaults", problems);
    for (Row row : rows()) {
      row.field()
          .standard()
          .map(text -> new Spot(YamlFile.parsed(text), source.whole(), row.path(), source))
          .ifPresent(spot -> assertThat(row.field().kind().read(spot)).as(row.path()).isPresent());
    }
    assertThat(problems.sorted()).isEmpty();
  }

  @Test
  void anExampleIsItselfARightValue() throws Refusal {
    for (Row row : rows()) {
      assertThat(row.field().kind().noun()).as(row.path()).isNotBlank();
      if (row.field().kind() instanceof Scalar<?> scalar) {
        assertThat(scalar.parse(scalar.example())).as(row.path()).isNotNull();
      }
    }
  }

  @Test
  void aPatternOfTheSchemaTakesTheExampleAndNotMore() {
    for (Row row : rows()) {
      if (row.field().kind() instanceof Scalar<?> scalar
          && scalar.schema().get("pattern") instanceof String pattern) {
        assertThat(scalar.example()).as(row.path()).containsPattern(pattern);
        assertThat(scalar.example() + "?").as(row.path()).doesNotContainPattern(pattern);
      }
    }
  }

  @Test
  void anInstantNamesItsClockAndNothingElseDoes() {
    Map<Kind<?>, String> endings =
        Map.of(
            Moment.ONBOARD, "_onboard_utc",
            Moment.GROUND, "_ground_utc",
            Moment.TDB, "_tdb",
            Moment.UTC, "issued");
    for (Row row : rows()) {
      String ending = endings.get(row.field().kind());
      if (ending == null) {
        assertThat(row.field().key()).as(row.path()).doesNotContain("_utc", "_tdb");
      } else {
        assertThat(row.field().key()).as(row.path()).endsWith(ending);
      }
    }
  }

  @Test
  void theReferenceHasOneRowForEachField() {
    String page = FieldReference.markdown();
    for (Row row : rows()) {
      String path = row.path().substring(row.path().indexOf(' ') + 1);
      assertThat(page).contains("| `" + path + "` | ").contains(row.field().sentence());
    }
    assertThat(page.lines().filter(line -> line.startsWith("| `")).count())
        .isEqualTo(rows().size());
  }

  @Test
  void theReferenceSaysWhatIsNeeded() {
    assertThat(FieldReference.markdown())
        .contains(
            "| `craft[].antenna.half_cone` | an angle such as `2.1 deg`, above 0 deg, at most 60"
                + " deg | yes |")
        .contains(
            "| `stations[].mask` | an angle such as `10 deg`, at least 0 deg, at most 90 deg"
                + " | exactly one of mask, mask_by_azimuth |")
        .contains("| `contacts.rate_steps` | a whole number from 1 to 20 | default `1` |");
  }
}
