package nightjar.refusal;

import java.util.Collection;
import java.util.Comparator;
import java.util.Locale;
import java.util.Optional;

/** The known name that a mistyped one is likely to mean. */
public final class NearestName {
  /** Longer names are compared by their beginning, which keeps the table of distances small. */
  private static final int LONGEST = 100;

  private NearestName() {}

  /** The nearest by edit distance [Levenshtein 1966, Sov Phys Dokl 10:707], if near at all. */
  public static Optional<String> of(String name, Collection<String> known) {
    return known.stream()
        .min(Comparator.comparingInt((String k) -> distance(name, k)).thenComparing(k -> k))
        .filter(k -> distance(name, k) <= Math.max(2, k.length() / 2));
  }

  /**
   * Insertions, deletions, replacements and swaps of neighbours, each counted as one; capitals do
   * not count.
   */
  static int distance(String name, String other) {
    String a = folded(name);
    String b = folded(other);
    int[][] d = new int[a.length() + 1][b.length() + 1];
    for (int i = 0; i <= a.length(); i++) {
      for (int j = 0; j <= b.length(); j++) {
        if (i == 0 || j == 0) {
          d[i][j] = i + j;
          continue;
        }
        int same = a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1;
        d[i][j] = Math.min(Math.min(d[i - 1][j], d[i][j - 1]) + 1, d[i - 1][j - 1] + same);
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

  private static String folded(String s) {
    return s.substring(0, Math.min(LONGEST, s.length())).toLowerCase(Locale.ROOT);
  }
}
