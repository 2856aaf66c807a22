package quietspan.cli;

import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.stream.Collectors;
import quietspan.export.EndState;
import quietspan.export.Summary;
import quietspan.export.Week;
import quietspan.model.Bound;
import quietspan.model.Finding;
import quietspan.model.Pause;
import quietspan.model.Plan;
import quietspan.model.Provenance;
import quietspan.model.QuietSpan;
import quietspan.model.Repoint;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.Waiver;
import quietspan.time.OnboardInstant;

/** A plan on one screen of 80 columns, to be read in half a minute. */
final class PlanScreen {

  private static final int WIDTH = 80;

  /** More rows than this of one table are left to its file. */
  private static final int MOST_ROWS = 30;

  private static final int MOST_REMARKS = 5;

  private static final DateTimeFormatter MINUTE =
      DateTimeFormatter.ofPattern("uuuu-MM-dd HH:mm", Locale.ROOT).withZone(ZoneOffset.UTC);

  private final Scenario scenario;
  private final Plan plan;
  private final Summary summary;
  private final List<EndState> ends;
  private final StringBuilder text = new StringBuilder();

  private PlanScreen(Scenario scenario, Plan plan, List<EndState> ends) {
    this.scenario = scenario;
    this.plan = plan;
    this.summary = Summary.of(scenario, plan);
    this.ends = ends;
  }

  /**
   * The whole screen.
   *
   * @param warnings remarks upon the scenario and the plan
   * @param folder where the files are; empty when nothing was written
   */
  static String of(
      Scenario scenario,
      Plan plan,
      List<EndState> ends,
      List<String> warnings,
      Optional<String> folder) {
    return new PlanScreen(scenario, plan, ends).screen(warnings, folder);
  }

  private String screen(List<String> warnings, Optional<String> folder) {
    verdict();
    figures();
    spans();
    weeks();
    craft();
    findings();
    remarks("Waived: no plan could keep these limits", waivers());
    remarks("Warnings", warnings);
    line("");
    folder.ifPresent(name -> line("Files in " + name + ": plan.json, csv/, calendars/"));
    provenance();
    return text.toString();
  }

  private void line(String line) {
    text.append(line.stripTrailing()).append('\n');
  }

  private void row(String format, Object... cells) {
    line(String.format(Locale.ROOT, format, cells));
  }

  private static String shortened(String text, int width) {
    return text.length() <= width ? text : text.substring(0, width - 3) + "...";
  }

  private void verdict() {
    Instant begin = scenario.period().begin().utc();
    row(
        "%s plan for %s, %s to %s on board (%s days)",
        summary.status(),
        plan.mission(),
        date(begin),
        date(scenario.period().end().utc()),
        trimmed(scenario.period().seconds() / 86_400));
    if (summary.shortfall()) {
      line(
          noLegalPlan()
              ? "No plan could meet every rule: proved by the bound."
              : "It is not proved that no plan could meet every rule.");
    }
    line("");
  }

  private boolean noLegalPlan() {
    return plan.bound().isPresent() && summary.boundScienceSeconds().isEmpty();
  }

  private static LocalDate date(Instant instant) {
    return LocalDate.ofInstant(instant, ZoneOffset.UTC);
  }

  private static String trimmed(double value) {
    String text = String.format(Locale.ROOT, "%.2f", value);
    return text.replaceAll("\\.?0+$", "");
  }

  private static String hours(double seconds) {
    return String.format(Locale.ROOT, "%.2f h", seconds / 3600);
  }

  private static String hours(long seconds) {
    return hours((double) seconds);
  }

  private static String hours(OptionalLong seconds) {
    return seconds.isPresent() ? hours(seconds.getAsLong()) : "none";
  }

