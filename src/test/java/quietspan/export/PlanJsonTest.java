package quietspan.export;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Random;
import java.util.TimeZone;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import quietspan.Seeds;
import quietspan.fixture.PlanFixture;
import quietspan.model.Plan;
import quietspan.problem.InputException;

final class PlanJsonTest {

  private static PlanFile read(String text) {
    return PlanReader.read(
        "plan.json", text.getBytes(StandardCharsets.UTF_8), Optional.of(PlanFixture.SCENARIO));
  }

  private static String write(Plan plan) {
    return PlanJson.write(PlanFixture.SCENARIO, PlanFixture.SKY, plan);
  }

  @Seeds
  void readingBackWhatWasWrittenChangesNothing(long seed) {
    Plan plan = PlanFixture.legal(seed);
    PlanFile read = read(write(plan));
    assertThat(read.decisions()).isEqualTo(plan.decisions());
    assertThat(read.provenance()).isEqualTo(plan.provenance());
    assertThat(read.mission()).isEqualTo(plan.mission());
    assertThat(read.issued()).isEqualTo(PlanFixture.SCENARIO.identity().issued());
  }

  @Test
  void bytesDoNotDependOnLocaleOrTimeZone() {
    String here = write(PlanFixture.shortfall(3));
    Locale locale = Locale.getDefault();
    TimeZone zone = TimeZone.getDefault();
    try {
      Locale.setDefault(Locale.forLanguageTag("tr"));
      TimeZone.setDefault(TimeZone.getTimeZone("Asia/Kolkata"));
      assertThat(write(PlanFixture.shortfall(3))).isEqualTo(here);
    } finally {
      Locale.setDefault(locale);
      TimeZone.setDefault(zone);
    }
  }

  @Test
  void summaryHasItsFieldsInOrder() throws IOException {
    JsonNode summary = new ObjectMapper().readTree(write(PlanFixture.legal(5))).get("summary");
    List<String> names = new ArrayList<>();
    summary.fieldNames().forEachRemaining(names::add);
    assertThat(names)
        .containsExactly(
            "status",
            "scienceHours",
            "boundScienceHours",
            "gapHours",
            "gapPercent",
            "pauses",
            "boundPauses",
            "longestQuietSpanHours",
            "shortestQuietSpanHours",
            "lostGbit",
            "highestFillPercent",
            "longestLatencyHours",
            "contactHours",
            "stationCostUnits",
            "waivers");
    assertThat(summary.get("status").asText()).isEqualTo("legal");
    assertThat(summary.get("boundScienceHours").decimalValue()).isEqualByComparingTo("640");
    assertThat(summary.get("highestFillPercent").decimalValue()).isEqualByComparingTo("75");
    assertThat(summary.get("longestLatencyHours").decimalValue()).isEqualByComparingTo("11.1111");
  }

  @Test
  void aPlanWithFindingsIsAShortfall() throws IOException {
    JsonNode file = new ObjectMapper().readTree(write(PlanFixture.shortfall(5)));
    assertThat(file.at("/summary/status").asText()).isEqualTo("shortfall");
    assertThat(file.at("/derived/findings/0/at_ground_utc").asText())
        .isEqualTo("2031-09-04T10:00:00.250Z");
  }

  @Test
  void oneDecisionStandsOnOneLine() {
    Plan plan = PlanFixture.legal(5);
    long lines = write(plan).lines().filter(line -> line.startsWith("      {\"id\": ")).count();
    assertThat(lines)
        .isEqualTo(
            plan.decisions().repoints().size()
                + plan.decisions().contacts().size()
                + plan.outcome().contacts().size());
  }

  private static final String SMALL =
      """
      {
        "format": 1,
        "mission": "Test formation",
        "issued_utc": "2031-08-20T12:00:00Z",
        "decisions": {
          "repoints": [
            {"id": "r1", "craft": "Hask", "start_onboard_utc": "2031-09-03T00:00:00Z", \
      "aim_azimuth_deg": 12.5, "aim_elevation_deg": -3}
          ],
          "contacts": [
            {"id": "c1", "station": "Vellmarch", "antenna": "main", "craft": "Hask", \
      "begin_ground_utc": "2031-09-02T01:00:00Z", "end_ground_utc": "2031-09-02T03:00:00Z", \
      "rate_bit_s": 160000, "services": ["telemetry"], "status": "tentative"}
          ]
        },
        "provenance": {
          "version": "0.1.0", "inputs": [], "sources": [], "seed": 1, "effort": 2,
          "stepsDone": 2, "interrupted": false, "waivers": []
        }
      }
      """;

  @Test
  void summaryAndDerivedMayBeMissing() {
    PlanFile plan = read(SMALL);
    assertThat(plan.decisions().repoints()).hasSize(1);
    assertThat(plan.decisions().contacts()).hasSize(1);
  }

