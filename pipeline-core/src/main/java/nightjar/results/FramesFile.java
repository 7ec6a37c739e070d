package nightjar.results;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.ToDoubleFunction;
import nightjar.alignment.AlignmentSettings.Model;
import nightjar.recording.Grid;
import nightjar.recording.RigidMotion;
import nightjar.recording.Table;
import nightjar.recording.VoxelOrder;
import org.jspecify.annotations.Nullable;

/**
 * {@code frames.csv}: what became of every frame; motion is the mean over planes, weighted by their
 * mask voxels, and empty where nothing was aligned.
 */
public final class FramesFile {
  /** Name in the result folder. */
  public static final String NAME = "frames.csv";

  private static final List<String> COLUMNS =
      List.of(
          "frame",
          "time_s",
          "kept",
          "reason",
          "shift_depth_mm",
          "shift_lateral_mm",
          "rotation_deg",
          "displacement_mm",
          "log_power",
          "change");

  private final FrameFindings frames;
  private final double[] weights;

  private FramesFile(FrameFindings frames, double[] weights) {
    this.frames = frames;
    this.weights = weights;
  }

  /** The file's table. */
  public static Table table(FrameFindings frames, VoxelOrder mask, Grid grid) {
    int units = frames.motion().units();
    double[] weights = new double[units];
    for (int k = 0; k < mask.size(); k++) {
      weights[units == 1 ? 0 : grid.planeOf(mask.voxel(k))] += 1.0 / mask.size();
    }
    FramesFile f = new FramesFile(frames, weights);
    List<List<@Nullable Object>> rows = new ArrayList<>();
    for (int t = 0; t < frames.kept().frames(); t++) {
      rows.add(f.row(t));
    }
    return new Table(COLUMNS, rows);
  }

  private List<@Nullable Object> row(int t) {
    boolean moves = frames.alignment().model() != Model.NONE;
    boolean turns = frames.alignment().model() == Model.RIGID;
    double displacement = 0;
    for (int u = 0; u < weights.length; u++) {
      displacement += weights[u] * frames.motion().displacementMillimetres(t, u);
    }
    return Arrays.<@Nullable Object>asList(
        t,
        frames.kept().times().at(t),
        frames.kept().isKept(t),
        frames.kept().reason(t).orElse(null),
        moves ? mean(t, RigidMotion::shiftDepthMillimetres) : null,
        moves ? mean(t, RigidMotion::shiftLateralMillimetres) : null,
        turns ? mean(t, RigidMotion::rotationDegrees) : null,
        moves ? displacement : null,
        frames.judgement().logPower(t),
        frames.judgement().change(t));
  }

  private Double mean(int t, ToDoubleFunction<RigidMotion> parameter) {
    double sum = 0;
    for (int u = 0; u < weights.length; u++) {
      sum += weights[u] * parameter.applyAsDouble(frames.motion().at(t, u));
    }
    return sum;
  }
}
