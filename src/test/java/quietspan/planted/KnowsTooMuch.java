package quietspan.planted;

import quietspan.planted.model.Fact;

/** Stands beside Main and knows more than the command line. */
public record KnowsTooMuch(Fact fact) {}
