package nightjar.screening;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Arrays;
import org.junit.jupiter.api.Test;

class EvenSampleTest {
  @Test
  void takesAllWhereFewAreThereAndSpreadsOtherwise() {
    assertArrayEquals(new int[] {0, 1, 2}, EvenSample.of(3, 5));
    assertArrayEquals(new int[] {1, 5, 8}, EvenSample.of(10, 3));
    assertArrayEquals(new int[0], EvenSample.of(0, 3));
  }

  @Test
  void positionsDiffer() {
    for (int n = 1; n < 300; n++) {
      assertEquals(Math.min(n, 101), Arrays.stream(EvenSample.of(n, 101)).distinct().count());
    }
  }
}