  private void figures() {
    row(
        "Science   %s of %s; %s",
        hours(summary.scienceSeconds()), hours(summary.periodSeconds()), gap());
    row(
        "Pauses    %d with repoints; %s",
        summary.pauses(),
        summary
            .boundPauses()
            .map(least -> "no legal plan has fewer than " + least)
            .orElse("no bound on them"));
    row(
        "Spans     longest %s, shortest inner one %s",
        hours(summary.longestQuietSpanSeconds()), hours(summary.shortestQuietSpanSeconds()));
    row(
        "Contacts  %d, %.1f h, %.1f cost units",
        plan.outcome().contacts().size(), summary.contactHours(), summary.stationCostUnits());
    row(
        "Data      %s Gbit lost, highest fill %.1f %%, longest latency %s",
        trimmed(summary.lostBits() / 1e9),
        100 * summary.highestFillShare(),
        summary.longestLatencySeconds().isPresent()
            ? hours(summary.longestLatencySeconds().getAsDouble())
            : "none");
  }

  private String gap() {
    Optional<Bound> bound = plan.bound();
    if (bound.isEmpty()) {
      return "no bound was computed";
    }
    if (noLegalPlan()) {
      return "bound on legal plans: none exists";
    }
    long gap = summary.gapSeconds().orElseThrow();
    String most = "bound on legal plans " + hours(summary.boundScienceSeconds().orElseThrow());
    if (gap == 0) {
      return most + ": proved optimal";
    }
    return String.format(
        Locale.ROOT,
        "%s,\n          gap %s (%.2f %% of the period)",
        most,
        hours(gap),
        100.0 * gap / summary.periodSeconds());
  }

  private void spans() {
    Map<Instant, Pause> pauses = new HashMap<>();
    plan.outcome().pauses().forEach(pause -> pauses.put(pause.during().begin().utc(), pause));
    line("");
    row("%-35s %9s %9s  %s", "Quiet spans (on board)", "hours", "counts", "ended by");
    List<QuietSpan> spans = plan.outcome().quietSpans();
    for (QuietSpan span : spans.subList(0, Math.min(spans.size(), MOST_ROWS))) {
      row(
          "%s to %s %9.2f %9.2f  %s",
          MINUTE.format(span.during().begin().utc()),
          MINUTE.format(span.during().end().utc()),
          span.lengthSeconds() / 3600.0,
          span.valueSeconds() / 3600.0,
          shortened(ending(span, pauses), WIDTH - 59));
    }
    more(spans.size(), "quiet-spans");
  }

  private String ending(QuietSpan span, Map<Instant, Pause> pauses) {
    if (span.openAfter()) {
      return "goes on";
    }
    Pause pause = pauses.get(span.during().end().utc());
    if (pause == null) {
      return "";
    }
    String what =
        pause.repoints().isEmpty()
            ? String.join(", ", pause.interruptions())
            : plan.decisions().repoints().stream()
                .filter(repoint -> pause.repoints().contains(repoint.id()))
                .map(Repoint::craft)
                .distinct()
                .collect(Collectors.joining(", "));
    return trimmed(pause.during().seconds() / 3600) + " h " + what;
  }

  private void more(int rows, String table) {
    if (rows > MOST_ROWS) {
      line("... and " + (rows - MOST_ROWS) + " more in csv/" + table + ".csv");
    }
  }

  private void weeks() {
    line("");
    row(
        "%-15s %8s %8s %8s %8s %8s %8s %8s",
        "Week from", "contacts", "hours", "made", "sent", "could", "fill %", "latency");
    List<Week> weeks = Week.of(scenario, plan);
    for (Week week : weeks.subList(0, Math.min(weeks.size(), MOST_ROWS))) {
      row(
          "%3d %-11s %8d %8.1f %8.2f %8.2f %8.2f %8.1f %8s",
          week.number(),
          date(week.during().begin().utc()),
          week.contacts(),
          week.contactSeconds() / 3600.0,
          week.generatedBits() / 1e9,
          week.deliveredBits() / 1e9,
          week.capacityBits() / 1e9,
          100 * week.highestFill(),
          week.longestLatencySeconds().isPresent()
              ? String.format(
                  Locale.ROOT, "%.1f h", week.longestLatencySeconds().getAsDouble() / 3600)
              : "");
    }
    more(weeks.size(), "weeks");
    line("(Gbit made by all craft, sent, and what the contacts could have carried)");
  }

