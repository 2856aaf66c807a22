package quietspan.input;

import static quietspan.input.Field.optional;
import static quietspan.input.Field.required;
import static quietspan.input.Field.standard;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;
import quietspan.units.DataRate;
import quietspan.units.DataVolume;
import quietspan.units.Distance;

/** The field table of {@code mission.yaml}. */
final class MissionFields {

  static final String FILE = "mission.yaml";

  /** What several blocks share; a class of its own so that blocks can be asked in any order. */
  private static final class Common {
    static final Quantity<Angle> TURN = Quantity.ANGLE.atLeast("-360 deg").atMost("360 deg");
    static final Quantity<Angle> HALF_TURN = TURN.atLeast("-90 deg").atMost("90 deg");
    static final Quantity<Double> LOSS = Quantity.DECIBEL.atLeast("0 dB").atMost("100 dB");
    static final Quantity<Double> PART = Quantity.SHARE.atLeast("0 %").atMost("100 %");
    static final Quantity<DataRate> ANY_RATE = Quantity.RATE.above("0 bit/s");

    static final Field<Angle> AZIMUTH_FROM =
        standard(
            "azimuth_from",
            TURN.atLeast("0 deg").below("360 deg"),
            "0 deg",
            "Lower azimuth limit.");
    static final Field<Angle> AZIMUTH_TO =
        standard(
            "azimuth_to",
            TURN.atLeast("0 deg").below("360 deg"),
            "0 deg",
            "Upper azimuth limit, reached from the lower one with rising azimuth; equal limits are the"
                + " whole circle.");
    static final Field<Angle> STEP =
        standard(
            "step",
            TURN.like("0.25 deg").atLeast("0 deg").atMost("30 deg"),
            "0 deg",
            "Aims lie whole steps above the lower limits; 0 deg stands for hundredths of a degree.");
  }

  /** The on-board clock's planning period. */
  static final class Period {
    static final Field<OnboardInstant> BEGIN =
        required("begin_onboard_utc", Moment.ONBOARD, "First instant of the planning period.");
    static final Field<OnboardInstant> END =
        required("end_onboard_utc", Moment.ONBOARD, "First instant after the planning period.");
    static final Block TABLE = Block.of("the planning period on board", BEGIN, END);

    private Period() {}
  }

  /** A triangle of three craft that turns once a year. */
  static final class Formation {
    static final Field<Instant> EPOCH =
        required("epoch_tdb", Moment.TDB, "Instant at which longitude and phase hold.");
    static final Field<Distance> ARM =
        required(
            "arm",
            Quantity.DISTANCE.above("0 km").atMost("0.2 au"),
            "Length of a side of the triangle.");
    static final Field<Angle> TRAILING =
        optional(
            "trailing",
            Quantity.ANGLE.like("31 deg").atLeast("0 deg").atMost("180 deg"),
            "Heliocentric ecliptic longitude by which its centre trails the Earth.");
    static final Field<Angle> LEADING =
        optional(
            "leading",
            Quantity.ANGLE.like("20 deg").atLeast("0 deg").atMost("180 deg"),
            "Heliocentric ecliptic longitude by which its centre leads the Earth.");
    static final Field<Angle> PHASE =
        standard(
            "phase",
            Common.TURN,
            "0 deg",
            "Turns the triangle in its plane: node of corner 1 at the epoch, from the direction of"
                + " the centre.");
    static final Field<Boolean> TILT =
        standard(
            "tilt",
            Word.of("first_order", false, "second_order", true),
            "second_order",
            "Tilt of the plane: first_order is 60 deg, second_order 60 deg + 5 alpha / 8 with alpha"
                + " = arm / 2 au, which keeps the arms more equal.");
    static final Block TABLE =
        Block.of("a formation", EPOCH, ARM, TRAILING, LEADING, PHASE, TILT)
            .exactlyOne(TRAILING, LEADING);

    private Formation() {}
  }

