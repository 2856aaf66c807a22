package quietspan.input;

import static quietspan.input.Field.optional;
import static quietspan.input.Field.required;
import static quietspan.input.Field.standard;

import java.time.Duration;
import java.util.List;
import quietspan.units.Angle;
import quietspan.units.Distance;

/** The field table of {@code stations.yaml}. */
final class StationFields {

  static final String FILE = "stations.yaml";

  /** What several blocks share; a class of its own so that blocks can be asked in any order. */
  private static final class Common {
    static final Quantity<Angle> ELEVATION =
        Quantity.ANGLE.like("10 deg").atLeast("0 deg").atMost("90 deg");
    static final Quantity<Angle> AZIMUTH =
        Quantity.ANGLE.like("120 deg").atLeast("0 deg").atMost("360 deg");
    static final Quantity<Double> FIGURE_OF_MERIT =
        Quantity.GAIN_OVER_TEMPERATURE.atLeast("-50 dB/K").atMost("100 dB/K");
  }

  /** A corner of a skyline. */
  static final class MaskPoint {
    static final Field<Angle> AT = required("azimuth", Common.AZIMUTH, "From north over east.");
    static final Field<Angle> HEIGHT =
        required("elevation", Common.ELEVATION, "Height of the skyline there.");
    static final Block TABLE = Block.of("a corner of the skyline", AT, HEIGHT);

    private MaskPoint() {}
  }

  /** G/T at an elevation. */
  static final class GainPoint {
    static final Field<Angle> AT =
        required("elevation", Common.ELEVATION, "Elevation of the antenna.");
    static final Field<Double> VALUE = required("g_over_t", Common.FIGURE_OF_MERIT, "G/T there.");
    static final Block TABLE = Block.of("G/T at an elevation", AT, VALUE);

    private GainPoint() {}
  }

  /** A sector in which nothing is received. */
  static final class DeadZone {
    static final Field<Angle> FROM = required("azimuth_from", Common.AZIMUTH, "Where it begins.");
    static final Field<Angle> TO =
        required("azimuth_to", Common.AZIMUTH, "Where it ends, reached with rising azimuth.");
    static final Field<Angle> UP_TO =
        standard(
            "up_to_elevation",
            Common.ELEVATION,
            "90 deg",
            "Elevation below which nothing is received.");
    static final Block TABLE = Block.of("a dead zone", FROM, TO, UP_TO);

    private DeadZone() {}
  }

  /** An antenna of a station. */
  static final class Antenna {
    static final Field<String> NAME = required("name", Plain.NAME, "Name, unique at the station.");
    static final Field<Double> G_OVER_T =
        optional("g_over_t", Common.FIGURE_OF_MERIT, "Figure of merit at every elevation.");
    static final Field<List<Located<Values>>> G_OVER_T_BY_ELEVATION =
        optional(
            "g_over_t_by_elevation",
            Items.atLeastOne(GainPoint.TABLE),
            "Figure of merit by rising elevation, linear between, constant outside.");
    static final Field<Double> ZENITH_ATTENUATION =
        standard(
            "zenith_attenuation",
            Quantity.DECIBEL.like("0.05 dB").atLeast("0 dB").atMost("20 dB"),
            "0 dB",
            "Atmosphere at the zenith; grows as 1/sin(elevation).");
    static final Field<Angle> LOWEST =
        standard("lowest_elevation", Common.ELEVATION, "0 deg", "Contacts only above it.");
    static final Field<Angle> HIGHEST =
        standard(
            "highest_elevation",
            Common.ELEVATION.like("87.5 deg"),
            "90 deg",
            "Keyhole: contacts only below it.");
    static final Field<List<Located<Values>>> DEAD_ZONES =
        standard("dead_zones", Items.of(DeadZone.TABLE), "[]", "Sectors without reception.");
    static final Field<Duration> SETUP =
        required("setup", Quantity.DURATION.like("45 min"), "Antenna busy before each contact.");
    static final Field<Duration> TEARDOWN =
        required("teardown", Quantity.DURATION.like("15 min"), "Antenna busy after each contact.");
    static final Field<Duration> CHANGEOVER =
        optional(
            "changeover",
            Quantity.DURATION,
            "Least time between two of our contacts with different craft on this antenna, in place"
                + " of teardown and setup; their sum when left out.");
    static final Field<Duration> MINIMUM_CONTACT =
        required(
            "minimum_contact", Quantity.DURATION.like("40 min").above("0 s"), "Shortest contact.");
    static final Field<Duration> MAXIMUM_CONTACT =
        required(
            "maximum_contact", Quantity.DURATION.like("10 h").above("0 s"), "Longest contact.");
    static final Field<Double> COST_PER_HOUR =
        standard(
            "cost_per_hour",
            Plain.number("a cost in units of your own", "10", 1e9),
            "0",
            "Station cost units per hour of contact; the unit is the scenario's own.");
    static final Field<Double> COST_PER_CONTACT =
        standard(
            "cost_per_contact",
            Plain.number("a cost in units of your own", "2", 1e9),
            "0",
            "Station cost units per contact.");
    static final Block TABLE =
        Block.of(
                "an antenna of a station",
                NAME,
                G_OVER_T,
                G_OVER_T_BY_ELEVATION,
                ZENITH_ATTENUATION,
                LOWEST,
                HIGHEST,
                DEAD_ZONES,
                SETUP,
                TEARDOWN,
                CHANGEOVER,
                MINIMUM_CONTACT,
                MAXIMUM_CONTACT,
                COST_PER_HOUR,
                COST_PER_CONTACT)
            .atMostOne(G_OVER_T, G_OVER_T_BY_ELEVATION);

