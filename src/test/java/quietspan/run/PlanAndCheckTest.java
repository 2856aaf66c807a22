package quietspan.run;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.TimeZone;
import java.util.TreeMap;
import java.util.concurrent.CancellationException;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import quietspan.fixture.SmallScenario;
import quietspan.model.Finding;
import quietspan.model.RuleId;
import quietspan.problem.InputException;

/** From a scenario folder to a plan folder, and what the check says of it when it is edited. */
final class PlanAndCheckTest {

  @TempDir private static Path shared;
  @TempDir private Path own;

  private static Path scenario;
  private static Path planned;
  private static PlanRun.Answer answer;

  @BeforeAll
  static void planOnce() throws IOException {
    scenario = SmallScenario.write(shared.resolve("small"));
    planned = shared.resolve("plans").resolve("first");
    answer = plan(scenario, planned);
  }

  private static PlanRun.Answer plan(Path scenario, Path out) {
    return plan(scenario, out, new AtomicBoolean());
  }

  private static PlanRun.Answer plan(Path scenario, Path out, AtomicBoolean stop) {
    Source source = new Source(scenario, Optional.empty(), Optional.empty());
    return PlanRun.plan(new PlanRun.Request(source, out, 1, 0, "0.0.0"), what -> {}, stop);
  }

  private static CheckRun.Answer check(Path plan) {
    return CheckRun.check(new CheckRun.Request(plan, shared, Optional.empty(), Optional.empty()));
  }

  /** A copy of the plan, with one thing in its file replaced. */
  private Path edited(String was, String becomes) throws IOException {
    Path copy = own.resolve("edited");
    Files.createDirectories(copy);
    String text = Files.readString(planned.resolve("plan.json"));
    assertThat(text).contains(was);
    Files.writeString(copy.resolve("plan.json"), text.replaceFirst(Pattern.quote(was), becomes));
    return copy;
  }

  private static Map<String, List<Byte>> bytes(Path folder) throws IOException {
    Map<String, List<Byte>> all = new TreeMap<>();
    try (Stream<Path> entries = Files.walk(folder)) {
      for (Path entry : entries.filter(Files::isRegularFile).toList()) {
        List<Byte> content = new ArrayList<>();
        for (byte each : Files.readAllBytes(entry)) {
          content.add(each);
        }
        all.put(folder.relativize(entry).toString(), content);
      }
    }
    return all;
  }

  @Test
  void aPlanIsWrittenWithItsTablesAndCalendars() throws IOException {
    assertThat(bytes(planned).keySet())
        .contains("plan.json", "csv/contacts.csv", "calendars/all.ics", "calendars/craft-hask.ics");
    assertThat(answer.plan().outcome().findings()).isEmpty();
    assertThat(answer.warnings()).isEmpty();
  }

  @Test
  void theCheckPassesAPlanAsItWasWritten() {
    CheckRun.Answer verdict = check(planned);
    assertThat(verdict.passed()).isTrue();
    assertThat(verdict.word()).isEqualTo("LEGAL");
    assertThat(verdict.altered()).isEmpty();
    assertThat(verdict.stale()).isEmpty();
    assertThat(verdict.disagreements()).isEmpty();
    assertThat(verdict.folder()).isEqualTo(scenario.toAbsolutePath());
  }

  @Test
  void thePlanItselfMayBeNamedInsteadOfItsFolder() {
    assertThat(check(planned.resolve("plan.json")).passed()).isTrue();
  }

  @Test
  void theSameInputsGiveTheSameBytesWhereverAndInWhateverLocale() throws IOException {
    Locale locale = Locale.getDefault();
    TimeZone zone = TimeZone.getDefault();
    Path out = own.resolve("there").resolve("plan");
    try {
      Locale.setDefault(Locale.forLanguageTag("tr"));
      TimeZone.setDefault(TimeZone.getTimeZone("Asia/Kolkata"));
      plan(SmallScenario.write(own.resolve("other name")), out);
    } finally {
      Locale.setDefault(locale);
      TimeZone.setDefault(zone);
    }
    assertThat(bytes(out)).isEqualTo(bytes(planned));
  }

  @Test
  void aContactMadeShorterLeavesStaleValuesThatHarmNobody() throws IOException {
    var contact = answer.plan().decisions().contacts().get(3);
    String end = contact.during().end().toString();
    CheckRun.Answer verdict =
        check(edited(end, contact.during().end().plusSeconds(-60L).toString()));
    assertThat(verdict.stale()).isNotEmpty().anyMatch(line -> line.contains("contact"));
    assertThat(verdict.altered()).isEmpty();
    assertThat(verdict.report().breaksAuthority()).isFalse();
  }

