package nightjar.film;

import nightjar.recording.KeptFrames;
import nightjar.recording.VoxelOrder;

/**
 * What the model is fitted to: kept frames by mask voxels, percent of each voxel's baseline. Owns
 * its rows. May be read by several threads at once.
 */
public final class PercentSeries implements AutoCloseable {
  private final FloatRows rows;
  private final VoxelOrder order;
  private final KeptFrames kept;
  private final double[] baseline;

  /**
   * @param rows {@code kept.count()} rows of {@code order.size()} values, percent
   * @param order the mask's voxels
   * @param kept the frames that the rows stand for
   * @param baseline power per mask voxel, in the recording's unit; copied
   */
  public PercentSeries(FloatRows rows, VoxelOrder order, KeptFrames kept, double[] baseline) {
    if (rows.rows() != kept.count()
        || rows.width() != order.size()
        || baseline.length != order.size()) {
      throw new IllegalArgumentException(
          rows.rows()
              + " x "
              + rows.width()
              + " values and "
              + baseline.length
              + " baselines for "
              + kept.count()
              + " frames x "
              + order.size()
              + " voxels");
    }
    this.rows = rows;
    this.order = order;
    this.kept = kept;
    this.baseline = baseline.clone();
  }

  /** {@code [kept frame][mask voxel]}, percent. */
  public FloatRows rows() {
    return rows;
  }

  /** The mask's voxels: position in a row to voxel of the grid. */
  public VoxelOrder order() {
    return order;
  }

  /** The frames that the rows stand for. */
  public KeptFrames kept() {
    return kept;
  }

  /** Mean power over the kept frames of position {@code k}, in the recording's unit. */
  public double baseline(int k) {
    return baseline[k];
  }

  @Override
  public void close() {
    rows.close();
  }
}
