package quietspan.planted.planning;

import org.optaplanner.core.api.score.buildin.hardsoft.HardSoftScore;

/** Rightly knows its library. */
public record Search(HardSoftScore score) {}
