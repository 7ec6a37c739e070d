package nightjar.analysis;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.stream.Collectors;
import nightjar.demo.DemoFiles;
import nightjar.demo.DemoStudy;
import nightjar.film.Scratch;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.PlaneOffsets;
import nightjar.recording.RegionLabels;
import nightjar.storage.RecordingFile;
import nightjar.storage.RecordingHeader;
import nightjar.storage.RecordingRequest;
import nightjar.storage.RecordingWriter;
import ucar.nc2.NetcdfFile;

/** The small synthetic session and variants of it, analysed in a folder of the test. */
final class SmallSession {
  static final double STEP = 0.002;

  private final Path folder;
  private final DemoFiles files;
  private int runs;

  SmallSession(Path folder) {
    this.folder = folder;
    this.files = DemoStudy.smallSession().writeTo(folder);
  }

  DemoFiles files() {
    return files;
  }

  /** Changes a frame before it is written again. */
  interface Change {
    float[] of(float[] frame);
  }

  /** Writes the recording again with changed frames, times later and another unit of power. */
  Path variant(String name, Change change, double laterSeconds, double unit) {
    Path out = folder.resolve(name + ".nc");
    try (RecordingFile r = RecordingFile.open(files.recording(), RecordingRequest.DEFAULT)) {
      double[] times = Arrays.stream(r.times().toArray()).map(t -> t + laterSeconds).toArray();
      Grid grid = r.grid();
      RecordingHeader header =
          new RecordingHeader(
              grid,
              FrameTimes.of(times),
              PlaneOffsets.of(0),
              r.labels().orElse(RegionLabels.NONE),
              r.metadata(),
              STEP * unit);
      float[] frame = new float[grid.voxels()];
      try (RecordingWriter w = RecordingWriter.create(out, header)) {
        for (int t = 0; t < times.length; t++) {
          r.read(t, 1, frame, 0);
          float[] changed = change.of(frame.clone());
          for (int v = 0; v < changed.length; v++) {
            changed[v] *= (float) unit;
          }
          w.write(changed, 1);
        }
      }
    }
    return out;
  }

  /** The event table with every onset later. */
  Path eventsLater(double seconds) {
    try {
      String text =
          Files.readAllLines(files.events()).stream()
              .map(
                  line -> {
                    String[] cells = line.split("\t", 2);
                    return cells[0].equals("onset")
                        ? line
                        : (Double.parseDouble(cells[0]) + seconds) + "\t" + cells[1];
                  })
              .collect(Collectors.joining("\n", "", "\n"));
      return Files.writeString(folder.resolve("later_events.tsv"), text);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  Path plan(String extra) {
    try {
      return Files.writeString(
          folder.resolve("plan" + runs + ".yaml"),
          "name: small\n"
              + extra
              + "\ncontrasts:\n"
              + "  - {name: left_over_sham, weights: {left_puff: 1, sham_puff: -1}}\n"
              + "  - {name: left_over_right, weights: {left_puff: 1, right_puff: -1}}\n");
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** Analyses; the result folder. */
  Path analyse(Path recording, Path events, Path plan, int threads) {
    Path out = folder.resolve("out" + runs++);
    SessionAnalysis.run(
        new SessionFiles(recording, events, plan, null, null),
        out,
        new RunSettings(threads, new Scratch(folder, 1 << 28)),
        StageListener.SILENT);
    return out;
  }

  /** A variable of maps.nc as doubles, the fill value as NaN. */
  static double[] map(Path out, String name) {
    try (NetcdfFile f = NetcdfFile.open(out.resolve("maps.nc").toString())) {
      ucar.nc2.Variable v = f.findVariable(name);
      if (v == null) {
        throw new IllegalArgumentException("maps.nc lacks " + name);
      }
      double[] values = (double[]) v.read().get1DJavaArray(double.class);
      return Arrays.stream(values).map(x -> x > 9e36 ? Double.NaN : x).toArray();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
