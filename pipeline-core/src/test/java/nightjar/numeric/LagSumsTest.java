package nightjar.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.SplittableRandom;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class LagSumsTest {
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 7, 64, 101})
  void equalsTheDirectSums(int n) {
    SplittableRandom random = new SplittableRandom(n);
    double[] x = random.doubles(n).toArray();
    double[] y = random.doubles(n).toArray();
    LagSums sums = new LagSums(n);
    sums.add(x, y, 2);
    sums.add(x, x, -1);
    double[] got = sums.sums();
    for (int k = 0; k < n; k++) {
      double want = 0;
      for (int i = 0; i + k < n; i++) {
        want += 2 * x[i] * y[i + k] - x[i] * x[i + k];
      }
      assertEquals(want, got[k], 1e-12 * n);
    }
  }
}
