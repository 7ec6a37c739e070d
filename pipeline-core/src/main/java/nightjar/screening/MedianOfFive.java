package nightjar.screening;

import nightjar.numeric.Median;

/** Medians over a few rows, value by value. */
final class MedianOfFive {
  private MedianOfFive() {}

  /**
   * Median of five rows by a sorting network: the smallest of two pairs' smaller and the largest of
   * their larger values cannot be the median; it is the median of the other three. NaN where any of
   * the five is NaN.
   *
   * @param into modified in {@code [0, width)}
   */
  static void ofFull(float[][] rows, float[] into, int width) {
    float[] a = rows[0];
    float[] b = rows[1];
    float[] c = rows[2];
    float[] d = rows[3];
    float[] e = rows[4];
    for (int v = 0; v < width; v++) {
      float low = Math.max(Math.min(a[v], b[v]), Math.min(c[v], d[v]));
      float high = Math.min(Math.max(a[v], b[v]), Math.max(c[v], d[v]));
      float least = Math.min(low, high);
      float most = Math.max(low, high);
      into[v] = Math.max(least, Math.min(most, e[v]));
    }
  }

  /** Median of one column of the first {@code count} rows, NaN left out. */
  static float of(float[][] rows, int count, int v, float[] scratch) {
    for (int i = 0; i < count; i++) {
      scratch[i] = rows[i][v];
    }
    return Median.sorting(scratch, count);
  }
}
