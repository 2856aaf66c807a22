package quietspan.model;

/**
 * What a craft makes of one data class.
 *
 * @param dataClass name of the class
 * @param profile rate outside pauses
 * @param shareInPauses fraction of the rate made during pauses, 0 to 1 (rounded down to the bit/s)
 */
public record Generation(String dataClass, Profile profile, double shareInPauses) {}
