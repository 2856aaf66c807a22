package quietspan.input;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import quietspan.model.ContactRules;
import quietspan.model.Craft;
import quietspan.model.DataClass;
import quietspan.model.DataRules;
import quietspan.model.LinkBudget;
import quietspan.model.Margins;
import quietspan.model.Rules;
import quietspan.model.ScienceRules;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/** What {@code mission.yaml} says: the checks that no single field can make, and its records. */
final class MissionFile {

  private static final Duration LONGEST_PERIOD = Duration.ofDays(800);
  private static final Duration SHORTEST_PERIOD = Duration.ofDays(1);

  private final Values mission;
  private final List<CraftSection> craft;
  private List<String> names = List.of();
  private List<String> classes = List.of();

  MissionFile(Values mission, Folder folder) {
    this.mission = mission;
    this.craft =
        mission.blocks(MissionFields.CRAFT).stream()
            .map(one -> new CraftSection(one, mission, folder))
            .toList();
  }

  Values values() {
    return mission;
  }

  /** Names of the craft in the order of the file; known once the file is checked. */
  List<String> names() {
    return names;
  }

  /** Names of the data classes; known once the file is checked. */
  List<String> classes() {
    return classes;
  }

  Optional<CraftSection> craft(String name) {
    return craft.stream().filter(one -> one.name().filter(name::equals).isPresent()).findFirst();
  }

  boolean needsBudget() {
    return craft.stream().anyMatch(CraftSection::needsBudget);
  }

  Optional<OnboardInstant> begin() {
    return mission
        .maybe(MissionFields.PERIOD)
        .flatMap(period -> period.maybe(MissionFields.Period.BEGIN));
  }

  void check() {
    mission.maybe(MissionFields.PERIOD).ifPresent(MissionFile::checkPeriod);
    names = Rows.distinct(mission.blocks(MissionFields.CRAFT), MissionFields.Craft.NAME);
    List<Values> rows =
        mission
            .maybe(MissionFields.DATA)
            .map(data -> data.blocks(MissionFields.Data.CLASSES))
            .orElse(List.of());
    classes = Rows.distinct(rows, MissionFields.DataClass.NAME);
    Rows.distinct(rows, MissionFields.DataClass.PRIORITY);
    checkCorners();
    craft.forEach(one -> one.check(classes));
  }

  private static void checkPeriod(Values period) {
    Optional<OnboardInstant> begin = period.maybe(MissionFields.Period.BEGIN);
    Optional<OnboardInstant> end = period.maybe(MissionFields.Period.END);
    if (begin.isEmpty() || end.isEmpty()) {
      return;
    }
    if (!begin.get().isBefore(end.get())) {
      period.refuse(
          MissionFields.Period.END, "is not after the begin of the period", "a later instant");
      return;
    }
    Duration length = end.get().since(begin.get());
    if (length.compareTo(SHORTEST_PERIOD) < 0 || length.compareTo(LONGEST_PERIOD) > 0) {
      period.refuse(
          MissionFields.Period.END,
          "makes a period of " + length.toHours() + " h",
          "a period of 1 to 800 days");
    }
  }

  private void checkCorners() {
    List<Values> orbits =
        craft.stream()
            .map(one -> one.values().maybe(MissionFields.Craft.ORBIT))
            .flatMap(Optional::stream)
            .toList();
    Rows.distinct(orbits, MissionFields.Orbit.CORNER);
  }

  String mission() {
    return mission.get(MissionFields.MISSION);
  }

  Instant issued() {
    return mission.get(MissionFields.ISSUED);
  }

  Interval<OnboardInstant> period() {
    Values period = mission.get(MissionFields.PERIOD);
    return Interval.of(
        period.get(MissionFields.Period.BEGIN), period.get(MissionFields.Period.END));
  }

  List<Craft> craft() {
    List<Craft> models = new ArrayList<>();
    craft.forEach(one -> models.add(one.model()));
    return models;
  }

  Rules rules() {
    Values science = mission.get(MissionFields.SCIENCE);
    Values data = mission.get(MissionFields.DATA);
    Values margins = mission.get(MissionFields.MARGINS);
    return new Rules(
        new ScienceRules(
            science.get(MissionFields.Science.MINIMUM_QUIET_SPAN),
            science.get(MissionFields.Science.WARM_UP)),
        contacts(mission.get(MissionFields.CONTACTS)),
        new DataRules(
            data.maybe(MissionFields.Data.GAP_LIMIT),
            data.maybe(MissionFields.Data.DIRECT_LIMIT),
            data.maybe(MissionFields.Data.END_FILL),
            data.maybe(MissionFields.Data.END_COVERAGE),
            data.get(MissionFields.Data.FORWARD_AHEAD),
            data.get(MissionFields.Data.CROSS_LINKS_IN_PAUSES)),
        new Margins(
            margins.get(MissionFields.Margins.USABLE_VOLUME),
            margins.get(MissionFields.Margins.PLANNED_FILL),
            margins.get(MissionFields.Margins.POINTING_ALLOWANCE),
            margins.get(MissionFields.Margins.CONE_ALLOWANCE)),
        mission.maybe(MissionFields.LINK).map(MissionFile::link),
        data.blocks(MissionFields.Data.CLASSES).stream()
            .map(
                row ->
                    new DataClass(
                        row.get(MissionFields.DataClass.NAME),
                        row.get(MissionFields.DataClass.PRIORITY),
                        row.get(MissionFields.DataClass.LATENCY)))
            .sorted(Comparator.comparingInt(DataClass::priority))
            .toList());
  }

  private static ContactRules contacts(Values contacts) {
    Duration lockUp = contacts.get(MissionFields.Contacts.LOCK_UP);
    return new ContactRules(
        lockUp,
        contacts.get(MissionFields.Contacts.RATE_STEPS),
        contacts.maybe(MissionFields.Contacts.RELOCK).orElse(lockUp),
        contacts.get(MissionFields.Contacts.CONTACTS_AT_ONCE),
        contacts.get(MissionFields.Contacts.CRAFT_SWITCH),
        contacts.get(MissionFields.Contacts.OVERHEAD));
  }

  private static LinkBudget link(Values link) {
    return new LinkBudget(
        link.get(MissionFields.Link.FREQUENCY),
        link.get(MissionFields.Link.REQUIRED_EB_N0),
        link.get(MissionFields.Link.IMPLEMENTATION_LOSS),
        link.get(MissionFields.Link.OTHER_LOSSES),
        link.get(MissionFields.Link.MARGIN));
  }
}
