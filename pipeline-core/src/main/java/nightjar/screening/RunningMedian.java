package nightjar.screening;

import nightjar.numeric.Selection;
import nightjar.recording.FrameTimes;

/** Median over a window of frames, cut at the ends and at the borders of segments. */
final class RunningMedian {
  private RunningMedian() {}

  /** Running median of {@code window} frames (odd); NaN does not count. */
  static double[] of(double[] x, int window, FrameTimes times) {
    double[] m = new double[x.length];
    double[] near = new double[window];
    int half = window / 2;
    for (int t = 0; t < x.length; t++) {
      int n = 0;
      for (int s = Math.max(0, t - half); s <= Math.min(x.length - 1, t + half); s++) {
        if (times.segment(s) == times.segment(t) && !Double.isNaN(x[s])) {
          near[n++] = x[s];
        }
      }
      m[t] = Selection.median(near, n);
    }
    return m;
  }
}
