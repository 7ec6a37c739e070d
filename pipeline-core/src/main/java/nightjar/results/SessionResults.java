package nightjar.results;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import nightjar.recording.Grid;
import nightjar.storage.CsvFile;
import nightjar.storage.GridFile;
import nightjar.storage.ResultFolder;

/** Writes the maps, tables and summary of a session into a folder. */
public final class SessionResults {
  private SessionResults() {}

  /** Writes every file of this package but {@code run.json}, which is known last. */
  public static void write(Findings f, ResultFolder folder) {
    Grid grid = f.provenance().grid();
    GridFile.write(
        folder.file(MapsFile.NAME),
        grid,
        MapsFile.dimensions(f.maps()),
        MapsFile.variables(f.maps()),
        MapsFile.attributes(f.provenance()));
    CsvFile.write(
        folder.file(RegionContrastsFile.NAME), RegionContrastsFile.table(f.regions().contrasts()));
    CsvFile.write(
        folder.file(RegionTimecoursesFile.NAME),
        RegionTimecoursesFile.table(f.regions(), f.frames().kept()));
    CsvFile.write(
        folder.file(RegionResponsesFile.NAME),
        RegionResponsesFile.table(f.regions().responses().bins()));
    CsvFile.write(
        folder.file(RegionTrialsFile.NAME),
        RegionTrialsFile.table(f.regions().responses().trials()));
    CsvFile.write(folder.file(DesignFile.NAME), DesignFile.table(f.frames()));
    CsvFile.write(
        folder.file(FramesFile.NAME), FramesFile.table(f.frames(), f.maps().order(), grid));
    CsvFile.write(folder.file(MotionFile.NAME), MotionFile.table(f.frames()));
    writeText(folder, SummaryFile.NAME, SummaryFile.text(f));
  }

  /** Writes a text file in UTF-8. */
  public static void writeText(ResultFolder folder, String name, String text) {
    try {
      Files.writeString(folder.file(name), text);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
