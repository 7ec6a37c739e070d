package nightjar.storage;

import java.util.Comparator;
import java.util.List;
import java.util.Locale;

/** How alike two names are. */
final class Similarity {
  /** Longer names are compared by their beginning, which keeps the table of distances small. */
  private static final int LONGEST = 100;

  private Similarity() {}

  /**
   * The candidate with the smallest edit distance to {@code name}, without regard to capitals; the
   * first of several.
   */
  static String nearest(String name, List<String> candidates) {
    return candidates.stream()
        .min(Comparator.comparingInt(c -> distance(folded(name), folded(c))))
        .orElseThrow();
  }

  private static String folded(String s) {
    return s.substring(0, Math.min(LONGEST, s.length())).toLowerCase(Locale.ROOT);
  }

  /** Insertions, deletions and replacements [Levenshtein 1966, Sov. Phys. Dokl. 10:707]. */
  static int distance(String a, String b) {
    int[] previous = new int[b.length() + 1];
    for (int j = 0; j <= b.length(); j++) {
      previous[j] = j;
    }
    for (int i = 1; i <= a.length(); i++) {
      int[] current = new int[b.length() + 1];
      current[0] = i;
      for (int j = 1; j <= b.length(); j++) {
        int replaced = previous[j - 1] + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
        current[j] = Math.min(replaced, 1 + Math.min(previous[j], current[j - 1]));
      }
      previous = current;
    }
    return previous[b.length()];
  }
}
