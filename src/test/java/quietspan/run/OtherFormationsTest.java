package quietspan.run;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import quietspan.fixture.SmallScenario;
import quietspan.model.Repoint;

/** Missions that are no triangle, planned and judged. */
final class OtherFormationsTest {

  private static final String DAYS = "end_onboard_utc: 2031-09-05T00:00:00Z";

  @TempDir private Path folder;

  /** The small scenario with its mission and state changed. */
  private PlanRun.Answer planned(
      String end, UnaryOperator<String> mission, UnaryOperator<String> state) throws IOException {
    Path scenario = SmallScenario.write(folder.resolve("scenario"));
    change(
        scenario.resolve("mission.yaml"),
        text -> mission.apply(replaced(text, DAYS, "end_onboard_utc: " + end)));
    change(scenario.resolve("state.yaml"), state);
    Source source = new Source(scenario, Optional.empty(), Optional.empty());
    return PlanRun.plan(
        new PlanRun.Request(source, folder.resolve("plan"), 1, 30, "0.0.0"),
        what -> {},
        new AtomicBoolean());
  }

  private static void change(Path file, UnaryOperator<String> edit) throws IOException {
    Files.writeString(file, edit.apply(Files.readString(file)));
  }

  private static String replaced(String text, String was, String becomes) {
    assertThat(text).contains(was);
    return text.replace(was, becomes);
  }

  /** Leaves out the blocks of craft by name. */
  private static String without(String text, String... craft) {
    String left = text;
    for (String name : craft) {
      int from = left.indexOf("  - name: " + name + "\n");
      assertThat(from).as(name).isPositive();
      int next = left.indexOf("\n  - name: ", from);
      int end = left.indexOf("\nlink:", from);
      int until = next >= 0 ? next + 1 : end >= 0 ? end : left.length();
      left = left.substring(0, from) + left.substring(until);
    }
    return left;
  }

  private void isLegal(PlanRun.Answer answer) {
    assertThat(answer.plan().outcome().findings()).isEmpty();
    CheckRun.Answer checked =
        CheckRun.check(
            new CheckRun.Request(
                folder.resolve("plan"), folder, Optional.empty(), Optional.empty()));
    assertThat(checked.passed()).isTrue();
  }

  @Test
  void oneCraftThatStandsStillAmongTheStars() throws IOException {
    PlanRun.Answer answer =
        planned(
            "2031-09-15T00:00:00Z",
            text ->
                replaced(
                    without(text, "Merle", "Tovin"),
                    "    orbit: {corner: 1}\n",
                    "    orbit: {corner: 1}\n    attitude: inertial\n    inertial_frame:"
                        + " {right_ascension: 0 deg, declination: 0 deg, roll: 0 deg}\n"),
            text -> without(text, "Merle", "Tovin"));
    isLegal(answer);
    assertThat(answer.plan().decisions().repoints()).isNotEmpty();
    assertThat(answer.plan().decisions().repoints())
        .extracting(Repoint::craft)
        .containsOnly("Hask");
  }

  @Test
  void twoCraftThatPointToTheSun() throws IOException {
    PlanRun.Answer answer =
        planned(
            "2031-09-15T00:00:00Z",
            text -> {
              String two = without(text, "Tovin");
              for (int corner : List.of(1, 2)) {
                String orbit = "    orbit: {corner: " + corner + "}\n";
                two = replaced(two, orbit, orbit + "    attitude: sun_pointing\n");
              }
              return two;
            },
            text -> without(text, "Tovin"));
    isLegal(answer);
    assertThat(answer.plan().bound().orElseThrow().scienceSeconds().orElseThrow())
        .isGreaterThanOrEqualTo(answer.plan().outcome().scienceSeconds());
  }

  @Test
  void twoContactsAtOnce() throws IOException {
    isLegal(
        planned(
            "2031-09-12T00:00:00Z",
            text -> replaced(text, "contacts_at_once: 1", "contacts_at_once: 2"),
            text -> text));
  }
}
