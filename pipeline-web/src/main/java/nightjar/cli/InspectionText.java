package nightjar.cli;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.stream.Collectors;
import nightjar.analysis.Inspection;
import org.jspecify.annotations.Nullable;

/** An inspection for reading. */
final class InspectionText {
  private InspectionText() {}

  static String of(Inspection found) {
    StringBuilder text = new StringBuilder();
    found
        .sections()
        .forEach(
            (name, facts) -> {
              text.append(title(name)).append('\n');
              int width = facts.keySet().stream().mapToInt(k -> label(k).length()).max().orElse(0);
              facts.forEach((key, value) -> line(text, label(key), width, value));
              text.append('\n');
            });
    if (!found.warnings().isEmpty()) {
      text.append("Warnings\n");
      found.warnings().forEach(w -> text.append("  ").append(w).append('\n'));
    }
    return text.toString().stripTrailing() + (text.length() > 0 ? "\n" : "");
  }

  private static String title(String name) {
    return name.substring(0, 1).toUpperCase(Locale.ROOT) + name.substring(1);
  }

  /** A key with its unit as people write it: {@code interval_s} becomes "interval, s". */
  private static String label(String key) {
    String words = key.replaceFirst("_(s|mm|mb)$", ", $1").replace('_', ' ');
    return words.replaceFirst(", mb$", ", MB");
  }

  private static void line(StringBuilder text, String label, int width, Object value) {
    if (value instanceof Map<?, ?> m && m.values().stream().anyMatch(Map.class::isInstance)) {
      text.append("  ").append(label).append('\n');
      text.append(nested(m).indent(4));
      return;
    }
    String shown =
        value instanceof Map<?, ?> m
            ? m.entrySet().stream()
                .map(e -> e.getKey() + " " + plain(e.getValue()))
                .collect(Collectors.joining(", "))
            : value instanceof List<?> l
                ? l.stream().map(InspectionText::plain).collect(Collectors.joining(", "))
                : plain(value);
    text.append("  ")
        .append(label)
        .append(" ".repeat(width - label.length()))
        .append("  ")
        .append(shown.isEmpty() ? "none" : shown)
        .append('\n');
  }

  private static String nested(Map<?, ?> rows) {
    List<String> keys =
        rows.values().stream()
            .filter(Map.class::isInstance)
            .findFirst()
            .map(m -> ((Map<?, ?>) m).keySet().stream().map(String::valueOf).toList())
            .orElse(List.of());
    List<String> header = new ArrayList<>(List.of("name"));
    keys.forEach(k -> header.add(label(k)));
    TextTable table = new TextTable(header);
    rows.forEach(
        (name, row) -> {
          List<String> cells = new ArrayList<>(List.of(String.valueOf(name)));
          if (row instanceof Map<?, ?> m) {
            m.values().forEach(v -> cells.add(plain(v)));
          }
          table.add(cells);
        });
    return table.toString();
  }

  private static String plain(@Nullable Object value) {
    if (value instanceof Double d && d == Math.rint(d) && Math.abs(d) < 1e9) {
      return Long.toString(d.longValue());
    }
    return String.valueOf(value);
  }
}