  @Test
  void aBrokenRuleIsFound() throws IOException {
    CheckRun.Answer verdict = check(edited("\"rate_bit_s\": ", "\"rate_bit_s\": 1"));
    assertThat(verdict.passed()).isFalse();
    assertThat(verdict.word()).isEqualTo("BROKEN");
    assertThat(verdict.report().findings())
        .extracting(Finding::rule)
        .containsAnyOf(RuleId.LINK_MARGIN, RuleId.RATE_STEPS);
  }

  @Test
  void anEnlargedWaiverListIsReported() throws IOException {
    CheckRun.Answer verdict =
        check(
            edited(
                "\"waivers\": []\n  }\n}",
                "\"waivers\": [{\"rule\": \"GAP\", \"craft\": \"\", \"data_class\": \"\","
                    + " \"begin_ground_utc\": \"2031-09-01T00:00:00Z\", \"end_ground_utc\":"
                    + " \"2031-09-04T00:00:00Z\", \"relaxed_limit_s\": 999999, \"reason\": \"\"}]"
                    + "}}"));
    assertThat(verdict.report().legal()).isTrue();
    assertThat(verdict.passed()).isFalse();
    assertThat(verdict.altered()).hasSize(1).allMatch(line -> line.contains("GAP"));
  }

  @Test
  void aChangedInputIsReported() throws IOException {
    Path changed = SmallScenario.write(own.resolve("small"));
    Files.writeString(
        changed.resolve("state.yaml"),
        Files.readString(changed.resolve("state.yaml")) + "# more\n");
    CheckRun.Answer verdict =
        CheckRun.check(new CheckRun.Request(planned, own, Optional.of(changed), Optional.empty()));
    assertThat(verdict.word()).isEqualTo("ALTERED");
    assertThat(verdict.altered()).hasSize(1).allMatch(line -> line.contains("state.yaml"));
  }

  @Test
  void aScenarioThatIsNowhereIsAskedFor() throws IOException {
    Path lonely = own.resolve("plan");
    Files.createDirectories(lonely);
    String text = Files.readString(planned.resolve("plan.json"));
    Files.writeString(
        lonely.resolve("plan.json"), text.replaceAll("\"sha256\": \"\\w+\"", "\"sha256\": \"0\""));
    Path empty = Files.createDirectory(own.resolve("empty"));
    assertThatThrownBy(
            () ->
                CheckRun.check(
                    new CheckRun.Request(lonely, empty, Optional.empty(), Optional.empty())))
        .isInstanceOf(InputException.class)
        .hasMessageContaining("--scenario");
  }

  @Test
  void aFolderWithoutAPlanIsRefused() {
    assertThatThrownBy(() -> check(own))
        .isInstanceOf(InputException.class)
        .hasMessageContaining("holds no plan.json");
    assertThatThrownBy(() -> check(own.resolve("nowhere")))
        .isInstanceOf(InputException.class)
        .hasMessageContaining("there is no such folder");
  }

  @Test
  void stoppedBeforeThereIsAPlanNothingIsWritten() throws IOException {
    Path out = own.resolve("plan");
    assertThatThrownBy(() -> plan(scenario, out, new AtomicBoolean(true)))
        .isInstanceOf(CancellationException.class);
    try (Stream<Path> entries = Files.list(own)) {
      assertThat(entries).isEmpty();
    }
  }

  @Test
  void wrongInputWritesNothing() throws IOException {
    Path wrong = SmallScenario.write(own.resolve("wrong"));
    Files.writeString(wrong.resolve("state.yaml"), "nonsense: 1\n");
    Path out = own.resolve("plan");
    assertThatThrownBy(() -> plan(wrong, out))
        .isInstanceOf(InputException.class)
        .hasMessageContaining("state.yaml:1:1: nonsense");
    assertThat(out).doesNotExist();
  }

  @Test
  void aFolderOfSomebodyElseIsRefusedBeforeAnythingIsComputed() throws IOException {
    Files.writeString(own.resolve("thesis.txt"), "mine");
    assertThatThrownBy(() -> plan(own.resolve("no scenario"), own))
        .isInstanceOf(InputException.class)
        .hasMessageContaining("thesis.txt");
  }
}
