package nightjar.storage;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.StringReader;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Consumer;
import nightjar.refusal.NearestName;
import nightjar.refusal.RefusedInput;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;

/**
 * A table as text: a header line, then one row a line, separated by tabs where the header line has
 * one, else by commas. Cells may be in quotation marks, which do not reach over the end of a line;
 * blanks around a cell are dropped, and lines without content are passed over.
 */
final class DelimitedText {
  private static final int MOST_MEGABYTES = 50;
  private static final int MOST_COLUMNS = 1000;

  /**
   * One row of cells, as many as there are columns.
   *
   * @param line line in the file, from 1
   */
  record Row(int line, List<String> cells) {}

  private final Path file;
  private final String text;
  private final char delimiter;
  private final int headerLine;
  private final List<String> columns;

  /**
   * Reads the text and its header line.
   *
   * @throws RefusedInput if the file cannot be read as text, or its header line is at fault
   */
  DelimitedText(Path file) {
    this.file = file;
    this.text = WholeText.read(file, MOST_MEGABYTES);
    long blankLines = text.lines().takeWhile(String::isBlank).count();
    String header = text.lines().skip(blankLines).findFirst().orElseThrow();
    this.headerLine = (int) blankLines + 1;
    this.delimiter = header.indexOf('\t') >= 0 ? '\t' : ',';
    if (header.indexOf(delimiter) < 0 && header.indexOf(';') >= 0) {
      throw refusal("the columns are separated by semicolons", headerLine)
          .found(WholeText.shown(header))
          .expected("tabs or commas")
          .remedy("save the table with tabs or commas, and numbers with a decimal point");
    }
    this.columns = cells(header, headerLine);
    checkColumns();
  }

  /** Names of the columns. */
  List<String> columns() {
    return columns;
  }

  /** Line of the header, from 1. */
  int headerLine() {
    return headerLine;
  }

  /** Begins a refusal that names the file and a line. */
  RefusedInput refusal(String what, int line) {
    return WholeText.refusal(file, what).at("line " + line);
  }

  /** The name of the file. */
  String fileName() {
    return WholeText.name(file);
  }

  /** Hands out the rows in the file's order. */
  void forEachRow(Consumer<Row> action) {
    BufferedReader lines = new BufferedReader(new StringReader(text));
    try {
      int number = 0;
      for (String line = lines.readLine(); line != null; line = lines.readLine()) {
        number++;
        if (number > headerLine && !line.isBlank()) {
          row(line, number, action);
        }
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private void row(String line, int number, Consumer<Row> action) {
    List<String> cells = cells(line, number);
    if (cells.stream().allMatch(String::isEmpty)) {
      return;
    }
    if (cells.size() != columns.size()) {
      throw refusal("the line does not fit the header line", number)
          .found(cells.size() + (cells.size() == 1 ? " cell" : " cells"))
          .expected(columns.size() + (columns.size() == 1 ? " cell" : " cells"))
          .remedy("give each column one cell, n/a where a value is missing");
    }
    action.accept(new Row(number, cells));
  }

  private List<String> cells(String line, int number) {
    if (line.chars().filter(c -> c == delimiter).count() >= MOST_COLUMNS) {
      throw refusal("the line has too many cells", number)
          .expected("at most " + MOST_COLUMNS)
          .remedy("leave columns out");
    }
    return line.indexOf('"') < 0 ? split(line) : unquoted(line, number);
  }

  private List<String> split(String line) {
    List<String> cells = new ArrayList<>();
    int from = 0;
    for (int to = line.indexOf(delimiter); to >= 0; to = line.indexOf(delimiter, from)) {
      cells.add(line.substring(from, to).strip());
      from = to + 1;
    }
    cells.add(line.substring(from).strip());
    return cells;
  }

  private List<String> unquoted(String line, int number) {
    CSVFormat format =
        CSVFormat.DEFAULT.builder().setDelimiter(delimiter).setIgnoreSurroundingSpaces(true).get();
    try (CSVParser parser = CSVParser.parse(line, format)) {
      List<CSVRecord> records = parser.getRecords();
      return Arrays.stream(records.get(0).values()).map(String::strip).toList();
    } catch (IOException | UncheckedIOException e) {
      throw refusal("the quotation marks are not in pairs around a cell", number)
          .found(WholeText.shown(line))
          .remedy("remove them or write two where one is meant");
    }
  }

  private void checkColumns() {
    Set<String> seen = new HashSet<>();
    for (String name : columns) {
      checkVisible(name, "the name of a column", headerLine);
      if (!name.isEmpty() && !seen.add(name)) {
        throw refusal("two columns have the same name", headerLine)
            .found(WholeText.shown(name))
            .remedy("rename one of them");
      }
    }
  }

  /** Refuses a name with a character that people cannot see. */
  void checkVisible(String name, String what, int line) {
    if (!name.codePoints().allMatch(WholeText::isVisible)) {
      throw refusal(what + " contains a control character", line)
          .found(WholeText.shown(name))
          .remedy("remove the character");
    }
  }

  /**
   * Position of a column that must be there.
   *
   * @param wanted all columns that must be there
   * @throws RefusedInput naming the present column with the most similar name
   */
  int required(String name, List<String> wanted) {
    int position = columns.indexOf(name);
    if (position >= 0) {
      return position;
    }
    String all = String.join(", ", wanted);
    List<String> others =
        columns.stream().filter(c -> !c.isEmpty() && !wanted.contains(c)).toList();
    RefusedInput refusal = refusal("the column " + name + " is missing", headerLine).expected(all);
    Optional<String> nearest = NearestName.of(name, others).map(WholeText::shown);
    if (nearest.isEmpty()) {
      return refuse(refusal.remedy("add the column, or the header line if there is none"));
    }
    return refuse(
        refusal
            .found("as the nearest " + nearest.get())
            .remedy("rename that column to " + name + ", or add a column " + name));
  }

  private static int refuse(RefusedInput refusal) {
    throw refusal;
  }

  /**
   * The number in a cell.
   *
   * @param what the quantity, such as "the onset"
   * @throws RefusedInput if it is not a finite decimal number
   */
  double number(Row row, int column, String what) {
    String cell = row.cells().get(column);
    double value = Decimal.parse(cell);
    if (Double.isFinite(value)) {
      return value;
    }
    String fault = Decimal.isInfiniteOrNaN(cell) ? " is not a finite number" : " is not a number";
    throw refusal(what + fault, row.line())
        .found(WholeText.shown(cell))
        .remedy("write a number such as 12.5, with a decimal point");
  }

  /** Whether a cell says that its value is missing. */
  static boolean isMissing(String cell) {
    return cell.isEmpty() || cell.equals("n/a");
  }
}
