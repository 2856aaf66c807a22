package quietspan.model;

import quietspan.units.Angle;

/** The law that turns a craft's body frame. */
public sealed interface Attitude {

  /**
   * X along the bisector of the directions to the two neighbours in the formation, Z along the
   * formation normal on the Sun's side, Y = Z x X. With one other craft X points to it and Z is the
   * part of the direction to the Sun normal to X. Of more than three craft the neighbours are the
   * next two in the mission file, cyclically.
   */
  record InFormation() implements Attitude {}

  /** X towards the Sun, Z towards the ecliptic north made normal to X, Y = Z x X. */
  record SunPointing() implements Attitude {}

  /**
   * The body frame turned once from the ICRF by right ascension and declination of X and a roll.
   */
  record Inertial(Angle rightAscension, Angle declination, Angle roll) implements Attitude {}
}
