package quietspan.cli;

import java.time.Instant;
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
import quietspan.model.Margins;
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

  /** More rows than this of one table are left to its file. */
  private static final int MOST_ROWS = 30;

  private static final int MOST_REMARKS = 5;

  private final Scenario scenario;
  private final Plan plan;
  private final Summary summary;
  private final List<EndState> ends;
  private final Lines lines = new Lines();

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
   * @param assumptions what was taken for granted
   * @param folder where the files are; empty when nothing was written
   */
  static String of(
      Scenario scenario,
      Plan plan,
      List<EndState> ends,
      List<String> warnings,
      List<String> assumptions,
      Optional<String> folder) {
    return new PlanScreen(scenario, plan, ends).screen(warnings, assumptions, folder);
  }

  private String screen(List<String> warnings, List<String> assumptions, Optional<String> folder) {
    verdict();
    figures();
    spans();
    weeks();
    craft();
    findings();
    lines.list("Waived: no plan could keep these limits", waivers(), MOST_REMARKS);
    lines.list("Warnings", warnings, MOST_REMARKS);
    lines.list("Taken for granted", assumptions, MOST_REMARKS);
    lines.add("");
    folder.ifPresent(name -> lines.add("Files in " + name + ": plan.json, csv/, calendars/"));
    provenance();
    return lines.toString();
  }

  private void verdict() {
    Instant begin = scenario.period().begin().utc();
    lines.row(
        "%s plan for %s, %s to %s on board (%s days)",
        summary.status(),
        plan.mission(),
        Lines.date(begin),
        Lines.date(scenario.period().end().utc()),
        Lines.trimmed(scenario.period().seconds() / 86_400));
    if (summary.shortfall()) {
      lines.add(
          noLegalPlan()
              ? "No plan could meet every rule: proved by the bound."
              : "It is not proved that no plan could meet every rule.");
    }
    lines.add("");
  }

  private boolean noLegalPlan() {
    return plan.bound().isPresent() && summary.boundScienceSeconds().isEmpty();
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
    lines.row(
        "Science   %s of %s; %s",
        hours(summary.scienceSeconds()), hours(summary.periodSeconds()), gap());
    lines.row(
        "Pauses    %d with repoints; %s",
        summary.pauses(),
        summary
            .boundPauses()
            .map(least -> "no legal plan has fewer than " + least)
            .orElse("no bound on them"));
    lines.row(
        "Spans     longest %s, shortest inner one %s",
        hours(summary.longestQuietSpanSeconds()), hours(summary.shortestQuietSpanSeconds()));
    lines.row(
        "Contacts  %d, %.1f h, %.1f cost units",
        plan.outcome().contacts().size(), summary.contactHours(), summary.stationCostUnits());
    lines.row(
        "Data      %s Gbit lost, highest fill %.1f %%, longest latency %s",
        Lines.trimmed(summary.lostBits() / 1e9),
        100 * summary.highestFillShare(),
        summary.longestLatencySeconds().isPresent()
            ? hours(summary.longestLatencySeconds().getAsDouble())
            : "none");
    Margins margins = scenario.rules().margins();
    lines.row(
        "Margins   %s %% of volume, %s %% of stores, %s deg pointing%s",
        Lines.trimmed(100 * margins.usableVolumeShare()),
        Lines.trimmed(100 * margins.plannedFillShare()),
        Lines.trimmed(margins.pointingAllowance().degrees()),
        scenario
            .rules()
            .link()
            .map(link -> ", " + Lines.trimmed(link.marginDb()) + " dB of link")
            .orElse(""));
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
    if (!plan.outcome().findings().isEmpty()) {
      return most + ",\n          which says nothing of a plan that breaks rules";
    }
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
    lines.add("");
    lines.row("%-30s %9s %9s  %s", "Quiet spans (on board)", "hours", "counts", "ended by");
    List<QuietSpan> spans = plan.outcome().quietSpans();
    for (QuietSpan span : spans.subList(0, Math.min(spans.size(), MOST_ROWS))) {
      lines.row(
          "%s to %s %9.2f %9.2f  %s",
          Lines.minute(span.during().begin().utc()),
          Lines.minuteOfYear(span.during().end().utc()),
          span.lengthSeconds() / 3600.0,
          span.valueSeconds() / 3600.0,
          Lines.shortened(ending(span, pauses), Lines.WIDTH - 54));
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
    return Lines.trimmed(pause.during().seconds() / 3600) + " h " + what;
  }

  private void more(int rows, String table) {
    if (rows > MOST_ROWS) {
      lines.add("... and " + (rows - MOST_ROWS) + " more in csv/" + table + ".csv");
    }
  }

  private void weeks() {
    lines.add("");
    lines.row(
        "%-15s %8s %8s %8s %8s %8s %8s %8s",
        "Week from", "contacts", "hours", "made", "sent", "could", "fill %", "latency");
    List<Week> weeks = Week.of(scenario, plan);
    for (Week week : weeks.subList(0, Math.min(weeks.size(), MOST_ROWS))) {
      lines.row(
          "%3d %-11s %8d %8.1f %8.2f %8.2f %8.2f %8.1f %8s",
          week.number(),
          Lines.date(week.during().begin().utc()),
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
    lines.add("(Gbit made by all craft, sent, and what the contacts could have carried)");
  }

  private void craft() {
    lines.add("");
    lines.row("%-14s %19s %18s  %s", "At the end", "aim", "fill", "holds the Earth until");
    for (EndState end : ends) {
      OnboardInstant until = end.earthHeldUntil();
      lines.row(
          "%-14s %7.2f, %6.2f deg %7.2f Gbit %3.0f %%  %s",
          Lines.shortened(end.craft(), 14),
          end.aim().azimuthCentidegrees() / 100.0,
          end.aim().elevationCentidegrees() / 100.0,
          end.fillBits() / 1e9,
          100 * end.fillShare(),
          until.equals(scenario.period().end())
              ? "(no longer)"
              : Lines.minute(until.utc()) + " on board");
    }
  }

  private void findings() {
    Map<RuleId, List<Finding>> byRule = new EnumMap<>(RuleId.class);
    for (Finding finding : plan.outcome().findings()) {
      byRule.computeIfAbsent(finding.rule(), rule -> new ArrayList<>()).add(finding);
    }
    List<String> broken =
        byRule.entrySet().stream().map(entry -> finding(entry.getKey(), entry.getValue())).toList();
    lines.list("Broken rules (each in csv/findings.csv)", broken, MOST_REMARKS);
  }

  private static String finding(RuleId rule, List<Finding> findings) {
    Finding worst =
        findings.stream().reduce((a, b) -> a.amount() >= b.amount() ? a : b).orElseThrow();
    return String.format(
        Locale.ROOT,
        "%s: %d, the worst by %s %s at %s %s%s",
        rule,
        findings.size(),
        Lines.trimmed(worst.amount()),
        rule.unit().symbol(),
        Lines.minute(worst.at()),
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
        Lines.minute(waiver.begin()),
        Lines.minute(waiver.end()),
        Lines.trimmed(waiver.relaxedLimit().toSeconds() / 3600.0));
  }

  private void provenance() {
    Provenance from = plan.provenance();
    lines.row("Seed %d, %d of %d steps", from.seed(), from.stepsDone(), from.effort());
    if (from.interrupted()) {
      lines.row("Interrupted: --effort %d gives the same plan again", from.stepsDone());
    }
    lines.add("Planning aid, not an authorisation.");
  }
}
