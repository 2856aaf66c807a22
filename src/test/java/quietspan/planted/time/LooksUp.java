package quietspan.planted.time;

import quietspan.planted.model.Fact;

/** A bottom package that knows one above it, which in turn knows it: an arrow up and a cycle. */
public final class LooksUp {
  public Fact fact() {
    return new Fact(this);
  }
}
