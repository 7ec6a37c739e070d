package nightjar.mask;

import java.util.Arrays;

/**
 * Otsu's threshold [Otsu 1979, IEEE Trans Syst Man Cybern 9:62]: the split into two classes with
 * the largest variance between them, {@code w0 w1 (mean0 - mean1)^2}. Every split of the sorted
 * values is tried, so that no histogram and no bin width come in.
 */
final class Otsu {
  private Otsu() {}

  /**
   * The largest value of the lower class; values above it make the upper class. Where all values
   * agree there is nothing to split and the result is minus infinity: all are upper.
   *
   * @param values NaN is left out; not modified
   */
  static double threshold(double[] values) {
    double[] sorted = Arrays.stream(values).filter(v -> !Double.isNaN(v)).sorted().toArray();
    int n = sorted.length;
    double mean = Arrays.stream(sorted).average().orElse(0);
    double threshold = Double.NEGATIVE_INFINITY;
    double largest = 0;
    double below = 0;
    for (int k = 1; k < n; k++) {
      below += sorted[k - 1] - mean;
      if (sorted[k - 1] < sorted[k]) {
        // With sums from the mean, w0 w1 (mean0 - mean1)^2 n^2 = below^2 n^2 / (k (n - k)).
        double between = below * below / ((double) k * (n - k));
        if (between > largest) {
          largest = between;
          threshold = sorted[k - 1];
        }
      }
    }
    return threshold;
  }
}
