package nightjar.inference;

import java.util.stream.IntStream;
import nightjar.glm.GlmFit;

/**
 * p values of every contrast adjusted over the series, each contrast by itself; nothing is
 * corrected over contrasts. Immutable.
 */
public final class AdjustedTests {
  private final double[][] q;

  private AdjustedTests(double[][] q) {
    this.q = q;
  }

  /** Adjusts the first {@code contrasts} contrasts of a fit. */
  public static AdjustedTests of(GlmFit fit, int contrasts, InferenceSettings settings) {
    return new AdjustedTests(
        IntStream.range(0, contrasts)
            .mapToObj(c -> MultipleTests.adjust(fit.p(c), settings.adjustment()))
            .toArray(double[][]::new));
  }

  /** Adjusted p of contrast {@code c}, one a series; shared, not copied. */
  public double[] q(int c) {
    return q[c];
  }
}
