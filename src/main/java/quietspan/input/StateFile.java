package quietspan.input;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import quietspan.model.Aim;
import quietspan.model.CraftState;
import quietspan.model.StartState;
import quietspan.model.Steering;
import quietspan.time.GroundInstant;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;

/** What {@code state.yaml} says: the checks that no single field can make, and its records. */
final class StateFile {

  private final Values state;

  StateFile(Values state) {
    this.state = state;
  }

  /** Complains about what does not go together, here and with the mission. */
  void check(Optional<MissionFile> mission) {
    List<Values> rows = state.blocks(StateFields.CRAFT);
    List<String> seen = Rows.distinct(rows, StateFields.Craft.NAME);
    for (Values row : rows) {
      Optional<Values> aim = row.maybe(StateFields.Craft.AIM);
      aim.ifPresent(
          values -> {
            onGrid(values, StateFields.Aim.AZIMUTH, "the grid of aims");
            onGrid(values, StateFields.Aim.ELEVATION, "the grid of aims");
          });
      Rows.distinct(row.blocks(StateFields.Craft.FILL), StateFields.Fill.DATA_CLASS);
      mission.ifPresent(file -> check(row, file));
    }
    if (mission.isEmpty()) {
      return;
    }
    for (String name : mission.get().names()) {
      if (!seen.contains(name)) {
        state.refuse(StateFields.CRAFT, "says nothing of " + name, "- name: " + name);
      }
    }
    Optional<OnboardInstant> begin = mission.get().begin();
    notAfter(state, StateFields.QUIET_SINCE, begin);
    groundNotAfter(state, StateFields.LAST_CONTACT_END, begin);
  }

  private static void check(Values row, MissionFile mission) {
    Optional<String> name = row.maybe(StateFields.Craft.NAME);
    Optional<OnboardInstant> begin = mission.begin();
    name.ifPresent(craft -> Rows.known(row, StateFields.Craft.NAME, craft, mission.names()));
    for (Values fill : row.blocks(StateFields.Craft.FILL)) {
      fill.maybe(StateFields.Fill.DATA_CLASS)
          .ifPresent(one -> Rows.known(fill, StateFields.Fill.DATA_CLASS, one, mission.classes()));
      notAfter(fill, StateFields.Fill.OLDEST, begin);
    }
    groundNotAfter(row, StateFields.Craft.LAST_CONTACT_END, begin);
    notAfter(row, StateFields.Craft.LAST_REPOINT, begin);
    Optional<CraftSection> craft = name.flatMap(mission::craft);
    if (craft.isPresent()) {
      checkFill(row, craft.get());
      checkSettled(row, craft.get(), begin);
      Optional<Values> aim = row.maybe(StateFields.Craft.AIM);
      Optional<Steering> steering = craft.get().steering();
      if (aim.isPresent() && steering.isPresent()) {
        checkAim(aim.get(), steering.get());
      }
    }
  }

  private static void notAfter(
      Values where, Field<OnboardInstant> field, Optional<OnboardInstant> begin) {
    Optional<OnboardInstant> instant = where.maybe(field);
    if (instant.isPresent() && begin.isPresent() && instant.get().isAfter(begin.get())) {
      where.refuse(field, "is after the begin of the period", "at most " + begin.get());
    }
  }

  /** By the digits alone: ground time is later by the light time, which is not known here. */
  private static void groundNotAfter(
      Values where, Field<GroundInstant> field, Optional<OnboardInstant> begin) {
    Optional<GroundInstant> instant = where.maybe(field);
    if (instant.isPresent()
        && begin.isPresent()
        && instant.get().utc().isAfter(begin.get().utc().plus(Duration.ofHours(2)))) {
      where.refuse(field, "is after the begin of the period", "about " + begin.get());
    }
  }

  private static void checkFill(Values row, CraftSection craft) {
    long bits = 0;
    for (Values fill : row.blocks(StateFields.Craft.FILL)) {
      long more = fill.maybe(StateFields.Fill.VOLUME).map(volume -> volume.bits()).orElse(0L);
      bits = bits > Long.MAX_VALUE - more ? Long.MAX_VALUE : bits + more;
    }
    long most =
        craft
            .values()
            .maybe(MissionFields.Craft.STORE)
            .map(store -> store.bits())
            .orElse(Long.MAX_VALUE);
    if (bits > most) {
      row.refuse(
          StateFields.Craft.FILL,
          "is " + bits + " bit together, more than the store of " + most + " bit",
          "at most the store");
    }
  }

