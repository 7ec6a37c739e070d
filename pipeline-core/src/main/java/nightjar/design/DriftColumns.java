package nightjar.design;

import java.util.ArrayList;
import java.util.List;
import nightjar.recording.FrameTimes;

/**
 * Cosine drift over recorded time (numerics section 7): {@code cos(pi k u / L)} for k = 1..floor(2
 * L / cutoff), the discrete cosine transform's basis [Ahmed, Natarajan & Rao 1974, IEEE Trans
 * Comput C-23:90] on the frames' own times.
 */
final class DriftColumns {
  private DriftColumns() {}

  /** Number of columns for a recording of {@code lengthSeconds}. */
  static int count(double lengthSeconds, DriftSettings settings) {
    return (int) Math.floor(2 * lengthSeconds / settings.cutoffSeconds());
  }

  /** The columns slow_1.., at the frames' recorded time plus {@code offsetSeconds}. */
  static List<DesignColumn> of(FrameTimes times, DriftSettings settings, double offsetSeconds) {
    double length = times.recordedLengthSeconds();
    List<DesignColumn> columns = new ArrayList<>();
    for (int k = 1; k <= count(length, settings); k++) {
      double[] c = new double[times.size()];
      for (int t = 0; t < c.length; t++) {
        c[t] = Math.cos(Math.PI * k * (times.recordedSeconds(t) + offsetSeconds) / length);
      }
      columns.add(new DesignColumn("slow_" + k, DesignColumn.Kind.DRIFT, c));
    }
    return columns;
  }
}
