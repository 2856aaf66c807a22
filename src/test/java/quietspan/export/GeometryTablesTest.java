package quietspan.export;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import quietspan.model.Aim;
import quietspan.model.BodyDirection;
import quietspan.model.Look;
import quietspan.model.Pass;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;

/** The columns that other programs rely on. */
final class GeometryTablesTest {

  @Test
  void passesHaveTheirColumns() {
    Pass pass =
        new Pass(
            "Corrin Downs",
            "Hask",
            Interval.of(
                GroundInstant.parse("2031-09-01T00:00:00.0004Z"),
                GroundInstant.parse("2031-09-01T08:00:00.0016Z")),
            GroundInstant.parse("2031-09-01T04:00:00.5Z"),
            Angle.ofDegrees(81.25),
            Angle.ofDegrees(105.125),
            Angle.ofDegrees(254.5),
            true);
    assertThat(GeometryTables.passes(List.of(pass)).csv())
        .isEqualTo(
            """
            station,craft,rise_ground_utc,set_ground_utc,duration_s,culmination_ground_utc,\
            max_elevation_deg,rise_azimuth_deg,set_azimuth_deg,clipped
            Corrin Downs,Hask,2031-09-01T00:00:00.000Z,2031-09-01T08:00:00.002Z,28800.001,\
            2031-09-01T04:00:00.500Z,81.25000,105.12500,254.50000,true
            """);
  }

  private static GeometryTables.Sample sample(Optional<Look> look) {
    return new GeometryTables.Sample(
        GroundInstant.parse("2031-09-01T00:00:00Z"),
        "Hask",
        7.5e10,
        250.173071,
        Math.toRadians(74.5),
        Math.toRadians(76.25),
        new BodyDirection(Math.toRadians(-170), Math.toRadians(11.5)),
        Math.toRadians(0.97) / 86_400,
        look);
  }

  @Test
  void geometryHasItsColumns() {
    assertThat(GeometryTables.geometry(List.of(sample(Optional.empty())), false).csv())
        .isEqualTo(
            """
            ground_utc,craft,range_km,owlt_s,sep_deg,spe_deg,earth_azimuth_deg,\
            earth_elevation_deg,drift_deg_per_day
            2031-09-01T00:00:00.000Z,Hask,75000000.000,250.173071,74.50000,76.25000,190.00000,\
            11.50000,0.97000
            """);
  }

  @Test
  void withAStationGeometryHasItsAngles() {
    Look look = new Look(Math.toRadians(187.5), Math.toRadians(37.25), 7.5e10);
    assertThat(GeometryTables.geometry(List.of(sample(Optional.of(look))), true).csv())
        .contains("drift_deg_per_day,azimuth_deg,elevation_deg\n")
        .endsWith(",0.97000,187.50000,37.25000\n");
  }

  @Test
  void coverageHasItsColumns() {
    GeometryTables.Coverage coverage =
        new GeometryTables.Coverage(
            "Tovin",
            Interval.of(OnboardInstant.parse("2031-09-01T00:00:00Z"), Duration.ofHours(66)),
            new Aim(30_725, 1_290));
    assertThat(GeometryTables.coverage(List.of(coverage)).csv())
        .isEqualTo(
            """
            craft,start_onboard_utc,end_onboard_utc,duration_days,aim_azimuth_deg,aim_elevation_deg
            Tovin,2031-09-01T00:00:00.000Z,2031-09-03T18:00:00.000Z,2.7500,307.25,12.90
            """);
  }
}
