package nightjar.demo;

import java.util.List;
import java.util.Locale;
import java.util.StringJoiner;
import java.util.function.Function;

/** Pieces of text files with the same digits on every machine. */
final class DemoText {
  private DemoText() {}

  /** Fixed number of decimals. */
  static String decimal(double value, int decimals) {
    // A rounded -0.000 would say no less than 0.000 and only puzzle.
    String text = String.format(Locale.ROOT, "%." + decimals + "f", value);
    return text.matches("-0\\.?0*") ? text.substring(1) : text;
  }

  /** A JSON string of a name without characters that JSON escapes. */
  static String quoted(String name) {
    return '"' + name + '"';
  }

  /** A JSON array on one line. */
  static <T> String array(List<T> items, Function<T, String> text) {
    StringJoiner joiner = new StringJoiner(", ", "[", "]");
    items.forEach(item -> joiner.add(text.apply(item)));
    return joiner.toString();
  }
}
