package nightjar.mask;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Arrays;
import java.util.SplittableRandom;
import java.util.stream.DoubleStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class OtsuReferenceTest {
  /**
   * A 6 x 6 image of six grey levels with 8, 7, 2, 6, 9, 4 cells, a common teaching example (from
   * memory): the variance within classes is smallest, 0.4909, with levels 0 to 2 below.
   */
  @Test
  void splitsTheTeachingExampleBelowLevelThree() {
    int[] cells = {8, 7, 2, 6, 9, 4};
    double[] image = new double[36];
    int n = 0;
    for (int level = 0; level < cells.length; level++) {
      Arrays.fill(image, n, n += cells[level], level);
    }
    assertEquals(2, Otsu.threshold(image));
    assertEquals(0.4909, within(image, 2), 5e-5);
  }

  @ParameterizedTest
  @ValueSource(ints = {2, 3, 10, 101, 400})
  void hasTheLeastVarianceWithinClassesOfAllSplits(int n) {
    SplittableRandom random = new SplittableRandom(n);
    double[] values =
        random.doubles(n).map(u -> u < 0.3 ? 5 + Math.round(20 * u) : 10 * u).toArray();
    double best =
        Arrays.stream(values)
            .filter(v -> v < Arrays.stream(values).max().orElseThrow())
            .map(v -> within(values, v))
            .min()
            .orElseThrow();
    // Two formulas of the same split: rounding of sums of n numbers around 10.
    assertEquals(best, within(values, Otsu.threshold(values)), 1e-11);
  }

  @Test
  void leavesMissingValuesOut() {
    assertEquals(2, Otsu.threshold(new double[] {1, Double.NaN, 9, 2, 10, Double.NaN}));
  }

  @Test
  void doesNotSplitWhatIsAllAlike() {
    assertEquals(Double.NEGATIVE_INFINITY, Otsu.threshold(new double[] {3, 3, 3}));
  }

  private static double within(double[] values, double threshold) {
    double sum = 0;
    for (boolean upper : new boolean[] {false, true}) {
      double[] part = Arrays.stream(values).filter(v -> (v > threshold) == upper).toArray();
      double mean = DoubleStream.of(part).average().orElse(0);
      sum += DoubleStream.of(part).map(v -> (v - mean) * (v - mean)).sum();
    }
    return sum / values.length;
  }
}
