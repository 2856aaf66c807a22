package quietspan.link;

/** The terms of a link budget that have a formula of their own, in decibels. */
final class Losses {

  /** Speed of light in vacuum (m/s), exact: SI, 2019. */
  static final double LIGHT_METRES_PER_SECOND = 299_792_458;

  /** Boltzmann constant (J/K), exact: SI, 2019. */
  static final double BOLTZMANN = 1.380649e-23;

  private Losses() {}

  /** Ten times the decimal logarithm. */
  static double decibels(double ratio) {
    return 10 * StrictMath.log10(ratio);
  }

  /** Boltzmann constant in dBW/K/Hz. */
  static double boltzmannDb() {
    return decibels(BOLTZMANN);
  }

  /**
   * Free-space basic transmission loss, 20 log10(4 pi d / lambda): ITU-R P.525, point-to-point
   * links (there 32.4 + 20 log f + 20 log d with MHz and km).
   *
   * @param rangeMetres d (m)
   * @param frequencyHz carrier (Hz)
   */
  static double freeSpaceDb(double rangeMetres, double frequencyHz) {
    return 20 * StrictMath.log10(4 * Math.PI * rangeMetres * frequencyHz / LIGHT_METRES_PER_SECOND);
  }

  /**
   * Loss off the beam's axis, 12 (theta / theta_3dB)^2: Maral and Bousquet, Satellite
   * Communications Systems, 3rd ed. 1998, p. 27 (formula from memory). Good to about half power,
   * which is at half of theta_3dB.
   *
   * @param offAxis theta, any unit
   * @param halfPowerWidth theta_3dB, the full width between half-power points, same unit
   */
  static double pointingDb(double offAxis, double halfPowerWidth) {
    double widths = offAxis / halfPowerWidth;
    return 12 * widths * widths;
  }

  /**
   * Attenuation of a flat atmosphere: common practice, no source.
   *
   * @param zenithDb attenuation at the zenith (dB)
   * @param elevationRadians above zero (rad)
   */
  static double atmosphereDb(double zenithDb, double elevationRadians) {
    return zenithDb / StrictMath.sin(elevationRadians);
  }
}
