package nightjar.mask;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Arrays;
import nightjar.checks.Grids;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import org.junit.jupiter.api.Test;

class PowerMaskTest {
  private static final Grid GRID = Grids.of(2, 12, 14);

  /** A bright disc with a dark middle and a bright speck apart, in both planes. */
  private static float[] image() {
    float[] power = new float[GRID.voxels()];
    for (int v = 0; v < power.length; v++) {
      double r = Math.hypot(GRID.depthOf(v) - 5.5, GRID.lateralOf(v) - 5.5);
      boolean speck = GRID.depthOf(v) == 11 && GRID.lateralOf(v) == 13;
      power[v] = (r > 1 && r < 4.5) || speck ? 10 + v % 7 : 1 + 0.1f * (v % 3);
    }
    return power;
  }

  private static boolean inDisc(int v) {
    return Math.hypot(GRID.depthOf(v) - 5.5, GRID.lateralOf(v) - 5.5) < 4.5;
  }

  @Test
  void isTheLargestBrightPartOfEachPlaneWithItsHolesFilled() {
    Mask mask = PowerMask.provisional(image(), GRID, 5);
    assertEquals(Mask.of(GRID.voxels(), PowerMaskTest::inDisc), mask);
  }

  @Test
  void doesNotDependOnTheUnitOfPower() {
    float[] other = image();
    for (int v = 0; v < other.length; v++) {
      other[v] *= 4096;
    }
    assertEquals(
        PowerMask.provisional(image(), GRID, 5), PowerMask.provisional(other, GRID, 5 * 4096));
  }

  @Test
  void zerosAreFlooredAndCountAsDark() {
    float[] power = image();
    for (int v = 0; v < power.length; v++) {
      power[v] = power[v] < 3 ? 0 : power[v];
    }
    assertEquals(
        Mask.of(GRID.voxels(), PowerMaskTest::inDisc), PowerMask.provisional(power, GRID, 5));
  }

  @Test
  void neverHoldsAVoxelWithoutPower() {
    float[] power = image();
    int centre = GRID.index(1, 5, 5);
    power[centre] = Float.NaN;
    Mask mask = PowerMask.provisional(power, GRID, 5);
    assertEquals(Mask.of(GRID.voxels(), v -> inDisc(v) && v != centre), mask);
  }

  @Test
  void aPlaneWithoutBrightVoxelsIsEmpty() {
    float[] power = image();
    Arrays.fill(power, 0, GRID.planeVoxels(), 1);
    Mask mask = PowerMask.provisional(power, GRID, 5);
    assertEquals(Mask.of(GRID.voxels(), v -> GRID.planeOf(v) == 1 && inDisc(v)), mask);
  }
}
