package quietspan.model;

import quietspan.units.Angle;

/**
 * How an antenna can be aimed. Azimuth limits run from {@code azimuthFrom} eastwards (increasing)
 * to {@code azimuthTo}; equal values mean the whole circle. A step of zero means the grid of
 * hundredths of a degree; otherwise aims lie at the lower limit plus whole steps.
 */
public sealed interface Steering {

  Angle azimuthFrom();

  Angle azimuthTo();

  Angle step();

  /** Azimuth and elevation can be set. */
  record TwoAxes(
      Angle azimuthFrom, Angle azimuthTo, Angle elevationFrom, Angle elevationTo, Angle step)
      implements Steering {}

  /** Only the azimuth can be set; the elevation is built in. */
  record AzimuthOnly(Angle azimuthFrom, Angle azimuthTo, Angle elevation, Angle step)
      implements Steering {}
}