  private static void checkSettled(Values row, CraftSection craft, Optional<OnboardInstant> begin) {
    Optional<Values> antenna = craft.values().maybe(MissionFields.Craft.ANTENNA);
    Optional<Duration> move = antenna.flatMap(one -> one.maybe(MissionFields.Antenna.MOVE));
    Optional<Duration> settle = antenna.flatMap(one -> one.maybe(MissionFields.Antenna.SETTLE));
    Optional<OnboardInstant> last = row.maybe(StateFields.Craft.LAST_REPOINT);
    if (move.isPresent() && settle.isPresent() && last.isPresent() && begin.isPresent()) {
      OnboardInstant settled = last.get().plus(move.get()).plus(settle.get());
      if (!last.get().isAfter(begin.get()) && settled.isAfter(begin.get())) {
        row.refuse(
            StateFields.Craft.LAST_REPOINT,
            "is still settling until " + settled,
            "a period that begins when it has settled");
      }
    }
  }

  private static void checkAim(Values aim, Steering steering) {
    Optional<Angle> azimuth = aim.maybe(StateFields.Aim.AZIMUTH);
    Optional<Angle> elevation = aim.maybe(StateFields.Aim.ELEVATION);
    long from = hundredths(steering.azimuthFrom());
    long travel = Math.floorMod(hundredths(steering.azimuthTo()) - from, 36_000L);
    long step = hundredths(steering.step());
    if (azimuth.isPresent()) {
      long along = Math.floorMod(hundredths(azimuth.get()) - from, 36_000L);
      if (travel > 0 && along > travel) {
        aim.refuse(
            StateFields.Aim.AZIMUTH,
            "lies outside the antenna's travel",
            degrees(from) + " to " + degrees(from + travel));
      }
      onStep(aim, StateFields.Aim.AZIMUTH, along, step);
    }
    if (elevation.isEmpty()) {
      return;
    }
    long height = hundredths(elevation.get());
    if (steering instanceof Steering.AzimuthOnly axis && height != hundredths(axis.elevation())) {
      aim.refuse(
          StateFields.Aim.ELEVATION,
          "is not the elevation that is built in",
          degrees(hundredths(axis.elevation())));
    }
    if (steering instanceof Steering.TwoAxes axes) {
      long low = hundredths(axes.elevationFrom());
      long high = hundredths(axes.elevationTo());
      if (height < low || height > high) {
        aim.refuse(
            StateFields.Aim.ELEVATION,
            "lies outside the antenna's travel",
            degrees(low) + " to " + degrees(high));
      }
      onStep(aim, StateFields.Aim.ELEVATION, height - low, step);
    }
  }

  private static void onStep(Values aim, Field<Angle> field, long along, long step) {
    if (step > 0 && along % step != 0) {
      aim.refuse(
          field,
          "lies between two steps of the antenna",
          "whole steps of " + degrees(step) + " from its lower limit");
    }
  }

  private static long hundredths(Angle angle) {
    return Math.round(angle.degrees() * 100);
  }

  private static String degrees(long hundredths) {
    return BigDecimal.valueOf(hundredths, 2).stripTrailingZeros().toPlainString() + " deg";
  }

  /** Complains about an angle that is not a whole number of hundredths of a degree. */
  static void onGrid(Values where, Field<Angle> field, String grid) {
    where
        .maybe(field)
        .ifPresent(
            angle -> {
              BigDecimal nearest =
                  BigDecimal.valueOf(angle.degrees()).setScale(2, RoundingMode.HALF_EVEN);
              if (Math.abs(nearest.doubleValue() - angle.degrees()) > 1e-9) {
                where.refuse(
                    field,
                    "is finer than " + grid,
                    "hundredths of a degree, such as " + nearest.toPlainString() + " deg");
              }
            });
  }

  /** The start; only when nothing was complained about. */
  StartState model(List<String> craft) {
    List<CraftState> states = new ArrayList<>();
    for (String name : craft) {
      for (Values row : state.blocks(StateFields.CRAFT)) {
        if (row.get(StateFields.Craft.NAME).equals(name)) {
          states.add(craftState(row));
        }
      }
    }
    return new StartState(
        state.maybe(StateFields.QUIET_SINCE), state.maybe(StateFields.LAST_CONTACT_END), states);
  }

  private static CraftState craftState(Values row) {
    Values aim = row.get(StateFields.Craft.AIM);
    return new CraftState(
        row.get(StateFields.Craft.NAME),
        Aim.nearest(aim.get(StateFields.Aim.AZIMUTH), aim.get(StateFields.Aim.ELEVATION)),
        row.blocks(StateFields.Craft.FILL).stream()
            .map(
                fill ->
                    new CraftState.Fill(
                        fill.get(StateFields.Fill.DATA_CLASS),
                        fill.get(StateFields.Fill.VOLUME),
                        fill.maybe(StateFields.Fill.OLDEST)))
            .toList(),
        row.maybe(StateFields.Craft.LAST_CONTACT_END),
        row.maybe(StateFields.Craft.LAST_REPOINT));
  }
}
