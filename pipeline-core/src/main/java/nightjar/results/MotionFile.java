package nightjar.results;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import nightjar.alignment.AlignmentSettings.Model;
import nightjar.recording.RigidMotion;
import nightjar.recording.Table;
import org.jspecify.annotations.Nullable;

/**
 * {@code motion.csv}: the motion of every frame and plane, or of every frame's whole volume; fields
 * that the alignment did not use are empty.
 */
public final class MotionFile {
  /** Name in the result folder. */
  public static final String NAME = "motion.csv";

  private static final List<String> COLUMNS =
      List.of(
          "frame",
          "plane",
          "shift_depth_mm",
          "shift_lateral_mm",
          "shift_plane_mm",
          "rotation_deg",
          "tilt_depth_deg",
          "tilt_lateral_deg",
          "displacement_mm");

  private MotionFile() {}

  /** The file's table. */
  public static Table table(FrameFindings frames) {
    boolean moves = frames.alignment().model() != Model.NONE;
    boolean turns = frames.alignment().model() == Model.RIGID;
    boolean volume = frames.motion().wholeVolume();
    List<List<@Nullable Object>> rows = new ArrayList<>();
    for (int t = 0; t < frames.motion().frames(); t++) {
      for (int u = 0; u < frames.motion().units(); u++) {
        RigidMotion m = frames.motion().at(t, u);
        rows.add(
            Arrays.<@Nullable Object>asList(
                t,
                volume ? null : (Object) u,
                moves ? (Object) m.shiftDepthMillimetres() : null,
                moves ? (Object) m.shiftLateralMillimetres() : null,
                moves && volume ? (Object) m.shiftPlaneMillimetres() : null,
                turns ? (Object) m.rotationDegrees() : null,
                turns && volume ? (Object) m.tiltDepthDegrees() : null,
                turns && volume ? (Object) m.tiltLateralDegrees() : null,
                moves ? (Object) frames.motion().displacementMillimetres(t, u) : null));
      }
    }
    return new Table(COLUMNS, rows);
  }
}