  @ParameterizedTest(name = "{0}")
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '`',
      textBlock =
          """
          unknown key        | "seed": 1          | "sede": 1           | 14:54: provenance.sede: is not known here; did you mean "seed"? (one of version, inputs, sources, seed, effort, stepsDone, interrupted, waivers)
          missing key        | "seed": 1,         |                     | 13:17: provenance: lacks seed (seed: a whole number)
          unknown craft      | "craft": "Hask", "st | "craft": "Haks", "st | 7:29: decisions.repoints[0].craft: is "Haks"; did you mean "Hask"? (one of Hask, Merle, Tovin)
          unknown station    | Vellmarch          | Velmarch            | 10:31: decisions.contacts[0].station: is "Velmarch"; did you mean "Vellmarch"? (one of Ostrand, Vellmarch, Corrin Downs)
          end before begin   | 02T03:00           | 02T00:30            | 10:142: decisions.contacts[0].end_ground_utc: is 2031-09-02T00:30:00Z (after the contact's begin, 2031-09-02T01:00:00Z)
          third decimal      | 12.5               | 12.345              | 7:101: decisions.repoints[0].aim_azimuth_deg: is 12.345 (hundredths of a degree from 0.00 to 359.99)
          huge exponent      | 12.5               | 1e999999999         | 7:101: decisions.repoints[0].aim_azimuth_deg: is 1e999999999 (hundredths of a degree from 0.00 to 359.99)
          no zone            | 03T00:00:00Z       | 03T00:00:00         | 7:58: decisions.repoints[0].start_onboard_utc: is "2031-09-03T00:00:00" (UTC, such as 2031-09-01T00:00:00Z)
          half a second      | 03T00:00:00Z       | 03T00:00:00.5Z      | 7:58: decisions.repoints[0].start_onboard_utc: is 2031-09-03T00:00:00.500Z (a whole second: decisions are whole seconds)
          no rate            | "rate_bit_s": 160000, |                  | 10:7: decisions.contacts[0].rate_bit_s: is missing (exactly one of rate_bit_s, rate_steps)
          rate of zero       | 160000             | 0                   | 10:180: decisions.contacts[0].rate_bit_s: is 0 (a whole number from 1)
          service            | telemetry          | telemetri           | 10:200: decisions.contacts[0].services: holds "telemetri"; did you mean "telemetry"? (a list of telemetry, command, ranging)
          same id            | "id": "c1"         | "id": "r1"          | 10:14: decisions.contacts[0].id: is "r1" like that at plan.json:7:14 (an id of its own)
          other format       | "format": 1        | "format": 7         | 2:13: format: is 7 (this program reads format 1)
          """)
  void aMistakeIsComplainedOfWhereItStands(
      String name, String was, String becomes, String complaint) {
    String text = SMALL.replace(was, becomes == null ? "" : becomes);
    assertThatThrownBy(() -> read(text))
        .isInstanceOf(InputException.class)
        .satisfies(
            thrown ->
                assertThat(((InputException) thrown).problems())
                    .extracting(Object::toString)
                    .contains("plan.json:" + complaint));
  }

  @Test
  void allMistakesAreComplainedOfAtOnce() {
    String text =
        SMALL
            .replace("\"Hask\"", "\"Husk\"")
            .replace("12.5", "400")
            .replace("tentative", "maybe")
            .replace("\"effort\": 2", "\"effort\": -2");
    assertThatThrownBy(() -> read(text))
        .isInstanceOf(InputException.class)
        .satisfies(
            thrown ->
                assertThat(((InputException) thrown).problems())
                    .extracting(problem -> problem.field())
                    .containsExactly(
                        "decisions.repoints[0].craft",
                        "decisions.repoints[0].aim_azimuth_deg",
                        "decisions.contacts[0].craft",
                        "decisions.contacts[0].status",
                        "provenance.effort"));
  }

  @ParameterizedTest(name = "case {index}")
  @ValueSource(
      strings = {
        "",
        "{",
        "[]",
        "{\"format\": 1",
        "{\"format\": 1} x",
        "nonsense",
        "\u0000",
        "null",
        "7",
        "{}"
      })
  void whatIsNoPlanIsRefusedWithAPlace(String text) {
    assertThatThrownBy(() -> read(text))
        .isInstanceOf(InputException.class)
        .hasMessageStartingWith("plan.json");
  }

  @Seeds(count = 5)
  void brokenBytesNeverEndInAnythingButComplaints(long seed) {
    byte[] bytes = write(PlanFixture.legal(seed)).getBytes(StandardCharsets.UTF_8);
    Random random = new Random(seed);
    int refused = 0;
    for (int i = 0; i < 200; i++) {
      byte[] broken = bytes.clone();
      for (int j = 0; j < 3; j++) {
        broken[random.nextInt(broken.length)] = (byte) random.nextInt(256);
      }
      try {
        PlanReader.read("plan.json", broken, Optional.of(PlanFixture.SCENARIO));
      } catch (InputException e) {
        refused++;
      }
    }
    assertThat(refused).isPositive();
  }
}
