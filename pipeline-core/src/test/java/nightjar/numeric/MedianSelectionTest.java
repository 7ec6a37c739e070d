package nightjar.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

class MedianSelectionTest {
  @Test
  void agreesWithSorting() {
    Random random = new Random(8);
    for (int i = 0; i < 500; i++) {
      int n = 1 + random.nextInt(60);
      double[] a = random.doubles(n + 3).toArray();
      if (i % 2 == 0) {
        for (int k = 0; k < n; k++) {
          a[k] = Math.floor(4 * a[k]); // many ties
        }
      }
      double[] sorted = Arrays.copyOf(a, n);
      Arrays.sort(sorted);
      double want = 0.5 * (sorted[(n - 1) / 2] + sorted[n / 2]);
      assertEquals(want, Median.selecting(a, n), "seed 8, draw " + i);
    }
  }

  @Test
  void hasNoMedianOfNothing() {
    assertTrue(Double.isNaN(Median.selecting(new double[] {1}, 0)));
  }
}
