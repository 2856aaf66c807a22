package quietspan.planning;

/**
 * Seeds of worlds about a feature in which it decides: found by running through the seeds from 1
 * on; the test sees for itself that it does. Phased rates, aged fills, waivers and classes rarely
 * decide, so fewer than twenty are known of these.
 */
final class TinySeeds {

  private TinySeeds() {}

  static long[] showing(TinyWorld.Feature feature) {
    return switch (feature) {
      case OFF_GRID_INTERRUPTION ->
          seeds(6, 24, 32, 35, 40, 54, 62, 66, 70, 72, 73, 80, 84, 87, 99, 100, 101, 107, 108, 109);
      case UNEQUAL_BEAMS ->
          seeds(2, 6, 22, 23, 29, 37, 41, 42, 53, 54, 58, 62, 66, 67, 73, 77, 80, 94, 99, 100);
      case LONG_LATENCY ->
          seeds(3, 5, 7, 8, 10, 11, 14, 16, 19, 20, 22, 24, 25, 28, 29, 31, 32, 38, 40, 47);
      case AIM_IN_MID_HOLD ->
          seeds(5, 6, 10, 11, 14, 16, 24, 32, 38, 40, 42, 45, 54, 66, 67, 80, 96, 116, 121, 122);
      case COVERAGE_GAP ->
          seeds(2, 5, 10, 14, 19, 22, 23, 28, 29, 31, 32, 37, 41, 45, 53, 58, 65, 74, 77, 79);
      case TWO_AT_ONCE ->
          seeds(2, 5, 6, 14, 17, 19, 22, 23, 24, 25, 28, 29, 31, 35, 38, 41, 42, 47, 50, 52);
      case THREE_AT_ONCE ->
          seeds(
              8, 10, 17, 22, 24, 29, 32, 35, 38, 40, 41, 45, 60, 62, 69, 74, 84, 94, 101, 107, 110);
      case PROTECTED ->
          seeds(3, 5, 7, 10, 11, 14, 16, 19, 20, 24, 25, 28, 32, 45, 47, 48, 50, 60, 65, 72);
      case REPOINT_SPACING ->
          seeds(3, 5, 7, 10, 11, 14, 16, 19, 20, 24, 25, 28, 32, 45, 47, 48, 50, 60, 65, 72);
      case QUIET_SINCE ->
          seeds(5, 6, 10, 13, 14, 32, 38, 42, 54, 66, 67, 80, 90, 93, 96, 116, 125, 130, 138, 155);
      case PHASED_RATES -> seeds(66, 69, 94);
      case AGED_FILL -> seeds(37, 41, 77, 114);
      case WAIVER -> seeds(77, 94);
      case SEVERAL_CLASSES ->
          seeds(31, 74, 77, 94, 118, 133, 148, 158, 205, 208, 221, 229, 238, 256);
      case CONFIRMED ->
          seeds(
              14, 19, 20, 25, 28, 29, 32, 37, 62, 74, 77, 84, 86, 91, 95, 109, 118, 122, 128, 143);
      case END_FILL ->
          seeds(
              2, 14, 29, 58, 74, 77, 86, 91, 94, 108, 128, 145, 148, 154, 158, 194, 197, 205, 208,
              218);
      case END_COVERAGE ->
          seeds(2, 5, 7, 11, 16, 17, 19, 20, 22, 23, 24, 25, 28, 31, 35, 37, 38, 41, 45, 47);
    };
  }

  private static long[] seeds(long... seeds) {
    return seeds;
  }
}
