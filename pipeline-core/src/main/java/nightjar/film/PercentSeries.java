package nightjar.film;

import nightjar.recording.KeptFrames;
import nightjar.recording.VoxelOrder;

/**
 * The series that the model is fitted to: one row a kept frame, one column a mask voxel, percent of
 * the voxel's baseline. Close it to free the rows.
 */
public final class PercentSeries implements AutoCloseable {
  private final FloatRows rows;
  private final VoxelOrder order;
  private final KeptFrames kept;
  private final double[] baselines;

  /**
   * @param rows owned from now on
   * @param baselines mean power of each voxel over the kept frames; shared, not copied
   */
  public PercentSeries(FloatRows rows, VoxelOrder order, KeptFrames kept, double[] baselines) {
    if (rows.rows() != kept.count() || rows.width() != order.size()) {
      throw new IllegalArgumentException(
          "%d x %d values for %d frames and %d voxels"
              .formatted(rows.rows(), rows.width(), kept.count(), order.size()));
    }
    this.rows = rows;
    this.order = order;
    this.kept = kept;
    this.baselines = baselines;
  }

  /** Kept frames by mask voxels, percent; no NaN. */
  public FloatRows rows() {
    return rows;
  }

  /** The mask's voxels. */
  public VoxelOrder order() {
    return order;
  }

  /** The frames of the rows. */
  public KeptFrames kept() {
    return kept;
  }

  /** Baseline power of position {@code k}. */
  public double baseline(int k) {
    return baselines[k];
  }

  @Override
  public void close() {
    rows.close();
  }
}
