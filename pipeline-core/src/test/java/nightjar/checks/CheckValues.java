package nightjar.checks;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/** Reads a CSV of check values from the test resources; lines with # name the source. */
public final class CheckValues {
  private CheckValues() {}

  /** One line of a table. */
  public record Row(Map<String, String> cells) {
    /** The cell as text. */
    public String text(String column) {
      return Objects.requireNonNull(cells.get(column), column);
    }

    /** The cell as a number. */
    public double number(String column) {
      return Double.parseDouble(text(column));
    }
  }

  /** The rows of {@code /nightjar/<resource>}. */
  public static List<Row> read(String resource) {
    try (InputStream in =
            Objects.requireNonNull(
                CheckValues.class.getResourceAsStream("/nightjar/" + resource), resource);
        BufferedReader lines =
            new BufferedReader(new InputStreamReader(in, StandardCharsets.UTF_8))) {
      List<String> data = lines.lines().filter(l -> !l.startsWith("#")).toList();
      String[] header = data.get(0).split(",", -1);
      List<Row> rows = new ArrayList<>();
      for (String line : data.subList(1, data.size())) {
        String[] cells = line.split(",", header.length);
        Map<String, String> row = new LinkedHashMap<>();
        for (int i = 0; i < cells.length; i++) {
          row.put(header[i], cells[i]);
        }
        rows.add(new Row(row));
      }
      return rows;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** One column as numbers. */
  public static double[] column(List<Row> rows, String name) {
    return rows.stream().mapToDouble(r -> r.number(name)).toArray();
  }
}
