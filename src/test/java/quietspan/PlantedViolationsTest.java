package quietspan;

import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.lang.ArchRule;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Each rule of the architecture finds the class planted against it, and no other. */
final class PlantedViolationsTest {
  private static final ArchitectureRules RULES = new ArchitectureRules("quietspan.planted");
  private static final JavaClasses PLANTED =
      new ClassFileImporter().importPackages("quietspan.planted");
  private static final Pattern ORIGIN = Pattern.compile("<quietspan\\.planted\\.([\\w.]+)");

  @Test
  void packageWithoutPlaceIsFound() {
    assertThat(RULES.packagesWithoutPlace(PLANTED)).containsExactly("wild");
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          time     | time.LooksUp
          check    | check.SharesWithSolver check.SharesWithSky
          planning | planning.AsksCheck
          model    |
          astro    |
          cli      |
          """)
  void arrowUpIsFound(String layer, String culprits) {
    assertThat(culprits(RULES.arrowsRunDownwardFrom(layer))).isEqualTo(classes(culprits));
  }

  @Test
  void rootThatKnowsTooMuchIsFound() {
    assertThat(culprits(RULES.rootKnowsOnlyTheCommandLine())).containsExactly("KnowsTooMuch");
  }

  @Test
  void cyclesAreFound() {
    assertThat(report(RULES.noCycles()))
        .anyMatch(cycle -> cycle.contains("Slice model") && cycle.contains("Slice time"))
        .anyMatch(cycle -> cycle.contains("Slice check") && cycle.contains("Slice planning"))
        .hasSize(2);
  }

  @Test
  void checkThatSharesIsFound() {
    assertThat(culprits(RULES.checkNeverSeesTheSolverOrTheSky()))
        .containsExactly("check.SharesWithSky", "check.SharesWithSolver");
  }

  @Test
  void plannerThatAsksTheCheckIsFound() {
    assertThat(culprits(RULES.planningNeverSeesTheCheck())).containsExactly("planning.AsksCheck");
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          org.orekit..            | link.UsesEveryLibrary
          org.hipparchus..        | link.UsesEveryLibrary
          org.optaplanner..       | link.UsesEveryLibrary
          net.fortuna.ical4j..    | link.UsesEveryLibrary
          org.snakeyaml..         | link.UsesEveryLibrary
          com.fasterxml.jackson.. | link.UsesEveryLibrary
          picocli..               | link.UsesEveryLibrary
          """)
  void strayedLibraryIsFound(String library, String culprits) {
    assertThat(ArchitectureRules.libraries()).contains(library);
    assertThat(culprits(RULES.libraryStaysWhereItBelongs(library))).isEqualTo(classes(culprits));
  }

  @Test
  void draggedLibraryIsFound() {
    assertThat(culprits(RULES.noOtherLibrary())).containsExactly("link.UsesDragged");
  }

  @Test
  void inexactFunctionsAreFound() {
    assertThat(culprits(RULES.functionsGiveTheSameBitsEverywhere()))
        .containsExactly("link.CallsSine", "link.HidesSineInLambda", "link.RefersToPower");
  }

  @Test
  void everyReadingOfTheClockIsFound() {
    assertThat(report(RULES.nobodyAsksForTheTime()))
        .hasSize(7)
        .allMatch(line -> line.contains("link.ReadsClock"));
  }

  @Test
  void everyChanceWithoutSeedIsFound() {
    assertThat(culprits(RULES.chanceHasASeed())).containsExactly("link.ThrowsDice");
    assertThat(report(RULES.chanceHasASeed()))
        .extracting(line -> line.replaceAll(".*ThrowsDice\\.(\\w+)\\(.*", "$1"))
        .contains("random", "splittable", "local", "math", "uuid", "shuffle");
  }

  @Test
  void everyDefaultOfTheMachineIsFound() {
    assertThat(report(RULES.machineSettingsPlayNoPart()))
        .hasSize(3)
        .allMatch(line -> line.contains("link.AsksMachine"));
  }

  @Test
  void defaultDataAreFound() {
    assertThat(culprits(RULES.skyHasItsOwnData()))
        .containsExactly("astro.MakesDefaultDate", "astro.TakesDefaultData");
  }

  @Test
  void everyPrintIsFound() {
    assertThat(report(RULES.onlyTheCommandLinePrints()))
        .hasSize(3)
        .allMatch(line -> line.contains("link.Prints"));
  }

  private static List<String> report(ArchRule rule) {
    return rule.evaluate(PLANTED).getFailureReport().getDetails();
  }

  /** The planted classes that the rule complains about, without the root. */
  private static List<String> culprits(ArchRule rule) {
    Set<String> found = new TreeSet<>();
    for (String line : report(rule)) {
      Matcher origin = ORIGIN.matcher(line);
      assertThat(origin.find()).as(line).isTrue();
      found.add(origin.group(1).replaceAll("\\.(<?[a-z]\\w*>?)?$", ""));
    }
    return new ArrayList<>(found);
  }

  private static List<String> classes(String names) {
    return names == null ? List.of() : List.of(names.split(" ")).stream().sorted().toList();
  }
}
