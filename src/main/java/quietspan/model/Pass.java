package quietspan.model;

import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.units.Angle;

/**
 * A station sees a craft above its mask without a break. Ground receive time, light time applied,
 * not rounded. Keyholes, Sun limits, outages and bookings are not applied.
 *
 * @param culmination instant of the highest elevation inside the visible stretch
 * @param clipped the visible stretch is cut by the period or by the end of the ephemeris
 */
public record Pass(
    String station,
    String craft,
    Interval<GroundInstant> visible,
    GroundInstant culmination,
    Angle highestElevation,
    Angle riseAzimuth,
    Angle setAzimuth,
    boolean clipped) {}
