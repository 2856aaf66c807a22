package quietspan.check;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import quietspan.model.Craft;
import quietspan.model.Finding;
import quietspan.model.Guarded;
import quietspan.model.HighGainAntenna;
import quietspan.model.Pause;
import quietspan.model.Repoint;
import quietspan.model.RuleId;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/** Rules on repoints and pauses. On-board time. */
final class Pointing {

  private Pointing() {}

  /** An antenna that moves or settles hears nothing reliably. */
  static List<Finding> still(Evidence evidence) {
    List<Finding> findings = new ArrayList<>();
    for (Watch watch : evidence.watches()) {
      double seconds = 0;
      OnboardInstant at = null;
      for (Repoint repoint : evidence.repoints(watch.contact().craft())) {
        Optional<Interval<OnboardInstant>> both =
            evidence.during(repoint).intersection(watch.onboard());
        if (both.isPresent()) {
          seconds += both.get().seconds();
          at = at == null ? both.get().begin() : at;
        }
      }
      if (at != null) {
        String detail =
            Findings.name(watch.contact())
                + " coincides on board with a repoint or its settling for "
                + Findings.seconds(seconds)
                + ".";
        findings.add(Findings.of(RuleId.STILL, watch.contact(), at.utc(), seconds, detail));
      }
    }
    return findings;
  }

  /** The mechanism cannot go there. */
  static List<Finding> aimLimits(Evidence evidence) {
    List<Finding> findings = new ArrayList<>();
    for (Repoint repoint : evidence.decisions().repoints()) {
      Craft craft = evidence.scenario().craft(repoint.craft());
      double beyond = Aims.beyondLimits(craft.antenna().steering(), repoint.aim());
      if (beyond > 0) {
        String detail =
            Findings.name(repoint)
                + " aims at azimuth "
                + Findings.number(repoint.aim().azimuthCentidegrees() / 100.0)
                + " deg, elevation "
                + Findings.number(repoint.aim().elevationCentidegrees() / 100.0)
                + " deg, which is "
                + Findings.number(beyond)
                + " deg from where the antenna can be held.";
        findings.add(
            Findings.of(RuleId.AIM_LIMITS, repoint, repoint.start().utc(), beyond, detail));
      }
    }
    return findings;
  }

  /** A move begins from rest, and the mechanism may need longer between moves. */
  static List<Finding> repointSpacing(Evidence evidence) {
    List<Finding> findings = new ArrayList<>();
    for (Craft craft : evidence.scenario().craft()) {
      Duration least = leastSpacing(craft.antenna());
      Optional<OnboardInstant> before = evidence.scenario().start().of(craft.name()).lastRepoint();
      for (Repoint repoint : evidence.repoints(craft.name())) {
        if (before.isPresent()) {
          double gap = repoint.start().secondsSince(before.get());
          double missing = Seconds.of(least) - gap;
          if (missing > 0) {
            String detail =
                Findings.name(repoint)
                    + " starts "
                    + Findings.seconds(gap)
                    + " after the one before; at least "
                    + Findings.seconds(Seconds.of(least))
                    + " must pass.";
            findings.add(
                Findings.of(
                    RuleId.REPOINT_SPACING, repoint, repoint.start().utc(), missing, detail));
          }
        }
        before = Optional.of(repoint.start());
      }
    }
    return findings;
  }

  private static Duration leastSpacing(HighGainAntenna antenna) {
    Duration length = antenna.repointLength();
    Duration spacing = antenna.repointSpacing();
    return spacing.compareTo(length) > 0 ? spacing : length;
  }

  /** What lies outside the period belongs to another plan. */
  static List<Finding> period(Evidence evidence) {
    Interval<OnboardInstant> period = evidence.scenario().period();
    List<Finding> findings = new ArrayList<>();
    for (Repoint repoint : evidence.decisions().repoints()) {
      Interval<OnboardInstant> during = evidence.during(repoint);
      double outside = outside(during, period);
      if (outside > 0) {
        String detail =
            Findings.name(repoint)
                + " with its settling leaves the period by "
                + Findings.seconds(outside)
                + ".";
        findings.add(
            Findings.of(
                RuleId.PERIOD, repoint, firstOutside(during, period).utc(), outside, detail));
      }
    }
    for (Watch watch : evidence.watches()) {
      double outside = outside(watch.onboard(), period);
      if (outside > 0) {
        String detail =
            Findings.name(watch.contact())
                + " leaves the period on board by "
                + Findings.seconds(outside)
                + ".";
        findings.add(
            Findings.of(
                RuleId.PERIOD,
                watch.contact(),
                firstOutside(watch.onboard(), period).utc(),
                outside,
                detail));
      }
    }
    return findings;
  }

  private static double outside(Interval<OnboardInstant> stretch, Interval<OnboardInstant> period) {
    double inside = stretch.intersection(period).map(Interval::seconds).orElse(0.0);
    return period.contains(stretch) ? 0 : stretch.seconds() - inside;
  }

  private static OnboardInstant firstOutside(
      Interval<OnboardInstant> stretch, Interval<OnboardInstant> period) {
    boolean early = stretch.begin().isBefore(period.begin());
    boolean late = !stretch.begin().isBefore(period.end());
    return early || late ? stretch.begin() : period.end();
  }

  /** The instrument must not be shaken while it is protected. */
  static List<Finding> protectedIntervals(Evidence evidence) {
    List<Finding> findings = new ArrayList<>();
    for (Pause pause : evidence.science().pauses()) {
      if (pause.repoints().isEmpty()) {
        continue;
      }
      for (Guarded guarded : evidence.scenario().calendars().guarded()) {
        Optional<Interval<OnboardInstant>> both = pause.during().intersection(guarded.during());
        if (both.isPresent()) {
          double seconds = both.get().seconds();
          String detail =
              "The pause that holds repoint "
                  + String.join(", ", pause.repoints())
                  + " lies "
                  + Findings.seconds(seconds)
                  + " inside the protected interval "
                  + guarded.label()
                  + ".";
          findings.add(
              new Finding(
                  RuleId.PROTECTED,
                  both.get().begin().utc(),
                  "",
                  "",
                  pause.repoints().get(0),
                  seconds,
                  detail));
        }
      }
    }
    return findings;
  }
}
