package quietspan.planning;

import java.util.EnumSet;
import java.util.Set;

/**
 * What the bound gives up against the rules, one entry per step of the chain, and why each keeps it
 * valid: an answer that is more favourable than the truth can only raise the science of the best
 * label. Those that can be switched off are measured by the science they cost.
 */
enum Relaxation {
  POOLED_STORES(
      false,
      "All craft share one store; any craft in contact sends any data. Cross-links, their rate and who"
          + " holds what are dropped, limits are those of the sum."),
  CONTACT_OVERHEAD(
      false,
      "Lock-up, re-lock, shortest and longest contacts, setup and teardown between our own contacts,"
          + " switching time, handover and rate steps are dropped; at every instant the best antennas are"
          + " in use."),
  CONFIRMED_LOOSE(
      false,
      "A confirmed contact holds its craft's beam in its cells, but takes no antenna from the others; what is frozen binds nothing."),
  TRAVEL_AND_SPACING(
      false,
      "Steps of the aim are dropped, limits of its travel widened by one cone; the spacing of repoints is"
          + " used only to keep a craft from moving twice in one pause."),
  DIRECT_DROPPED(false, "The limit on time without a contact per craft is dropped."),
  BEAM_CELLS(
      true,
      "A beam that opens in a cell serves every cell that any instant of the two cells allows: both"
          + " directions within two half-cones of each other, or overlapping azimuths where only the"
          + " azimuth moves."),
  BEST_RATE(
      true,
      "The off-pointing at every instant is the least that a beam which also served its opening cell can"
          + " have, and the link is as good as at the better end of a sample interval."),
  WHOLE_CELLS(
      true, "What a cell can send is sent in it before the limits are looked at, at its end."),
  PAUSE_ANYWHERE(
      true,
      "A pause that starts in a cell leaves the whole cell to the old aims, and the new aims begin with"
          + " the first cell they could reach from its begin."),
  PAUSE_SAVES(true, "Data are made at the pause rate in every cell that the pause may touch."),
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
