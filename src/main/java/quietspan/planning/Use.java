package quietspan.planning;

/**
 * A contact in the planner's numbers.
 *
 * @param begin ground receive time, seconds since the instant that the period's begin reads on
 *     board
 * @param end as begin, exclusive
 * @param step of the craft's ladder
 */
record Use(int craft, int antenna, int begin, int end, int step) {

  int length() {
    return end - begin;
  }
}
