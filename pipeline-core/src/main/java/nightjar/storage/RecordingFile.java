package nightjar.storage;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.TreeMap;
import nightjar.recording.FrameSource;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.RegionLabels;
import nightjar.recording.SessionMetadata;
import org.jspecify.annotations.Nullable;

/**
 * A recording in a NetCDF file (classic, 64-bit offset or netCDF-4), opened and checked. Everything
 * but the frames is read when it is opened. May be read by several threads at once.
 */
public final class RecordingFile implements FrameSource, AutoCloseable {
  private static final List<String> METADATA =
      List.of(
          "animal",
          "study",
          "cohort",
          "acquired",
          "ensemble_duration_s",
          "probe_frequency_mhz",
          "title");
  private static final String PLANE_OFFSET = "plane_time_offset";
  private static final int LONGEST_TEXT = 2000;

  private final Container container;
  private final StoredVariable frames;
  private final Packing packing;
  private final Grid grid;
  private final FrameTimes times;
  private final SessionMetadata metadata;
  private final @Nullable RegionLabels labels;
  private final @Nullable Mask brainMask;
  private final double @Nullable [] planeTimeOffsets;

  private RecordingFile(Container container, RecordingRequest request) {
    this.container = container;
    frames = MainVariable.find(container, request);
    packing = Packing.of(container, frames);
    List<StoredDimension> dimensions = frames.dimensions();
    grid = SpatialAxes.read(container, dimensions.subList(1, dimensions.size()));
    times = TimeAxis.read(container, dimensions.get(0), request.frameIntervalSeconds());
    metadata = metadata(container);
    labels =
        container
            .variable(LabelVariable.REGIONS)
            .map(v -> LabelVariable.regions(container, v, grid))
            .orElse(null);
    brainMask =
        container
            .variable(LabelVariable.BRAIN)
            .map(v -> LabelVariable.mask(container, v, grid))
            .orElse(null);
    planeTimeOffsets =
        container
            .variable(PLANE_OFFSET)
            .map(v -> planeTimeOffsets(container, v, grid))
            .orElse(null);
  }

  /**
   * Opens a recording and checks all of it but the frames' values.
   *
   * @throws nightjar.refusal.RefusedInput if the file is not a recording that can be read; says why
   *     and what to do
   */
  public static RecordingFile open(Path file, RecordingRequest request) {
    Container container = Container.open(file);
    try {
      return new RecordingFile(container, request);
    } catch (RuntimeException | Error e) {
      container.close();
      throw e;
    }
  }

  /** Last name of the file. */
  public String fileName() {
    return container.fileName();
  }

  /** Name of the variable that holds the frames. */
  public String variableName() {
    return frames.name();
  }

  /** "classic", "64-bit offset" or "netCDF-4". */
  public String formatName() {
    return container.formatName();
  }

  /** Type of the stored frames: "short", "int", "float" or "double". */
  public String valueType() {
    return frames.type().label();
  }

  @Override
  public Grid grid() {
    return grid;
  }

  @Override
  public FrameTimes times() {
    return times;
  }

  /** What the file says of the session. */
  public SessionMetadata metadata() {
    return metadata;
  }

  /** The regions of the variable {@code roi}. */
  public Optional<RegionLabels> labels() {
    return Optional.ofNullable(labels);
  }

  /** The voxels where the variable {@code brain_mask} is 1. */
  public Optional<Mask> brainMask() {
    return Optional.ofNullable(brainMask);
  }

  /** Acquisition time of each plane within the frame, s; zeros where the file says nothing. */
  public double[] planeTimeOffsetsSeconds() {
    return planeTimeOffsets == null ? new double[grid.planes().size()] : planeTimeOffsets.clone();
  }

  /** Whether the file gives the planes' acquisition times. */
  public boolean hasPlaneTimeOffsets() {
    return planeTimeOffsets != null;
  }

  /**
   * {@inheritDoc}
   *
   * @throws nightjar.refusal.RefusedInput if a compressed part of the file turns out to be damaged
   */
  @Override
  public void read(int first, int count, float[] into, int offset) {
    Objects.checkFromIndexSize(first, count, times.size());
    Objects.checkFromIndexSize(offset, (long) count * grid.voxels(), into.length);
    int[] at = {offset};
    container.read(
        frames,
        first,
        count,
        (primitives, from, n) -> {
          packing.toFloats(primitives, from, n, into, at[0]);
          at[0] += n;
        });
  }

  @Override
  public void close() {
    container.close();
  }

  private static SessionMetadata metadata(Container container) {
    Map<String, String> found = new TreeMap<>();
    for (String name : METADATA) {
      Attribute a = container.attributes().get(name);
      if (a != null && !a.display().isEmpty()) {
        String text = a.display().replaceAll("\\p{Cntrl}+", " ");
        found.put(name, text.substring(0, Math.min(LONGEST_TEXT, text.length())));
      }
    }
    return new SessionMetadata(found);
  }

  private static double[] planeTimeOffsets(Container container, StoredVariable v, Grid grid) {
    if (!grid.hasPlaneAxis()) {
      throw container
          .refusal(v, "the recording has times of planes but no planes")
          .remedy("leave the variable out or store the frames with the dimension plane");
    }
    return AxisValues.seconds(container, v, new StoredDimension("plane", grid.planes().size()));
  }
}
