package nightjar.mask;

import nightjar.numeric.Workers;
import nightjar.recording.OutsideField;
import nightjar.recording.Progress;

/** Sums over the kept frames, one a voxel of the grid; one pass over the film. */
final class VoxelTally {
  /** Voxels that one thread takes at a time: some pages of a mapped film. */
  static final int TILE = 4096;

  final double[] sum;
  final int[] values;
  final int[] outside;
  final float[] smallest;
  final float[] largest;

  private VoxelTally(int voxels) {
    sum = new double[voxels];
    values = new int[voxels];
    outside = new int[voxels];
    smallest = new float[voxels];
    largest = new float[voxels];
  }

  static VoxelTally of(KeptFilm f, OutsideField outside, Workers workers, Progress progress) {
    VoxelTally tally = new VoxelTally(f.film().width());
    workers.forEachBlock(
        f.film().width(),
        TILE,
        progress,
        (first, end) -> {
          float[] row = new float[end - first];
          java.util.Arrays.fill(tally.smallest, first, end, Float.POSITIVE_INFINITY);
          java.util.Arrays.fill(tally.largest, first, end, Float.NEGATIVE_INFINITY);
          for (int r = 0; r < f.kept().count(); r++) {
            int t = f.kept().frame(r);
            f.film().read(t, first, row.length, row, 0);
            tally.add(row, first, t, outside);
          }
        });
    return tally;
  }

  private void add(float[] row, int first, int frame, OutsideField field) {
    for (int i = 0; i < row.length; i++) {
      int v = first + i;
      float y = row[i];
      if (!Float.isNaN(y)) {
        sum[v] += y;
        values[v]++;
        smallest[v] = Math.min(smallest[v], y);
        largest[v] = Math.max(largest[v], y);
      } else if (field.at(frame, v)) {
        outside[v]++;
      }
    }
  }
}
