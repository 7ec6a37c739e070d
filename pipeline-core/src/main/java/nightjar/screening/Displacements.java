package nightjar.screening;

import java.util.function.ToDoubleFunction;
import nightjar.recording.FrameMotion;
import nightjar.recording.Grid;
import nightjar.recording.RigidMotion;

/**
 * How far each frame lies from the median position of its plane (or volume), mm: shifts, and the
 * turn as the path of a voxel at the root mean square distance from the field's centre.
 */
final class Displacements {
  private final FrameMotion motion;

  private Displacements(FrameMotion motion) {
    this.motion = motion;
  }

  /** The largest over planes, one a frame. */
  static double[] of(FrameMotion motion, Grid grid) {
    Displacements d = new Displacements(motion);
    double depth = grid.depths().size() * grid.depths().spacingMillimetres();
    double lateral = grid.laterals().size() * grid.laterals().spacingMillimetres();
    double turning = Math.toRadians(Math.sqrt((depth * depth + lateral * lateral) / 12));
    double[] largest = new double[motion.frames()];
    for (int u = 0; u < motion.units(); u++) {
      double[] squares = new double[largest.length];
      d.add(squares, u, RigidMotion::shiftDepthMillimetres);
      d.add(squares, u, RigidMotion::shiftLateralMillimetres);
      d.add(squares, u, RigidMotion::shiftPlaneMillimetres);
      d.add(squares, u, m -> turning * m.rotationDegrees());
      for (int t = 0; t < largest.length; t++) {
        largest[t] = Math.max(largest[t], Math.sqrt(squares[t]));
      }
    }
    return largest;
  }

  private void add(double[] squares, int unit, ToDoubleFunction<RigidMotion> parameter) {
    double[] x = new double[squares.length];
    for (int t = 0; t < x.length; t++) {
      x[t] = parameter.applyAsDouble(motion.at(t, unit));
    }
    double median = ModifiedZ.median(x);
    for (int t = 0; t < x.length; t++) {
      squares[t] += (x[t] - median) * (x[t] - median);
    }
  }
}
