package quietspan.cli;

/** Exit codes. */
final class Exit {

  /** Done as asked; also an interrupted legal plan. */
  static final int DONE = 0;

  /** Our own fault. */
  static final int FAULT = 1;

  /** Usage or input. */
  static final int INPUT = 2;

  /** A shortfall, findings, or changed inputs. */
  static final int SHORTFALL = 3;

  /** Interrupted with nothing to deliver. */
  static final int INTERRUPTED = 130;

  private Exit() {}
}
