package nightjar.screening;

import java.util.function.ToDoubleFunction;
import java.util.stream.IntStream;
import nightjar.numeric.Median;
import nightjar.recording.FrameMotion;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.RigidMotion;

/**
 * How far frames lie from the median position: every parameter of the motion at its median over the
 * frames. Rotations are taken to first order about the centre of the field; the order in which they
 * are applied then does not matter.
 */
final class MedianPosition {
  /** Places of the mask that a displacement is averaged over. */
  private static final int PLACES = 400;

  private MedianPosition() {}

  /** Mean displacement over the mask from the median position, mm, per frame, of one unit. */
  static double[] distances(FrameMotion motion, int unit, Grid grid, Mask mask) {
    int[] inside =
        IntStream.range(0, mask.size())
            .filter(v -> mask.contains(v) && (motion.wholeVolume() || grid.planeOf(v) == unit))
            .toArray();
    int[] voxels = IntStream.of(EvenSample.of(inside.length, PLACES)).map(i -> inside[i]).toArray();
    RigidMotion median = median(motion, unit);
    double[] distance = new double[motion.frames()];
    for (int t = 0; t < distance.length; t++) {
      RigidMotion off = minus(motion.at(t, unit), median);
      double sum = 0;
      for (int v : voxels) {
        sum += length(off, grid, v);
      }
      distance[t] = voxels.length == 0 ? 0 : sum / voxels.length;
    }
    return distance;
  }

  private static double length(RigidMotion m, Grid grid, int v) {
    double p = fromCentre(grid.planes(), grid.planeOf(v));
    double z = fromCentre(grid.depths(), grid.depthOf(v));
    double x = fromCentre(grid.laterals(), grid.lateralOf(v));
    double turn = Math.toRadians(m.rotationDegrees());
    double tiltDepth = Math.toRadians(m.tiltDepthDegrees());
    double tiltLateral = Math.toRadians(m.tiltLateralDegrees());
    double dp = m.shiftPlaneMillimetres() - tiltDepth * z - tiltLateral * x;
    double dz = m.shiftDepthMillimetres() - turn * x + tiltDepth * p;
    double dx = m.shiftLateralMillimetres() + turn * z + tiltLateral * p;
    return Math.sqrt(dp * dp + dz * dz + dx * dx);
  }

  private static double fromCentre(nightjar.recording.Axis axis, int i) {
    return axis.at(i) - 0.5 * (axis.at(0) + axis.at(axis.size() - 1));
  }

  private static RigidMotion median(FrameMotion motion, int unit) {
    return new RigidMotion(
        median(motion, unit, RigidMotion::shiftDepthMillimetres),
        median(motion, unit, RigidMotion::shiftLateralMillimetres),
        median(motion, unit, RigidMotion::shiftPlaneMillimetres),
        median(motion, unit, RigidMotion::rotationDegrees),
        median(motion, unit, RigidMotion::tiltDepthDegrees),
        median(motion, unit, RigidMotion::tiltLateralDegrees));
  }

  private static double median(
      FrameMotion motion, int unit, ToDoubleFunction<RigidMotion> parameter) {
    return Median.of(
        IntStream.range(0, motion.frames())
            .mapToDouble(t -> parameter.applyAsDouble(motion.at(t, unit)))
            .toArray());
  }

  private static RigidMotion minus(RigidMotion a, RigidMotion b) {
    return new RigidMotion(
        a.shiftDepthMillimetres() - b.shiftDepthMillimetres(),
        a.shiftLateralMillimetres() - b.shiftLateralMillimetres(),
        a.shiftPlaneMillimetres() - b.shiftPlaneMillimetres(),
        a.rotationDegrees() - b.rotationDegrees(),
        a.tiltDepthDegrees() - b.tiltDepthDegrees(),
        a.tiltLateralDegrees() - b.tiltLateralDegrees());
  }
}
