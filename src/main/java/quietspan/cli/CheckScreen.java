package quietspan.cli;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import quietspan.check.CheckMargins;
import quietspan.check.CheckMargins.Extreme;
import quietspan.check.CheckReport;
import quietspan.model.Finding;
import quietspan.model.RuleId;
import quietspan.problem.Problem;
import quietspan.run.CheckRun;

/** The verdict on a plan, in 80 columns. */
final class CheckScreen {

  private static final int MOST_FINDINGS = 40;
  private static final int MOST_LINES = 12;

  private final Lines lines = new Lines();

  private CheckScreen() {}

  /**
   * The whole screen.
   *
   * @param plan as the user gave it
   * @param scenario folder that it was held against, for the eye
   */
  static String of(String plan, String scenario, CheckRun.Answer answer) {
    CheckScreen screen = new CheckScreen();
    screen.write(plan, scenario, answer);
    return screen.lines.toString();
  }

  private void write(String plan, String scenario, CheckRun.Answer answer) {
    CheckReport report = answer.report();
    lines.add(answer.word() + " plan " + plan + ", held against " + scenario);
    lines.row(
        "Science %.2f h; pauses with repoints: %d; findings: %d",
        answer.summary().scienceSeconds() / 3600.0,
        answer.summary().pauses(),
        report.findings().size());
    lines.list(
        "Findings", report.findings().stream().map(CheckScreen::finding).toList(), MOST_FINDINGS);
    lines.list(
        "ALTERED: the plan was made for other inputs or with other waivers",
        answer.altered(),
        MOST_LINES);
    lines.list(
        "STALE: these do not follow from the decisions; the decisions count",
        answer.stale(),
        MOST_LINES);
    margins(report.margins());
    lines.list("Simulation and check differ, a fault of ours", answer.disagreements(), MOST_LINES);
    List<String> warnings = new java.util.ArrayList<>(report.warnings());
    answer.warnings().stream().map(Problem::toString).forEach(warnings::add);
    lines.list("Warnings", warnings, MOST_LINES);
    lines.list("Taken for granted", report.assumptions(), MOST_LINES);
    lines.add("");
    lines.wrapped(report.missable().sentence(), 0);
  }

  private static String finding(Finding finding) {
    String who =
        String.join(" ", List.of(finding.craft(), finding.station(), finding.subject()))
            .strip()
            .replaceAll(" +", " ");
    return String.format(
        Locale.ROOT,
        "%s at %s %s%s: by %s %s. %s",
        finding.rule(),
        Lines.second(finding.at()),
        finding.rule().clock() == RuleId.Clock.GROUND ? "ground" : "on board",
        who.isEmpty() ? "" : ", " + who,
        Lines.trimmed(finding.amount()),
        finding.rule().unit().symbol(),
        finding.detail());
  }

  private void margins(CheckMargins margins) {
    lines.add("");
    lines.add("Nearest to the limits:");
    margin("off-pointing", "%.3f deg inside the usable cone", margins.offPointingDegrees());
    margin("link", "%.2f dB beyond the margin", margins.linkDecibels());
    margin("turn-round", "%.0f s to spare", margins.turnRoundSeconds());
    margin("after repoint", "%.0f s until the next contact", margins.afterRepointSeconds());
    margin("fill", "%.1f %% of the store", margins.highestFillPercent());
    for (Extreme latency : margins.longestLatencySeconds()) {
      lines.row("  %-14s %.2f h  %s", "latency", latency.value() / 3600, latency.subject());
    }
  }

  private void margin(String name, String form, Optional<Extreme> extreme) {
    extreme.ifPresent(
        each ->
            lines.row(
                "  %-14s %s  %s",
                name, String.format(Locale.ROOT, form, each.value()), each.subject()));
  }
}
