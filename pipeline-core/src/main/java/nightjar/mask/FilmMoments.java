package nightjar.mask;

import java.util.Arrays;
import java.util.concurrent.atomic.AtomicLong;
import nightjar.film.FloatRows;
import nightjar.numeric.Workers;
import nightjar.recording.KeptFrames;
import nightjar.recording.Progress;

/** What the final mask needs of every voxel's kept values, from one pass over the aligned film. */
final class FilmMoments {
  private static final int VOXELS_A_BLOCK = 4096;

  private final double[] sum;
  private final float[] smallest;
  private final float[] largest;
  private final int[] missing;
  private final int frames;

  private FilmMoments(int voxels, int frames) {
    this.frames = frames;
    sum = new double[voxels];
    smallest = new float[voxels];
    largest = new float[voxels];
    missing = new int[voxels];
    Arrays.fill(smallest, Float.POSITIVE_INFINITY);
    Arrays.fill(largest, Float.NEGATIVE_INFINITY);
  }

  static FilmMoments of(FloatRows film, KeptFrames kept, Workers workers, Progress progress) {
    FilmMoments m = new FilmMoments(film.width(), kept.count());
    AtomicLong done = new AtomicLong();
    workers.forEachBlock(
        film.width(),
        VOXELS_A_BLOCK,
        (first, end) -> {
          float[] row = new float[end - first];
          for (int i = 0; i < kept.count(); i++) {
            film.read(kept.frame(i), first, row.length, row, 0);
            m.add(row, first);
          }
          progress.report((double) done.addAndGet(end - first) / film.width());
        });
    return m;
  }

  private void add(float[] row, int first) {
    for (int k = 0; k < row.length; k++) {
      float y = row[k];
      int v = first + k;
      if (Float.isNaN(y)) {
        missing[v]++;
      } else {
        sum[v] += y;
        smallest[v] = Math.min(smallest[v], y);
        largest[v] = Math.max(largest[v], y);
      }
    }
  }

  /** Mean of the values that are there; NaN without any. */
  double mean(int v) {
    return sum[v] / (frames - missing[v]);
  }

  /** Frames without a value. */
  int missing(int v) {
    return missing[v];
  }

  /** Whether all values are the same. */
  boolean isConstant(int v) {
    return !(largest[v] > smallest[v]);
  }

  float smallest(int v) {
    return smallest[v];
  }
}