  /** Kepler elements about the Sun. */
  static final class Elements {
    static final Field<Instant> EPOCH =
        required("epoch_tdb", Moment.TDB, "Epoch of the mean anomaly.");
    static final Field<Distance> SEMI_MAJOR_AXIS =
        required(
            "semi_major_axis",
            Quantity.DISTANCE.like("1 au").atLeast("0.1 au").atMost("10 au"),
            "Semi-major axis.");
    static final Field<Double> ECCENTRICITY =
        required("eccentricity", Plain.number("an eccentricity", "0.0031", 0.9), "Eccentricity.");
    static final Field<Angle> INCLINATION =
        required(
            "inclination",
            Quantity.ANGLE.like("0.31 deg").atLeast("0 deg").atMost("180 deg"),
            "Inclination to the J2000 ecliptic.");
    static final Field<Angle> NODE =
        required("node", Common.TURN.like("270 deg"), "Longitude of the ascending node.");
    static final Field<Angle> PERIHELION =
        required("argument_of_perihelion", Common.TURN.like("270 deg"), "Argument of perihelion.");
    static final Field<Angle> MEAN_ANOMALY =
        required("mean_anomaly", Common.TURN.like("80.3 deg"), "Mean anomaly at the epoch.");
    static final Block TABLE =
        Block.of(
            "heliocentric Kepler elements in the J2000 ecliptic",
            EPOCH,
            SEMI_MAJOR_AXIS,
            ECCENTRICITY,
            INCLINATION,
            NODE,
            PERIHELION,
            MEAN_ANOMALY);

    private Elements() {}
  }

  /** A CCSDS orbit ephemeris message. */
  static final class Ephemeris {
    static final Field<String> FILE =
        required(
            "file",
            Plain.FILE,
            "Orbit ephemeris message (CCSDS 502.0-B), as text or XML, in the scenario folder.");
    static final Field<String> OBJECT =
        standard(
            "object",
            new ObjectName(),
            "\"\"",
            "OBJECT_NAME or OBJECT_ID to take; may be left out when the file holds one object.");
    static final Block TABLE = Block.of("an orbit ephemeris message", FILE, OBJECT);

    private Ephemeris() {}
  }

  /** Where a craft's trajectory comes from. */
  static final class Orbit {
    static final Field<Integer> CORNER =
        optional("corner", Plain.count(1, 3), "Corner of the mission's formation.");
    static final Field<Values> ELEMENTS =
        optional("elements", Elements.TABLE, "Heliocentric elements, propagated by Kepler's laws.");
    static final Field<Values> OEM = optional("oem", Ephemeris.TABLE, "An ephemeris file.");
    static final Block TABLE =
        Block.of("where the trajectory comes from", CORNER, ELEMENTS, OEM)
            .exactlyOne(CORNER, ELEMENTS, OEM);

    private Orbit() {}
  }

  /** Laws that turn the body frame. */
  enum AttitudeLaw {
    IN_FORMATION,
    SUN_POINTING,
    INERTIAL
  }

  /** A body frame that stands still among the stars. */
  static final class InertialFrame {
    static final Field<Angle> RIGHT_ASCENSION =
        required(
            "right_ascension",
            Common.TURN.like("85 deg"),
            "Right ascension of body X in the ICRF.");
    static final Field<Angle> DECLINATION =
        required(
            "declination", Common.HALF_TURN.like("-20 deg"), "Declination of body X in the ICRF.");
    static final Field<Angle> ROLL =
        standard(
            "roll",
            Common.TURN,
            "0 deg",
            "Turn about body X; at zero body Y lies in the ICRF equator, towards rising right"
                + " ascension.");
    static final Block TABLE =
        Block.of("an inertial body frame", RIGHT_ASCENSION, DECLINATION, ROLL);

    private InertialFrame() {}
  }

  /** An antenna that can be aimed in azimuth and elevation. */
  static final class TwoAxes {
    static final Field<Angle> FROM = Common.AZIMUTH_FROM;
    static final Field<Angle> TO = Common.AZIMUTH_TO;
    static final Field<Angle> ELEVATION_FROM =
        standard("elevation_from", Common.HALF_TURN, "-90 deg", "Lower elevation limit.");
    static final Field<Angle> ELEVATION_TO =
        standard("elevation_to", Common.HALF_TURN, "90 deg", "Upper elevation limit.");
    static final Field<Angle> STEPS = Common.STEP;
    static final Block TABLE =
        Block.of("the travel of two axes", FROM, TO, ELEVATION_FROM, ELEVATION_TO, STEPS);

    private TwoAxes() {}
  }

