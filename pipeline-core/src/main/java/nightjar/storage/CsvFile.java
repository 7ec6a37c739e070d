package nightjar.storage;

import java.io.BufferedWriter;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import nightjar.recording.Table;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVPrinter;
import org.jspecify.annotations.Nullable;

/**
 * Writes a neutral table as comma-separated text: UTF-8, LF, '.' decimal, numbers rounded to the
 * fewest digits that read back as the same number, missing = empty field, quotation marks where RFC
 * 4180 needs them.
 */
public final class CsvFile {
  private static final CSVFormat FORMAT =
      CSVFormat.RFC4180.builder().setRecordSeparator('\n').get();

  private CsvFile() {}

  /**
   * Writes {@code table} to {@code file}, replacing it.
   *
   * @throws IllegalArgumentException if a row is not as long as the header
   */
  public static void write(Path file, Table table) {
    try (BufferedWriter out = Files.newBufferedWriter(file);
        CSVPrinter csv = new CSVPrinter(out, FORMAT)) {
      csv.printRecord(table.columns());
      for (List<@Nullable Object> row : table.rows()) {
        if (row.size() != table.columns().size()) {
          throw new IllegalArgumentException(row + " under the header " + table.columns());
        }
        csv.printRecord(row.stream().map(CsvFile::text));
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** Null for an empty field: an empty text would be put in quotation marks at a line's start. */
  private static @Nullable String text(@Nullable Object cell) {
    if (cell == null || cell.equals("")) {
      return null;
    } else if (cell instanceof Boolean b) {
      return b ? "1" : "0";
    } else if (cell instanceof Double d) {
      return d.isNaN() ? null : ShortestDecimal.of(d);
    } else if (cell instanceof Float f) {
      return f.isNaN() ? null : ShortestDecimal.of(f);
    }
    return cell.toString();
  }
}
