package nightjar.mask;

import nightjar.film.FloatRows;
import nightjar.numeric.Workers;
import nightjar.recording.Axis;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;
import nightjar.recording.Mask;
import nightjar.recording.VoxelOrder;

/**
 * Gaussian smoothing by its full width at half maximum in mm along every axis, normalised within
 * the mask: nothing bleeds in from outside, and a constant stays what it is (numerics section 3).
 */
public final class Smoothing {
  /** The kernel ends where it has fallen below 1/3000 of its top: 4 standard deviations. */
  private static final double EXTENT = 4;

  private static final double WIDTH_OF_UNIT_SD = 2 * Math.sqrt(2 * Math.log(2));

  private final Grid grid;
  private final double[] alongPlanes;
  private final double[] alongDepths;
  private final double[] alongLaterals;

  private Smoothing(Grid grid, double widthMillimetres) {
    this.grid = grid;
    alongPlanes = kernel(grid.planes(), widthMillimetres);
    alongDepths = kernel(grid.depths(), widthMillimetres);
    alongLaterals = kernel(grid.laterals(), widthMillimetres);
  }

  /** Half of the symmetric kernel, from its top. */
  private static double[] kernel(Axis axis, double width) {
    double sd = width / WIDTH_OF_UNIT_SD;
    double spacing = axis.spacingMillimetres();
    int reach =
        spacing > 0 ? (int) Math.min(axis.size() - 1, Math.floor(EXTENT * sd / spacing)) : 0;
    double[] k = new double[reach + 1];
    for (int i = 0; i <= reach; i++) {
      double x = i * spacing / sd;
      k[i] = Math.exp(-x * x / 2);
    }
    return k;
  }

  /**
   * Smooths the kept frames of a film within the mask; other voxels stay.
   *
   * @param film modified, every frame by every voxel; NaN does not count and stays
   */
  public static void smooth(
      FloatRows film,
      KeptFrames kept,
      Grid grid,
      Mask mask,
      double widthMillimetres,
      Workers workers) {
    Smoothing s = new Smoothing(grid, widthMillimetres);
    workers.forEachBlock(
        kept.count(),
        8,
        (first, end) -> {
          float[] row = new float[film.width()];
          double[] values = new double[row.length];
          for (int i = first; i < end; i++) {
            film.read(kept.frame(i), 0, row.length, row, 0);
            for (int v = 0; v < row.length; v++) {
              values[v] = mask.contains(v) ? row[v] : Double.NaN;
            }
            double[] smooth = s.apply(values);
            for (int v = 0; v < row.length; v++) {
              row[v] = Double.isNaN(smooth[v]) ? row[v] : (float) smooth[v];
            }
            film.write(kept.frame(i), 0, row.length, row, 0);
          }
        });
  }

  /** Smooths one value a mask voxel; NaN does not count and stays. */
  public static double[] smooth(
      double[] values, VoxelOrder order, Grid grid, double widthMillimetres) {
    double[] smooth = new Smoothing(grid, widthMillimetres).apply(order.spread(values, Double.NaN));
    double[] result = new double[values.length];
    for (int k = 0; k < result.length; k++) {
      result[k] = smooth[order.voxel(k)];
    }
    return result;
  }

  /** Weighted means of the values that are there, at the voxels that have one. */
  private double[] apply(double[] values) {
    double[] weighted = new double[values.length];
    double[] weight = new double[values.length];
    for (int v = 0; v < values.length; v++) {
      boolean there = !Double.isNaN(values[v]);
      weighted[v] = there ? values[v] : 0;
      weight[v] = there ? 1 : 0;
    }
    weighted = convolve(weighted);
    weight = convolve(weight);
    for (int v = 0; v < values.length; v++) {
      weighted[v] = Double.isNaN(values[v]) ? Double.NaN : weighted[v] / weight[v];
    }
    return weighted;
  }

  private double[] convolve(double[] a) {
    int depths = grid.depths().size();
    int laterals = grid.laterals().size();
    double[] b = along(a, alongLaterals, 1, laterals);
    b = along(b, alongDepths, laterals, depths);
    return along(b, alongPlanes, depths * laterals, grid.planes().size());
  }

  private static double[] along(double[] a, double[] kernel, int stride, int size) {
    if (kernel.length == 1) {
      return a;
    }
    double[] b = new double[a.length];
    for (int v = 0; v < a.length; v++) {
      int i = v / stride % size;
      double sum = kernel[0] * a[v];
      for (int k = 1; k < kernel.length; k++) {
        sum +=
            kernel[k] * ((i >= k ? a[v - k * stride] : 0) + (i + k < size ? a[v + k * stride] : 0));
      }
      b[v] = sum;
    }
    return b;
  }
}
