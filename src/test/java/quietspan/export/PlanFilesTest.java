package quietspan.export;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Map;
import java.util.SortedMap;
import org.junit.jupiter.api.Test;
import quietspan.fixture.PlanFixture;
import quietspan.model.Plan;

final class PlanFilesTest {

  private static SortedMap<String, byte[]> files(Plan plan) {
    return PlanFiles.of(PlanFixture.SCENARIO, PlanFixture.SKY, plan);
  }

  private static List<String> lines(Plan plan, String file) {
    return new String(files(plan).get(file), StandardCharsets.UTF_8).lines().toList();
  }

  @Test
  void aPlanIsOneJsonFileSevenTablesAndItsCalendars() {
    Map<String, byte[]> files = files(PlanFixture.legal(1));
    assertThat(files.keySet())
        .containsExactly(
            "calendars/all.ics",
            "calendars/craft-hask.ics",
            "calendars/craft-merle.ics",
            "calendars/craft-tovin.ics",
            "calendars/science.ics",
            "calendars/station-corrin-downs.ics",
            "calendars/station-ostrand.ics",
            "calendars/station-vellmarch.ics",
            "csv/contacts.csv",
            "csv/findings.csv",
            "csv/pauses.csv",
            "csv/quiet-spans.csv",
            "csv/repoints.csv",
            "csv/stores.csv",
            "csv/weeks.csv",
            "plan.json");
  }

  @Test
  void tablesHaveOneRowForEachThing() {
    Plan plan = PlanFixture.shortfall(4);
    assertThat(lines(plan, "csv/contacts.csv")).hasSize(1 + plan.decisions().contacts().size());
    assertThat(lines(plan, "csv/repoints.csv")).hasSize(1 + plan.decisions().repoints().size());
    assertThat(lines(plan, "csv/pauses.csv")).hasSize(1 + plan.outcome().pauses().size());
    assertThat(lines(plan, "csv/quiet-spans.csv")).hasSize(1 + plan.outcome().quietSpans().size());
    assertThat(lines(plan, "csv/stores.csv")).hasSize(1 + 9);
    assertThat(lines(plan, "csv/weeks.csv")).hasSize(1 + 4);
    assertThat(lines(plan, "csv/findings.csv"))
        .containsExactly(
            "rule,clock,at_utc,craft,station,subject,amount,unit,detail",
            "GAP,ground,2031-09-04T10:00:00.250Z,,Vellmarch,,3600.5,s,"
                + "\"31.0 h without a contact, \"\"limit\"\" 30 h\"");
  }

  /** Everything written while all craft make 20 kbit/s outside and 15 % of it inside pauses. */
  @Test
  void weeksAddUpToTheWholePeriod() {
    Plan plan = PlanFixture.legal(4);
    List<Week> weeks = Week.of(PlanFixture.SCENARIO, plan);
    long paused =
        plan.outcome().pauses().stream()
            .mapToLong(pause -> pause.during().length().toSeconds())
            .sum();
    long rate =
        PlanFixture.SCENARIO.craft().get(0).generation().stream()
            .mapToLong(each -> each.profile().steps().get(0).rate().bitsPerSecond())
            .sum();
    long whole = PlanFixture.SCENARIO.period().length().toSeconds();
    assertThat(weeks.stream().mapToLong(Week::generatedBits).sum())
        .isEqualTo(3 * (rate * (whole - paused) + rate * 15 / 100 * paused));
    assertThat(weeks.stream().mapToInt(Week::contacts).sum())
        .isEqualTo(plan.outcome().contacts().size());
  }

  /** The fixture's stores rise to 9 Gbit of 12 after a day and fall to 2 Gbit by day 28. */
  @Test
  void theHighestFillOfAWeekIsFoundBetweenPoints() {
    List<Week> weeks = Week.of(PlanFixture.SCENARIO, PlanFixture.legal(4));
    assertThat(weeks.get(0).highestFill()).isEqualTo(0.75);
    // Linear from 9 Gbit on day 1 to 2 Gbit on day 28: on day 7 it is 9 - 7 * 6 / 27 Gbit.
    assertThat(weeks.get(1).highestFill()).isCloseTo((9 - 7 * 6 / 27.0) / 12, within(1e-9));
  }

  private static org.assertj.core.data.Offset<Double> within(double value) {
    return org.assertj.core.data.Offset.offset(value);
  }
}