  /** An antenna that can be aimed in azimuth only. */
  static final class AzimuthOnly {
    static final Field<Angle> FROM = Common.AZIMUTH_FROM;
    static final Field<Angle> TO = Common.AZIMUTH_TO;
    static final Field<Angle> ELEVATION =
        required("elevation", Common.HALF_TURN.like("13.1 deg"), "The elevation that is built in.");
    static final Field<Angle> STEPS = Common.STEP;
    static final Block TABLE = Block.of("the travel of one axis", FROM, TO, ELEVATION, STEPS);

    private AzimuthOnly() {}
  }

  /** The antenna that is held between repoints. */
  static final class Antenna {
    static final Field<Angle> HALF_CONE =
        required(
            "half_cone",
            Quantity.ANGLE.like("2.1 deg").above("0 deg").atMost("60 deg"),
            "Rated half-cone: off-pointing up to which the antenna may be used.");
    static final Field<Angle> HALF_POWER_WIDTH =
        optional(
            "half_power_width",
            Quantity.ANGLE.like("4.6 deg").above("0 deg").atMost("120 deg"),
            "Full width of the beam between its half-power points; needed for a link budget,"
                + " otherwise twice the half-cone.");
    static final Field<Duration> MOVE =
        required("move", Quantity.DURATION.above("0 s"), "Time of a repointing move, on board.");
    static final Field<Duration> SETTLE =
        required(
            "settle",
            Quantity.DURATION.like("4 h"),
            "Time after the move until the instrument is quiet, on board.");
    static final Field<Duration> REPOINT_SPACING =
        standard(
            "repoint_spacing",
            Quantity.DURATION.like("2 d"),
            "0 s",
            "Least time between the starts of two repoints of this craft.");
    static final Field<Values> TWO_AXES =
        optional("two_axes", TwoAxes.TABLE, "The antenna is aimed in azimuth and elevation.");
    static final Field<Values> AZIMUTH_ONLY =
        optional(
            "azimuth_only", AzimuthOnly.TABLE, "The antenna is aimed in azimuth at one elevation.");
    static final Block TABLE =
        Block.of(
                "an antenna",
                HALF_CONE,
                HALF_POWER_WIDTH,
                MOVE,
                SETTLE,
                REPOINT_SPACING,
                TWO_AXES,
                AZIMUTH_ONLY)
            .exactlyOne(TWO_AXES, AZIMUTH_ONLY);

    private Antenna() {}
  }

  /** One row of a plain rate table. */
  static final class RateRow {
    static final Field<Angle> UP_TO =
        required(
            "up_to",
            Quantity.ANGLE.like("1.5 deg").above("0 deg").atMost("60 deg"),
            "Off-pointing, with the pointing allowance added, up to which the rate holds.");
    static final Field<DataRate> RATE = required("rate", Common.ANY_RATE, "Downlink rate.");
    static final Block TABLE = Block.of("a rate and where it holds", UP_TO, RATE);

    private RateRow() {}
  }

  /** The downlink rates of a craft. */
  static final class Rates {
    static final Field<Double> EIRP =
        optional(
            "eirp",
            Quantity.POWER.atLeast("-50 dBW").atMost("150 dBW"),
            "Effective isotropic radiated power on the axis of the beam; goes with ladder.");
    static final Field<List<Located<DataRate>>> LADDER =
        optional(
            "ladder",
            Items.atLeastOne(Common.ANY_RATE),
            "Rates, rising, of which the link budget takes the highest that closes.");
    static final Field<List<Located<Values>>> BY_OFF_POINTING =
        optional(
            "by_off_pointing",
            Items.atLeastOne(RateRow.TABLE),
            "A plain table instead of a budget, off-pointing rising and rate falling.");
    static final Block TABLE =
        Block.of("downlink rates", EIRP, LADDER, BY_OFF_POINTING)
            .exactlyOne(LADDER, BY_OFF_POINTING)
            .atMostOne(EIRP, BY_OFF_POINTING);

    private Rates() {}
  }

  /** One phase of a generation profile. */
  static final class Phase {
    static final Field<OnboardInstant> FROM =
        required("from_onboard_utc", Moment.ONBOARD, "Instant from which the rate holds.");
    static final Field<DataRate> RATE = required("rate", Quantity.RATE, "Rate of generation.");
    static final Block TABLE = Block.of("a phase", FROM, RATE);

    private Phase() {}
  }

