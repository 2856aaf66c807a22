package quietspan.model;

/**
 * Where a station sees a craft at a ground receive instant: direction of the craft at the instant
 * the wave left it, no refraction, no aberration.
 *
 * @param azimuthRadians from north over east, 0 to 2 pi (rad)
 * @param elevationRadians above the local horizon of the ellipsoid (rad)
 * @param rangeMetres light-time range, c times the downlink light time to the station (m)
 */
public record Look(double azimuthRadians, double elevationRadians, double rangeMetres) {}
