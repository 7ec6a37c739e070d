package nightjar.mask;

/**
 * The threshold that parts values into two classes with the largest variance between them [Otsu
 * 1979, IEEE Trans Syst Man Cybern 9:62], on a histogram of 256 bins.
 */
final class Otsu {
  private static final int BINS = 256;

  private Otsu() {}

  /**
   * The threshold: a value belongs to the upper class where it is larger.
   *
   * @param values NaN is left out
   * @return NaN without two different values
   */
  static double threshold(double[] values) {
    double lowest = Double.POSITIVE_INFINITY;
    double highest = Double.NEGATIVE_INFINITY;
    for (double v : values) {
      if (!Double.isNaN(v)) {
        lowest = Math.min(lowest, v);
        highest = Math.max(highest, v);
      }
    }
    if (!(highest > lowest)) {
      return Double.NaN;
    }
    double width = (highest - lowest) / BINS;
    long[] counts = new long[BINS];
    for (double v : values) {
      if (!Double.isNaN(v)) {
        counts[Math.min(BINS - 1, (int) ((v - lowest) / width))]++;
      }
    }
    return lowest + (bestSplit(counts) + 1) * width;
  }

  /** The last bin of the lower class; bins' own numbers stand for their values. */
  private static int bestSplit(long[] counts) {
    double all = 0;
    double sum = 0;
    for (int b = 0; b < counts.length; b++) {
      all += counts[b];
      sum += (double) counts[b] * b;
    }
    double below = 0;
    double sumBelow = 0;
    double best = -1;
    int split = 0;
    for (int b = 0; b < counts.length - 1; b++) {
      below += counts[b];
      sumBelow += (double) counts[b] * b;
      double above = all - below;
      if (below > 0 && above > 0) {
        double distance = sumBelow / below - (sum - sumBelow) / above;
        double between = below * above * distance * distance;
        if (between > best) {
          best = between;
          split = b;
        }
      }
    }
    return split;
  }
}
