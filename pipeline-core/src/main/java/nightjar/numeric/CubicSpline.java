package nightjar.numeric;

/**
 * Cubic B-spline through the voxels of a block {@code [plane][depth][lateral]}, mirrored at the
 * outermost voxels; evaluated anywhere within half a voxel of the block. The coefficients come from
 * the recursive prefilter of Unser 1999, IEEE Signal Process Mag 16(6):22 (pole sqrt(3) - 2), so
 * the spline goes through every voxel. An axis of one voxel is constant.
 *
 * <p>One instance is filled again and again; not thread-safe while it is filled.
 */
public final class CubicSpline {
  private static final double POLE = Math.sqrt(3) - 2;
  private static final double SIXTH = 1.0 / 6;

  /** The pole to this power is below the rounding of a float. */
  private static final int HORIZON = 24;

  /** Coefficients that are needed beyond the outermost voxel. */
  private static final int PAD = 2;

  private final int planes;
  private final int depths;
  private final int laterals;
  private final float[][] rows;
  private final float[][][] mirrored;
  private final double[] firstPlanes;
  private final double[] firstDepths;
  private final double[] firstLaterals;

  /** For blocks of the given size. */
  public CubicSpline(int planes, int depths, int laterals) {
    this.planes = planes;
    this.depths = depths;
    this.laterals = laterals;
    rows = new float[planes * depths][laterals + 2 * PAD];
    mirrored = new float[planes + 2 * PAD][depths + 2 * PAD][];
    for (int p = -PAD; p < planes + PAD; p++) {
      for (int z = -PAD; z < depths + PAD; z++) {
        mirrored[p + PAD][z + PAD] = rows[mirror(p, planes) * depths + mirror(z, depths)];
      }
    }
    firstPlanes = firstWeights(planes);
    firstDepths = firstWeights(depths);
    firstLaterals = firstWeights(laterals);
  }

  /**
   * Fits the spline.
   *
   * @param values {@code [plane][depth][lateral]} from {@code offset}, all finite; not modified
   */
  public void fit(float[] values, int offset) {
    for (int r = 0; r < rows.length; r++) {
      System.arraycopy(values, offset + r * laterals, rows[r], PAD, laterals);
      filterLine(rows[r]);
    }
    for (int p = 0; p < planes; p++) {
      filterRows(p * depths, 1, depths, firstDepths);
    }
    for (int z = 0; z < depths; z++) {
      filterRows(z, depths, planes, firstPlanes);
    }
    for (float[] row : rows) {
      for (int x = 1; x <= PAD; x++) {
        row[PAD - x] = row[PAD + mirror(-x, laterals)];
        row[PAD + laterals - 1 + x] = row[PAD + mirror(laterals - 1 + x, laterals)];
      }
    }
  }

  /** Value in the only plane of the block; -0.5 to size - 0.5 along either axis. */
  public double at(double depth, double lateral) {
    return inPlane(mirrored[PAD], depth, lateral);
  }

  /** Value at a place of the block; -0.5 to size - 0.5 along every axis. */
  public double at(double plane, double depth, double lateral) {
    int p = (int) Math.floor(plane);
    double f = plane - p;
    double e = 1 - f;
    double w0 = e * e * e * SIXTH;
    double w1 = 2.0 / 3 - 0.5 * f * f * (2 - f);
    double w3 = f * f * f * SIXTH;
    double w2 = 1 - w0 - w1 - w3;
    return w0 * inPlane(mirrored[p + PAD - 1], depth, lateral)
        + w1 * inPlane(mirrored[p + PAD], depth, lateral)
        + w2 * inPlane(mirrored[p + PAD + 1], depth, lateral)
        + w3 * inPlane(mirrored[p + PAD + 2], depth, lateral);
  }

