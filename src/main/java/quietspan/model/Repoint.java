package quietspan.model;

import quietspan.time.OnboardInstant;

/** One antenna moves. The start is a whole second on board. */
public record Repoint(String id, String craft, OnboardInstant start, Aim aim) {}
