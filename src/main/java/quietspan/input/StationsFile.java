package quietspan.input;

import java.time.Duration;
import java.util.List;
import java.util.Optional;
import quietspan.model.Dish;
import quietspan.model.Station;
import quietspan.units.Angle;

/** What {@code stations.yaml} says: the checks that no single field can make, and its records. */
final class StationsFile {

  private final List<Values> stations;
  private List<String> names = List.of();

  StationsFile(Values file) {
    this.stations = file.blocks(StationFields.STATIONS);
  }

  /** Names of the stations in the order of the file; known once the file is checked. */
  List<String> names() {
    return names;
  }

  /** Names of the antennas of a station in the order of the file. */
  List<String> antennas(String station) {
    return stations.stream()
        .filter(one -> one.maybe(StationFields.Station.NAME).filter(station::equals).isPresent())
        .flatMap(one -> one.blocks(StationFields.Station.ANTENNAS).stream())
        .map(one -> one.maybe(StationFields.Antenna.NAME))
        .flatMap(Optional::stream)
        .toList();
  }

  /**
   * Complains about what does not go together.
   *
   * @param budget whether some craft chooses its rates by a link budget
   */
  void check(boolean budget) {
    names = Rows.distinct(stations, StationFields.Station.NAME);
    for (Values station : stations) {
      checkMask(station);
      List<Values> antennas = station.blocks(StationFields.Station.ANTENNAS);
      Rows.distinct(antennas, StationFields.Antenna.NAME);
      antennas.forEach(antenna -> checkAntenna(antenna, budget));
    }
  }

  private static void checkMask(Values station) {
    List<Values> mask = station.blocks(StationFields.Station.MASK_BY_AZIMUTH);
    Rows.rising(mask, StationFields.MaskPoint.AT);
    if (mask.isEmpty()) {
      return;
    }
    Values first = mask.get(0);
    Values last = mask.get(mask.size() - 1);
    if (first.maybe(StationFields.MaskPoint.AT).filter(at -> at.degrees() > 0).isPresent()) {
      first.refuse(StationFields.MaskPoint.AT, "the skyline begins here", "0 deg");
    }
    if (last.maybe(StationFields.MaskPoint.AT).filter(at -> at.degrees() < 360).isPresent()) {
      last.refuse(StationFields.MaskPoint.AT, "the skyline ends here", "360 deg");
    }
    Optional<Angle> begin = first.maybe(StationFields.MaskPoint.HEIGHT);
    Optional<Angle> end = last.maybe(StationFields.MaskPoint.HEIGHT);
    if (begin.isPresent() && end.isPresent() && !begin.equals(end)) {
      last.refuse(
          StationFields.MaskPoint.HEIGHT,
          "is not the height at 0 deg, which is the same direction",
          "the same elevation");
    }
  }

  private static void checkAntenna(Values antenna, boolean budget) {
    Rows.rising(
        antenna.blocks(StationFields.Antenna.G_OVER_T_BY_ELEVATION), StationFields.GainPoint.AT);
    if (budget
        && !antenna.has(StationFields.Antenna.G_OVER_T)
        && !antenna.has(StationFields.Antenna.G_OVER_T_BY_ELEVATION)) {
      antenna.refuse("lacks g_over_t, which a link budget needs", "g_over_t: 50.4 dB/K");
    }
    Optional<Angle> lowest = antenna.maybe(StationFields.Antenna.LOWEST);
    Optional<Angle> highest = antenna.maybe(StationFields.Antenna.HIGHEST);
    if (lowest.isPresent() && highest.isPresent() && lowest.get().compareTo(highest.get()) >= 0) {
      antenna.refuse(
          StationFields.Antenna.HIGHEST, "is not above lowest_elevation", "a higher elevation");
    }
    for (Values zone : antenna.blocks(StationFields.Antenna.DEAD_ZONES)) {
      Optional<Angle> from = zone.maybe(StationFields.DeadZone.FROM);
      if (from.isPresent() && from.equals(zone.maybe(StationFields.DeadZone.TO))) {
        zone.refuse(
            StationFields.DeadZone.TO,
            "is where the zone begins",
            "another azimuth; all round is highest_elevation or lowest_elevation");
      }
    }
    Optional<Duration> shortest = antenna.maybe(StationFields.Antenna.MINIMUM_CONTACT);
    Optional<Duration> longest = antenna.maybe(StationFields.Antenna.MAXIMUM_CONTACT);
    if (shortest.isPresent()
        && longest.isPresent()
        && shortest.get().compareTo(longest.get()) > 0) {
      antenna.refuse(
          StationFields.Antenna.MAXIMUM_CONTACT,
          "is shorter than minimum_contact",
          "at least minimum_contact");
    }
    Optional<Duration> changeover = antenna.maybe(StationFields.Antenna.CHANGEOVER);
    Optional<Duration> setup = antenna.maybe(StationFields.Antenna.SETUP);
    Optional<Duration> teardown = antenna.maybe(StationFields.Antenna.TEARDOWN);
    if (changeover.isPresent()
        && setup.isPresent()
        && teardown.isPresent()
        && changeover.get().compareTo(setup.get().plus(teardown.get())) > 0) {
      antenna.refuse(
          StationFields.Antenna.CHANGEOVER,
          "is longer than teardown and setup, which it stands in place of",
          "at most their sum");
    }
  }

