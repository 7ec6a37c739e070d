package nightjar.numeric;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;

class MedianTest {
  private static final double NAN = Double.NaN;

  @Test
  void ofAnEvenNumberIsTheMeanOfTheMiddleTwo() {
    assertEquals(2.5, Median.of(new double[] {4, 1, 2, 3}));
    assertEquals(2.5f, Median.sorting(new float[] {4, 1, 2, 3, -9}, 4));
  }

  @Test
  void leavesMissingValuesOut() {
    assertEquals(2, Median.of(new double[] {NAN, 3, 1, NAN, 2}));
    assertEquals(NAN, Median.of(new double[] {NAN, NAN}));
    assertEquals(1.5f, Median.sorting(new float[] {Float.NaN, 2, 1}, 3));
  }

  @Test
  void runningWindowsAreCutAtBothEndsOfTheStretch() {
    double[] x = {100, 5, 1, 4, NAN, 2, 3, -100};
    double[] into = new double[x.length];
    Median.running(x, 1, 7, 3, into);
    // Windows: (5 1) (5 1 4) (1 4 -) (4 - 2) (- 2 3) (2 3).
    assertArrayEquals(new double[] {0, 3, 4, 2.5, 3, 2.5, 2.5, 0}, into);
  }
}
