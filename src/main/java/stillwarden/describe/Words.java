package stillwarden.describe;

import java.util.Collection;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Wording of the messages: the user's word made printable, and the nearest known word. */
final class Words {
  private static final int LONGEST = 60;

  private Words() {}

  /** The user's word in backticks: cut to a line's length, without characters that a terminal would obey. */
  static String quote(String word) {
    StringBuilder b = new StringBuilder("`");
    word.codePoints().limit(LONGEST).forEach(c -> b.appendCodePoint(plain(c) ? c : '?'));
    return b.append(word.codePointCount(0, word.length()) > LONGEST ? "...`" : "`").toString();
  }

  private static boolean plain(int c) {
    int type = Character.getType(c);
    return type != Character.CONTROL && type != Character.FORMAT && type != Character.SURROGATE
        && type != Character.LINE_SEPARATOR && type != Character.PARAGRAPH_SEPARATOR && c != '`';
  }

  static String list(Collection<String> words) {
    return String.join(", ", words);
  }

  /** {@code ; nearest is `clamped`}, or nothing when no known word is near. */
  static String hint(String word, Collection<String> known) {
    return nearest(word, known).map(n -> "; nearest is `" + n + "`").orElse("");
  }

  /** The one known word that has it as a part ({@code liebig}), else the one with the fewest edits, else none. */
  static Optional<String> nearest(String word, Collection<String> known) {
    String w = word.substring(0, Math.min(word.length(), LONGEST)).toLowerCase(Locale.ROOT).replace('_', '-').replace(' ', '-');
    int most = Math.max(2, w.length() / 3);
    List<String> longer = known.stream().filter(k -> w.length() > 2 && List.of(k.split("[-./]")).contains(w)).toList();
    List<String> near = longer.isEmpty() ? nearest(w, known, 2 * most) : longer;
    return near.size() == 1 ? Optional.of(near.get(0)) : Optional.empty();
  }

  /** All that are nearest: of two equally near words neither is suggested, for one could be the calm one and wrong. */
  private static List<String> nearest(String w, Collection<String> known, int most) {
    int best = known.stream().mapToInt(k -> score(w, k)).min().orElse(Integer.MAX_VALUE);
    return best > most ? List.of() : known.stream().filter(k -> score(w, k) == best).distinct().toList();
  }

  /** Twice the edits to the whole word, or one more than twice those to a long member of it: {@code anethol} is anethole, not menthol. */
  private static int score(String w, String known) {
    String k = known.toLowerCase(Locale.ROOT);
    int best = 2 * distance(w, k);
    for (String member : k.split("-")) {
      best = member.length() > 4 && !member.equals(k) && distance(w, member) < 2 ? Math.min(best, 2 * distance(w, member) + 1) : best;
    }
    return best;
  }

  /** Edits between two words, a swap of neighbours counting as one. */
  static int distance(String a, String b) {
    int[][] d = new int[a.length() + 1][b.length() + 1];
    for (int i = 0; i <= a.length(); i++) {
      for (int j = 0; j <= b.length(); j++) {
        d[i][j] = i == 0 || j == 0 ? i + j : step(d, a, b, i, j);
      }
    }
    return d[a.length()][b.length()];
  }

  private static int step(int[][] d, String a, String b, int i, int j) {
    int same = a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1;
    int best = Math.min(Math.min(d[i - 1][j] + 1, d[i][j - 1] + 1), d[i - 1][j - 1] + same);
    boolean swap = i > 1 && j > 1 && a.charAt(i - 1) == b.charAt(j - 2) && a.charAt(i - 2) == b.charAt(j - 1);
    return swap ? Math.min(best, d[i - 2][j - 2] + 1) : best;
  }
}
