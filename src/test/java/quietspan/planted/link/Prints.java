package quietspan.planted.link;

/** Prints and ends the process. */
public final class Prints {
  public void print() {
    System.out.println("planted");
  }

  public void end() {
    System.exit(1);
  }

  @SuppressWarnings("CatchAndPrintStackTrace")
  public void trace(Exception problem) {
    problem.printStackTrace();
  }
}
