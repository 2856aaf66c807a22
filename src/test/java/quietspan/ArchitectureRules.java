package quietspan;

import static com.tngtech.archunit.core.domain.JavaAccess.Predicates.target;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAnyPackage;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideOutsideOfPackage;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;

import com.tngtech.archunit.base.DescribedPredicate;
import com.tngtech.archunit.core.domain.AccessTarget;
import com.tngtech.archunit.core.domain.AccessTarget.CodeUnitAccessTarget;
import com.tngtech.archunit.core.domain.JavaAccess;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.lang.ArchRule;
import java.security.SecureRandom;
import java.time.Clock;
import java.time.ZoneId;
import java.util.Calendar;
import java.util.Collection;
import java.util.Collections;
import java.util.Date;
import java.util.GregorianCalendar;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Random;
import java.util.Set;
import java.util.SplittableRandom;
import java.util.TimeZone;
import java.util.TreeSet;
import java.util.UUID;
import java.util.concurrent.ThreadLocalRandom;
import java.util.function.Predicate;
import java.util.random.RandomGenerator;
import java.util.stream.Stream;

/**
 * What may know what, for the packages under one root. The root is {@code quietspan}, or a planted
 * one whose classes break the rules on purpose.
 */
record ArchitectureRules(String root) {
  private static final List<String> BASE = List.of("time", "units", "problem");

  /** Each package with the packages that it may look at; the arrows run downward only. */
  private static final Map<String, List<String>> SEES = new LinkedHashMap<>();

  /** Each library with the packages that may use it; nobody may use any other. */
  private static final Map<String, List<String>> LIBRARIES = new LinkedHashMap<>();

  static {
    BASE.forEach(basic -> SEES.put(basic, List.of()));
    SEES.put("model", BASE);
    SEES.put("link", plus(BASE, "model"));
    SEES.put("rules", plus(BASE, "model", "link"));
    SEES.put("capacity", plus(BASE, "model", "link", "rules"));
    SEES.put("input", plus(BASE, "model", "link"));
    SEES.put("astro", plus(BASE, "model", "link"));
    SEES.put("check", plus(BASE, "model", "link", "rules"));
    SEES.put("planning", plus(BASE, "model", "link", "rules", "capacity"));
    SEES.put("compare", plus(BASE, "model", "link"));
    SEES.put("study", List.copyOf(SEES.keySet()));
    SEES.put("export", List.copyOf(SEES.keySet()));
    SEES.put("run", List.copyOf(SEES.keySet()));
    SEES.put("cli", List.copyOf(SEES.keySet()));

    LIBRARIES.put("org.orekit..", List.of("astro"));
    LIBRARIES.put("org.hipparchus..", List.of("astro"));
    LIBRARIES.put("org.optaplanner..", List.of("planning"));
    LIBRARIES.put("org.ojalgo..", List.of("capacity"));
    LIBRARIES.put("net.fortuna.ical4j..", List.of("input", "export"));
    LIBRARIES.put("org.snakeyaml..", List.of("input"));
    LIBRARIES.put("com.fasterxml.jackson..", List.of("input", "export", "run"));
    LIBRARIES.put("picocli..", List.of("cli"));
  }

  /** Not in the JDK's contract to the last bit, so they may differ between machines. */
  private static final Set<String> INEXACT =
      Set.of(
          "sin", "cos", "tan", "asin", "acos", "atan", "atan2", "sinh", "cosh", "tanh", "exp",
          "expm1", "log", "log10", "log1p", "pow", "cbrt", "hypot");

  private static final Set<String> SYSTEM_TALK = Set.of("in", "out", "err", "exit");

  static Set<String> packages() {
    return Collections.unmodifiableSet(SEES.keySet());
  }

  static List<String> libraries() {
    return List.copyOf(LIBRARIES.keySet());
  }

