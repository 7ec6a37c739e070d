package nightjar.screening;

import nightjar.numeric.FlooredLog;
import nightjar.numeric.Workers;
import nightjar.recording.FrameSource;
import nightjar.recording.Progress;

/** What one pass over the unaligned frames tells of each. */
final class FrameSums {
  private static final int FRAMES_A_BLOCK = 16;

  final int[] missing;
  final double[] meanLogPower;
  final float[] smallest;
  final float[] largest;

  private FrameSums(int frames) {
    missing = new int[frames];
    meanLogPower = new double[frames];
    smallest = new float[frames];
    largest = new float[frames];
  }

  static FrameSums of(FrameSource source, FlooredLog log, Workers workers, Progress progress) {
    int voxels = source.grid().voxels();
    FrameSums sums = new FrameSums(source.times().size());
    workers.forEachBlock(
        source.times().size(),
        FRAMES_A_BLOCK,
        progress,
        (first, end) -> {
          float[] frames = new float[(end - first) * voxels];
          source.read(first, end - first, frames, 0);
          for (int t = first; t < end; t++) {
            sums.add(t, frames, (t - first) * voxels, voxels, log);
          }
        });
    return sums;
  }

  private void add(int t, float[] frames, int offset, int voxels, FlooredLog log) {
    float low = Float.POSITIVE_INFINITY;
    float high = Float.NEGATIVE_INFINITY;
    int values = 0;
    double sum = 0;
    for (int i = offset; i < offset + voxels; i++) {
      float y = frames[i];
      if (!Float.isNaN(y)) {
        low = Math.min(low, y);
        high = Math.max(high, y);
        sum += log.of(y);
        values++;
      }
    }
    missing[t] = voxels - values;
    meanLogPower[t] = values == 0 ? Double.NaN : sum / values;
    smallest[t] = low;
    largest[t] = high;
  }
}
