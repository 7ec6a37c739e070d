package nightjar.numeric;

import org.apache.commons.math3.distribution.TDistribution;
import org.apache.commons.math3.special.Beta;

/** Student's t distribution; fractional degrees of freedom allowed. */
public final class StudentT {
  private StudentT() {}

  /**
   * Two-sided tail {@code P(|T| >= |t|)} through the incomplete beta function [Abramowitz & Stegun
   * 1964, 26.7.1], accurate in the far tail down to the smallest double. NaN for NaN.
   */
  public static double twoSided(double t, double df) {
    if (Double.isNaN(t) || Double.isNaN(df)) {
      return Double.NaN;
    }
    double t2 = t * t;
    if (Double.isInfinite(t2)) {
      return 0;
    }
    // Near the centre the complement keeps its digits, in the tails the tail itself.
    return t2 > 1
        ? Beta.regularizedBeta(df / (df + t2), 0.5 * df, 0.5)
        : 1 - Beta.regularizedBeta(t2 / (df + t2), 0.5, 0.5 * df);
  }

  /** The value that T exceeds with probability {@code upper}, 0 &lt; upper &lt; 1. */
  public static double quantile(double upper, double df) {
    return -new TDistribution(null, df).inverseCumulativeProbability(upper);
  }
}
