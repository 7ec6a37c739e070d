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
 * Writes a neutral table as comma-separated text: UTF-8, LF, '.' decimal, the shortest digits that
 * give the number back, missing = empty field.
 */
public final class CsvFile {
  private static final CSVFormat FORMAT =
      CSVFormat.RFC4180.builder().setRecordSeparator('\n').get();

  private CsvFile() {}

  /** Writes {@code table} to {@code file}, replacing it. */
  public static void write(Path file, Table table) {
    try (BufferedWriter out = Files.newBufferedWriter(file);
        CSVPrinter csv = new CSVPrinter(out, FORMAT)) {
      csv.printRecord(table.columns());
      for (List<@Nullable Object> row : table.rows()) {
        csv.printRecord(row.stream().map(CsvFile::text));
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static String text(@Nullable Object cell) {
    if (cell == null
        || (cell instanceof Double d && d.isNaN())
        || (cell instanceof Float f && f.isNaN())) {
      return "";
    }
    if (cell instanceof Boolean b) {
      return b ? "1" : "0";
    }
    if (cell instanceof Double || cell instanceof Float) {
      String s = cell.toString();
      return s.endsWith(".0") ? s.substring(0, s.length() - 2) : s;
    }
    return cell.toString();
  }
}
