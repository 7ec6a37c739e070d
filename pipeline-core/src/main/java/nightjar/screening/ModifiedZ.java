package nightjar.screening;

import nightjar.numeric.Selection;

/**
 * Modified z-score 0.6745 (x - median) / MAD [Iglewicz & Hoaglin 1993, How to Detect and Handle
 * Outliers; NIST/SEMATECH e-Handbook of Statistical Methods 1.3.5.17].
 */
final class ModifiedZ {
  private static final double NORMAL_QUARTILE = 0.6745;

  private ModifiedZ() {}

  /**
   * The scores; NaN where {@code x} is. Where over half of the values are equal the MAD is 0: these
   * score 0 and all others infinity.
   */
  static double[] of(double[] x) {
    double median = median(x);
    double[] deviations = new double[x.length];
    for (int i = 0; i < x.length; i++) {
      deviations[i] = Math.abs(x[i] - median);
    }
    double mad = median(deviations);
    double[] z = new double[x.length];
    for (int i = 0; i < x.length; i++) {
      z[i] = x[i] == median ? 0 : NORMAL_QUARTILE * (x[i] - median) / mad;
    }
    return z;
  }

  /** Median of the values that are numbers. */
  static double median(double[] x) {
    double[] there = new double[x.length];
    int n = 0;
    for (double v : x) {
      if (!Double.isNaN(v)) {
        there[n++] = v;
      }
    }
    return Selection.median(there, n);
  }
}
