package quietspan.export;

import java.util.List;
import java.util.Optional;
import quietspan.export.Table.Kind;
import quietspan.model.Aim;
import quietspan.model.BodyDirection;
import quietspan.model.Look;
import quietspan.model.Pass;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;

/** Tables of geometry, unrounded as far as it makes sense: instants to the millisecond. */
public final class GeometryTables {

  private GeometryTables() {}

  /**
   * One craft at one ground instant.
   *
   * @param rangeMetres light-time range to the Earth's centre, or to the station if there is one
   * @param owltSeconds downlink one-way light time over that range
   * @param driftRadiansPerSecond great-circle rate of the Earth direction in the body frame
   * @param look from the station; absent when none was asked for
   */
  public record Sample(
      GroundInstant at,
      String craft,
      double rangeMetres,
      double owltSeconds,
      double sepRadians,
      double speRadians,
      BodyDirection earth,
      double driftRadiansPerSecond,
      Optional<Look> look) {}

  /** The longest stretch that one aim can serve from its begin on. */
  public record Coverage(String craft, Interval<OnboardInstant> during, Aim aim) {}

  public static Table passes(List<Pass> passes) {
    Table table =
        Table.of("station", "craft", "rise_ground_utc", "set_ground_utc")
            .and(Kind.NUMBER, "duration_s")
            .and(Kind.TEXT, "culmination_ground_utc")
            .and(Kind.NUMBER, "max_elevation_deg", "rise_azimuth_deg", "set_azimuth_deg")
            .and(Kind.FLAG, "clipped");
    for (Pass pass : passes) {
      table.row(
          pass.station(),
          pass.craft(),
          milliseconds(pass.visible().begin()),
          milliseconds(pass.visible().end()),
          Decimal.fixed(pass.visible().seconds(), 3),
          milliseconds(pass.culmination()),
          fine(pass.highestElevation()),
          fine(pass.riseAzimuth()),
          fine(pass.setAzimuth()),
          pass.clipped());
    }
    return table;
  }

  /** With a station's columns when {@code withStation}; then every sample must have its look. */
  public static Table geometry(List<Sample> samples, boolean withStation) {
    Table table =
        Table.of("ground_utc", "craft")
            .and(
                Kind.NUMBER,
                "range_km",
                "owlt_s",
                "sep_deg",
                "spe_deg",
                "earth_azimuth_deg",
                "earth_elevation_deg",
                "drift_deg_per_day");
    if (withStation) {
      table.and(Kind.NUMBER, "azimuth_deg", "elevation_deg");
    }
    for (Sample sample : samples) {
      Object[] row = new Object[withStation ? 11 : 9];
      row[0] = milliseconds(sample.at());
      row[1] = sample.craft();
      row[2] = Decimal.fixed(sample.rangeMetres() / 1000, 3);
      row[3] = Decimal.fixed(sample.owltSeconds(), 6);
      row[4] = fine(sample.sepRadians());
      row[5] = fine(sample.speRadians());
      row[6] = fine(turned(sample.earth().azimuthRadians()));
      row[7] = fine(sample.earth().elevationRadians());
      row[8] = fine(sample.driftRadiansPerSecond() * 86_400);
      if (withStation) {
        Look look = sample.look().orElseThrow();
        row[9] = fine(look.azimuthRadians());
        row[10] = fine(look.elevationRadians());
      }
      table.row(row);
    }
    return table;
  }

  public static Table coverage(List<Coverage> coverages) {
    Table table =
        Table.of("craft", "start_onboard_utc", "end_onboard_utc")
            .and(Kind.NUMBER, "duration_days", "aim_azimuth_deg", "aim_elevation_deg");
    for (Coverage each : coverages) {
      table.row(
          each.craft(),
          milliseconds(each.during().begin()),
          milliseconds(each.during().end()),
          Decimal.fixed(each.during().seconds() / 86_400, 4),
          Words.degrees(each.aim().azimuthCentidegrees()),
          Words.degrees(each.aim().elevationCentidegrees()));
    }
    return table;
  }

  /** An azimuth in the body frame from 0 to 360 deg, as aims are given. */
  private static double turned(double azimuthRadians) {
    return azimuthRadians - 2 * Math.PI * Math.floor(azimuthRadians / (2 * Math.PI));
  }

  private static String milliseconds(quietspan.time.ClockInstant<?> instant) {
    return Words.milliseconds(instant.utc());
  }

  private static String fine(Angle angle) {
    return fine(angle.radians());
  }

  private static String fine(double radians) {
    return Words.degrees(radians, 5);
  }
}
