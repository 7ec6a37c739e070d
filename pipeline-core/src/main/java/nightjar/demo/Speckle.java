package nightjar.demo;

/**
 * Multiplicative noise of power images: gamma-distributed with mean 1 (power is a mean of squares
 * over the pulses of an ensemble), first-order autoregressive in time, slightly smooth in space.
 * Made from a Gaussian field by the cube transform of Wilson & Hilferty 1931, PNAS 17:684, which at
 * this shape is nearly linear, so that the autocorrelation is that of the field within a
 * thousandth.
 */
final class Speckle {
  /** Shape of the gamma distribution; the coefficient of variation is 1/sqrt(shape). */
  static final double SHAPE = 400;

  private static final double NEIGHBOUR = 0.2;

  private final int planes;
  private final int depths;
  private final int laterals;
  private final double rho;
  private final float[] field;
  private final float[] padded;
  private final float[] half;

  Speckle(DemoScan scan, double rho) {
    planes = scan.planes();
    depths = scan.depths();
    laterals = scan.laterals();
    this.rho = rho;
    field = new float[planes * depths * laterals];
    padded = new float[(depths + 2) * (laterals + 2)];
    half = new float[depths * (laterals + 2)];
  }

  /** Moves the field one frame on; the first call draws it from its lasting distribution. */
  void next(NormalStream random, boolean isFirst) {
    double keep = isFirst ? 0 : rho;
    double share = StrictMath.sqrt(1 - keep * keep);
    double centre = 1 - 2 * NEIGHBOUR;
    // Smoothing along two axes shrinks the variance by the square of the sum of squared weights.
    double gain = share / (centre * centre + 2 * NEIGHBOUR * NEIGHBOUR);
    for (int p = 0; p < planes; p++) {
      smoothInnovation(random);
      for (int i = 0; i < depths; i++) {
        for (int x = 0; x < laterals; x++) {
          int h = i * (laterals + 2) + x;
          double e = NEIGHBOUR * (half[h] + half[h + 2]) + centre * half[h + 1];
          int v = (p * depths + i) * laterals + x;
          field[v] = (float) (keep * field[v] + gain * e);
        }
      }
    }
  }

  private void smoothInnovation(NormalStream random) {
    for (int i = 0; i < padded.length; i++) {
      padded[i] = (float) random.normal();
    }
    int width = laterals + 2;
    double centre = 1 - 2 * NEIGHBOUR;
    for (int i = 0; i < half.length; i++) {
      half[i] =
          (float) (NEIGHBOUR * (padded[i] + padded[i + 2 * width]) + centre * padded[i + width]);
    }
  }

  /** Factor of voxel {@code v} in this frame. */
  double factor(int v) {
    double u = 1 - 1 / (9 * SHAPE) + field[v] / (3 * StrictMath.sqrt(SHAPE));
    return u * u * u;
  }
}
