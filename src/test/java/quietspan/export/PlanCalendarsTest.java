package quietspan.export;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.StringReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.UUID;
import java.util.function.Function;
import java.util.stream.Collectors;
import net.fortuna.ical4j.data.CalendarBuilder;
import net.fortuna.ical4j.data.ParserException;
import net.fortuna.ical4j.model.Calendar;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import quietspan.Seeds;
import quietspan.fixture.NodeScript;
import quietspan.fixture.PlanFixture;
import quietspan.model.Contact;
import quietspan.model.Decisions;
import quietspan.model.Plan;
import quietspan.model.Repoint;
import quietspan.time.Interval;

final class PlanCalendarsTest {

  private static Map<String, CalendarSheet> calendars(Plan plan) {
    List<ContactClocks> clocks =
        plan.decisions().contacts().stream()
            .map(contact -> ContactClocks.of(PlanFixture.SCENARIO, PlanFixture.SKY, contact))
            .toList();
    return PlanCalendars.of(PlanFixture.SCENARIO, plan, clocks);
  }

  private static String text(CalendarSheet sheet) {
    return new String(sheet.write(), StandardCharsets.UTF_8);
  }

  @Test
  void everyPartyHasItsCalendar() {
    assertThat(calendars(PlanFixture.legal(1)).keySet())
        .containsExactly(
            "station-ostrand",
            "station-vellmarch",
            "station-corrin-downs",
            "craft-hask",
            "craft-merle",
            "craft-tovin",
            "science",
            "all");
  }

  @Test
  void aStationsEventRunsFromSetupToTeardown() {
    Plan plan = PlanFixture.legal(1);
    Contact contact = plan.decisions().contacts().get(0);
    CalendarEntry entry =
        entry(
            calendars(plan).get("station-" + FileNames.plain(contact.station())),
            "contact-ground",
            contact.id());
    assertThat(entry.begin()).isEqualTo(contact.during().begin().utc().minusSeconds(45 * 60));
    assertThat(entry.end()).isEqualTo(contact.during().end().utc().plusSeconds(15 * 60));
  }

  /** Light time 250 s and a little more in the synthetic sky. */
  @Test
  void aCraftsEventIsOnTheOnboardClock() {
    Plan plan = PlanFixture.legal(1);
    Contact contact = plan.decisions().contacts().get(0);
    CalendarEntry entry =
        entry(
            calendars(plan).get("craft-" + FileNames.plain(contact.craft())),
            "contact-onboard",
            contact.id());
    double owlt = PlanFixture.SKY.downlinkSeconds(contact.craft(), contact.during().begin());
    assertThat(entry.begin())
        .isEqualTo(contact.during().begin().utc().minusSeconds((long) Math.floor(owlt)));
    assertThat(entry.title()).endsWith("(on board)");
  }

  private static CalendarEntry entry(CalendarSheet sheet, String kind, String id) {
    UUID uid = NameUuid.of(PlanFixture.SCENARIO.identity().mission(), kind, id);
    return sheet.entries().stream()
        .filter(entry -> entry.uid().equals(uid))
        .findFirst()
        .orElseThrow();
  }

  @Test
  void aContactTellsAllItsClocks() {
    Plan plan = PlanFixture.legal(1);
    for (CalendarEntry entry : calendars(plan).get("all").entries()) {
      if (entry.category().equals("CONTACT")) {
        assertThat(entry.description())
            .contains(
                "Craft: ",
                "Rate: ",
                " kbit/s",
                "Setup begins (ground): ",
                "Receive begins (ground): ",
                "Receive ends (ground): ",
                "Teardown ends (ground): ",
                "Transmit on (on board): ",
                "Transmit off (on board): ",
                "Uplink transmit (ground): ",
                "Uplink arrives (on board): ",
                "At begin: azimuth ",
                "At end: azimuth ",
                "not an authorisation")
            .containsPattern("Z \\(day 2\\d\\d\\)");
      }
    }
  }

