package nightjar.screening;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

class MedianOfFiveTest {
  @Test
  void isTheMiddleForEveryOrderWithAndWithoutTies() {
    // Every choice of five values out of 0 to 4, ties included.
    int columns = 5 * 5 * 5 * 5 * 5;
    float[][] rows = new float[5][columns];
    for (int v = 0; v < columns; v++) {
      int code = v;
      for (int i = 0; i < 5; i++) {
        rows[i][v] = code % 5;
        code /= 5;
      }
    }
    float[] median = new float[columns];
    MedianOfFive.ofFull(rows, median, columns);
    for (int v = 0; v < columns; v++) {
      int below = 0;
      int above = 0;
      for (float[] row : rows) {
        below += row[v] < median[v] ? 1 : 0;
        above += row[v] > median[v] ? 1 : 0;
      }
      assertTrue(below <= 2 && above <= 2, "column " + v);
    }
  }

  @Test
  void aMissingValueShowsAndTheSlowWayLeavesItOut() {
    float[][] rows = {{1}, {5}, {Float.NaN}, {2}, {9}};
    float[] median = new float[1];
    MedianOfFive.ofFull(rows, median, 1);
    assertTrue(Float.isNaN(median[0]));
    assertEquals(3.5f, MedianOfFive.of(rows, 5, 0, new float[5]));
  }
}
