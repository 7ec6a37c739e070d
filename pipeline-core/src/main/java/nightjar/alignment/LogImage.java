package nightjar.alignment;

import nightjar.numeric.LocalFill;

/**
 * What is compared: ln(power), floored, lightly smoothed within each plane by a Gaussian of one
 * voxel. Speckle becomes additive, a gain becomes an offset, and the image is smooth enough for
 * linear interpolation between voxels. Holds scratch arrays: one instance a thread.
 */
final class LogImage {
  private static final double SIGMA_VOXELS = 1;
  private static final int RADIUS = 3;
  private static final float[] KERNEL = kernel();

  private final Slab slab;
  private final double floor;
  private final float[] image;
  private final float[] line;
  private final float[][] rows;
  private final float[] sum;

  /** {@code floor} in units of power, positive. */
  LogImage(Slab slab, double floor) {
    this.slab = slab;
    this.floor = floor;
    image = new float[slab.voxels()];
    line = new float[slab.laterals() + 2 * RADIUS];
    rows = new float[slab.depths()][slab.laterals()];
    sum = new float[slab.laterals()];
  }

  /**
   * The smoothed logarithms of the slab; NaN where the frame has no value.
   *
   * @param frame power of the whole grid, not modified
   * @return this instance's own array, overwritten by the next call
   */
  float[] ofPower(float[] frame) {
    int first = slab.firstVoxel();
    for (int v = 0; v < image.length; v++) {
      float power = frame[first + v];
      image[v] = Float.isNaN(power) ? Float.NaN : (float) Math.log(Math.max(power, floor));
    }
    return smoothed(frame, first);
  }

  /** The same of values that are logarithms already. */
  float[] ofLogarithms(float[] logarithms) {
    int first = slab.firstVoxel();
    System.arraycopy(logarithms, first, image, 0, image.length);
    return smoothed(logarithms, first);
  }

  private float[] smoothed(float[] source, int first) {
    int size = slab.depths() * slab.laterals();
    for (int p = 0; p < slab.planes(); p++) {
      LocalFill.fill(image, p * size, slab.depths(), slab.laterals());
      smoothPlane(p * size);
    }
    for (int v = 0; v < image.length; v++) {
      if (Float.isNaN(source[first + v])) {
        image[v] = Float.NaN;
      }
    }
    return image;
  }

  private void smoothPlane(int offset) {
    int nx = slab.laterals();
    for (int z = 0; z < rows.length; z++) {
      int at = offset + z * nx;
      System.arraycopy(image, at, line, RADIUS, nx);
      java.util.Arrays.fill(line, 0, RADIUS, image[at]);
      java.util.Arrays.fill(line, RADIUS + nx, line.length, image[at + nx - 1]);
      alongLine(line, rows[z]);
    }
    for (int z = 0; z < rows.length; z++) {
      java.util.Arrays.fill(sum, 0);
      for (int k = -RADIUS; k <= RADIUS; k++) {
        addScaled(KERNEL[k + RADIUS], rows[Math.max(0, Math.min(rows.length - 1, z + k))], sum);
      }
      System.arraycopy(sum, 0, image, offset + z * nx, nx);
    }
  }

  private static void alongLine(float[] padded, float[] into) {
    float k0 = KERNEL[RADIUS];
    float k1 = KERNEL[RADIUS + 1];
    float k2 = KERNEL[RADIUS + 2];
    float k3 = KERNEL[RADIUS + 3];
    for (int x = 0; x < into.length; x++) {
      into[x] =
          k0 * padded[x + 3]
              + k1 * (padded[x + 2] + padded[x + 4])
              + k2 * (padded[x + 1] + padded[x + 5])
              + k3 * (padded[x] + padded[x + 6]);
    }
  }

  private static void addScaled(float weight, float[] from, float[] into) {
    for (int x = 0; x < into.length; x++) {
      into[x] += weight * from[x];
    }
  }

  private static float[] kernel() {
    double[] g = new double[2 * RADIUS + 1];
    double total = 0;
    for (int k = 0; k < g.length; k++) {
      double d = (k - RADIUS) / SIGMA_VOXELS;
      g[k] = Math.exp(-0.5 * d * d);
      total += g[k];
    }
    float[] kernel = new float[g.length];
    for (int k = 0; k < g.length; k++) {
      kernel[k] = (float) (g[k] / total);
    }
    return kernel;
  }
}
