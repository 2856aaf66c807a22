package quietspan.planning;

import static org.assertj.core.api.Assertions.assertThat;

import java.lang.reflect.RecordComponent;
import java.util.Arrays;
import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import quietspan.model.Calendars;
import quietspan.model.ContactRules;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.DataClass;
import quietspan.model.DataRules;
import quietspan.model.Dish;
import quietspan.model.Generation;
import quietspan.model.HighGainAntenna;
import quietspan.model.Margins;
import quietspan.model.RuleId;
import quietspan.model.Rules;
import quietspan.model.ScienceRules;
import quietspan.model.StartState;
import quietspan.model.Station;

/** Nothing that a scenario asks for escapes the bound: it is kept, or a relaxation gives it up. */
class RelaxationTest {

  /** What the bound does with each thing that a scenario can say and that can bind a plan. */
  private static final Map<String, String> TREATMENT =
      new TreeMap<>(
          Map.ofEntries(
              of(ScienceRules.class, "kept", "minimumSpan", "warmUp"),
              of(
                  ContactRules.class,
                  "CONTACT_OVERHEAD",
                  "lockUp",
                  "rateSteps",
                  "relock",
                  "craftSwitch"),
              of(ContactRules.class, "kept", "contactsAtOnce", "overheadShare"),
              of(DataRules.class, "WHOLE_CELLS", "gapLimit"),
              of(DataRules.class, "DIRECT_DROPPED", "directLimit"),
              of(
                  DataRules.class,
                  "POOLED_STORES",
                  "endFillShare",
                  "forwardAhead",
                  "crossLinksInPauses"),
              of(DataRules.class, "BEAM_CELLS", "endCoverage"),
              of(
                  Margins.class,
                  "kept",
                  "usableVolumeShare",
                  "plannedFillShare",
                  "pointingAllowance",
                  "coneAllowance"),
              of(Rules.class, "kept", "science", "contacts", "data", "margins", "link", "classes"),
              of(
                  Craft.class,
                  "kept",
                  "name",
                  "orbit",
                  "attitude",
                  "antenna",
                  "rates",
                  "generation"),
              of(Craft.class, "POOLED_STORES", "store", "crossLink"),
              of(HighGainAntenna.class, "TRAVEL_AND_SPACING", "steering", "repointSpacing"),
              of(
                  HighGainAntenna.class,
                  "kept",
                  "ratedHalfCone",
                  "halfPowerWidth",
                  "move",
                  "settle"),
              of(Generation.class, "PAUSE_SAVES", "shareInPauses"),
              of(Generation.class, "kept", "dataClass", "profile"),
              of(DataClass.class, "POOLED_STORES", "priority", "latencyLimit"),
              of(DataClass.class, "kept", "name"),
              of(
                  Dish.class,
                  "CONTACT_OVERHEAD",
                  "setup",
                  "teardown",
                  "changeover",
                  "minimumContact",
                  "maximumContact"),
              of(
                  Dish.class,
                  "kept",
                  "name",
                  "gOverT",
                  "zenithAttenuationDb",
                  "lowestElevation",
                  "highestElevation",
                  "deadZones"),
              // Costs bind no plan, and data that are late by the delay alone are so in any plan.
              of(Dish.class, "no limit", "costPerHour", "costPerContact"),
              of(Station.class, "dropped in POOLED_STORES", "deliveryDelay"),
              of(
                  Station.class,
                  "kept",
                  "name",
                  "latitude",
                  "longitude",
                  "altitude",
                  "mask",
                  "sepLimit",
                  "dishes"),
              of(Station.class, "no limit", "zone"),
              of(Calendars.class, "kept", "blocked", "interruptions"),
              of(Calendars.class, "JOINED_PAUSES", "guarded"),
              of(Calendars.class, "CONFIRMED_LOOSE", "confirmed"),
              of(StartState.class, "kept", "quietSince", "lastContactEnd", "craft"),
              of(CraftState.class, "kept", "craft", "aim", "fill"),
              of(CraftState.class, "DIRECT_DROPPED", "lastContactEnd"),
              of(CraftState.class, "TRAVEL_AND_SPACING", "lastRepoint")));

  private static Map.Entry<String, String> of(
      Class<?> record, String treatment, String... components) {
    return Map.entry(
        record.getSimpleName() + " " + treatment, String.join(",", List.of(components)));
  }

  @Test
  void everyRuleIsKeptOrGivenUpByName() {
    EnumSet<RuleId> treated = EnumSet.copyOf(Relaxation.keptInFull());
    for (Relaxation relaxation : Relaxation.values()) {
      for (RuleId rule : relaxation.rules()) {
        assertThat(Relaxation.keptInFull()).as(relaxation.title()).doesNotContain(rule);
      }
      treated.addAll(relaxation.rules());
    }
    assertThat(treated).containsExactlyInAnyOrder(RuleId.values());
  }

  @Test
  void everyInputThatCanBindIsTreated() {
    List<Class<?>> records =
        List.of(
            ScienceRules.class,
            ContactRules.class,
            DataRules.class,
            Margins.class,
            Rules.class,
            Craft.class,
            HighGainAntenna.class,
            Generation.class,
            DataClass.class,
            Dish.class,
            Station.class,
            Calendars.class,
            StartState.class,
            CraftState.class);
    for (Class<?> record : records) {
      List<String> treated =
          TREATMENT.entrySet().stream()
              .filter(entry -> entry.getKey().startsWith(record.getSimpleName() + " "))
              .flatMap(entry -> Stream.of(entry.getValue().split(",")))
              .toList();
      assertThat(treated)
          .as(record.getSimpleName())
          .containsExactlyInAnyOrderElementsOf(
              Arrays.stream(record.getRecordComponents()).map(RecordComponent::getName).toList());
    }
  }

  @Test
  void everyTreatmentNamesARelaxationOrKeepsTheRule() {
    for (String key : TREATMENT.keySet()) {
      String[] words = key.split(" ", 2);
      String last = words[1].substring(words[1].lastIndexOf(' ') + 1);
      assertThat(
              words[1].equals("kept")
                  || words[1].equals("no limit")
                  || Stream.of(Relaxation.values()).anyMatch(one -> one.name().equals(last)))
          .as(key)
          .isTrue();
    }
  }
}