  /** The stations; only when nothing was complained about. */
  List<Station> model() {
    return stations.stream().map(StationsFile::station).toList();
  }

  private static Station station(Values station) {
    List<Station.MaskPoint> mask =
        station
            .maybe(StationFields.Station.MASK)
            .map(height -> List.of(new Station.MaskPoint(Angle.ZERO, height)))
            .orElseGet(
                () ->
                    station.blocks(StationFields.Station.MASK_BY_AZIMUTH).stream()
                        .map(
                            point ->
                                new Station.MaskPoint(
                                    point.get(StationFields.MaskPoint.AT),
                                    point.get(StationFields.MaskPoint.HEIGHT)))
                        .toList());
    return new Station(
        station.get(StationFields.Station.NAME),
        station.get(StationFields.Station.LATITUDE),
        station.get(StationFields.Station.LONGITUDE),
        station.get(StationFields.Station.ALTITUDE),
        mask,
        station.get(StationFields.Station.SEP_LIMIT),
        station.get(StationFields.Station.DELIVERY_DELAY),
        station.get(StationFields.Station.ZONE),
        station.blocks(StationFields.Station.ANTENNAS).stream().map(StationsFile::dish).toList());
  }

  private static Dish dish(Values dish) {
    Duration setup = dish.get(StationFields.Antenna.SETUP);
    Duration teardown = dish.get(StationFields.Antenna.TEARDOWN);
    return new Dish(
        dish.get(StationFields.Antenna.NAME),
        gain(dish),
        dish.get(StationFields.Antenna.ZENITH_ATTENUATION),
        dish.get(StationFields.Antenna.LOWEST),
        dish.get(StationFields.Antenna.HIGHEST),
        dish.blocks(StationFields.Antenna.DEAD_ZONES).stream()
            .map(
                zone ->
                    new Dish.Sector(
                        zone.get(StationFields.DeadZone.FROM),
                        zone.get(StationFields.DeadZone.TO),
                        zone.get(StationFields.DeadZone.UP_TO)))
            .toList(),
        setup,
        teardown,
        dish.maybe(StationFields.Antenna.CHANGEOVER).orElse(setup.plus(teardown)),
        dish.get(StationFields.Antenna.MINIMUM_CONTACT),
        dish.get(StationFields.Antenna.MAXIMUM_CONTACT),
        dish.get(StationFields.Antenna.COST_PER_HOUR),
        dish.get(StationFields.Antenna.COST_PER_CONTACT));
  }

  /** G/T by elevation; a single point is a constant, and without any no budget asks for it. */
  private static List<Dish.GainPoint> gain(Values dish) {
    List<Values> points = dish.blocks(StationFields.Antenna.G_OVER_T_BY_ELEVATION);
    if (points.isEmpty()) {
      return List.of(
          new Dish.GainPoint(
              Angle.ofDegrees(90), dish.maybe(StationFields.Antenna.G_OVER_T).orElse(0.0)));
    }
    return points.stream()
        .map(
            point ->
                new Dish.GainPoint(
                    point.get(StationFields.GainPoint.AT),
                    point.get(StationFields.GainPoint.VALUE)))
        .toList();
  }
}
