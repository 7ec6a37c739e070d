package nightjar.plan;

import java.util.regex.Pattern;

/** Names of plans, stimuli and contrasts: 1 to 64 of letters, digits, _ - . */
final class Names {
  private static final Pattern RULE = Pattern.compile("[A-Za-z0-9_.-]{1,64}");

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

  static String shown(String text) {
    String s = text.replaceAll("\\p{Cntrl}", "?");
    return s.length() > 64 ? s.substring(0, 64) + "..." : s;
  }
}
