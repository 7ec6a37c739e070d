package nightjar.picture;

import java.util.Locale;

/**
 * Writes one SVG picture. Lines and letters take the colour of the page's text ({@code
 * currentColor}), so that one picture serves the day and the night theme. Numbers are rounded to
 * hundredths and written the same way everywhere, so that equal pictures are equal texts.
 */
final class Svg {
  /** Height of letters, pixels. */
  static final double LETTERS = 12;

  private static final double LETTER_WIDTH = 6.4;

  private final StringBuilder out = new StringBuilder();

  /** Begins a picture of {@code width} by {@code height} pixels that is read aloud as its title. */
  Svg(String title, double width, double height) {
    String name = escape(title);
    out.append("<svg xmlns=\"http://www.w3.org/2000/svg\" role=\"img\" aria-label=\"")
        .append(name)
        .append("\" width=\"" + number(width) + "\" height=\"" + number(height))
        .append("\" viewBox=\"0 0 " + number(width) + " " + number(height))
        .append("\" font-family=\"system-ui, sans-serif\" font-size=\"" + number(LETTERS))
        .append("\" fill=\"currentColor\" style=\"font-variant-numeric:tabular-nums\">")
        .append("<title>" + name + "</title>\n");
  }

  /** Adds markup as it is. */
  Svg add(String markup) {
    out.append(markup).append('\n');
    return this;
  }

  /** Adds a line of text; {@code anchor} is start, middle or end. */
  Svg text(double x, double y, String anchor, String words) {
    return add(
        "<text"
            + at("x", x)
            + at("y", y)
            + " text-anchor=\""
            + anchor
            + "\">"
            + escape(words)
            + "</text>");
  }

  /** Adds a line of text that reads upwards. */
  Svg textUpwards(double x, double y, String words) {
    return add(
        "<text text-anchor=\"middle\" transform=\"translate("
            + number(x)
            + " "
            + number(y)
            + ") rotate(-90)\">"
            + escape(words)
            + "</text>");
  }

  /** Adds a straight line in the colour of the text. */
  Svg line(double x1, double y1, double x2, double y2, double opacity) {
    return add(
        "<line"
            + at("x1", x1)
            + at("y1", y1)
            + at("x2", x2)
            + at("y2", y2)
            + " stroke=\"currentColor\" stroke-opacity=\""
            + number(opacity)
            + "\"/>");
  }

  /** Adds a filled rectangle. */
  Svg box(double x, double y, double width, double height, String paint) {
    return add(
        "<rect"
            + at("x", x)
            + at("y", y)
            + at("width", width)
            + at("height", height)
            + " "
            + paint
            + "/>");
  }

  /** Adds a PNG stretched over a rectangle, its pixels kept as squares. */
  Svg image(double x, double y, double width, double height, String base64) {
    return add(
        "<image"
            + at("x", x)
            + at("y", y)
            + at("width", width)
            + at("height", height)
            + " preserveAspectRatio=\"none\" style=\"image-rendering:pixelated\""
            + " href=\"data:image/png;base64,"
            + base64
            + "\"/>");
  }

  /** Ends the picture. */
  String finish() {
    return out.append("</svg>").toString();
  }

  private static String at(String name, double value) {
    return " " + name + "=\"" + number(value) + "\"";
  }

  /** Hundredths without trailing zeros; a value that is not finite is our own fault. */
  static String number(double value) {
    if (!Double.isFinite(value)) {
      throw new IllegalArgumentException("a coordinate of " + value);
    }
    long hundredths = Math.round(value * 100);
    String sign = hundredths < 0 ? "-" : "";
    long whole = Math.abs(hundredths) / 100;
    long rest = Math.abs(hundredths) % 100;
    if (rest == 0) {
      return sign + whole;
    }
    String digits = String.format(Locale.ROOT, "%02d", rest);
    return sign + whole + "." + (digits.endsWith("0") ? digits.substring(0, 1) : digits);
  }

  /** Text that is safe in SVG and HTML, between tags and in quoted attributes. */
  static String escape(String text) {
    StringBuilder safe = new StringBuilder(text.length() + 16);
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      switch (c) {
        case '&' -> safe.append("&amp;");
        case '<' -> safe.append("&lt;");
        case '>' -> safe.append("&gt;");
        case '"' -> safe.append("&quot;");
        case '\'' -> safe.append("&#39;");
        default -> safe.append(c < ' ' && c != '\n' && c != '\t' ? '\uFFFD' : c);
      }
    }
    return safe.toString();
  }

  /** The text, or its two ends around an ellipsis, so that it fits into {@code pixels}. */
  static String fit(String text, double pixels) {
    int letters = Math.max(3, (int) (pixels / LETTER_WIDTH));
    int end = (letters - 1) / 2;
    return text.length() <= letters
        ? text
        : text.substring(0, letters - 1 - end) + "…" + text.substring(text.length() - end);
  }

  /** About how many pixels a text takes. */
  static double widthOf(String text) {
    return LETTER_WIDTH * text.length();
  }
}
