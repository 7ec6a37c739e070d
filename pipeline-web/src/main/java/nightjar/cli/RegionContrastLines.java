package nightjar.cli;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import nightjar.recording.Table;
import org.jspecify.annotations.Nullable;

/** The region contrasts in short, for reading. */
final class RegionContrastLines {
  private RegionContrastLines() {}

  static String of(Table contrasts) {
    TextTable text =
        new TextTable(
            List.of("region", "voxels", "contrast", "effect %", "95 % interval", "t", "q"));
    for (List<@Nullable Object> row : contrasts.rows()) {
      List<String> cells = new ArrayList<>();
      cells.add(String.valueOf(cell(contrasts, row, "region")));
      cells.add(String.valueOf(cell(contrasts, row, "voxels")));
      cells.add(String.valueOf(cell(contrasts, row, "contrast")));
      cells.add(number(cell(contrasts, row, "effect_percent"), "%.2f"));
      String low = number(cell(contrasts, row, "ci_low_percent"), "%.2f");
      String high = number(cell(contrasts, row, "ci_high_percent"), "%.2f");
      cells.add(low.isEmpty() ? "" : low + " to " + high);
      cells.add(number(cell(contrasts, row, "t"), "%.2f"));
      cells.add(number(cell(contrasts, row, "q"), "%.2g"));
      text.add(cells);
    }
    return text.toString();
  }

  private static @Nullable Object cell(Table table, List<@Nullable Object> row, String column) {
    return row.get(table.columns().indexOf(column));
  }

  private static String number(@Nullable Object value, String format) {
    if (!(value instanceof Double d) || d.isNaN()) {
      return "";
    }
    return format.endsWith("g") ? small(d) : String.format(Locale.ROOT, format, d);
  }

  private static String small(double q) {
    return q >= 0.001
        ? String.format(Locale.ROOT, "%.3f", q)
        : String.format(Locale.ROOT, "%.1e", q);
  }
}
