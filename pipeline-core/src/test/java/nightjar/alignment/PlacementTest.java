package nightjar.alignment;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Random;
import nightjar.recording.Axis;
import nightjar.recording.Grid;
import nightjar.recording.RigidMotion;
import org.junit.jupiter.api.Test;

class PlacementTest {
  private static final Grid GRID =
      new Grid(
          MovingTexture.axis(3, 0.4),
          MovingTexture.axis(12, 0.1),
          Axis.of(0.9, 0.7, 0.5, 0.3, 0.1, -0.1, -0.3, -0.5),
          true);
  private static final Slab SLAB = Slab.of(GRID, AlignmentSettings.Scope.VOLUME).get(0);

  @Test
  void withoutMotionEveryVoxelIsWhereItIs() {
    Placement place = new Placement(SLAB, Pose.IDENTITY);
    assertEquals(2, place.plane(2, 5, 7), 1e-12);
    assertEquals(5, place.depth(2, 5, 7), 1e-12);
    assertEquals(7, place.lateral(2, 5, 7), 1e-12);
    assertEquals(0, place.firstInField(2, 11));
    assertEquals(8, place.endInField(2, 11, 0));
  }

  @Test
  void aShiftCountsInVoxelsOfItsAxis() {
    Placement place = new Placement(SLAB, Pose.of(new RigidMotion(0.25, 0.3, -0.2, 0, 0, 0)));
    assertEquals(0.5, place.plane(1, 5, 4), 1e-12);
    assertEquals(7.5, place.depth(1, 5, 4), 1e-12);
    // Lateral coordinates fall by 0.2 mm a voxel.
    assertEquals(2.5, place.lateral(1, 5, 4), 1e-12);
  }

  @Test
  void aQuarterTurnTakesDepthToLateral() {
    Placement place = new Placement(SLAB, Pose.of(new RigidMotion(0, 0, 0, 90, 0, 0)));
    // Voxel (7, 3) lies (0.15, 0.1) mm from the centre (5.5, 3.5), and comes to (-0.1, 0.15) mm.
    assertEquals(5.5 - 0.1 / 0.1, place.depth(1, 7, 3), 1e-12);
    assertEquals(3.5 - 0.15 / 0.2, place.lateral(1, 7, 3), 1e-12);
  }

  @Test
  void theRangeOfARowIsWhatLiesInTheField() {
    Random random = new Random(41);
    for (int i = 0; i < 300; i++) {
      RigidMotion m =
          new RigidMotion(
              0.5 * random.nextGaussian(),
              0.5 * random.nextGaussian(),
              0.4 * random.nextGaussian(),
              30 * random.nextGaussian(),
              20 * random.nextGaussian(),
              20 * random.nextGaussian());
      Placement place = new Placement(SLAB, Pose.of(m));
      for (int row = 0; row < 36; row++) {
        int first = place.firstInField(row / 12, row % 12);
        int end = place.endInField(row / 12, row % 12, first);
        for (int x = 0; x < 8; x++) {
          assertEquals(
              x >= first && x < end, place.inField(row / 12, row % 12, x), "seed 41, draw " + i);
        }
      }
    }
  }
}