  /** RFC 5545, 3.8.4.7: a UID is for one component only. */
  @Seeds(count = 8)
  void identifiersAreUniqueInEveryCalendar(long seed) {
    calendars(PlanFixture.legal(seed))
        .forEach(
            (name, sheet) -> {
              Set<UUID> uids = new HashSet<>();
              sheet.entries().forEach(entry -> assertThat(uids.add(entry.uid())).isTrue());
            });
  }

  @Test
  void identifiersOutliveAChangeOfTimes() {
    Plan plan = PlanFixture.legal(1);
    Decisions later =
        new Decisions(
            plan.decisions().repoints().stream()
                .map(each -> new Repoint(each.id(), each.craft(), each.start(), each.aim()))
                .toList(),
            plan.decisions().contacts().stream().map(PlanCalendarsTest::shortened).toList());
    Plan changed = new Plan(plan.mission(), later, plan.outcome(), plan.bound(), plan.provenance());
    assertThat(uids(changed)).isEqualTo(uids(plan));
  }

  private static Contact shortened(Contact contact) {
    return new Contact(
        contact.id(),
        contact.station(),
        contact.antenna(),
        contact.craft(),
        Interval.of(contact.during().begin(), contact.during().end().plusSeconds(-60L)),
        contact.steps(),
        contact.services(),
        contact.status());
  }

  private static Set<UUID> uids(Plan plan) {
    return calendars(plan).get("all").entries().stream()
        .map(CalendarEntry::uid)
        .collect(Collectors.toSet());
  }

  @Test
  void aShortfallIsHeadedAndTentativeEverywhere() {
    calendars(PlanFixture.shortfall(2))
        .forEach(
            (name, sheet) -> {
              assertThat(sheet.name()).startsWith("SHORTFALL ");
              for (CalendarEntry entry : sheet.entries()) {
                assertThat(entry.title()).startsWith("SHORTFALL ");
                assertThat(entry.description()).startsWith("SHORTFALL ");
                assertThat(entry.status()).isNotEqualTo(Contact.Status.CONFIRMED);
              }
            });
  }

  @Test
  void aWithdrawnContactStaysWithARaisedSequence() {
    Plan plan = PlanFixture.legal(2);
    assertThat(plan.decisions().contacts())
        .anyMatch(contact -> contact.status() == Contact.Status.CANCELLED);
    String all = text(calendars(plan).get("all"));
    assertThat(all).contains("STATUS:CANCELLED\r\nSEQUENCE:1\r\n").contains("SEQUENCE:0\r\n");
  }

  @Test
  void scienceIsFreeTimeAndPausesAreNot() {
    for (CalendarEntry entry : calendars(PlanFixture.legal(2)).get("science").entries()) {
      assertThat(entry.free()).isEqualTo(entry.category().equals("QUIET SPAN"));
    }
  }

  /** RFC 5545: version, Z times, no METHOD and no ORGANIZER in what is subscribed to. */
  @Seeds(count = 3)
  void filesAreValidAndPlain(long seed) throws IOException, ParserException {
    for (CalendarSheet sheet : calendars(PlanFixture.legal(seed)).values()) {
      String text = text(sheet);
      assertThat(text)
          .startsWith("BEGIN:VCALENDAR\r\nPRODID:")
          .contains("REFRESH-INTERVAL;VALUE=DURATION:PT12H\r\nX-PUBLISHED-TTL:PT12H\r\n")
          .doesNotContain("METHOD", "ORGANIZER", "TZID")
          .endsWith("END:VCALENDAR\r\n");
      assertThat(text.replace("\r\n", "")).doesNotContain("\n", "\r");
      assertThat(text.lines().filter(line -> line.startsWith("DT")))
          .allMatch(line -> line.matches("DT(STAMP|START|END):\\d{8}T\\d{6}Z"));
      for (String line : text.split("\r\n")) {
        assertThat(line.getBytes(StandardCharsets.UTF_8).length).isLessThanOrEqualTo(75);
      }
      Calendar read = new CalendarBuilder().build(new StringReader(text));
      assertThat(read.validate().hasErrors()).isFalse();
      assertThat(read.getComponents()).hasSize(sheet.entries().size());
    }
  }

