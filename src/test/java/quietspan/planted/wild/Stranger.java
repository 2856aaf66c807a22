package quietspan.planted.wild;

/** Stands in a package that has no place among the arrows. */
public final class Stranger {}
