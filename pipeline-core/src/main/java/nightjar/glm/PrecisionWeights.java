package nightjar.glm;

/**
 * The inverse covariance of AR(1) noise over kept rows as a weighted sum of fixed quadratic forms.
 * Whitening is exact for missing frames: with h the lag to the row before, {@code row <- s_h (row -
 * rho^h before)}, {@code s_h^2 = (1 - rho^2) / (1 - rho^2h)}, the first row of a segment times
 * {@code sqrt(1 - rho^2)} [Markov property of the first-order autoregression; Prais & Winsten
 * 1954]. Multiplied out, a form of the whitened rows is
 *
 * <pre>
 * (1 + rho^2) total - rho neighbours - rho^2 ends + sum over h > 1 of [g_h own_h - c_h product_h]
 * g_h = (rho^2h - rho^2) / (1 - rho^2h),  c_h = rho^h (1 - rho^2) / (1 - rho^2h)
 * </pre>
 *
 * <p>total: every row with itself; neighbours: both products of rows at lag 1; ends: first and last
 * row of each segment; own_h, product_h: the rows of the pairs at lag h with themselves, and with
 * each other.
 */
final class PrecisionWeights {
  private final int[] longLags;

  PrecisionWeights(RowLinks links) {
    this.longLags = links.longLags();
  }

  /** Weights of the moments at {@code rho}. */
  void at(double rho, double[] weights) {
    double r2 = rho * rho;
    weights[0] = 1 + r2;
    weights[1] = -rho;
    weights[2] = -r2;
    for (int i = 0; i < longLags.length; i++) {
      double rh = Math.pow(rho, longLags[i]);
      double a = rh * rh;
      weights[3 + 2 * i] = (a - r2) / (1 - a);
      weights[4 + 2 * i] = -rh * (1 - r2) / (1 - a);
    }
  }

  /** Derivatives of the weights by rho. */
  void slopeAt(double rho, double[] slopes) {
    double r2 = rho * rho;
    slopes[0] = 2 * rho;
    slopes[1] = -1;
    slopes[2] = -2 * rho;
    for (int i = 0; i < longLags.length; i++) {
      int h = longLags[i];
      double rh = Math.pow(rho, h);
      double rhSlope = h * Math.pow(rho, h - 1);
      double a = rh * rh;
      double aSlope = 2 * rh * rhSlope;
      double d = 1 - a;
      slopes[3 + 2 * i] = ((aSlope - 2 * rho) * d + (a - r2) * aSlope) / (d * d);
      slopes[4 + 2 * i] =
          -((rhSlope * (1 - r2) - 2 * rho * rh) * d + rh * (1 - r2) * aSlope) / (d * d);
    }
  }
}
