package quietspan.model;

import quietspan.units.Angle;

/**
 * Planning margins: explicit inputs, printed with every plan. The link margin stands in {@link
 * LinkBudget}.
 *
 * @param usableVolumeShare fraction of a contact's volume that plans may count on, above 0 to 1
 * @param plannedFillShare fraction of each store that plans may fill, above 0 to 1
 * @param pointingAllowance attitude and antenna error, added to every off-pointing
 * @param coneAllowance aberration and the Earth's radius, taken from the rated half-cone
 */
public record Margins(
    double usableVolumeShare,
    double plannedFillShare,
    Angle pointingAllowance,
    Angle coneAllowance) {}