  /** What a craft makes of one data class. */
  static final class Generation {
    static final Field<String> DATA_CLASS =
        required("data_class", Plain.NAME, "Name of a class in data.classes.");
    static final Field<DataRate> RATE =
        optional("rate", Quantity.RATE.like("17 kbit/s"), "A rate that never changes.");
    static final Field<List<Located<Values>>> PHASES =
        optional(
            "phases",
            Items.atLeastOne(Phase.TABLE),
            "Rates by phase, in time order; the first also holds before its instant.");
    static final Field<String> CSV =
        optional(
            "csv",
            Plain.FILE,
            "Rates by phase as a table with the header from_onboard_utc,rate [kbit/s] (any unit of"
                + " rate).");
    static final Field<Double> SHARE_IN_PAUSES =
        standard(
            "share_in_pauses",
            Common.PART.like("15 %"),
            "100 %",
            "Part of the rate made during pauses.");
    static final Block TABLE =
        Block.of("what is made of one data class", DATA_CLASS, RATE, PHASES, CSV, SHARE_IN_PAUSES)
            .exactlyOne(RATE, PHASES, CSV);

    private Generation() {}
  }

  /** One spacecraft. */
  static final class Craft {
    static final Field<String> NAME = required("name", Plain.NAME, "Name, unique in the mission.");
    static final Field<Values> ORBIT =
        required("orbit", Orbit.TABLE, "Where the trajectory comes from.");
    static final Field<AttitudeLaw> ATTITUDE =
        standard(
            "attitude",
            Word.of(AttitudeLaw.class),
            "in_formation",
            "Law of the body frame: in_formation has X on the bisector of the directions to the"
                + " neighbours and Z along the formation's normal on the Sun's side, sun_pointing"
                + " has X to the Sun and Z near the ecliptic north, inertial stands still.");
    static final Field<Values> INERTIAL_FRAME =
        optional("inertial_frame", InertialFrame.TABLE, "The frame of an inertial attitude.");
    static final Field<Values> ANTENNA = required("antenna", Antenna.TABLE, "High-gain antenna.");
    static final Field<Values> RATES = required("rates", Rates.TABLE, "Downlink rates.");
    static final Field<DataVolume> STORE =
        required(
            "store", Quantity.VOLUME.like("12 Gbit").above("0 bit"), "Capacity of its memory.");
    static final Field<DataRate> CROSS_LINK =
        standard(
            "cross_link",
            Quantity.RATE.like("44 kbit/s"),
            "0 bit/s",
            "Highest rate at which it sends to another craft; zero for none.");
    static final Field<List<Located<Values>>> GENERATION =
        standard("generation", Items.of(Generation.TABLE), "[]", "What it makes, by data class.");
    static final Block TABLE =
        Block.of(
            "a craft",
            NAME,
            ORBIT,
            ATTITUDE,
            INERTIAL_FRAME,
            ANTENNA,
            RATES,
            STORE,
            CROSS_LINK,
            GENERATION);

    private Craft() {}
  }

  /** What all links share. */
  static final class Link {
    static final Field<Double> FREQUENCY =
        required(
            "frequency",
            Quantity.FREQUENCY.atLeast("100 MHz").atMost("100 GHz"),
            "Downlink carrier.");
    static final Field<Double> REQUIRED_EB_N0 =
        required(
            "required_eb_n0",
            Quantity.DECIBEL.like("1.5 dB").atLeast("-2 dB").atMost("30 dB"),
            "Required energy per bit over noise density.");
    static final Field<Double> IMPLEMENTATION_LOSS =
        standard(
            "implementation_loss",
            Common.LOSS.like("1 dB"),
            "0 dB",
            "Receiver's loss against theory.");
    static final Field<Double> OTHER_LOSSES =
        standard("other_losses", Common.LOSS.like("0.3 dB"), "0 dB", "Polarisation and the like.");
    static final Field<Double> MARGIN =
        required("margin", Common.LOSS, "Link margin that must remain: a planning margin.");
    static final Block TABLE =
        Block.of(
            "what all links share",
            FREQUENCY,
            REQUIRED_EB_N0,
            IMPLEMENTATION_LOSS,
            OTHER_LOSSES,
            MARGIN);

    private Link() {}
  }

