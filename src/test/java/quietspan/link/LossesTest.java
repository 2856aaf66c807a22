package quietspan.link;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

final class LossesTest {

  /** SI 2019: k = 1.380649e-23 J/K, in decibels -228.5992 dBW/K/Hz (arithmetic). */
  @Test
  void boltzmannConstantInDecibels() {
    assertThat(Losses.boltzmannDb()).isCloseTo(-228.5992, within(5e-5));
  }

  /**
   * Each row a published figure, to half of its last digit. P.525: ITU-R P.525, free-space basic
   * transmission loss 32.4 + 20 log f + 20 log d with MHz and km, rounded there to 0.1. Downlink
   * and uplink at 41 127 km: NOAA, EMWIN-N link budget (web page, no date). 15e9 km: a worked
   * amateur link budget of a deep-space downlink, 2012.
   */
  @ParameterizedTest(name = "{0}")
  @CsvSource({
    "P.525 constant,              1,         1e6,       32.4,   0.05",
    "uplink at 2034.70 MHz,       41127,     2034.70e6, 190.9,  0.05",
    "downlink at 1692.70 MHz,     41127,     1692.70e6, 189.3,  0.05",
    "downlink at 8.415 GHz,       15e9,      8.415e9,   314.47, 0.005",
  })
  void freeSpaceLossIsThePublishedOne(
      String name, double kilometres, double hertz, double decibels, double tolerance) {
    assertThat(Losses.freeSpaceDb(kilometres * 1000, hertz)).isCloseTo(decibels, within(tolerance));
  }

  /** 20 log10(4 pi 10^12 / c) = 92.4478 for 1 km and 1 GHz: arithmetic. */
  @Test
  void freeSpaceConstantForKilometresAndGigahertz() {
    assertThat(Losses.freeSpaceDb(1000, 1e9)).isCloseTo(92.4478, within(5e-5));
  }

  /** By definition of the half-power width: Maral and Bousquet 1998, p. 27 (from memory). */
  @Test
  void halfOfTheHalfPowerWidthCostsThreeDecibels() {
    assertThat(Losses.pointingDb(2.3, 4.6)).isCloseTo(3.0, within(1e-12));
    assertThat(Losses.pointingDb(0, 4.6)).isZero();
  }

  /** 0.04 dB at the zenith is typical at X-band (from memory); 1/sin 30 deg = 2. */
  @Test
  void atmosphereDoublesAtThirtyDegrees() {
    assertThat(Losses.atmosphereDb(0.04, Math.toRadians(90))).isCloseTo(0.04, within(1e-12));
    assertThat(Losses.atmosphereDb(0.04, Math.toRadians(30))).isCloseTo(0.08, within(1e-12));
  }
}