    private Antenna() {}
  }

  /** A ground station. */
  static final class Station {
    static final Field<String> NAME =
        required("name", Plain.NAME, "Name, unique among the stations.");
    static final Field<Angle> LATITUDE =
        required(
            "latitude",
            Quantity.ANGLE.like("38.3 deg").atLeast("-90 deg").atMost("90 deg"),
            "Geodetic latitude, WGS84, north positive.");
    static final Field<Angle> LONGITUDE =
        required(
            "longitude",
            Quantity.ANGLE.like("33.2 deg").atLeast("-180 deg").atMost("360 deg"),
            "Longitude, east positive.");
    static final Field<Distance> ALTITUDE =
        standard(
            "altitude",
            Quantity.DISTANCE.like("900 m").atLeast("-500 m").atMost("9000 m"),
            "0 m",
            "Height above the ellipsoid.");
    static final Field<Angle> MASK =
        optional("mask", Common.ELEVATION, "Skyline of equal height all round.");
    static final Field<List<Located<Values>>> MASK_BY_AZIMUTH =
        optional(
            "mask_by_azimuth",
            Items.atLeastOne(MaskPoint.TABLE),
            "Skyline by azimuth from 0 deg to 360 deg, linear between.");
    static final Field<Angle> SEP_LIMIT =
        standard(
            "sep_limit",
            Quantity.ANGLE.like("3 deg").atLeast("0 deg").below("180 deg"),
            "0 deg",
            "Least Sun-Earth-probe angle of a contact.");
    static final Field<Duration> DELIVERY_DELAY =
        standard(
            "delivery_delay",
            Quantity.DURATION.like("5 min"),
            "0 s",
            "Time from reception to delivery.");
    static final Field<String> ZONE =
        standard("zone", Plain.ZONE, "UTC", "Local time zone, for display.");
    static final Field<List<Located<Values>>> ANTENNAS =
        required("antennas", Items.atLeastOne(Antenna.TABLE), "Its antennas.");
    static final Block TABLE =
        Block.of(
                "a station",
                NAME,
                LATITUDE,
                LONGITUDE,
                ALTITUDE,
                MASK,
                MASK_BY_AZIMUTH,
                SEP_LIMIT,
                DELIVERY_DELAY,
                ZONE,
                ANTENNAS)
            .exactlyOne(MASK, MASK_BY_AZIMUTH);

    private Station() {}
  }

  static final Field<List<Located<Values>>> STATIONS =
      required("stations", Items.atLeastOne(Station.TABLE), "The ground stations.");

  static final Block TABLE = Block.of("the stations", STATIONS);

  private StationFields() {}
}
