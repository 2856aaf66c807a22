package quietspan.planning;

import quietspan.model.Aim;

/** A repoint in the planner's numbers: seconds on board since the begin of the period. */
record Move(int craft, int start, Aim aim) {}
