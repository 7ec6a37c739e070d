package nightjar.recording;

import java.util.Arrays;

/**
 * The mask's voxels in ascending order: position in a series' row to voxel of the grid and back.
 * Immutable.
 */
public final class VoxelOrder {
  private final int[] voxels;
  private final int gridVoxels;

  private VoxelOrder(int[] voxels, int gridVoxels) {
    this.voxels = voxels;
    this.gridVoxels = gridVoxels;
  }

  static VoxelOrder of(int[] ascending, int gridVoxels) {
    return new VoxelOrder(ascending, gridVoxels);
  }

  /** Number of voxels in the order. */
  public int size() {
    return voxels.length;
  }

  /** Number of voxels of the whole grid. */
  public int gridVoxels() {
    return gridVoxels;
  }

  /** Grid voxel of position {@code k}. */
  public int voxel(int k) {
    return voxels[k];
  }

  /** The first position whose grid voxel is at least {@code v} (for the range of a plane). */
  public int firstAtOrAfter(int v) {
    int i = Arrays.binarySearch(voxels, v);
    return i >= 0 ? i : -i - 1;
  }

  /** Values per position spread over the grid; {@code outside} elsewhere. */
  public float[] spread(float[] values, float outside) {
    float[] g = new float[gridVoxels];
    Arrays.fill(g, outside);
    for (int k = 0; k < voxels.length; k++) {
      g[voxels[k]] = values[k];
    }
    return g;
  }

  /** Values per position spread over the grid; {@code outside} elsewhere. */
  public double[] spread(double[] values, double outside) {
    double[] g = new double[gridVoxels];
    Arrays.fill(g, outside);
    for (int k = 0; k < voxels.length; k++) {
      g[voxels[k]] = values[k];
    }
    return g;
  }
}
