package quietspan.check;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;
import quietspan.model.Finding;
import quietspan.model.RuleId;

/** Rules on where a contact looks, judged on samples. Ground time. */
final class ContactSight {

  private ContactSight() {}

  /** The Earth must not stand between craft and station, nor the station's skyline. */
  static List<Finding> aboveMask(Evidence evidence) {
    return broken(
        evidence,
        RuleId.ABOVE_MASK,
        Watch::aboveMask,
        Survey::brokenSeconds,
        survey -> "is below the mask for " + Findings.seconds(survey.brokenSeconds()));
  }

  /** The antenna cannot look there: too low, too high or into a dead zone. */
  static List<Finding> keyhole(Evidence evidence) {
    return broken(
        evidence,
        RuleId.KEYHOLE,
        Watch::insideLimits,
        Survey::brokenSeconds,
        survey ->
            "is in a dead zone or beyond an elevation limit of the antenna for "
                + Findings.seconds(survey.brokenSeconds()));
  }

  /** Close to the Sun the link is noise. */
  static List<Finding> sep(Evidence evidence) {
    return broken(
        evidence,
        RuleId.SEP,
        Watch::sep,
        survey -> Math.toDegrees(-survey.least()),
        survey ->
            "comes closer to the Sun than the station's limit, by "
                + Findings.degrees(-survey.least())
                + ", for "
                + Findings.seconds(survey.brokenSeconds()));
  }

  /** Outside the usable cone there is no link, whatever the rate. */
  static List<Finding> offPointing(Evidence evidence) {
    return broken(
        evidence,
        RuleId.OFF_POINTING,
        Watch::insideCone,
        survey -> Math.toDegrees(-survey.least()),
        survey ->
            "has the Earth outside the usable cone by up to "
                + Findings.degrees(-survey.least())
                + " for "
                + Findings.seconds(survey.brokenSeconds()));
  }

  /** A rate that does not close with its margin may lose data. */
  static List<Finding> linkMargin(Evidence evidence) {
    return broken(
        evidence,
        RuleId.LINK_MARGIN,
        Watch::link,
        survey -> -survey.least(),
        survey ->
            "falls short of the link margin at the stated rate by up to "
                + Findings.number(-survey.least())
                + " dB for "
                + Findings.seconds(survey.brokenSeconds()));
  }

  private static List<Finding> broken(
      Evidence evidence,
      RuleId rule,
      Function<Watch, Survey> which,
      Function<Survey, Double> amount,
      Function<Survey, String> words) {
    List<Finding> findings = new ArrayList<>();
    for (Watch watch : evidence.watches()) {
      Survey survey = which.apply(watch);
      if (survey.broken()) {
        Instant at = survey.brokenFrom().orElseThrow().utc();
        String detail =
            Findings.name(watch.contact()) + " " + words.apply(survey) + ", from " + at + " on.";
        findings.add(Findings.of(rule, watch.contact(), at, amount.apply(survey), detail));
      }
    }
    return findings;
  }
}
