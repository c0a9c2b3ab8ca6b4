package stillwarden.cli;

import java.util.Collection;
import java.util.Comparator;
import java.util.Optional;

/** Messages in the house's words: lower case, the user's own word between backticks, the nearest right word named. */
final class Plain {
  private Plain() {}

  static String words(String message) {
    String quoted = message.replaceAll("'([^']*)'", "`$1`");
    return quoted.isEmpty() ? quoted : Character.toLowerCase(quoted.charAt(0)) + quoted.substring(1);
  }

  /** The known word with the fewest letters to change; the first in order of two. */
  static Optional<String> nearest(String word, Collection<String> known) {
    return known.stream().sorted().min(Comparator.comparingInt(k -> distance(word, k)));
  }

  private static int distance(String a, String b) {
    int[] row = new int[b.length() + 1];
    for (int j = 0; j <= b.length(); j++) {
      row[j] = j;
    }
    for (int i = 1; i <= a.length(); i++) {
      int diagonal = row[0];
      row[0] = i;
      for (int j = 1; j <= b.length(); j++) {
        int changed = diagonal + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
        diagonal = row[j];
        row[j] = Math.min(changed, 1 + Math.min(row[j], row[j - 1]));
      }
    }
    return row[b.length()];
  }
}