  private static double inPlane(float[][] plane, double depth, double lateral) {
    int z = (int) Math.floor(depth);
    int x = (int) Math.floor(lateral);
    double f = depth - z;
    double e = 1 - f;
    double w0 = e * e * e * SIXTH;
    double w1 = 2.0 / 3 - 0.5 * f * f * (2 - f);
    double w3 = f * f * f * SIXTH;
    double w2 = 1 - w0 - w1 - w3;
    double g = lateral - x;
    double h = 1 - g;
    double v0 = h * h * h * SIXTH;
    double v1 = 2.0 / 3 - 0.5 * g * g * (2 - g);
    double v3 = g * g * g * SIXTH;
    double v2 = 1 - v0 - v1 - v3;
    int i = x + PAD - 1;
    int r = z + PAD - 1;
    return w0 * four(plane[r], i, v0, v1, v2, v3)
        + w1 * four(plane[r + 1], i, v0, v1, v2, v3)
        + w2 * four(plane[r + 2], i, v0, v1, v2, v3)
        + w3 * four(plane[r + 3], i, v0, v1, v2, v3);
  }

  private static double four(float[] row, int i, double v0, double v1, double v2, double v3) {
    return v0 * row[i] + v1 * row[i + 1] + v2 * row[i + 2] + v3 * row[i + 3];
  }

  /** Along lateral; the forward and the backward recursion with the gain of 6. */
  private void filterLine(float[] c) {
    int n = laterals;
    if (n == 1) {
      return;
    }
    double first = 0;
    for (int k = 0; k < firstLaterals.length; k++) {
      first += firstLaterals[k] * c[PAD + k];
    }
    double last = first;
    c[PAD] = (float) (6 * last);
    double before = last;
    for (int k = 1; k < n; k++) {
      before = last;
      last = c[PAD + k] + POLE * last;
      c[PAD + k] = (float) (6 * last);
    }
    last = 6 * POLE / (POLE * POLE - 1) * (POLE * before + last);
    c[PAD + n - 1] = (float) last;
    for (int k = n - 2; k >= 0; k--) {
      last = POLE * (last - c[PAD + k]);
      c[PAD + k] = (float) last;
    }
  }

  /** Along another axis: rows {@code base + k step}, k &lt; n, whole rows at a time. */
  private void filterRows(int base, int step, int n, double[] firstWeights) {
    if (n == 1) {
      return;
    }
    float[] first = new float[laterals + 2 * PAD];
    for (int k = 0; k < firstWeights.length; k++) {
      addScaled((float) firstWeights[k], rows[base + k * step], first);
    }
    System.arraycopy(first, 0, rows[base], 0, first.length);
    for (int k = 1; k < n; k++) {
      addScaled((float) POLE, rows[base + (k - 1) * step], rows[base + k * step]);
    }
    float gain = (float) (6 * POLE / (POLE * POLE - 1));
    combine(
        gain,
        rows[base + (n - 1) * step],
        gain * (float) POLE,
        rows[base + (n - 2) * step],
        rows[base + (n - 1) * step]);
    for (int k = n - 2; k >= 0; k--) {
      float[] row = rows[base + k * step];
      combine((float) POLE, rows[base + (k + 1) * step], (float) (-6 * POLE), row, row);
    }
  }

  private static void addScaled(float weight, float[] from, float[] into) {
    for (int x = 0; x < into.length; x++) {
      into[x] += weight * from[x];
    }
  }

  private static void combine(float wa, float[] a, float wb, float[] b, float[] into) {
    for (int x = 0; x < into.length; x++) {
      into[x] = wa * a[x] + wb * b[x];
    }
  }

  /** Weights that give the first value of the forward recursion on the mirrored line. */
  private static double[] firstWeights(int n) {
    if (n == 1) {
      return new double[] {1};
    }
    double[] w = new double[Math.min(n, HORIZON)];
    double period = 1 - Math.pow(POLE, 2.0 * n - 2);
    for (int k = 0; k < w.length; k++) {
      double there = Math.pow(POLE, k);
      double back = k == 0 || k == n - 1 ? 0 : Math.pow(POLE, 2.0 * n - 2 - k);
      w[k] = (there + back) / period;
    }
    return w;
  }

  private static int mirror(int i, int n) {
    if (n == 1) {
      return 0;
    }
    int period = 2 * n - 2;
    int k = Math.floorMod(i, period);
    return k < n ? k : period - k;
  }
}
