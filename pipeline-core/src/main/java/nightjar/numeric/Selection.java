package nightjar.numeric;

/** Medians in linear time, in caller-owned arrays (Hoare 1961, Commun ACM 4:321). */
public final class Selection {
  private Selection() {}

  /**
   * Median of the first {@code n} values, the mean of the middle two where n is even.
   *
   * @param a modified: its order changes; no NaN
   * @return NaN where n is 0
   */
  public static double median(double[] a, int n) {
    if (n == 0) {
      return Double.NaN;
    }
    int k = n / 2;
    double upper = smallest(a, n, k);
    if (n % 2 == 1) {
      return upper;
    }
    double lower = a[0];
    for (int i = 1; i < k; i++) {
      lower = Math.max(lower, a[i]);
    }
    return 0.5 * (lower + upper);
  }

  /** Puts the k-th smallest at k, nothing larger before it, nothing smaller behind it. */
  private static double smallest(double[] a, int n, int k) {
    int low = 0;
    int high = n - 1;
    while (low < high) {
      double pivot = medianOfThree(a[low], a[(low + high) >>> 1], a[high]);
      int i = low;
      int j = high;
      while (i <= j) {
        while (a[i] < pivot) {
          i++;
        }
        while (a[j] > pivot) {
          j--;
        }
        if (i <= j) {
          double t = a[i];
          a[i++] = a[j];
          a[j--] = t;
        }
      }
      if (k <= j) {
        high = j;
      } else if (k >= i) {
        low = i;
      } else {
        break;
      }
    }
    return a[k];
  }

  private static double medianOfThree(double a, double b, double c) {
    return Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
  }
}
