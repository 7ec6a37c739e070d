package nightjar.storage;

import java.nio.file.Path;
import java.util.Map;
import nightjar.recording.Axis;
import nightjar.recording.Grid;
import nightjar.recording.RegionLabels;

/** A NetCDF file of its own with the variable {@code roi} on the grid of a recording. */
public final class LabelFile {
  /** Coordinates may differ from the recording's by this share of a step. */
  private static final double PLACE_TOLERANCE = 0.01;

  private LabelFile() {}

  /**
   * Reads the regions of a label file.
   *
   * @param file the label file
   * @param grid the grid of the recording
   * @param recordingName the recording's file name, for refusals
   * @throws nightjar.refusal.RefusedInput if the file cannot be read, has no labels, or is on
   *     another grid: other sizes, or coordinates (where it has any) that differ by more than a
   *     hundredth of a step
   */
  public static RegionLabels read(Path file, Grid grid, String recordingName) {
    try (Container container = Container.open(file)) {
      StoredVariable labels =
          container
              .variable(LabelVariable.REGIONS)
              .orElseThrow(
                  () ->
                      container
                          .refusal("the file has no labels")
                          .at("variable " + LabelVariable.REGIONS)
                          .remedy("store the labels under that name"));
      RegionLabels regions = LabelVariable.regions(container, labels, grid);
      for (StoredDimension d : labels.dimensions()) {
        checkCoordinates(container, d, axes(grid).get(d.name()), recordingName);
      }
      return regions;
    }
  }

  private static Map<String, Axis> axes(Grid grid) {
    return Map.of("plane", grid.planes(), "depth", grid.depths(), "lateral", grid.laterals());
  }

  private static void checkCoordinates(
      Container container,
      StoredDimension d,
      @org.jspecify.annotations.Nullable Axis axis,
      String recordingName) {
    StoredVariable v = container.variable(d.name()).orElse(null);
    if (v == null || axis == null) {
      return;
    }
    double[] mm = AxisValues.millimetres(container, v, d);
    double largest = PLACE_TOLERANCE * (mm.length == 1 ? 1 : axis.spacingMillimetres());
    for (int i = 0; i < mm.length; i++) {
      if (!(Math.abs(mm[i] - axis.at(i)) <= largest)) {
        throw container
            .refusal(v, "the labels are on another grid than " + recordingName + ", position " + i)
            .found(AxisValues.shown(mm[i]) + " mm")
            .expected(AxisValues.shown(axis.at(i)) + " mm")
            .remedy("draw them on the grid of the recording");
      }
    }
  }
}
