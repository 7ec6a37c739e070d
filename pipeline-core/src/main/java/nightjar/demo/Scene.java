package nightjar.demo;

import java.util.Arrays;

/**
 * Power at rest of one plane, sampled four times finer than voxels and blurred by the system's
 * spread (standard deviation 0.75 voxel = 3 samples), so that cubic interpolation between samples
 * is exact to about a thousandth. It reaches beyond the field on all sides. Immutable.
 */
final class Scene {
  static final int FINE = 4;
  private static final int MARGIN_VOXELS = 8;
  private static final double SPREAD_SAMPLES = 0.75 * FINE;
  private static final double TISSUE = 1;
  private static final double OUTSIDE = 0.06;
  private static final double NOISE_FLOOR = 0.03;
  private static final double ATTENUATION = 1.3;

  private final float[] samples;
  private final int depths;
  private final int laterals;

  private Scene(float[] samples, int depths, int laterals) {
    this.samples = samples;
    this.depths = depths;
    this.laterals = laterals;
  }

  /** Grows a plane's tissue and vessels. */
  static Scene grow(DemoScan scan, NormalStream random) {
    int depths = (scan.depths() + 2 * MARGIN_VOXELS) * FINE;
    int laterals = (scan.laterals() + 2 * MARGIN_VOXELS) * FINE;
    double height = scan.depths() * FINE;
    double[] surface = surface(laterals, height);
    float[] image = new float[depths * laterals];
    for (int z = 0; z < depths; z++) {
      for (int x = 0; x < laterals; x++) {
        // Tissue is uneven on the scale of a voxel: small vessels that the system cannot part.
        double uneven = StrictMath.exp(0.9 * random.normal());
        boolean inside = z > surface[x] && z < floor(x, laterals, height);
        image[z * laterals + x] = (float) ((inside ? TISSUE : OUTSIDE) * uneven / 1.5);
      }
    }
    new VesselTree(image, surface, FINE, random).grow(height);
    return new Scene(
        attenuated(blurred(image, depths, laterals), depths, laterals), depths, laterals);
  }

  /** A scene of given samples {@code [depths][laterals]}, not copied. */
  static Scene of(float[] samples, int depths, int laterals) {
    return new Scene(samples, depths, laterals);
  }

  /** The dome of the brain's surface, samples. */
  private static double[] surface(int laterals, double height) {
    double[] surface = new double[laterals];
    for (int x = 0; x < laterals; x++) {
      double u = 2.0 * x / laterals - 1;
      surface[x] = MARGIN_VOXELS * FINE + height * (0.07 + 0.22 * u * u);
    }
    return surface;
  }

  private static double floor(int x, int laterals, double height) {
    double u = 2.0 * x / laterals - 1;
    return MARGIN_VOXELS * FINE + height * (0.95 - 0.15 * u * u);
  }

  private static float[] attenuated(float[] image, int depths, int laterals) {
    int first = MARGIN_VOXELS * FINE;
    for (int z = 0; z < depths; z++) {
      double below = Math.max(0, z - first) / (double) (depths - 2 * first);
      float factor = (float) StrictMath.exp(-ATTENUATION * below);
      for (int x = 0; x < laterals; x++) {
        int i = z * laterals + x;
        image[i] = image[i] * factor + (float) NOISE_FLOOR;
      }
    }
    return image;
  }

  private static float[] blurred(float[] image, int depths, int laterals) {
    double[] kernel = kernel();
    float[] half = new float[image.length];
    blurLines(image, half, depths, laterals, kernel);
    float[] turned = new float[image.length];
    transpose(half, turned, depths, laterals);
    blurLines(turned, half, laterals, depths, kernel);
    transpose(half, turned, laterals, depths);
    return turned;
  }

  private static double[] kernel() {
    int reach = (int) Math.ceil(4 * SPREAD_SAMPLES);
    double[] kernel = new double[2 * reach + 1];
    for (int k = -reach; k <= reach; k++) {
      double u = k / SPREAD_SAMPLES;
      kernel[k + reach] = StrictMath.exp(-0.5 * u * u);
    }
    double area = Arrays.stream(kernel).sum();
    for (int k = 0; k < kernel.length; k++) {
      kernel[k] /= area;
    }
    return kernel;
  }

  /** Each line smoothed; samples beyond its ends repeat the last. */
  private static void blurLines(
      float[] from, float[] into, int lines, int length, double[] kernel) {
    int reach = kernel.length / 2;
    for (int line = 0; line < lines; line++) {
      int base = line * length;
      for (int i = 0; i < length; i++) {
        double sum = 0;
        for (int k = -reach; k <= reach; k++) {
          sum += kernel[k + reach] * from[base + Math.min(length - 1, Math.max(0, i + k))];
        }
        into[base + i] = (float) sum;
      }
    }
  }

  private static void transpose(float[] from, float[] into, int rows, int columns) {
    for (int r = 0; r < rows; r++) {
      for (int c = 0; c < columns; c++) {
        into[c * rows + r] = from[r * columns + c];
      }
    }
  }

  /**
   * Power at a place of the field, in voxels from its first voxel; cubic between samples [Keys
   * 1981, IEEE Trans ASSP 29:1153].
   */
  double at(double depth, double lateral) {
    double z = (depth + MARGIN_VOXELS) * FINE;
    double x = (lateral + MARGIN_VOXELS) * FINE;
    int iz = Math.max(1, Math.min(depths - 3, (int) z));
    int ix = Math.max(1, Math.min(laterals - 3, (int) x));
    double u = Math.max(0, Math.min(1, x - ix));
    double x0 = ((-0.5 * u + 1) * u - 0.5) * u;
    double x1 = (1.5 * u - 2.5) * u * u + 1;
    double x2 = ((-1.5 * u + 2) * u + 0.5) * u;
    double x3 = (0.5 * u - 0.5) * u * u;
    double w = Math.max(0, Math.min(1, z - iz));
    int i = (iz - 1) * laterals + ix - 1;
    double above = line(i, x0, x1, x2, x3);
    double first = line(i + laterals, x0, x1, x2, x3);
    double second = line(i + 2 * laterals, x0, x1, x2, x3);
    double below = line(i + 3 * laterals, x0, x1, x2, x3);
    return (((-0.5 * w + 1) * w - 0.5) * w) * above
        + ((1.5 * w - 2.5) * w * w + 1) * first
        + (((-1.5 * w + 2) * w + 0.5) * w) * second
        + ((0.5 * w - 0.5) * w * w) * below;
  }

  private double line(int i, double x0, double x1, double x2, double x3) {
    return x0 * samples[i] + x1 * samples[i + 1] + x2 * samples[i + 2] + x3 * samples[i + 3];
  }
}
