package nightjar.plan;

import java.util.Collection;
import java.util.regex.Pattern;
import java.util.stream.Collectors;

/** Names of plans, stimuli and contrasts: 1 to 64 of letters, digits, _ - . */
final class Names {
  private static final Pattern RULE = Pattern.compile("[A-Za-z0-9_.-]{1,64}");

  /** Controls, marks that turn the direction of writing, breaks of lines, halves of characters. */
  private static final Pattern UNSEEN = Pattern.compile("[\\p{Cc}\\p{Cf}\\p{Zl}\\p{Zp}\\p{Cs}]");

  private static final int LONGEST_SHOWN = 64;
  private static final int MOST_LISTED = 20;

  private Names() {}

  static boolean isName(String text) {
    return RULE.matcher(text).matches();
  }

  /** The name itself, or a refusal at {@code key}. */
  static String check(Section section, String key, String text, String of) {
    if (!isName(text)) {
      throw section
          .refusal(key, "the name of " + of + " breaks the rule for names")
          .found(shown(text))
          .expected("1 to 64 of letters, digits, _ - .")
          .remedy("rename it");
    }
    return text;
  }

  /** The text in one short line without what would not show, for messages. */
  static String shown(String text) {
    String s = UNSEEN.matcher(text).replaceAll("?");
    if (s.length() <= LONGEST_SHOWN) {
      return s;
    }
    boolean splits = Character.isHighSurrogate(s.charAt(LONGEST_SHOWN - 1));
    return s.substring(0, splits ? LONGEST_SHOWN - 1 : LONGEST_SHOWN) + "...";
  }

  /** The first names, for messages. */
  static String listed(Collection<String> names) {
    String first =
        names.stream().limit(MOST_LISTED).map(Names::shown).collect(Collectors.joining(", "));
    return names.size() > MOST_LISTED ? first + ", ..." : first;
  }
}
