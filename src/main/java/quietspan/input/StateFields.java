package quietspan.input;

import static quietspan.input.Field.optional;
import static quietspan.input.Field.required;
import static quietspan.input.Field.standard;

import java.util.List;
import quietspan.time.GroundInstant;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;
import quietspan.units.DataVolume;

/** The field table of {@code state.yaml}. */
final class StateFields {

  static final String FILE = "state.yaml";

  /** Where an antenna is held. */
  static final class Aim {
    static final Field<Angle> AZIMUTH =
        required(
            "azimuth",
            Quantity.ANGLE.like("217.4 deg").atLeast("0 deg").below("360 deg"),
            "From body X towards body Y, in hundredths of a degree.");
    static final Field<Angle> ELEVATION =
        required(
            "elevation",
            Quantity.ANGLE.like("11.25 deg").atLeast("-90 deg").atMost("90 deg"),
            "From the body X-Y plane towards body Z, in hundredths of a degree.");
    static final Block TABLE = Block.of("a held body direction", AZIMUTH, ELEVATION);

    private Aim() {}
  }

  /** Data of one class aboard. */
  static final class Fill {
    static final Field<String> DATA_CLASS =
        required("data_class", Plain.NAME, "Name of a class in data.classes.");
    static final Field<DataVolume> VOLUME =
        required("volume", Quantity.VOLUME.like("3 Gbit"), "What is aboard of it.");
    static final Field<OnboardInstant> OLDEST =
        optional(
            "oldest_onboard_utc",
            Moment.ONBOARD,
            "When its oldest bit was made, ages linear to the begin of the period; when left out,"
                + " all was made at the begin.");
    static final Block TABLE = Block.of("data of one class aboard", DATA_CLASS, VOLUME, OLDEST);

    private Fill() {}
  }

  /** A craft at the begin of the period. */
  static final class Craft {
    static final Field<String> NAME = required("name", Plain.NAME, "A craft of the mission.");
    static final Field<Values> AIM = required("aim", Aim.TABLE, "Where its antenna is held.");
    static final Field<List<Located<Values>>> FILL =
        standard("fill", Items.of(Fill.TABLE), "[]", "What its store holds.");
    static final Field<GroundInstant> LAST_CONTACT_END =
        optional(
            "last_contact_end_ground_utc",
            Moment.GROUND,
            "End of its last contact; when left out, the begin of the period plus light time.");
    static final Field<OnboardInstant> LAST_REPOINT =
        optional(
            "last_repoint_onboard_utc",
            Moment.ONBOARD,
            "Start of its last repoint; when left out, long ago.");
    static final Block TABLE =
        Block.of(
            "a craft at the begin of the period", NAME, AIM, FILL, LAST_CONTACT_END, LAST_REPOINT);

    private Craft() {}
  }

  static final Field<OnboardInstant> QUIET_SINCE =
      optional(
          "quiet_since_onboard_utc",
          Moment.ONBOARD,
          "When the present quiet span began; when left out, at the begin of the period.");
  static final Field<GroundInstant> LAST_CONTACT_END =
      optional(
          "last_contact_end_ground_utc",
          Moment.GROUND,
          "End of the formation's last contact; when left out, the latest of its craft's.");
  static final Field<List<Located<Values>>> CRAFT =
      required("craft", Items.atLeastOne(Craft.TABLE), "Every craft of the mission, once.");

  static final Block TABLE =
      Block.of("the state at the begin of the period", QUIET_SINCE, LAST_CONTACT_END, CRAFT);

  private StateFields() {}
}
