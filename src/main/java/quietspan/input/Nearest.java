package quietspan.input;

import java.util.Collection;
import java.util.Locale;
import java.util.Optional;

/** The nearest known word to a mistyped one. */
final class Nearest {

  private Nearest() {}

  /** {@code ; did you mean "x"?}, or nothing when no word is near. */
  static String hint(String text, Collection<String> known) {
    return of(text, known).map(word -> "; did you mean \"" + word + "\"?").orElse("");
  }

  /** The first known word that differs least, if it differs by at most a third of its letters. */
  static Optional<String> of(String text, Collection<String> known) {
    String best = null;
    int least = Integer.MAX_VALUE;
    for (String word : known) {
      int distance = distance(folded(text), folded(word));
      if (distance <= Math.max(1, word.length() / 3) && distance < least) {
        least = distance;
        best = word;
      }
    }
    return Optional.ofNullable(best);
  }

  private static String folded(String text) {
    String cut = text.length() > 60 ? text.substring(0, 60) : text;
    return cut.toLowerCase(Locale.ROOT).replace('-', '_').replace(' ', '_');
  }

  /** Letters to insert, drop, change or swap with their neighbour (Damerau 1964). */
  private static int distance(String a, String b) {
    int[][] d = new int[a.length() + 1][b.length() + 1];
    for (int i = 0; i <= a.length(); i++) {
      d[i][0] = i;
    }
    for (int j = 0; j <= b.length(); j++) {
      d[0][j] = j;
    }
    for (int i = 1; i <= a.length(); i++) {
      for (int j = 1; j <= b.length(); j++) {
        int change = a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1;
        d[i][j] = Math.min(d[i - 1][j - 1] + change, Math.min(d[i - 1][j] + 1, d[i][j - 1] + 1));
        if (i > 1
            && j > 1
            && a.charAt(i - 1) == b.charAt(j - 2)
            && a.charAt(i - 2) == b.charAt(j - 1)) {
          d[i][j] = Math.min(d[i][j], d[i - 2][j - 2] + 1);
        }
      }
    }
    return d[a.length()][b.length()];
  }
}
