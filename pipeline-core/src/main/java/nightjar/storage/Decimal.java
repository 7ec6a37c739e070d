package nightjar.storage;

import java.util.regex.Pattern;

/** Decimal numbers as people and programs write them into tables. */
final class Decimal {
  private static final int LONGEST = 60;
  private static final Pattern FORM =
      Pattern.compile("[+-]?(?:[0-9]++(?:\\.[0-9]*+)?|\\.[0-9]++)(?:[eE][+-]?[0-9]++)?");
  private static final Pattern NO_VALUE =
      Pattern.compile("(?i)[+-]?(?:nan|inf|infinity)|1\\.#(?:inf|qnan|ind)");

  private Decimal() {}

  /**
   * The number; NaN where the text is no decimal number, infinite where it is too large. Narrower
   * than {@link Double#parseDouble}, which also reads {@code 1d} and {@code 0x1p3}.
   */
  static double parse(String text) {
    return text.length() <= LONGEST && FORM.matcher(text).matches()
        ? Double.parseDouble(text)
        : Double.NaN;
  }

  /** Whether the text stands for no number or infinity, or is a number beyond all doubles. */
  static boolean isInfiniteOrNaN(String text) {
    return text.length() <= LONGEST
        && (NO_VALUE.matcher(text).matches() || Double.isInfinite(parse(text)));
  }
}