  /** What counts as science. */
  static final class Science {
    static final Field<Duration> MINIMUM_QUIET_SPAN =
        required(
            "minimum_quiet_span",
            Quantity.DURATION.like("48 h"),
            "A quiet span shorter than this counts nothing.");
    static final Field<Duration> WARM_UP =
        standard(
            "warm_up",
            Quantity.DURATION.like("2 h"),
            "0 s",
            "Deducted from every quiet span that counts.");
    static final Block TABLE = Block.of("what counts as science", MINIMUM_QUIET_SPAN, WARM_UP);

    private Science() {}
  }

  /** Rules of contacts. */
  static final class Contacts {
    static final Field<Duration> LOCK_UP =
        standard(
            "lock_up",
            Quantity.DURATION.like("5 min"),
            "0 s",
            "Time at the begin of a contact without data.");
    static final Field<Integer> RATE_STEPS =
        standard("rate_steps", Plain.count(1, 20), "1", "Most rates in one contact.");
    static final Field<Duration> RELOCK =
        optional(
            "relock",
            Quantity.DURATION.like("1 min"),
            "Time without data after each change of rate; as long as lock_up when left out.");
    static final Field<Integer> CONTACTS_AT_ONCE =
        standard(
            "contacts_at_once",
            Plain.count(1, 20),
            "1",
            "Most contacts of the formation at one time.");
    static final Field<Duration> CRAFT_SWITCH =
        standard(
            "craft_switch",
            Quantity.DURATION.like("10 min"),
            "0 s",
            "Least ground time between the end of a contact and the begin of one with another"
                + " craft.");
    static final Field<Double> OVERHEAD =
        standard(
            "overhead",
            Quantity.SHARE.like("10 %").atLeast("0 %").below("100 %"),
            "0 %",
            "Part of the rate spent on frames.");
    static final Block TABLE =
        Block.of(
            "rules of contacts",
            LOCK_UP,
            RATE_STEPS,
            RELOCK,
            CONTACTS_AT_ONCE,
            CRAFT_SWITCH,
            OVERHEAD);

    private Contacts() {}
  }

  /** A class of data. */
  static final class DataClass {
    static final Field<String> NAME = required("name", Plain.NAME, "Name, unique in the mission.");
    static final Field<Integer> PRIORITY =
        required("priority", Plain.count(1, 99), "1 is sent first.");
    static final Field<Duration> LATENCY =
        required(
            "latency_limit",
            Quantity.DURATION.like("36 h").above("0 s"),
            "Longest time from generation on board to delivery on the ground.");
    static final Block TABLE = Block.of("a data class", NAME, PRIORITY, LATENCY);

    private DataClass() {}
  }

  /** Limits on data. */
  static final class Data {
    static final Field<List<Located<Values>>> CLASSES =
        required("classes", Items.atLeastOne(DataClass.TABLE), "Classes of data.");
    static final Field<Duration> GAP_LIMIT =
        optional(
            "gap_limit",
            Quantity.DURATION.like("30 h").above("0 s"),
            "Longest ground time without any contact of the formation.");
    static final Field<Duration> DIRECT_LIMIT =
        optional(
            "direct_limit",
            Quantity.DURATION.like("20 d").above("0 s"),
            "Longest ground time per craft without a contact of its own.");
    static final Field<Double> END_FILL =
        optional(
            "end_fill",
            Common.PART.like("30 %"),
            "Limit of each store at the end of the period; when left out, the larger of its start"
                + " fill and 25 %.");
    static final Field<Duration> END_COVERAGE =
        optional(
            "end_coverage",
            Quantity.DURATION.like("1 d").above("0 s"),
            "How long each craft's aim at the end must still hold the Earth.");
    static final Field<Duration> FORWARD_AHEAD =
        standard(
            "forward_ahead",
            Quantity.DURATION.like("1 h"),
            "0 s",
            "How long before a contact the other craft already send to its craft.");
    static final Field<Boolean> CROSS_LINKS_IN_PAUSES =
        standard(
            "cross_links_in_pauses", Plain.FLAG, "true", "Whether craft exchange data in pauses.");
    static final Block TABLE =
        Block.of(
            "limits on data",
            CLASSES,
            GAP_LIMIT,
            DIRECT_LIMIT,
            END_FILL,
            END_COVERAGE,
            FORWARD_AHEAD,
            CROSS_LINKS_IN_PAUSES);

    private Data() {}
  }

