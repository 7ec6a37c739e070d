package nightjar.mask;

import nightjar.film.FloatRows;
import nightjar.numeric.Workers;
import nightjar.recording.Axis;
import nightjar.recording.Grid;
import nightjar.recording.Mask;

/**
 * Smoothing by a Gaussian within each plane, normalised within the mask so that nothing bleeds in
 * from outside: {@code sum(g m y) / sum(g m)} over the neighbours, m the mask (numerics section 3).
 * Planes are never mixed.
 */
public final class Smoothing {
  /** FWHM over standard deviation of a Gaussian, 2 sqrt(2 ln 2). */
  private static final double FWHM_OVER_SIGMA = 2 * Math.sqrt(2 * Math.log(2));

  /** Beyond four standard deviations the weight is below 4e-4 of the centre's. */
  private static final double REACH_IN_SIGMAS = 4;

  private static final int FRAMES_A_BLOCK = 16;

  private Smoothing() {}

  /**
   * Smooths every frame. A value that is missing inside the mask spreads within its frame, so give
   * a final mask; rejected frames may come out with gaps.
   *
   * @param film one value a voxel of the grid; mask voxels are modified, others untouched
   * @param fwhmMillimetres full width at half maximum along depth and lateral, mm; 0 = none
   */
  public static void smooth(
      FloatRows film, Grid grid, Mask mask, double fwhmMillimetres, Workers workers) {
    if (fwhmMillimetres == 0) {
      return;
    }
    double[] depthKernel = kernel(grid.depths(), fwhmMillimetres);
    double[] lateralKernel = kernel(grid.laterals(), fwhmMillimetres);
    double[] shares = new double[grid.voxels()];
    for (int v = 0; v < shares.length; v++) {
      shares[v] = mask.contains(v) ? 1 : 0;
    }
    double[] weights = shares.clone();
    convolve(weights, grid, depthKernel, lateralKernel);
    workers.forEachBlock(
        film.rows(),
        FRAMES_A_BLOCK,
        (first, end) -> {
          float[] row = new float[film.width()];
          double[] values = new double[film.width()];
          for (int t = first; t < end; t++) {
            film.read(t, 0, row.length, row, 0);
            for (int v = 0; v < row.length; v++) {
              values[v] = shares[v] > 0 ? row[v] : 0;
            }
            convolve(values, grid, depthKernel, lateralKernel);
            for (int v = 0; v < row.length; v++) {
              row[v] = shares[v] > 0 ? (float) (values[v] / weights[v]) : row[v];
            }
            film.write(t, 0, row.length, row, 0);
          }
        });
  }

  /** Half of a symmetric kernel, centre first; its scale cancels. */
  static double[] kernel(Axis axis, double fwhmMillimetres) {
    if (axis.size() == 1) {
      return new double[] {1};
    }
    double sigma = fwhmMillimetres / FWHM_OVER_SIGMA / axis.spacingMillimetres();
    int reach = Math.min(axis.size() - 1, (int) Math.ceil(REACH_IN_SIGMAS * sigma));
    double[] half = new double[reach + 1];
    for (int k = 0; k <= reach; k++) {
      half[k] = Math.exp(-0.5 * (k / sigma) * (k / sigma));
    }
    return half;
  }

  private static void convolve(double[] values, Grid grid, double[] depth, double[] lateral) {
    int depths = grid.depths().size();
    int laterals = grid.laterals().size();
    double[] plane = new double[depths * laterals];
    for (int p = 0; p < grid.planes().size(); p++) {
      int from = p * plane.length;
      java.util.Arrays.fill(plane, 0);
      for (int z = 0; z < depths; z++) {
        // Along depth whole lines are added, along lateral shifted parts of a line.
        for (int j = Math.max(0, z - depth.length + 1);
            j < Math.min(depths, z + depth.length);
            j++) {
          double w = depth[Math.abs(j - z)];
          addScaled(w, values, from + j * laterals, plane, z * laterals, laterals);
        }
      }
      java.util.Arrays.fill(values, from, from + plane.length, 0);
      for (int z = 0; z < depths; z++) {
        int line = z * laterals;
        addScaled(lateral[0], plane, line, values, from + line, laterals);
        for (int k = 1; k < lateral.length; k++) {
          addScaled(lateral[k], plane, line + k, values, from + line, laterals - k);
          addScaled(lateral[k], plane, line, values, from + line + k, laterals - k);
        }
      }
    }
  }

  private static void addScaled(
      double w, double[] from, int first, double[] into, int offset, int count) {
    for (int i = 0; i < count; i++) {
      into[offset + i] += w * from[first + i];
    }
  }
}
