package quietspan.planning.simulation;

/**
 * A stretch of seconds over which nothing that the stores depend on changes from outside: rates of
 * generation, who is in contact at which rate, to whom cross-links send. Arrays are indexed by
 * craft, or by craft and class.
 */
final class Stretch {

  final long begin;
  final long end;

  /** Whether a pause overlaps its seconds. */
  boolean paused;

  /** Bits generated each second, by craft and class. */
  final long[] generated;

  /** Bits generated each second, by craft. */
  final long[] generatedByCraft;

  /** Whether a craft keeps its data to itself because it receives or is in contact. */
  final boolean[] sink;

  /** Effective downlink rate; zero without data. */
  final long[] rate;

  /** The contact whose rate counts, as an index into the images; meaningless at rate zero. */
  final int[] image;

  /** The craft to which the others send, or {@link #NOBODY}. */
  int receiver = NOBODY;

  /**
   * Fill up to which the receiver takes data in the first second of the stretch; each second later
   * it is higher by what the receiver generates in one.
   */
  long allowance;

  static final int NOBODY = -1;

  Stretch(long begin, long end, int craft, int classes) {
    this.begin = begin;
    this.end = end;
    this.generated = new long[craft * classes];
    this.generatedByCraft = new long[craft];
    this.sink = new boolean[craft];
    this.rate = new long[craft];
    this.image = new int[craft];
  }
}
