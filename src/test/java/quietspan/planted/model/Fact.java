package quietspan.planted.model;

import quietspan.planted.time.LooksUp;

/** Rightly knows what lies below. */
public record Fact(LooksUp below) {}