  private void craft() {
    line("");
    row("%-14s %19s %18s  %s", "At the end", "aim", "fill", "holds the Earth until");
    for (EndState end : ends) {
      OnboardInstant until = end.earthHeldUntil();
      row(
          "%-14s %7.2f, %6.2f deg %7.2f Gbit %3.0f %%  %s",
          shortened(end.craft(), 14),
          end.aim().azimuthCentidegrees() / 100.0,
          end.aim().elevationCentidegrees() / 100.0,
          end.fillBits() / 1e9,
          100 * end.fillShare(),
          until.equals(scenario.period().end())
              ? "(no longer)"
              : MINUTE.format(until.utc()) + " on board");
    }
  }

  private void findings() {
    Map<RuleId, List<Finding>> byRule = new EnumMap<>(RuleId.class);
    for (Finding finding : plan.outcome().findings()) {
      byRule.computeIfAbsent(finding.rule(), rule -> new ArrayList<>()).add(finding);
    }
    List<String> lines =
        byRule.entrySet().stream().map(entry -> finding(entry.getKey(), entry.getValue())).toList();
    remarks("Broken rules (each in csv/findings.csv)", lines);
  }

  private static String finding(RuleId rule, List<Finding> findings) {
    Finding worst =
        findings.stream().reduce((a, b) -> a.amount() >= b.amount() ? a : b).orElseThrow();
    return String.format(
        Locale.ROOT,
        "%s: %d, the worst by %s %s at %s %s%s",
        rule,
        findings.size(),
        trimmed(worst.amount()),
        rule.unit().symbol(),
        MINUTE.format(worst.at()),
        rule.clock() == RuleId.Clock.GROUND ? "ground" : "on board",
        worst.craft().isEmpty() ? "" : ", " + worst.craft());
  }

  private List<String> waivers() {
    return summary.waivers().stream().map(PlanScreen::waiver).toList();
  }

  private static String waiver(Waiver waiver) {
    return String.format(
        Locale.ROOT,
        "%s%s%s from %s to %s: limit %s h",
        waiver.rule(),
        waiver.dataClass().isEmpty() ? "" : " " + waiver.dataClass(),
        waiver.craft().isEmpty() ? "" : " " + waiver.craft(),
        MINUTE.format(waiver.begin()),
        MINUTE.format(waiver.end()),
        trimmed(waiver.relaxedLimit().toSeconds() / 3600.0));
  }

  private void remarks(String title, List<String> remarks) {
    if (remarks.isEmpty()) {
      return;
    }
    line("");
    line(title + ":");
    for (String remark : remarks.subList(0, Math.min(remarks.size(), MOST_REMARKS))) {
      wrapped(remark);
    }
    if (remarks.size() > MOST_REMARKS) {
      line("  ... and " + (remarks.size() - MOST_REMARKS) + " more");
    }
  }

  /** Breaks a long line at blanks; what follows is indented further. */
  private void wrapped(String remark) {
    StringBuilder line = new StringBuilder(" ");
    for (String word : remark.split(" ")) {
      if (line.length() + 1 + word.length() > WIDTH && !line.toString().isBlank()) {
        line(line.toString());
        line.setLength(0);
        line.append("   ");
      }
      line.append(' ').append(word);
    }
    line(line.toString());
  }

  private void provenance() {
    Provenance from = plan.provenance();
    row("Seed %d, %d of %d steps", from.seed(), from.stepsDone(), from.effort());
    if (from.interrupted()) {
      row("Interrupted: --effort %d gives the same plan again", from.stepsDone());
    }
    line("Planning aid, not an authorisation.");
  }
}
