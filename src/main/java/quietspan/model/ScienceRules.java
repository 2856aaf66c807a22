package quietspan.model;

import java.time.Duration;

/**
 * What counts as science.
 *
 * @param minimumSpan a quiet span shorter than this counts nothing
 * @param warmUp deducted from every span that counts
 */
public record ScienceRules(Duration minimumSpan, Duration warmUp) {}
