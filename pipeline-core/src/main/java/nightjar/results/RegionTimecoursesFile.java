package nightjar.results;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import nightjar.recording.KeptFrames;
import nightjar.recording.Region;
import nightjar.recording.Table;
import nightjar.regions.RegionFits;
import org.jspecify.annotations.Nullable;

/**
 * {@code region_timecourses.csv}: region means in percent, drift and nuisance removed; empty at
 * rejected frames and for regions without voxels.
 */
public final class RegionTimecoursesFile {
  /** Name in the result folder. */
  public static final String NAME = "region_timecourses.csv";

  private RegionTimecoursesFile() {}

  /** The file's table. */
  public static Table table(RegionFindings regions, KeptFrames kept) {
    List<String> names = regions.labels().regions().stream().map(Region::name).toList();
    List<String> columns = new ArrayList<>(List.of("frame", "time_s", "kept"));
    columns.addAll(names);
    double[][] courses = regions.fits().timeCourses();
    int[] position = positions(regions.fits(), names);
    List<List<@Nullable Object>> rows = new ArrayList<>();
    int row = 0;
    for (int t = 0; t < kept.frames(); t++) {
      List<@Nullable Object> cells = new ArrayList<>();
      cells.add(t);
      cells.add(kept.times().at(t));
      cells.add(kept.isKept(t));
      for (int r : position) {
        cells.add(kept.isKept(t) && r >= 0 ? (Object) courses[r][row] : null);
      }
      rows.add(cells);
      row += kept.isKept(t) ? 1 : 0;
    }
    return new Table(columns, rows);
  }

  private static int[] positions(RegionFits fits, List<String> names) {
    List<String> fitted = IntStream.range(0, fits.size()).mapToObj(fits::name).toList();
    return names.stream().mapToInt(fitted::indexOf).toArray();
  }
}
