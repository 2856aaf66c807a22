package quietspan.export;

import java.util.Collection;
import java.util.Locale;

/** Names of files made of the names of stations and craft, safe on every file system. */
final class FileNames {

  private FileNames() {}

  /** Small letters, digits and hyphens. */
  static String plain(String text) {
    String plain =
        text.toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]+", "-").replaceAll("^-+|-+$", "");
    return plain.isEmpty() ? "x" : plain;
  }

  /** The plain name, with a number behind it when it is taken. */
  static String free(String text, Collection<String> taken) {
    String plain = plain(text);
    String name = plain;
    for (int i = 2; taken.contains(name); i++) {
      name = plain + "-" + i;
    }
    return name;
  }
}