  /** What ical.js 2.2.1 (Mozilla Public License 2.0), a reader written by others, makes of it. */
  @Test
  void aSecondReaderSeesTheSameEvents(@TempDir Path folder) throws IOException {
    List<String> paths = new ArrayList<>();
    List<CalendarSheet> sheets = new ArrayList<>();
    for (Plan plan : List.of(PlanFixture.legal(1), PlanFixture.shortfall(2))) {
      for (CalendarSheet sheet : calendars(plan).values()) {
        Path path = folder.resolve(sheets.size() + ".ics");
        Files.write(path, sheet.write());
        paths.add(path.toString());
        sheets.add(sheet);
      }
    }
    sheets.add(awkward());
    Files.write(folder.resolve("awkward.ics"), awkward().write());
    paths.add(folder.resolve("awkward.ics").toString());
    JsonNode seen = new ObjectMapper().readTree(NodeScript.run("read-calendar.mjs", paths));
    assertThat(seen).hasSize(sheets.size());
    for (int i = 0; i < sheets.size(); i++) {
      assertSame(seen.get(i), sheets.get(i));
    }
  }

  /** Texts full of what has to be escaped or must not be torn. */
  private static CalendarSheet awkward() {
    List<CalendarEntry> entries = new ArrayList<>();
    for (int i = 0; i < 80; i++) {
      entries.add(
          new CalendarEntry(
              NameUuid.of("m", "k", "" + i),
              Instant.parse("2031-09-01T00:00:00Z").plusSeconds(i),
              Instant.parse("2031-09-01T01:00:00Z").plusSeconds(i),
              "x".repeat(i) + ", \u00e9\u20ac\ud83d\udce1; back\\slash \"quoted\": end",
              "one\ntwo, three; " + "\ud83d\udce1\u00fc".repeat(i) + "\nfour",
              "CONTACT",
              Contact.Status.CONFIRMED,
              false));
    }
    return new CalendarSheet(
        "Name, with; all\\ of it \u00e9", "d", "1", Instant.parse("2031-08-20T12:00:00Z"), entries);
  }

  /** RFC 5545, 3.3.11. */
  private static String unescaped(String text) {
    return text.replaceAll("\\\\([,;\\\\])", "$1");
  }

  private static void assertSame(JsonNode seen, CalendarSheet sheet) {
    // This reader does not know these two, and hands them over as they are written, escaped.
    assertThat(unescaped(seen.get("name").asText())).isEqualTo(sheet.name());
    assertThat(unescaped(seen.get("oldName").asText())).isEqualTo(sheet.name());
    assertThat(seen.get("refresh").asText()).isEqualTo("PT12H");
    assertThat(seen.get("method").isNull()).isTrue();
    Map<String, JsonNode> events = new LinkedHashMap<>();
    seen.get("events").forEach(event -> events.put(event.get("uid").asText(), event));
    assertThat(events).hasSize(sheet.entries().size());
    for (CalendarEntry entry : sheet.entries()) {
      JsonNode event = events.get(entry.uid().toString());
      Function<String, String> value = key -> event.get(key).asText();
      assertThat(Instant.parse(value.apply("begin"))).isEqualTo(entry.begin());
      assertThat(Instant.parse(value.apply("end"))).isEqualTo(entry.end());
      assertThat(Instant.parse(value.apply("stamp"))).isEqualTo(sheet.issued());
      assertThat(value.apply("title")).isEqualTo(entry.title());
      assertThat(value.apply("description")).isEqualTo(entry.description());
      assertThat(value.apply("category")).isEqualTo(entry.category());
      assertThat(value.apply("status")).isEqualTo(entry.status().name());
      assertThat(event.get("sequence").asInt())
          .isEqualTo(entry.status() == Contact.Status.CANCELLED ? 1 : 0);
      assertThat(value.apply("transparency")).isEqualTo(entry.free() ? "TRANSPARENT" : "OPAQUE");
      assertThat(event.get("organizer").isNull()).isTrue();
    }
  }
}
