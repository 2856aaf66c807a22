package quietspan;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.jar.Attributes;
import java.util.jar.JarFile;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.zip.ZipEntry;
import org.junit.jupiter.api.Test;
import quietspan.fixture.PackagedProgram;

/** What the packaged jar must carry, and what it must not. */
final class PackagedJarIT {
  /** A line of Maven's list of resolved artifacts: group, artifact, type, version, scope. */
  private static final Pattern BUNDLED =
      Pattern.compile("\\s+[\\w.\\-]+:([\\w.\\-]+):jar:([\\w.\\-]+):(?:compile|runtime).*");

  /** A line of the notice that names a library: artifact and version. */
  private static final Pattern NAMED = Pattern.compile("[\\w.\\-]+ \\d+(\\.\\d+)+");

  @Test
  void manifestNamesProgramAndVersion() throws Exception {
    try (JarFile jar = open()) {
      Attributes manifest = jar.getManifest().getMainAttributes();
      assertThat(manifest.getValue(Attributes.Name.MAIN_CLASS)).isEqualTo("quietspan.Main");
      assertThat("quietspan " + manifest.getValue(Attributes.Name.IMPLEMENTATION_VERSION))
          .isEqualTo(PackagedProgram.run("--version").results().strip());
      assertThat(manifest.getValue(Attributes.Name.MULTI_RELEASE)).isEqualTo("true");
    }
  }

  @Test
  void noticeNamesExactlyTheBundledLibraries() throws Exception {
    try (JarFile jar = open()) {
      List<String> named =
          text(jar, "META-INF/NOTICE").lines().filter(NAMED.asMatchPredicate()).toList();
      assertThat(named).containsExactlyInAnyOrderElementsOf(bundled(" "));
    }
  }

  @Test
  void eachBundledLibrarysLicenceIsAboard() throws Exception {
    // Jars without a licence inside: two with their text beside the others, two under the Apache
    // License of META-INF/LICENSE, one in the public domain.
    List<String> without =
        List.of(
            "ical4j-4.4.0",
            "istack-commons-runtime-4.1.2",
            "picocli-4.7.7",
            "snakeyaml-engine-2.10",
            "LatencyUtils-2.0.3");
    try (JarFile jar = open()) {
      List<String> names = jar.stream().map(ZipEntry::getName).toList();
      for (String library : bundled("-")) {
        boolean aboard =
            names.stream()
                .anyMatch(name -> name.matches(".*/licenses/" + library + "-jar/.*LICENSE.*"));
        assertThat(aboard).as(library).isNotEqualTo(without.contains(library));
      }
      assertThat(names)
          .contains(
              "META-INF/licenses/ical4j-LICENSE.txt",
              "META-INF/licenses/istack-commons-runtime-LICENSE.md");
      assertThat(text(jar, "META-INF/LICENSE"))
          .isEqualTo(Files.readString(Path.of("LICENSE"), StandardCharsets.UTF_8))
          .contains("Apache License\n                           Version 2.0, January 2004")
          .contains("END OF TERMS AND CONDITIONS");
    }
  }

  @Test
  void noSignatureOfAnotherJarIsLeft() throws Exception {
    try (JarFile jar = open()) {
      assertThat(jar.stream().map(ZipEntry::getName))
          .noneMatch(name -> name.matches("META-INF/.*\\.(SF|DSA|RSA)"))
          .noneMatch(name -> name.endsWith("module-info.class"));
    }
  }

  @Test
  void servicesOfTheLibrariesSurviveTheMerge() throws Exception {
    try (JarFile jar = open()) {
      assertThat(text(jar, "META-INF/services/net.fortuna.ical4j.model.PropertyFactory"))
          .contains("net.fortuna.ical4j.model.property.RRule$Factory");
      assertThat(text(jar, "META-INF/services/com.fasterxml.jackson.core.JsonFactory"))
          .contains("com.fasterxml.jackson.core.JsonFactory");
    }
  }

  @Test
  void calendarLibraryFetchesNoZones() throws Exception {
    try (JarFile jar = open()) {
      assertThat(text(jar, "ical4j.properties"))
          .contains("net.fortuna.ical4j.timezone.update.enabled=false");
    }
  }

  private static JarFile open() throws IOException {
    return new JarFile(PackagedProgram.jar().toFile());
  }

  private static String text(JarFile jar, String name) throws IOException {
    ZipEntry entry = jar.getEntry(name);
    assertThat(entry).as(name).isNotNull();
    try (InputStream bytes = jar.getInputStream(entry)) {
      return new String(bytes.readAllBytes(), StandardCharsets.UTF_8);
    }
  }

  private static List<String> bundled(String between) throws IOException {
    Path list = Path.of(System.getProperty("quietspan.bundled"));
    List<String> libraries =
        Files.readAllLines(list, StandardCharsets.UTF_8).stream()
            .map(BUNDLED::matcher)
            .filter(Matcher::matches)
            .map(line -> line.group(1) + between + line.group(2))
            .toList();
    assertThat(libraries).hasSizeGreaterThan(30);
    return libraries;
  }
}
