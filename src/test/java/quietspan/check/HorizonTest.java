package quietspan.check;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.Duration;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import quietspan.model.Dish;
import quietspan.model.Look;
import quietspan.model.Station;
import quietspan.units.Angle;
import quietspan.units.Distance;

final class HorizonTest {

  private static Look look(double azimuth, double elevation) {
    return new Look(Math.toRadians(azimuth), Math.toRadians(elevation), 1e11);
  }

  private static Station station(double... corners) {
    List<Station.MaskPoint> mask =
        Stream.iterate(0, i -> i < corners.length, i -> i + 2)
            .map(
                i ->
                    new Station.MaskPoint(
                        Angle.ofDegrees(corners[i]), Angle.ofDegrees(corners[i + 1])))
            .toList();
    return new Station(
        "S",
        Angle.ZERO,
        Angle.ZERO,
        Distance.ofMetres(0),
        mask,
        Angle.ZERO,
        Duration.ZERO,
        "UTC",
        List.of());
  }

  @ParameterizedTest
  @CsvSource(
      textBlock =
          """
          on a corner,         90, 20
          half way up,         45, 15
          past the last one,  315, 15
          just before north,  351, 11
          at north,             0, 10
          """)
  void theSkylineIsLinearBetweenCornersAndAcrossNorth(String name, double azimuth, double skyline) {
    Station station = station(0, 10, 90, 20, 270, 20);
    assertThat(Horizon.aboveMask(station, look(azimuth, 30)))
        .as(name)
        .isCloseTo(Math.toRadians(30 - skyline), within(1e-12));
  }

  @ParameterizedTest
  @CsvSource(
      textBlock =
          """
          outside to the west, 339, 20, true
          on its western edge, 340, 20, true
          inside,              350, 20, false
          inside past north,    10, 20, false
          outside to the east,  21, 20, true
          above it,            350, 41, true
          """)
  void aDeadZoneMayCrossNorth(String name, double azimuth, double elevation, boolean free) {
    Dish.Sector zone =
        new Dish.Sector(Angle.ofDegrees(340), Angle.ofDegrees(20), Angle.ofDegrees(40));
    Dish dish =
        new Dish(
            "main",
            List.of(),
            0,
            Angle.ofDegrees(5),
            Angle.ofDegrees(85),
            List.of(zone),
            Duration.ZERO,
            Duration.ZERO,
            Duration.ZERO,
            Duration.ZERO,
            Duration.ofDays(1),
            0,
            0);
    assertThat(Horizon.insideLimits(dish, look(azimuth, elevation)) >= -1e-12)
        .as(name)
        .isEqualTo(free);
  }
}
