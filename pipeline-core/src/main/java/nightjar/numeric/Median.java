package nightjar.numeric;

import java.util.Arrays;

/** Medians of numbers of which some may be missing (NaN). */
public final class Median {
  private Median() {}

  /** Median of the numbers in {@code values}; NaN where there is none. Not modified. */
  public static double of(double[] values) {
    return sorting(values.clone(), values.length);
  }

  /** Median of the first {@code count} values, NaN left out; {@code values} is put in order. */
  public static double sorting(double[] values, int count) {
    Arrays.sort(values, 0, count);
    int n = count;
    // The order of Double.compare puts NaN last.
    while (n > 0 && Double.isNaN(values[n - 1])) {
      n--;
    }
    if (n == 0) {
      return Double.NaN;
    }
    return n % 2 == 1 ? values[n / 2] : 0.5 * (values[n / 2 - 1] + values[n / 2]);
  }

  /** The same for floats. */
  public static float sorting(float[] values, int count) {
    Arrays.sort(values, 0, count);
    int n = count;
    while (n > 0 && Float.isNaN(values[n - 1])) {
      n--;
    }
    if (n == 0) {
      return Float.NaN;
    }
    return n % 2 == 1 ? values[n / 2] : 0.5f * (values[n / 2 - 1] + values[n / 2]);
  }

  /**
   * Running median over windows of {@code window} values around each, cut at both ends of the
   * stretch {@code [first, end)}; NaN is left out.
   *
   * @param into modified in {@code [first, end)}
   */
  public static void running(double[] values, int first, int end, int window, double[] into) {
    double[] around = new double[window];
    int half = window / 2;
    for (int i = first; i < end; i++) {
      int from = Math.max(first, i - half);
      int count = Math.min(end, i + half + 1) - from;
      System.arraycopy(values, from, around, 0, count);
      into[i] = sorting(around, count);
    }
  }

  /**
   * Median of the first {@code n} values, the mean of the middle two where n is even.
   *
   * @param a modified: its order changes; no NaN
   * @return NaN where n is 0
   */
  public static double selecting(double[] a, int n) {
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
