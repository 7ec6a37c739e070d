package nightjar.cli;

import java.util.ArrayList;
import java.util.List;

/** Columns aligned with spaces: text to the left, numbers to the right. */
final class TextTable {
  private static final String GAP = "  ";

  private final List<List<String>> rows = new ArrayList<>();

  TextTable(List<String> header) {
    rows.add(List.copyOf(header));
  }

  void add(List<String> cells) {
    if (cells.size() != rows.get(0).size()) {
      throw new IllegalArgumentException(
          cells.size() + " cells for " + rows.get(0).size() + " columns");
    }
    rows.add(List.copyOf(cells));
  }

  @Override
  public String toString() {
    int columns = rows.get(0).size();
    int[] width = new int[columns];
    boolean[] numeric = new boolean[columns];
    for (int c = 0; c < columns; c++) {
      numeric[c] = true;
      for (int r = 0; r < rows.size(); r++) {
        String cell = rows.get(r).get(c);
        width[c] = Math.max(width[c], cell.length());
        numeric[c] &= r == 0 || cell.isEmpty() || cell.matches("[-+0-9][-+0-9.e]*( to .*)?");
      }
    }
    StringBuilder text = new StringBuilder();
    for (List<String> row : rows) {
      StringBuilder line = new StringBuilder();
      for (int c = 0; c < columns; c++) {
        String pad = " ".repeat(width[c] - row.get(c).length());
        line.append(c > 0 ? GAP : "").append(numeric[c] ? pad + row.get(c) : row.get(c) + pad);
      }
      text.append(line.toString().stripTrailing()).append('\n');
    }
    return text.toString();
  }
}
