package quietspan.planning.simulation;

import java.util.List;
import quietspan.model.Craft;
import quietspan.model.DataClass;
import quietspan.model.Scenario;

/**
 * What is fixed about the stores of a scenario. Craft are numbered as in the mission file, classes
 * in the order of the scenario's list, which is that of priority; a store of one class of one craft
 * has one index.
 */
final class Stores {

  private final List<String> craftNames;
  private final List<String> classNames;
  private final long[] capacity;
  private final long[] plannedFill;
  private final long[] crossLink;

  private Stores(Scenario scenario) {
    List<Craft> craft = scenario.craft();
    craftNames = craft.stream().map(Craft::name).toList();
    classNames = scenario.rules().classes().stream().map(DataClass::name).toList();
    double share = scenario.rules().margins().plannedFillShare();
    capacity = craft.stream().mapToLong(one -> one.store().bits()).toArray();
    plannedFill = craft.stream().mapToLong(one -> one.store().share(share).bits()).toArray();
    crossLink = craft.stream().mapToLong(one -> one.crossLink().bitsPerSecond()).toArray();
  }

  static Stores of(Scenario scenario) {
    return new Stores(scenario);
  }

  int craft() {
    return craftNames.size();
  }

  int classes() {
    return classNames.size();
  }

  String craftName(int craft) {
    return craftNames.get(craft);
  }

  String className(int dataClass) {
    return classNames.get(dataClass);
  }

  int craftIndex(String name) {
    return known(craftNames, name, "craft");
  }

  int index(int craft, String className) {
    return craft * classes() + known(classNames, className, "data class");
  }

  private static int known(List<String> names, String name, String what) {
    int index = names.indexOf(name);
    if (index < 0) {
      throw new IllegalArgumentException("no " + what + " " + name);
    }
    return index;
  }

  /** Bits that a craft's store can hold. */
  long capacity(int craft) {
    return capacity[craft];
  }

  /** Bits that a plan may fill. */
  long plannedFill(int craft) {
    return plannedFill[craft];
  }

  /** Bits that a craft can send to another each second. */
  long crossLink(int craft) {
    return crossLink[craft];
  }
}
