package nightjar.screening;

import java.util.Arrays;
import java.util.concurrent.atomic.AtomicLong;
import nightjar.film.FloatRows;
import nightjar.numeric.Workers;
import nightjar.recording.FrameTimes;
import nightjar.recording.Progress;
import nightjar.recording.VoxelOrder;

/**
 * What screening judges of each frame of one plane: the mean of ln(power), the root mean square of
 * its difference to the voxelwise median over the five frames around it, the share of voxels
 * without a value.
 */
final class LogPowerSeries {
  private static final int HALF_WINDOW = 2;
  private static final int FRAMES_A_BLOCK = 64;

  final double[] logPower;
  final double[] change;
  final double[] missing;

  private final FloatRows film;
  private final FrameTimes times;
  private final VoxelOrder voxels;
  private final float floor;

  private LogPowerSeries(FloatRows film, FrameTimes times, VoxelOrder voxels, double floor) {
    this.film = film;
    this.times = times;
    this.voxels = voxels;
    this.floor = (float) floor;
    logPower = new double[times.size()];
    change = new double[times.size()];
    missing = new double[times.size()];
  }

  /**
   * One pass over the voxels of the film.
   *
   * @param floor of power before logarithms
   */
  static LogPowerSeries of(
      FloatRows film,
      FrameTimes times,
      VoxelOrder voxels,
      double floor,
      Workers workers,
      Progress progress) {
    LogPowerSeries s = new LogPowerSeries(film, times, voxels, floor);
    AtomicLong done = new AtomicLong();
    workers.forEachBlock(
        times.size(),
        FRAMES_A_BLOCK,
        (first, end) -> {
          s.block(first, end);
          progress.report((double) done.addAndGet(end - first) / times.size());
        });
    return s;
  }

  private void block(int first, int end) {
    int n = voxels.size();
    int from = voxels.voxel(0);
    float[] row = new float[voxels.voxel(n - 1) - from + 1];
    float[][] ring = new float[2 * HALF_WINDOW + 1][n];
    int next = Math.max(0, first - HALF_WINDOW);
    for (int t = first; t < end; t++) {
      for (; next <= Math.min(times.size() - 1, t + HALF_WINDOW); next++) {
        film.read(next, from, row.length, row, 0);
        logarithms(row, from, ring[next % ring.length]);
      }
      judge(t, ring);
    }
  }

  private void logarithms(float[] row, int from, float[] into) {
    for (int k = 0; k < into.length; k++) {
      float y = row[voxels.voxel(k) - from];
      into[k] = Float.isNaN(y) ? y : (float) Math.log(Math.max(y, floor));
    }
  }

  private void judge(int t, float[][] ring) {
    float[] now = ring[t % ring.length];
    int first = t;
    int last = t;
    while (first > Math.max(0, t - HALF_WINDOW) && times.segment(first - 1) == times.segment(t)) {
      first--;
    }
    while (last < Math.min(times.size() - 1, t + HALF_WINDOW)
        && times.segment(last + 1) == times.segment(t)) {
      last++;
    }
    float[] near = new float[last - first + 1];
    double sum = 0;
    double squares = 0;
    int count = 0;
    for (int k = 0; k < now.length; k++) {
      if (Float.isNaN(now[k])) {
        continue;
      }
      int n = 0;
      for (int s = first; s <= last; s++) {
        float v = ring[s % ring.length][k];
        if (!Float.isNaN(v)) {
          near[n++] = v;
        }
      }
      double d = now[k] - median(near, n);
      sum += now[k];
      squares += d * d;
      count++;
    }
    logPower[t] = count == 0 ? Double.NaN : sum / count;
    change[t] = count == 0 ? Double.NaN : Math.sqrt(squares / count);
    missing[t] = 1 - (double) count / now.length;
  }

  /** Of at most five values. */
  private static double median(float[] near, int n) {
    if (n == 5) {
      return median5(near[0], near[1], near[2], near[3], near[4]);
    }
    Arrays.sort(near, 0, n);
    return n % 2 == 1 ? near[n / 2] : 0.5 * (near[n / 2 - 1] + near[n / 2]);
  }

  /** Without branches: the median of the two inner extremes and the fifth. */
  private static float median5(float a, float b, float c, float d, float e) {
    float low = Math.max(Math.min(a, b), Math.min(c, d));
    float high = Math.min(Math.max(a, b), Math.max(c, d));
    return Math.max(Math.min(low, high), Math.min(Math.max(low, high), e));
  }
}