  /** Packages below the root that have no place among the arrows. */
  Set<String> packagesWithoutPlace(Iterable<JavaClass> classes) {
    Set<String> strangers = new TreeSet<>();
    for (JavaClass each : classes) {
      String below = each.getPackageName().substring(root.length());
      if (!below.isEmpty()) {
        strangers.add(below.substring(1).split("\\.")[0]);
      }
    }
    strangers.removeAll(SEES.keySet());
    return strangers;
  }

  ArchRule arrowsRunDownwardFrom(String layer) {
    return classes()
        .that()
        .resideInAPackage(in(layer))
        .should()
        .onlyDependOnClassesThat(
            resideOutsideOfPackage(root + "..")
                .or(resideInAnyPackage(in(plus(SEES.get(layer), layer)))))
        .because("arrows run downward only");
  }

  /** The class in the root starts the command line and knows nothing else. */
  ArchRule rootKnowsOnlyTheCommandLine() {
    return classes()
        .that()
        .resideInAPackage(root)
        .should()
        .onlyDependOnClassesThat(
            resideOutsideOfPackage(root + "..").or(resideInAnyPackage(root, in("cli"))))
        .because("Main only starts the program");
  }

  ArchRule noCycles() {
    return slices().matching(root + ".(*)..").should().beFreeOfCycles();
  }

  ArchRule checkNeverSeesTheSolverOrTheSky() {
    return noClasses()
        .that()
        .resideInAPackage(in("check"))
        .should()
        .dependOnClassesThat(
            resideInAnyPackage(
                in("planning"),
                in("astro"),
                in("capacity"),
                "org.optaplanner..",
                "org.ojalgo..",
                "org.orekit..",
                "org.hipparchus.."))
        .because("a check that shares code with the solver shares its mistakes");
  }

  ArchRule planningNeverSeesTheCheck() {
    return noClasses()
        .that()
        .resideInAPackage(in("planning"))
        .should()
        .dependOnClassesThat(resideInAnyPackage(in("check")))
        .because("the check judges plans from outside");
  }

  ArchRule libraryStaysWhereItBelongs(String library) {
    return noClasses()
        .that()
        .resideInAPackage(root + "..")
        .and()
        .resideOutsideOfPackages(in(LIBRARIES.get(library)))
        .should()
        .dependOnClassesThat(resideInAnyPackage(library))
        .because("only " + LIBRARIES.get(library) + " may know this library");
  }

  ArchRule noOtherLibrary() {
    List<String> known = plus(LIBRARIES.keySet(), "java..", "javax.xml..", "quietspan..");
    return classes()
        .should()
        .onlyDependOnClassesThat(
            resideInAnyPackage(known.toArray(String[]::new))
                .or(
                    DescribedPredicate.describe(
                        "are primitive", type -> type.getBaseComponentType().isPrimitive())))
        .because("what a library drags along is not ours to use");
  }

  ArchRule functionsGiveTheSameBitsEverywhere() {
    return noClasses()
        .should()
        .accessTargetWhere(
            target(
                codeUnit(
                    "an inexact function of Math",
                    unit ->
                        unit.getOwner().isEquivalentTo(Math.class)
                            && INEXACT.contains(unit.getName()))))
        .because("Math's functions differ between machines; StrictMath's and FastMath's do not");
  }

  ArchRule nobodyAsksForTheTime() {
    return noClasses()
        .that()
        .resideOutsideOfPackage(in("cli"))
        .should()
        .accessTargetWhere(target(codeUnit("a reading of the clock", ArchitectureRules::isNow)))
        .because("cli passes a Clock down");
  }

  ArchRule chanceHasASeed() {
    return noClasses()
        .that()
        .resideOutsideOfPackage(in("cli"))
        .should()
        .accessTargetWhere(target(codeUnit("chance without a seed", ArchitectureRules::isUnseeded)))
        .because("equal seeds give equal plans");
  }

  ArchRule machineSettingsPlayNoPart() {
    return noClasses()
        .should()
        .accessTargetWhere(
            target(
                codeUnit(
                    "a default of the machine",
                    unit ->
                        isNamed(unit, Locale.class, "getDefault")
                            || isNamed(unit, TimeZone.class, "getDefault")
                            || isNamed(unit, ZoneId.class, "systemDefault")
                            || isNamed(unit, Clock.class, "systemDefaultZone"))))
        .because("results do not depend on the machine's locale and zone");
  }

