package nightjar.design;

import java.util.ArrayList;
import java.util.List;
import java.util.function.ToDoubleFunction;
import nightjar.recording.FrameMotion;
import nightjar.recording.FrameTimes;
import nightjar.recording.NamedSeries;
import nightjar.recording.RigidMotion;

/**
 * Motion parameters as nuisance columns: position (mm, degrees), its square, its difference from
 * the frame before. Planes that were aligned by themselves share the mean over planes.
 */
public final class MotionColumns {
  private record Parameter(String name, ToDoubleFunction<RigidMotion> of) {}

  private static final List<Parameter> PARAMETERS =
      List.of(
          new Parameter("shift_depth", RigidMotion::shiftDepthMillimetres),
          new Parameter("shift_lateral", RigidMotion::shiftLateralMillimetres),
          new Parameter("shift_plane", RigidMotion::shiftPlaneMillimetres),
          new Parameter("rotation", RigidMotion::rotationDegrees),
          new Parameter("tilt_depth", RigidMotion::tiltDepthDegrees),
          new Parameter("tilt_lateral", RigidMotion::tiltLateralDegrees));

  private MotionColumns() {}

  /** The parameters that moved at all, one series each, in the order of design.csv. */
  public static List<NamedSeries> positions(FrameMotion motion) {
    List<NamedSeries> series = new ArrayList<>();
    for (Parameter p : PARAMETERS) {
      double[] values = new double[motion.frames()];
      boolean moved = false;
      for (int t = 0; t < values.length; t++) {
        for (int u = 0; u < motion.units(); u++) {
          values[t] += p.of.applyAsDouble(motion.at(t, u)) / motion.units();
        }
        moved |= values[t] != values[0];
      }
      if (moved) {
        series.add(new NamedSeries(p.name, values));
      }
    }
    return series;
  }

  /** The nuisance columns that the plan asks for. */
  public static List<NamedSeries> of(
      FrameMotion motion, FrameTimes times, NuisanceSettings settings) {
    List<NamedSeries> positions = positions(motion);
    List<NamedSeries> columns = new ArrayList<>();
    if (settings.motion().contains(NuisanceSettings.MotionColumns.POSITION)) {
      columns.addAll(positions);
    }
    if (settings.motion().contains(NuisanceSettings.MotionColumns.SQUARE)) {
      positions.forEach(s -> columns.add(square(s)));
    }
    if (settings.motion().contains(NuisanceSettings.MotionColumns.DIFFERENCE)) {
      positions.forEach(s -> columns.add(difference(s, times)));
    }
    return columns;
  }

  private static NamedSeries square(NamedSeries s) {
    double[] v = s.toArray();
    for (int t = 0; t < v.length; t++) {
      v[t] *= v[t];
    }
    return new NamedSeries("square:" + s.name(), v);
  }

  /** Zero at the first frame of a segment. */
  private static NamedSeries difference(NamedSeries s, FrameTimes times) {
    double[] v = new double[s.size()];
    for (int t = 1; t < v.length; t++) {
      v[t] = times.segment(t) == times.segment(t - 1) ? s.at(t) - s.at(t - 1) : 0;
    }
    return new NamedSeries("difference:" + s.name(), v);
  }
}
