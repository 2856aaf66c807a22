/**
 * Not a part of the program: classes that break the rules of the architecture, each in one way, and
 * a few that stand just inside them. {@code PlantedViolationsTest} asks the rules to tell which is
 * which.
 */
package quietspan.planted;
