package quietspan.model;

/**
 * Every rule a plan can break, each with its sentence. Solver, check, rule reference and tests
 * enumerate this list; a rule lives nowhere else.
 */
public enum RuleId {
  ABOVE_MASK(
      Kind.AUTHORITY, Clock.GROUND, Unit.SECOND, "A contact lies inside one pass above the mask."),
  KEYHOLE(
      Kind.AUTHORITY,
      Clock.GROUND,
      Unit.SECOND,
      "A contact stays outside its antenna's dead zones and between its elevation limits."),
  SEP(
      Kind.AUTHORITY,
      Clock.GROUND,
      Unit.DEGREE,
      "During a contact the Sun-Earth-probe angle is at least the station's limit."),
  MIN_LENGTH(
      Kind.AUTHORITY,
      Clock.GROUND,
      Unit.SECOND,
      "A contact is at least as long as its antenna's shortest contact."),
  MAX_LENGTH(
      Kind.AUTHORITY,
      Clock.GROUND,
      Unit.SECOND,
      "A contact is at most as long as its antenna's longest contact."),
  OFF_POINTING(
      Kind.AUTHORITY,
      Clock.GROUND,
      Unit.DEGREE,
      "During a contact, outside its craft's repoints and settling, the Earth is inside the usable"
          + " cone of the aim then held."),
  LINK_MARGIN(
      Kind.AUTHORITY,
      Clock.GROUND,
      Unit.DECIBEL,
      "The stated rate closes with the link margin for its whole segment."),
  RATE_STEPS(
      Kind.AUTHORITY,
      Clock.GROUND,
      Unit.COUNT,
      "A contact has at most the allowed number of rates, each on the craft's ladder."),
  RELOCK(
      Kind.AUTHORITY,
      Clock.GROUND,
      Unit.SECOND,
      "Each rate is held longer than the time its lock takes."),
  STILL(
      Kind.AUTHORITY,
      Clock.ONBOARD,
      Unit.SECOND,
      "The on-board image of a contact overlaps no repoint or settling of its craft."),
  ANTENNA_FREE(
      Kind.AUTHORITY,
      Clock.GROUND,
      Unit.SECOND,
      "From setup to teardown a contact overlaps no other use, outage or lent slot of its antenna."),
  AT_ONCE(
      Kind.AUTHORITY,
      Clock.GROUND,
      Unit.SECOND,
      "No more contacts of the formation run at one time than are allowed."),
  CRAFT_SWITCH(
      Kind.AUTHORITY,
      Clock.GROUND,
      Unit.SECOND,
      "Between contacts of different craft the least switching time passes."),
  AIM_LIMITS(
      Kind.AUTHORITY,
      Clock.ONBOARD,
      Unit.DEGREE,
      "An aim lies within the antenna's travel and on its steps."),
  REPOINT_SPACING(
      Kind.AUTHORITY,
      Clock.ONBOARD,
      Unit.SECOND,
      "Between the starts of two repoints of one craft the least time passes; none begins before"
          + " the last one has settled."),
  PERIOD(
      Kind.AUTHORITY,
      Clock.ONBOARD,
      Unit.SECOND,
      "Repoints with their settling, and the on-board images of contacts, lie inside the period."),
  PROTECTED(
      Kind.AUTHORITY,
      Clock.ONBOARD,
      Unit.SECOND,
      "No pause that holds a repoint overlaps a protected interval."),
  CONFIRMED(
      Kind.AUTHORITY,
      Clock.GROUND,
      Unit.SECOND,
      "A confirmed contact stays: same station, antenna and craft, at least its interval."),
  FROZEN(
      Kind.AUTHORITY,
      Clock.GROUND,
      Unit.COUNT,
      "What begins before the freeze stays as it was published."),
  OVERFLOW(
      Kind.DATA,
      Clock.ONBOARD,
      Unit.BIT,
      "No store is filled beyond its capacity; what does not fit is lost."),
  FILL(Kind.DATA, Clock.ONBOARD, Unit.BIT_SECOND, "No store is filled beyond the planned limit."),
  LATENCY(
      Kind.DATA,
      Clock.GROUND,
      Unit.BIT,
      "Every bit is delivered within the latency limit of its class."),
  GAP(
      Kind.DATA,
      Clock.GROUND,
      Unit.SECOND,
      "The formation is never longer without a contact than the limit."),
  DIRECT(
      Kind.DATA,
      Clock.GROUND,
      Unit.SECOND,
      "No craft is longer without a contact of its own than the limit."),
  END_FILL(
      Kind.DATA,
      Clock.ONBOARD,
      Unit.BIT,
      "At the end of the period each store is below its limit."),
  END_COVERAGE(
      Kind.DATA,
      Clock.ONBOARD,
      Unit.SECOND,
      "At the end of the period each aim still holds the Earth for the time asked.");

  /** What breaking the rule means for a plan. */
  public enum Kind {
    /** A written plan never breaks it. */
    AUTHORITY,
    /** A plan that breaks it is a shortfall. */
    DATA
  }

  /** The clock on which the rule is judged. */
  public enum Clock {
    GROUND,
    ONBOARD
  }

  /** The unit of the amount by which the rule is broken. */
  public enum Unit {
    SECOND("s"),
    DEGREE("deg"),
    DECIBEL("dB"),
    COUNT(""),
    BIT("bit"),
    BIT_SECOND("bit s");

    private final String symbol;

    Unit(String symbol) {
      this.symbol = symbol;
    }

    public String symbol() {
      return symbol;
    }
  }

  private final Kind kind;
  private final Clock clock;
  private final Unit unit;
  private final String sentence;

  RuleId(Kind kind, Clock clock, Unit unit, String sentence) {
    this.kind = kind;
    this.clock = clock;
    this.unit = unit;
    this.sentence = sentence;
  }

  public Kind kind() {
    return kind;
  }

  public Clock clock() {
    return clock;
  }

  public Unit unit() {
    return unit;
  }

  public String sentence() {
    return sentence;
  }
}