  /** Planning margins. */
  static final class Margins {
    private static final Quantity<Double> MOST = Quantity.SHARE.above("0 %").atMost("100 %");

    static final Field<Double> USABLE_VOLUME =
        standard(
            "usable_volume",
            MOST.like("90 %"),
            "100 %",
            "Part of a contact's volume that plans may count on.");
    static final Field<Double> PLANNED_FILL =
        standard("planned_fill", MOST, "100 %", "Part of each store that plans may fill.");
    static final Field<Angle> POINTING_ALLOWANCE =
        standard(
            "pointing_allowance",
            Quantity.ANGLE.like("0.1 deg").atLeast("0 deg").atMost("10 deg"),
            "0 deg",
            "Attitude and antenna error, added to every off-pointing.");
    static final Field<Angle> CONE_ALLOWANCE =
        standard(
            "cone_allowance",
            Quantity.ANGLE.like("0.01 deg").atLeast("0 deg").atMost("10 deg"),
            "0.01 deg",
            "Aberration and the Earth's radius, taken from the rated half-cone.");
    static final Block TABLE =
        Block.of(
            "planning margins", USABLE_VOLUME, PLANNED_FILL, POINTING_ALLOWANCE, CONE_ALLOWANCE);

    private Margins() {}
  }

  /** One calendar file. */
  static final class Calendar {
    static final Field<String> FILE =
        required("file", Plain.FILE, "Calendar file (RFC 5545) in the scenario folder.");
    static final Field<CalendarMeaning> MEANING =
        required(
            "meaning",
            Word.of(CalendarMeaning.class),
            "What its events are: outage and lent (the antenna is not ours), protected (no pause"
                + " with a repoint), interruption (science stops), confirmed (a contact the station"
                + " has confirmed).");
    static final Field<CalendarClock> CLOCK =
        required(
            "clock",
            Word.of(CalendarClock.class),
            "Clock of its times: ground for outage, lent and confirmed, onboard for protected and"
                + " interruption.");
    static final Field<String> STATION =
        optional(
            "station", Plain.NAME, "Station it concerns; needed for outage, lent and confirmed.");
    static final Field<String> ANTENNA =
        optional(
            "antenna",
            Plain.NAME,
            "Antenna of the station; when left out, all of them (confirmed: the only one).");
    static final Field<String> CRAFT =
        optional(
            "craft",
            Plain.NAME,
            "Craft of every confirmed contact in the file; when left out, each event names its"
                + " craft.");
    static final Block TABLE =
        Block.of("a calendar", FILE, MEANING, CLOCK, STATION, ANTENNA, CRAFT);

    private Calendar() {}
  }

  static final Field<String> MISSION =
      required("mission", Plain.TEXT, "Name of the mission, shown in everything that is written.");
  static final Field<Instant> ISSUED =
      required(
          "issued", Moment.UTC, "Time stamp of everything that is written; no clock is ever read.");
  static final Field<Values> PERIOD = required("period", Period.TABLE, "Planning period.");
  static final Field<Values> FORMATION =
      optional("formation", Formation.TABLE, "The triangle whose corners craft may take.");
  static final Field<List<Located<Values>>> CRAFT =
      required(
          "craft", Items.atLeastOne(Craft.TABLE), "The craft; their order decides among equals.");
  static final Field<Values> LINK =
      optional("link", Link.TABLE, "What all links share; needed where a craft has a ladder.");
  static final Field<Values> SCIENCE =
      required("science", Science.TABLE, "What counts as science.");
  static final Field<Values> CONTACTS =
      standard("contacts", Contacts.TABLE, "{}", "Rules of contacts.");
  static final Field<Values> DATA = required("data", Data.TABLE, "Data classes and limits.");
  static final Field<Values> MARGINS =
      standard("margins", Margins.TABLE, "{}", "Planning margins.");
  static final Field<List<Located<Values>>> CALENDARS =
      standard("calendars", Items.of(Calendar.TABLE), "[]", "Calendar files and what they mean.");

  static final Block TABLE =
      Block.of(
          "a mission",
          MISSION,
          ISSUED,
          PERIOD,
          FORMATION,
          CRAFT,
          LINK,
          SCIENCE,
          CONTACTS,
          DATA,
          MARGINS,
          CALENDARS);

  private MissionFields() {}
}
