package nightjar.screening;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import nightjar.checks.Grids;
import nightjar.recording.FrameMotion;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.RigidMotion;
import org.junit.jupiter.api.Test;

class MedianPositionTest {
  private static final Grid GRID = Grids.of(2, 21, 31);

  private static double[] distances(boolean whole, Mask mask, RigidMotion... motions) {
    List<List<RigidMotion>> all =
        java.util.Arrays.stream(motions).map(m -> whole ? List.of(m) : List.of(m, m)).toList();
    FrameMotion motion = new FrameMotion(whole, all, new double[motions.length][whole ? 1 : 2]);
    return MedianPosition.distances(motion, whole ? 0 : 1, GRID, mask);
  }

  private static RigidMotion motion(double z, double x, double p, double turn, double tilt) {
    return new RigidMotion(z, x, p, turn, tilt, 0);
  }

  @Test
  void aShiftCountsByItsLengthFromTheMedian() {
    double[] d =
        distances(
            false,
            Mask.all(GRID.voxels()),
            motion(1, 2, 0, 0, 0),
            motion(1.3, 2.4, 0, 0, 0),
            motion(1, 2, 0, 0, 0));
    assertEquals(0, d[0], 1e-12);
    assertEquals(0.5, d[1], 1e-12);
  }

  @Test
  void aTurnCountsByTheDistanceFromTheCentre() {
    // One voxel 1 mm below the centre and one 1.5 mm beside it, both in plane 1.
    Mask mask =
        Mask.of(GRID.voxels(), v -> v == GRID.index(1, 20, 15) || v == GRID.index(1, 10, 30));
    double[] d = distances(false, mask, RigidMotion.NONE, motion(0, 0, 0, 2, 0), RigidMotion.NONE);
    assertEquals(Math.toRadians(2) * 1.25, d[1], 1e-12);
  }

  @Test
  void aTiltOfTheWholeVolumeCountsThroughThePlanes() {
    // Plane 1 lies 0.2 mm from the centre: depth moves by the tilt times that.
    Mask mask = Mask.of(GRID.voxels(), v -> v == GRID.index(1, 10, 15));
    double[] d = distances(true, mask, RigidMotion.NONE, motion(0, 0, 0.3, 0, 1), RigidMotion.NONE);
    assertEquals(Math.hypot(0.3, Math.toRadians(1) * 0.2), d[1], 1e-12);
  }
}
