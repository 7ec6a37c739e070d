package nightjar.numeric;

/**
 * Modified z-scores {@code 0.6745 (x - median) / MAD}, MAD being the median absolute deviation from
 * the median [Iglewicz & Hoaglin 1993, How to Detect and Handle Outliers; NIST/SEMATECH e-Handbook
 * 1.3.5.17]. Missing values (NaN) enter neither median and score NaN.
 *
 * @param median of the values
 * @param deviation median absolute deviation from it
 */
public record ModifiedScore(double median, double deviation) {
  private static final double NORMAL_QUARTILE = 0.6745;

  /** Median and MAD of {@code values}, which are not modified. */
  public static ModifiedScore of(double[] values) {
    double median = Median.of(values);
    double[] distance = new double[values.length];
    for (int i = 0; i < values.length; i++) {
      distance[i] = Math.abs(values[i] - median);
    }
    return new ModifiedScore(median, Median.sorting(distance, distance.length));
  }

  /** Score of {@code x}: 0 at the median, infinite off it where more than half agree exactly. */
  public double z(double x) {
    double off = x - median;
    return off == 0 ? 0 : NORMAL_QUARTILE * off / deviation;
  }
}
