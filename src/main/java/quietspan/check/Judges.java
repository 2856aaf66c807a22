package quietspan.check;

import quietspan.model.RuleId;

/** Who judges which rule. The compiler refuses a rule without a judge. */
final class Judges {

  private Judges() {}

  static Judge of(RuleId rule) {
    return switch (rule) {
      case ABOVE_MASK -> ContactSight::aboveMask;
      case KEYHOLE -> ContactSight::keyhole;
      case SEP -> ContactSight::sep;
      case MIN_LENGTH -> ContactForm::minLength;
      case MAX_LENGTH -> ContactForm::maxLength;
      case OFF_POINTING -> ContactSight::offPointing;
      case LINK_MARGIN -> ContactSight::linkMargin;
      case RATE_STEPS -> ContactForm::rateSteps;
      case RELOCK -> ContactForm::relock;
      case STILL -> Pointing::still;
      case ANTENNA_FREE -> ContactOrder::antennaFree;
      case AT_ONCE -> ContactOrder::atOnce;
      case CRAFT_SWITCH -> ContactOrder::craftSwitch;
      case AIM_LIMITS -> Pointing::aimLimits;
      case REPOINT_SPACING -> Pointing::repointSpacing;
      case PERIOD -> Pointing::period;
      case PROTECTED -> Pointing::protectedIntervals;
      case CONFIRMED -> Promises::confirmed;
      case FROZEN -> Promises::frozen;
      case OVERFLOW -> DataLimits::overflow;
      case FILL -> DataLimits::fill;
      case LATENCY -> DataLimits::latency;
      case GAP -> Reach::gap;
      case DIRECT -> Reach::direct;
      case END_FILL -> DataLimits::endFill;
      case END_COVERAGE -> Reach::endCoverage;
    };
  }
}
