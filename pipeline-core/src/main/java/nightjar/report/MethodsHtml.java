package nightjar.report;

import java.util.ArrayList;
import java.util.List;
import java.util.regex.Pattern;

/**
 * The part of Markdown that {@link MethodsText} writes as HTML: headings, paragraphs, one numbered
 * list, names between backticks. Everything else is text.
 */
final class MethodsHtml {
  private static final Pattern NAME = Pattern.compile("`([^`]*)`");
  private static final Pattern ITEM = Pattern.compile("(?m)^\\d+\\. ");

  private MethodsHtml() {}

  static String of(String markdown) {
    List<String> parts = new ArrayList<>();
    for (String block : markdown.split("\n\n+", -1)) {
      String text = inline(block.strip());
      if (text.startsWith("## ")) {
        parts.add("<h3>" + text.substring(3) + "</h3>");
      } else if (ITEM.matcher(text).lookingAt()) {
        parts.add("<ol>" + items(text) + "</ol>");
      } else if (!text.isEmpty() && !text.startsWith("# ")) {
        parts.add("<p>" + text + "</p>");
      }
    }
    return String.join("\n", parts);
  }

  private static String items(String list) {
    StringBuilder items = new StringBuilder();
    for (String line : list.split("\n", -1)) {
      items.append("<li>").append(ITEM.matcher(line).replaceFirst("")).append("</li>");
    }
    return items.toString();
  }

  private static String inline(String text) {
    String safe =
        text.replace("&", "&amp;")
            .replace("<", "&lt;")
            .replace(">", "&gt;")
            .replace("\"", "&quot;");
    return NAME.matcher(safe).replaceAll("<code>$1</code>");
  }
}
