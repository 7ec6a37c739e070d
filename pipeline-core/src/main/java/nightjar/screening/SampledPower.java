package nightjar.screening;

import nightjar.numeric.Median;
import nightjar.recording.FrameSource;

/** The recording's median power from a fixed sample of frames and voxels. */
final class SampledPower {
  private static final int MOST_FRAMES = 101;
  private static final int MOST_VOXELS = 10_007;

  private SampledPower() {}

  /**
   * Median of at most 101 frames by 10,007 voxels, both spread evenly. Where half of the values are
   * zero or less (packed files, empty margins), the median of the positive ones; NaN where the
   * sample has none.
   */
  static double median(FrameSource source) {
    int[] frames = EvenSample.of(source.times().size(), MOST_FRAMES);
    int[] voxels = EvenSample.of(source.grid().voxels(), MOST_VOXELS);
    float[] frame = new float[source.grid().voxels()];
    float[] values = new float[frames.length * voxels.length];
    int n = 0;
    for (int t : frames) {
      source.read(t, 1, frame, 0);
      for (int v : voxels) {
        values[n++] = frame[v];
      }
    }
    float median = Median.sorting(values, n);
    if (median > 0) {
      return median;
    }
    for (int i = 0; i < n; i++) {
      values[i] = values[i] > 0 ? values[i] : Float.NaN;
    }
    return Median.sorting(values, n);
  }
}
