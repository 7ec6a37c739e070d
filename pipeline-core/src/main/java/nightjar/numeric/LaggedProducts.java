package nightjar.numeric;

/**
 * Products of a block of series with weights, added up over frames: {@code sums[j][v] += sum_t
 * weights[j][t] y[t][v]}. The rows of a tile are arrays of their own and share one index with the
 * sums, so that the loops are vectorised.
 */
public final class LaggedProducts {
  /** Rows that are fused in one sweep over the sums. */
  public static final int FUSED = 8;

  private LaggedProducts() {}

  /**
   * Adds {@code count} rows.
   *
   * @param weights one a row, from {@code first}
   * @param rows {@code count} rows of at least {@code width} values
   * @param sums modified, {@code width} values
   */
  public static void add(
      double[] weights, int first, double[][] rows, int count, double[] sums, int width) {
    int r = 0;
    for (; r + FUSED <= count; r += FUSED) {
      add8(weights, first + r, rows, r, sums, width);
    }
    for (; r < count; r++) {
      addScaled(weights[first + r], rows[r], sums, width);
    }
  }

  private static void add8(double[] w, int f, double[][] rows, int r, double[] sums, int width) {
    fused(
        sums,
        width,
        w[f],
        rows[r],
        w[f + 1],
        rows[r + 1],
        w[f + 2],
        rows[r + 2],
        w[f + 3],
        rows[r + 3],
        w[f + 4],
        rows[r + 4],
        w[f + 5],
        rows[r + 5],
        w[f + 6],
        rows[r + 6],
        w[f + 7],
        rows[r + 7]);
  }

  private static void fused(
      double[] sums,
      int width,
      double w0,
      double[] y0,
      double w1,
      double[] y1,
      double w2,
      double[] y2,
      double w3,
      double[] y3,
      double w4,
      double[] y4,
      double w5,
      double[] y5,
      double w6,
      double[] y6,
      double w7,
      double[] y7) {
    for (int v = 0; v < width; v++) {
      double a = Math.fma(w0, y0[v], Math.fma(w1, y1[v], sums[v]));
      double b = Math.fma(w2, y2[v], w3 * y3[v]);
      double c = Math.fma(w4, y4[v], w5 * y5[v]);
      double d = Math.fma(w6, y6[v], w7 * y7[v]);
      sums[v] = (a + b) + (c + d);
    }
  }

  /** {@code sums[v] += weight * row[v]}. */
  public static void addScaled(double weight, double[] row, double[] sums, int width) {
    for (int v = 0; v < width; v++) {
      sums[v] = Math.fma(weight, row[v], sums[v]);
    }
  }

  /** {@code sums[v] += weight * a[v] * b[v]}. */
  public static void addProduct(double weight, double[] a, double[] b, double[] sums, int width) {
    for (int v = 0; v < width; v++) {
      sums[v] = Math.fma(weight * a[v], b[v], sums[v]);
    }
  }
}
