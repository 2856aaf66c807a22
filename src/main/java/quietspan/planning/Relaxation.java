package quietspan.planning;

import java.util.EnumSet;
import java.util.Set;
import quietspan.model.RuleId;

/**
 * What the bound gives up against the rules, one entry per step of the chain, and why each keeps it
 * valid: an answer that is more favourable than the truth can only raise the science of the best
 * label. Those that can be switched off are measured by the science they cost. Each names the rules
 * that it drops or widens; the rest are {@link #keptInFull}.
 */
enum Relaxation {
  /**
   * Valid because whatever a craft sends was aboard some craft, and what all hold together is at
   * most the sum of what each may hold: a plan that keeps every store keeps the sum. The same holds
   * for every prefix of the priorities, and for the bits that are young enough.
   */
  POOLED_STORES(
      false,
      "All craft share one store; any craft in contact sends any data. Cross-links, their rate and who"
          + " holds what are dropped, limits are those of the sum."),
  /**
   * Valid because dropping a rule only adds plans, and at every instant the links in use are at
   * most the best choice of that many pairs of craft and antenna. Passes shorter than the shortest
   * contact hold no legal contact and are left out.
   */
  CONTACT_OVERHEAD(
      false,
      "Lock-up, re-lock, shortest and longest contacts, setup and teardown between our own contacts,"
          + " switching time, handover and rate steps are dropped; at every instant the best antennas are"
          + " in use."),
  /** Valid because what is asked of a plan is only made less. */
  CONFIRMED_LOOSE(
      false,
      "A confirmed contact holds its craft's beam in its cells, but takes no antenna from the others; what is frozen binds nothing."),
  /**
   * Valid because more aims and more repoints are allowed. That no craft moves twice in one pause
   * is used only where the spacing is longer than all that could make up the pause between two
   * moves.
   */
  TRAVEL_AND_SPACING(
      false,
      "Steps of the aim are dropped, limits of its travel widened by one cone; the spacing of repoints is"
          + " used only to keep a craft from moving twice in one pause."),
  /** Valid because dropping a rule only adds plans. */
  DIRECT_DROPPED(false, "The limit on time without a contact per craft is dropped."),
  /**
   * Valid because an aim that serves in two cells is, at some instant of each, within the cone of
   * the Earth, so these two directions are at most two cones apart. Only pairs with the opening
   * cell are asked, so the path of the Earth may bend.
   */
  BEAM_CELLS(
      true,
      "A beam that opens in a cell serves every cell that any instant of the two cells allows: both"
          + " directions within two half-cones of each other, or overlapping azimuths where only the"
          + " azimuth moves."),
  /**
   * Valid because a lower off-pointing never lowers the rate, and the level on the axis between two
   * samples is above both by less than the guard.
   */
  BEST_RATE(
      true,
      "The off-pointing at every instant is the least that a beam which also served its opening cell can"
          + " have, and the link is as good as at the better end of a sample interval."),
  /**
   * Valid because a store that is within its limit at the end of a cell, after it has sent all that
   * the cell allows, holds no more then than in any plan; limits inside the cell are dropped. A gap
   * is counted in whole cells without any capacity, which are never longer than the gap itself.
   */
  WHOLE_CELLS(
      true, "What a cell can send is sent in it before the limits are looked at, at its end."),
  /**
   * Valid because the old aims serve at most until the pause and the new ones at least not before
   * the first cell given; where a repoint is shorter than a cell, both may serve in it.
   */
  PAUSE_ANYWHERE(
      true,
      "A pause that starts in a cell leaves the whole cell to the old aims, and the new aims begin with"
          + " the first cell they could reach from its begin."),
  /** Valid because less is made in a pause, never more. */
  PAUSE_SAVES(true, "Data are made at the pause rate in every cell that the pause may touch."),
  /**
   * Valid because what sticks out of the interruption is lost in any case, at the start that makes
   * it least. Only the repoint itself is kept out of protected intervals, not the interruption it
   * joins. What a repoint costs is handed back where it lies in a span that counts nothing anyway.
   */
  JOINED_PAUSES(
      true,
      "A repoint that may belong to the pause of an interruption costs only what sticks out of it, and no"
          + " warm-up.");

  private final boolean switchable;
  private final String sentence;

  Relaxation(boolean switchable, String sentence) {
    this.switchable = switchable;
    this.sentence = sentence;
  }

  /** Rules that it drops or widens. */
  Set<RuleId> rules() {
    return switch (this) {
      case POOLED_STORES ->
          EnumSet.of(RuleId.OVERFLOW, RuleId.FILL, RuleId.LATENCY, RuleId.END_FILL);
      case CONTACT_OVERHEAD ->
          EnumSet.of(
              RuleId.MIN_LENGTH,
              RuleId.MAX_LENGTH,
              RuleId.RATE_STEPS,
              RuleId.RELOCK,
              RuleId.ANTENNA_FREE,
              RuleId.CRAFT_SWITCH);
      case CONFIRMED_LOOSE -> EnumSet.of(RuleId.CONFIRMED, RuleId.FROZEN);
      case TRAVEL_AND_SPACING -> EnumSet.of(RuleId.AIM_LIMITS, RuleId.REPOINT_SPACING);
      case DIRECT_DROPPED -> EnumSet.of(RuleId.DIRECT);
      case BEAM_CELLS -> EnumSet.of(RuleId.OFF_POINTING, RuleId.END_COVERAGE);
      case BEST_RATE -> EnumSet.of(RuleId.LINK_MARGIN);
      case WHOLE_CELLS -> EnumSet.of(RuleId.GAP);
      case PAUSE_ANYWHERE -> EnumSet.of(RuleId.STILL);
      case JOINED_PAUSES -> EnumSet.of(RuleId.PROTECTED);
      case PAUSE_SAVES -> EnumSet.noneOf(RuleId.class);
    };
  }

  /** Rules that the bound keeps as they are. */
  static Set<RuleId> keptInFull() {
    return EnumSet.of(RuleId.ABOVE_MASK, RuleId.KEYHOLE, RuleId.SEP, RuleId.AT_ONCE, RuleId.PERIOD);
  }

  boolean switchable() {
    return switchable;
  }

  /** Its name as printed, in lower case with spaces. */
  String title() {
    return name().toLowerCase(java.util.Locale.ROOT).replace('_', ' ');
  }

  String sentence() {
    return sentence;
  }

  /** The chain of a bound. */
  static Set<Relaxation> all() {
    return EnumSet.allOf(Relaxation.class);
  }

  /**
   * What remains when everything that can be judged closely is: a base for skeletons, not for
   * bounds.
   */
  static Set<Relaxation> unavoidable() {
    EnumSet<Relaxation> left = EnumSet.allOf(Relaxation.class);
    left.removeIf(Relaxation::switchable);
    return left;
  }

  static Set<Relaxation> allBut(Relaxation tightened) {
    EnumSet<Relaxation> left = EnumSet.allOf(Relaxation.class);
    left.remove(tightened);
    return left;
  }
}
