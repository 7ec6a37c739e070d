package nightjar.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class RobustRegressionReferenceTest {
  /** Brownlee's stack loss data [Brownlee 1965, Statistical Theory and Methodology, p. 454]. */
  private static final double[] AIR = {
    80, 80, 75, 62, 62, 62, 62, 62, 58, 58, 58, 58, 58, 58, 50, 50, 50, 50, 50, 56, 70
  };

  private static final double[] WATER = {
    27, 27, 25, 24, 22, 23, 24, 24, 23, 18, 18, 17, 18, 19, 18, 18, 19, 19, 20, 20, 20
  };
  private static final double[] ACID = {
    89, 88, 90, 87, 87, 87, 93, 93, 87, 80, 89, 88, 82, 93, 89, 86, 72, 79, 80, 82, 91
  };
  private static final double[] LOSS = {
    42, 37, 37, 28, 18, 18, 19, 20, 15, 14, 14, 13, 11, 12, 8, 7, 8, 8, 9, 15, 15
  };

  private static double[] ones(int n) {
    double[] x = new double[n];
    Arrays.fill(x, 1);
    return x;
  }

  /**
   * Bisquare estimates with the scale by the median absolute residual, as R's MASS prints them for
   * these data (from memory; the same to all digits from an independent iteration in numpy).
   */
  @Test
  void findsThePublishedBisquareEstimatesOfTheStackLossData() {
    RobustRegression fit = RobustRegression.fit(List.of(ones(21), AIR, WATER, ACID), LOSS);
    double[] published = {-42.28532154, 0.92755899, 0.6507112, -0.11233312};
    for (int j = 0; j < published.length; j++) {
      // The iteration ends at 1e-8 of the scale 2.28, but converges linearly.
      assertEquals(published[j], fit.coefficient(j), 1e-6 * Math.abs(published[j]));
    }
    // Observation 21, the worst of this data set's known outliers, is all but left aside.
    for (int i = 0; i < 20; i++) {
      assertTrue(fit.weight(i) > 0.3, "observation " + (i + 1));
    }
    assertEquals(0, fit.weight(20), 0.01);
  }

  @Test
  void aFewWildRowsDoNotMoveTheCoefficients() {
    SplittableRandom random = new SplittableRandom(4);
    int n = 400;
    double[] x = random.doubles(n, -1, 1).toArray();
    double[] y = new double[n];
    for (int i = 0; i < n; i++) {
      y[i] = 2 + 3 * x[i] + 0.01 * (random.nextDouble() - 0.5) + (i % 20 == 0 ? 40 : 0);
    }
    RobustRegression fit = RobustRegression.fit(List.of(ones(n), x, x.clone()), y);
    // Noise of sd 0.003 over 380 rows: standard errors below 3e-4; four of them.
    assertEquals(2, fit.coefficient(0), 1.2e-3);
    assertEquals(3, fit.coefficient(1), 1.2e-3);
    assertEquals(0, fit.coefficient(2), "a repeated column");
    assertEquals(0, fit.weight(20));
  }

  @Test
  void anExactFitIsLeftAsItIs() {
    double[] x = {1, 2, 3, 4, 5};
    RobustRegression fit = RobustRegression.fit(List.of(x), new double[] {2, 4, 6, 8, 10});
    assertEquals(2, fit.coefficient(0), 1e-14);
    assertEquals(1, fit.weight(2));
  }
}
