package nightjar.report;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;
import java.util.Locale;

/** Numbers and names as the report writes them. */
final class Words {
  private static final MathContext SIX_DIGITS = new MathContext(6);

  private Words() {}

  /** Up to six significant digits without trailing zeros; an en dash where it is not finite. */
  static String plain(double value) {
    if (!Double.isFinite(value)) {
      return "–";
    }
    BigDecimal rounded = new BigDecimal(value).round(SIX_DIGITS).stripTrailingZeros();
    return rounded.signum() == 0 ? "0" : rounded.toPlainString();
  }

  /** A fixed number of decimals with a true minus; an en dash where it is not finite. */
  static String fixed(double value, int decimals) {
    if (!Double.isFinite(value)) {
      return "–";
    }
    String text = String.format(Locale.ROOT, "%." + decimals + "f", value);
    return text.startsWith("-") ? "\u2212" + text.substring(1) : text;
  }

  /** A probability: three decimals, small ones with an exponent. */
  static String probability(double p) {
    if (!Double.isFinite(p)) {
      return "–";
    }
    return p >= 0.001 || p == 0 ? fixed(p, 3) : String.format(Locale.ROOT, "%.1e", p);
  }

  /** A name of the plan or the session in Markdown. */
  static String name(String name) {
    return "`" + name.replace("`", "'").replace("\n", " ") + "`";
  }

  /** {@code a, b and c}. */
  static String list(List<String> items) {
    int last = items.size() - 1;
    return last < 1
        ? String.join("", items)
        : String.join(", ", items.subList(0, last)) + " and " + items.get(last);
  }

  /** {@code 1 frame}, {@code 2 frames}. */
  static String count(int n, String thing) {
    return n + " " + thing + (n == 1 ? "" : "s");
  }
}
