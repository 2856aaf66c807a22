package quietspan.planted.check;

import quietspan.planted.model.Fact;

/** Rightly judges facts alone. */
public record Verdict(Fact fact) {}
