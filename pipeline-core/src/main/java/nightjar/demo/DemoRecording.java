package nightjar.demo;

import java.nio.file.Path;
import java.util.Arrays;
import java.util.Map;
import java.util.function.IntToDoubleFunction;
import java.util.stream.IntStream;
import nightjar.recording.Axis;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.PlaneOffsets;
import nightjar.recording.Region;
import nightjar.recording.RegionLabels;
import nightjar.recording.SessionMetadata;
import nightjar.storage.RecordingHeader;
import nightjar.storage.RecordingWriter;

/** Streams a session's frames into its recording. */
final class DemoRecording {
  /** Packed power reaches 65 times that of tissue; flashes on the brightest vessels stay below. */
  private static final double PACKED_STEP = 0.002;

  private DemoRecording() {}

  static void write(DemoSession session, DemoTruth truth, Path file) {
    FilmMaker maker = new FilmMaker(session, truth);
    RecordingHeader header = header(session);
    float[] frame = new float[header.grid().voxels()];
    try (RecordingWriter writer = RecordingWriter.create(file, header)) {
      while (maker.hasNext()) {
        maker.next(frame);
        writer.write(frame, 1);
      }
    }
  }

  private static RecordingHeader header(DemoSession session) {
    DemoScan scan = session.scan();
    Grid grid = grid(scan);
    return new RecordingHeader(
        grid,
        FrameTimes.of(values(scan.frames(), scan::frameSeconds)),
        PlaneOffsets.of(values(scan.planes(), p -> p * scan.sweepSeconds())),
        regions(scan, grid),
        new SessionMetadata(
            Map.of(
                "title",
                "Invented session " + session.name(),
                "study",
                DemoStudy.NAME,
                "animal",
                session.animal().name(),
                "cohort",
                session.animal().cohort())),
        PACKED_STEP);
  }

  private static Grid grid(DemoScan scan) {
    double step = scan.spacingMillimetres();
    return new Grid(
        axis(scan.planes(), p -> p * DemoScan.PLANE_SPACING_MILLIMETRES),
        axis(scan.depths(), z -> DemoScan.FIRST_DEPTH_MILLIMETRES + z * step),
        axis(scan.laterals(), x -> (x - 0.5 * (scan.laterals() - 1)) * step),
        scan.planes() > 1);
  }

  private static Axis axis(int size, IntToDoubleFunction place) {
    return Axis.of(values(size, place));
  }

  private static double[] values(int size, IntToDoubleFunction value) {
    return IntStream.range(0, size).mapToDouble(value).toArray();
  }

  /** The labelled discs, where the tissue lies that has not moved. */
  private static RegionLabels regions(DemoScan scan, Grid grid) {
    return new RegionLabels(
        Arrays.stream(DemoRegion.values())
            .map(
                r ->
                    new Region(
                        r.label(),
                        Mask.of(
                            grid.voxels(), v -> r.holds(grid.depthOf(v), grid.lateralOf(v), scan))))
            .toList());
  }
}
