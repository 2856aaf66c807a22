package quietspan.model;

import java.time.Duration;

/**
 * Rules of contacts that hold for the whole formation.
 *
 * @param lockUp time at the begin of a contact without data
 * @param rateSteps most rates in one contact, at least 1
 * @param relock time without data after each change of rate
 * @param contactsAtOnce most contacts of the formation at one time, at least 1
 * @param craftSwitch least ground time between the end of a contact and the begin of one with
 *     another craft; zero for none (contacts that overlap, where {@code contactsAtOnce} allows it,
 *     are exempt)
 * @param overheadShare fraction of the rate spent on frames, 0 to below 1
 */
public record ContactRules(
    Duration lockUp,
    int rateSteps,
    Duration relock,
    int contactsAtOnce,
    Duration craftSwitch,
    double overheadShare) {}
