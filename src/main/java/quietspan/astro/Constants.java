package quietspan.astro;

/** Physical constants, each with its source. */
final class Constants {

  /** Astronomical unit (m): IAU 2012 Resolution B2. */
  static final double AU = 149_597_870_700.0;

  /** Speed of light (m/s): exact, SI. */
  static final double LIGHT = 299_792_458.0;

  /**
   * GM of the Sun (m3/s2), TDB-compatible: DE440, Park et al. 2021, Astronomical Journal 161:105.
   */
  static final double GM_SUN = 1.32712440041939e20;

  /** WGS84 equatorial radius (m) and flattening: NGA.STND.0036, 2014. */
  static final double EARTH_RADIUS = 6_378_137.0;

  static final double EARTH_FLATTENING = 1 / 298.257223563;

  /**
   * Mean ecliptic and equinox of J2000 to ICRF, by rows: the matrix that SOFA's routine epv00 uses
   * to orient its planetary theory to the ICRF (IAU SOFA collection, issue 2021-05-12).
   */
  static final double[][] ECLIPTIC_TO_ICRF = {
    {1, 2.11284e-7, -9.1603e-8},
    {-2.30286e-7, 0.917482137087, -0.397776982902},
    {0, 0.397776982902, 0.917482137087}
  };

  /**
   * Dynamical ecliptic and equinox J2000 of VSOP87 to the FK5, by rows, which is the ICRF to some
   * 20 milliarcseconds: Bretagnon and Francou 1988, as given in Meeus, Astronomical Algorithms, 2nd
   * ed. 1998, chapter 26.
   */
  static final double[][] VSOP_TO_FK5 = {
    {1, 4.40360e-7, -1.90919e-7},
    {-4.79966e-7, 0.917482137087, -0.397776982902},
    {0, 0.397776982902, 0.917482137087}
  };

  private Constants() {}
}
