/**
 * The only package that knows Orekit: time scales, Earth rotation, planetary series, trajectories,
 * light time, attitude and passes. Everything leaves it as {@code model} types. Open {@link
 * quietspan.astro.GeometryFactory} first. Inside, positions are Sun-centred in ICRF axes (m) and
 * time is seconds of TT since J2000.0.
 */
package quietspan.astro;
