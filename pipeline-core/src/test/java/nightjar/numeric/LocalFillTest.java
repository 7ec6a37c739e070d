package nightjar.numeric;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;

class LocalFillTest {
  private static final float N = Float.NaN;

  @Test
  void aSingleHoleTakesTheMeanOfItsFourNeighbours() {
    float[] image = {9, 1, 9, 2, N, 4, 9, 5, 9};
    LocalFill.fill(image, 0, 3, 3);
    assertEquals(3, image[4]);
  }

  @Test
  void aWideHoleIsFilledFromItsRimInwards() {
    float[] image = {1, N, N, N, 5};
    LocalFill.fill(image, 0, 1, 5);
    assertArrayEquals(new float[] {1, 1, 3, 5, 5}, image);
  }

  @Test
  void leavesWhatIsThereAndWhatIsNotItsOwn() {
    float[] image = {N, 1, 2, N, 4, N};
    LocalFill.fill(image, 1, 2, 2);
    assertArrayEquals(new float[] {N, 1, 2, 2.5f, 4, N}, image);
  }

  @Test
  void anImageWithoutValuesIsZero() {
    float[] image = {N, N, N, N};
    LocalFill.fill(image, 0, 2, 2);
    assertArrayEquals(new float[4], image);
  }
}
