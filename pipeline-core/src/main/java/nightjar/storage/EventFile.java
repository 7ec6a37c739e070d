package nightjar.storage;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import nightjar.recording.EventTable;
import nightjar.recording.Trial;
import nightjar.refusal.RefusedInput;
import org.jspecify.annotations.Nullable;

/**
 * An event table: the columns {@code onset} and {@code duration} (s) and {@code trial_type} of the
 * BIDS standard's {@code events.tsv}, separated by tabs or commas; optionally {@code block} (text)
 * and further numeric columns.
 */
public final class EventFile {
  private static final String ONSET = "onset";
  private static final String DURATION = "duration";
  private static final String STIMULUS = "trial_type";
  private static final String BLOCK = "block";
  private static final List<String> REQUIRED = List.of(ONSET, DURATION, STIMULUS);
  private static final int MOST_TRIALS = 100_000;

  private final DelimitedText text;
  private final int onset;
  private final int duration;
  private final int stimulus;
  private final int block;

  private EventFile(DelimitedText text) {
    this.text = text;
    this.onset = text.required(ONSET, REQUIRED);
    this.duration = text.required(DURATION, REQUIRED);
    this.stimulus = text.required(STIMULUS, REQUIRED);
    this.block = text.columns().indexOf(BLOCK);
  }

  /**
   * Reads an event table.
   *
   * <p>A further column becomes a value of each trial if all its cells are numbers or missing
   * ({@code n/a} or empty, read as NaN) and at least one is a number; other columns are left out.
   *
   * @throws RefusedInput if the file cannot be read (missing, over 50 MB, not UTF-8, empty), lacks
   *     a required column, has a line of another length than the header, an onset or duration that
   *     is no finite number, a negative duration, a trial without stimulus, a name with a control
   *     character, no trial or more than 100 000
   */
  public static EventTable read(Path file) {
    DelimitedText text = new DelimitedText(file);
    return new EventTable(text.fileName(), new EventFile(text).trials());
  }

  private List<Trial> trials() {
    List<DelimitedText.Row> rows = new ArrayList<>();
    text.forEachRow(
        row -> {
          if (rows.size() == MOST_TRIALS) {
            throw text.refusal("there are too many trials", row.line())
                .expected("at most " + MOST_TRIALS)
                .remedy("check that it is an event table");
          }
          rows.add(row);
        });
    if (rows.isEmpty()) {
      throw text.refusal("there is no trial below the header", text.headerLine())
          .found("0 trials")
          .remedy("export the table again");
    }
    Map<String, Integer> further = furtherColumns(rows);
    return rows.stream().map(row -> trial(row, further)).toList();
  }

  private Map<String, Integer> furtherColumns(List<DelimitedText.Row> rows) {
    Map<String, Integer> further = new LinkedHashMap<>();
    for (int c = 0; c < text.columns().size(); c++) {
      String name = text.columns().get(c);
      if (!name.isEmpty() && !REQUIRED.contains(name) && c != block && isNumeric(c, rows)) {
        further.put(name, c);
      }
    }
    return further;
  }

  private static boolean isNumeric(int column, List<DelimitedText.Row> rows) {
    boolean anyNumber = false;
    for (DelimitedText.Row row : rows) {
      String cell = row.cells().get(column);
      if (!DelimitedText.isMissing(cell)) {
        if (!Double.isFinite(Decimal.parse(cell))) {
          return false;
        }
        anyNumber = true;
      }
    }
    return anyNumber;
  }

  private Trial trial(DelimitedText.Row row, Map<String, Integer> further) {
    Map<String, Double> values = new LinkedHashMap<>();
    // The parser of numbers gives NaN for missing cells, and the columns have no other fault.
    further.forEach((name, c) -> values.put(name, Decimal.parse(row.cells().get(c))));
    return new Trial(
        stimulus(row),
        text.number(row, onset, "the onset"),
        duration(row),
        block(row),
        values,
        row.line());
  }

  private String stimulus(DelimitedText.Row row) {
    String name = row.cells().get(stimulus);
    if (DelimitedText.isMissing(name)) {
      throw text.refusal("the trial has no stimulus in the column " + STIMULUS, row.line())
          .found(WholeText.shown(name))
          .remedy("name the stimulus or delete the line");
    }
    text.checkVisible(name, "the name of the stimulus", row.line());
    return name;
  }

  private double duration(DelimitedText.Row row) {
    double seconds = text.number(row, duration, "the duration");
    if (seconds < 0) {
      throw text.refusal("the duration is negative", row.line())
          .found(row.cells().get(duration) + " s")
          .remedy("write the seconds that the stimulus lasted, 0 for an impulse");
    }
    return seconds;
  }

  private @Nullable String block(DelimitedText.Row row) {
    if (block < 0 || DelimitedText.isMissing(row.cells().get(block))) {
      return null;
    }
    text.checkVisible(row.cells().get(block), "the name of the block", row.line());
    return row.cells().get(block);
  }
}
