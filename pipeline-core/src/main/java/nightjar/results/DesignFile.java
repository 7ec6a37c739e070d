package nightjar.results;

import java.util.ArrayList;
import java.util.List;
import nightjar.design.DesignColumn;
import nightjar.recording.KeptFrames;
import nightjar.recording.Table;
import org.jspecify.annotations.Nullable;

/**
 * {@code design.csv}: the matrix as fitted, every frame; a row a plane as well where planes have
 * their own times.
 */
public final class DesignFile {
  /** Name in the result folder. */
  public static final String NAME = "design.csv";

  private DesignFile() {}

  /** The file's table. */
  public static Table table(FrameFindings frames) {
    boolean swept = frames.design().isSwept();
    List<String> columns = new ArrayList<>(List.of("frame"));
    if (swept) {
      columns.add("plane");
    }
    columns.addAll(List.of("time_s", "kept"));
    columns.addAll(frames.design().ofPlane(0).names());
    KeptFrames kept = frames.kept();
    List<List<@Nullable Object>> rows = new ArrayList<>();
    for (int t = 0; t < kept.frames(); t++) {
      for (int p = 0; p < frames.design().planes().size(); p++) {
        List<@Nullable Object> cells = new ArrayList<>(columns.size());
        cells.add(t);
        if (swept) {
          cells.add(p);
        }
        cells.add(kept.times().at(t) + frames.offsets().seconds(p));
        cells.add(kept.isKept(t));
        for (DesignColumn c : frames.design().ofPlane(p).columns()) {
          cells.add(c.at(t));
        }
        rows.add(cells);
      }
    }
    return new Table(columns, rows);
  }
}
