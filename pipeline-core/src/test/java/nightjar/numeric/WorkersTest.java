package nightjar.numeric;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class WorkersTest {
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 4})
  void everyPositionIsVisitedOnceInFixedBlocks(int threads) {
    int[] visits = new int[1001];
    int[] blockOf = new int[1001];
    try (Workers w = new Workers(threads)) {
      w.forEachBlock(
          1001,
          64,
          (first, end) -> {
            for (int i = first; i < end; i++) {
              visits[i]++;
              blockOf[i] = first;
            }
          });
    }
    int[] once = new int[1001];
    Arrays.fill(once, 1);
    assertArrayEquals(once, visits);
    assertEquals(960, blockOf[1000]);
  }

  @Test
  void theFirstFailureIsThrownToTheCaller() {
    try (Workers w = new Workers(2)) {
      IllegalStateException e =
          assertThrows(
              IllegalStateException.class,
              () ->
                  w.forEachBlock(
                      10,
                      1,
                      (first, end) -> {
                        if (first == 3) {
                          throw new IllegalStateException("block 3");
                        }
                      }));
      assertEquals("block 3", e.getMessage());
    }
  }

  @Test
  void refusesNoThreads() {
    assertThrows(IllegalArgumentException.class, () -> new Workers(0));
  }
}
