package quietspan;

import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.lang.ArchRule;
import java.net.URISyntaxException;
import java.nio.file.Path;
import java.util.List;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Keeps the packages of the program apart; {@link ArchitectureRules} says how. */
final class ArchitectureTest {
  private static final ArchitectureRules RULES = new ArchitectureRules("quietspan");
  private static final JavaClasses PROGRAM = program();

  /** Packages that have a place among the arrows but no class yet. */
  private static final Set<String> YET_TO_COME =
      Set.of("rules", "input", "astro", "check", "planning", "capacity", "compare", "study", "run");

  static Set<String> packages() {
    return ArchitectureRules.packages();
  }

  static List<String> libraries() {
    return ArchitectureRules.libraries();
  }

  @Test
  void everyPackageHasItsPlace() {
    assertThat(RULES.packagesWithoutPlace(PROGRAM)).isEmpty();
  }

  @ParameterizedTest
  @MethodSource("packages")
  void arrowsRunDownward(String layer) {
    check(RULES.arrowsRunDownwardFrom(layer), layer);
  }

  @Test
  void rootKnowsOnlyTheCommandLine() {
    RULES.rootKnowsOnlyTheCommandLine().check(PROGRAM);
  }

  @Test
  void packagesFormNoCycle() {
    RULES.noCycles().check(PROGRAM);
  }

  @Test
  void checkNeverSeesTheSolverOrTheSky() {
    check(RULES.checkNeverSeesTheSolverOrTheSky(), "check");
  }

  @Test
  void planningNeverSeesTheCheck() {
    check(RULES.planningNeverSeesTheCheck(), "planning");
  }

  @ParameterizedTest
  @MethodSource("libraries")
  void libraryStaysWhereItBelongs(String library) {
    RULES.libraryStaysWhereItBelongs(library).check(PROGRAM);
  }

  @Test
  void noOtherLibraryIsUsed() {
    RULES.noOtherLibrary().check(PROGRAM);
  }

  @Test
  void functionsGiveTheSameBitsEverywhere() {
    RULES.functionsGiveTheSameBitsEverywhere().check(PROGRAM);
  }

  @Test
  void nobodyAsksForTheTime() {
    RULES.nobodyAsksForTheTime().check(PROGRAM);
  }

  @Test
  void chanceHasASeed() {
    RULES.chanceHasASeed().check(PROGRAM);
  }

  @Test
  void machineSettingsPlayNoPart() {
    RULES.machineSettingsPlayNoPart().check(PROGRAM);
  }

  @Test
  void skyHasItsOwnData() {
    RULES.skyHasItsOwnData().check(PROGRAM);
  }

  @Test
  void onlyTheCommandLinePrints() {
    RULES.onlyTheCommandLinePrints().check(PROGRAM);
  }

  private static void check(ArchRule rule, String layer) {
    rule.allowEmptyShould(YET_TO_COME.contains(layer)).check(PROGRAM);
  }

  private static JavaClasses program() {
    try {
      return new ClassFileImporter()
          .importPath(
              Path.of(Main.class.getProtectionDomain().getCodeSource().getLocation().toURI()));
    } catch (URISyntaxException e) {
      throw new IllegalStateException(e);
    }
  }
}
