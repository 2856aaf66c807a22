package quietspan.model;

/**
 * What all links share.
 *
 * @param frequencyHz downlink carrier (Hz)
 * @param requiredEbN0Db required energy per bit over noise density (dB)
 * @param implementationLossDb receiver's loss against theory (dB)
 * @param otherLossesDb polarisation and the like (dB)
 * @param marginDb link margin that must remain (dB), a planning margin
 */
public record LinkBudget(
    double frequencyHz,
    double requiredEbN0Db,
    double implementationLossDb,
    double otherLossesDb,
    double marginDb) {}
