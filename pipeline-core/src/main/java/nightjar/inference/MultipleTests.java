package nightjar.inference;

import java.util.Arrays;

/** Adjustment of p values for many tests. NaN stays NaN and does not count as a test. */
public final class MultipleTests {
  private MultipleTests() {}

  /** Adjusted p values, in the order given; {@code p} is not modified. */
  public static double[] adjust(double[] p, InferenceSettings.Adjustment adjustment) {
    int[] order = ascending(p);
    return switch (adjustment) {
      case BH -> stepUp(p, order, 1);
      case BY -> stepUp(p, order, harmonic(order.length));
      case BONFERRONI -> each(p, order.length, (x, m) -> Math.min(1, x * m));
      case SIDAK -> each(p, order.length, (x, m) -> -Math.expm1(m * Math.log1p(-x)));
    };
  }

  /** Positions of the values that are numbers, ascending by value. */
  private static int[] ascending(double[] p) {
    return java.util.stream.IntStream.range(0, p.length)
        .filter(i -> !Double.isNaN(p[i]))
        .boxed()
        .sorted(java.util.Comparator.comparingDouble(i -> p[i]))
        .mapToInt(Integer::intValue)
        .toArray();
  }

  /**
   * {@code min over k >= i of p_(k) m c / k}: Benjamini & Hochberg 1995, J R Stat Soc B 57:289 with
   * c = 1; Benjamini & Yekutieli 2001, Ann Stat 29:1165 with c = 1 + 1/2 + ... + 1/m.
   */
  private static double[] stepUp(double[] p, int[] order, double factor) {
    double[] q = new double[p.length];
    Arrays.fill(q, Double.NaN);
    double smallest = 1;
    for (int k = order.length; k >= 1; k--) {
      int i = order[k - 1];
      smallest = Math.min(smallest, p[i] * order.length / k * factor);
      q[i] = smallest;
    }
    return q;
  }

  private static double harmonic(int m) {
    double c = 0;
    for (int i = m; i >= 1; i--) {
      c += 1.0 / i;
    }
    return c;
  }

  private interface SingleStep {
    double of(double p, int tests);
  }

  private static double[] each(double[] p, int tests, SingleStep step) {
    return Arrays.stream(p).map(x -> Double.isNaN(x) ? x : step.of(x, tests)).toArray();
  }
}
