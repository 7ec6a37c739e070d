package nightjar.numeric;

/** The gamma distribution of unit scale. */
public final class Gamma {
  private Gamma() {}

  /** Density {@code x^(a-1) e^-x / Gamma(a)} at {@code x > 0}. */
  public static double density(double shape, double x) {
    return Math.exp(
        (shape - 1) * Math.log(x) - x - org.apache.commons.math3.special.Gamma.logGamma(shape));
  }

  /** Regularised lower incomplete gamma function P(a, x), {@code x >= 0}. */
  public static double regularised(double shape, double x) {
    // Beyond this the complement is below the smallest double near 1, and the series would not
    // converge.
    if (x > shape + 60 + 12 * Math.sqrt(shape)) {
      return 1;
    }
    return org.apache.commons.math3.special.Gamma.regularizedGammaP(shape, x, 1e-15, 100_000);
  }
}