  ArchRule skyHasItsOwnData() {
    return noClasses()
        .should()
        .accessTargetWhere(
            target(
                DescribedPredicate.describe(
                    "marked as using the default data context",
                    (AccessTarget each) ->
                        each.isAnnotatedWith("org.orekit.annotation.DefaultDataContext")
                            || each.getOwner()
                                .isAnnotatedWith("org.orekit.annotation.DefaultDataContext"))))
        .because("which data served must be known, so the data context is passed explicitly");
  }

  ArchRule onlyTheCommandLinePrints() {
    return noClasses()
        .that()
        .resideOutsideOfPackages(root, in("cli"))
        .should()
        .accessTargetWhere(
            DescribedPredicate.describe(
                "the standard streams or the end of the process",
                (JavaAccess<?> access) ->
                    access.getTarget().getName().equals("printStackTrace")
                        || (access.getTargetOwner().isEquivalentTo(System.class)
                            && SYSTEM_TALK.contains(access.getTarget().getName()))))
        .because("results, remarks and exit codes are the command line's business");
  }

  private static boolean isNow(CodeUnitAccessTarget unit) {
    String name = unit.getName();
    boolean handedClock = takes(unit, Clock.class);
    return (unit.getOwner().getPackageName().startsWith("java.time")
            && name.equals("now")
            && !handedClock)
        || (unit.getOwner().isEquivalentTo(Clock.class)
            && (name.startsWith("system") || (name.startsWith("tick") && !handedClock)))
        || isNamed(unit, System.class, "currentTimeMillis")
        || isNamed(unit, System.class, "nanoTime")
        || isNamed(unit, Calendar.class, "getInstance")
        || isBareConstructor(unit, Date.class)
        || isBareConstructor(unit, GregorianCalendar.class);
  }

  private static boolean isUnseeded(CodeUnitAccessTarget unit) {
    return isBareConstructor(unit, Random.class)
        || isBareConstructor(unit, SplittableRandom.class)
        || unit.getOwner().isAssignableTo(ThreadLocalRandom.class)
        || unit.getOwner().isAssignableTo(SecureRandom.class)
        || isNamed(unit, Math.class, "random")
        || isNamed(unit, StrictMath.class, "random")
        || isNamed(unit, UUID.class, "randomUUID")
        || (unit.getOwner().isEquivalentTo(RandomGenerator.class)
            && (unit.getName().equals("of") || unit.getName().equals("getDefault")))
        || (isNamed(unit, Collections.class, "shuffle") && unit.getRawParameterTypes().size() == 1);
  }

  private static boolean isNamed(CodeUnitAccessTarget unit, Class<?> owner, String name) {
    return unit.getOwner().isEquivalentTo(owner) && unit.getName().equals(name);
  }

  private static boolean isBareConstructor(CodeUnitAccessTarget unit, Class<?> owner) {
    return isNamed(unit, owner, "<init>") && unit.getRawParameterTypes().isEmpty();
  }

  private static boolean takes(CodeUnitAccessTarget unit, Class<?> type) {
    return unit.getRawParameterTypes().stream().anyMatch(each -> each.isEquivalentTo(type));
  }

  /** Calls and method references alike. */
  private static DescribedPredicate<AccessTarget> codeUnit(
      String description, Predicate<CodeUnitAccessTarget> test) {
    return DescribedPredicate.describe(
        description,
        (AccessTarget each) -> each instanceof CodeUnitAccessTarget unit && test.test(unit));
  }

  private String in(String layer) {
    return root + "." + layer + "..";
  }

  private String[] in(Collection<String> layers) {
    return layers.stream().map(this::in).toArray(String[]::new);
  }

  private static List<String> plus(Collection<String> some, String... more) {
    return Stream.concat(some.stream(), Stream.of(more)).toList();
  }
}
