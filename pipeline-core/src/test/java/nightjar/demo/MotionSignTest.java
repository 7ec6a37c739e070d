package nightjar.demo;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Collections;
import java.util.List;
import nightjar.recording.EventTable;
import nightjar.recording.RigidMotion;
import org.junit.jupiter.api.Test;

/** Shifts and rotations in a film are those that the truth states, with their signs. */
class MotionSignTest {
  private static final int SIZE = 24;
  private static final DemoScan SCAN = new DemoScan(1, SIZE, SIZE, 40, 0.4, 0);
  private static final DemoSession SESSION =
      new DemoSession("s", 5, SCAN, new DemoAnimal("a", "young", 0, 0), DemoDisturbance.NONE, 0.3);

  /** Drift stays where it is when tissue moves; two places differ by less than this share. */
  private static final double DRIFT = 0.16;

  @Test
  void positiveShiftsAreDeeperAndTowardsLargerLateral() {
    double step = SCAN.spacingMillimetres();
    double[] still = tissue(RigidMotion.NONE);
    double[] moved = tissue(new RigidMotion(3 * step, 2 * step, 0, 0, 0, 0));
    for (int z = 0; z < SIZE - 3; z++) {
      for (int x = 0; x < SIZE - 2; x++) {
        assertEquals(1, moved[(z + 3) * SIZE + x + 2] / still[z * SIZE + x], DRIFT);
      }
    }
  }

  @Test
  void positiveRotationsTurnFromDepthTowardsLateral() {
    double[] still = tissue(RigidMotion.NONE);
    double[] turned = tissue(new RigidMotion(0, 0, 0, 90, 0, 0));
    for (int z = 0; z < SIZE; z++) {
      for (int x = 0; x < SIZE; x++) {
        // About the centre (dz, dx) goes to (-dx, dz).
        assertEquals(1, turned[(SIZE - 1 - x) * SIZE + z] / still[z * SIZE + x], DRIFT);
      }
    }
  }

  /** The first frame without its speckle. */
  private static double[] tissue(RigidMotion motion) {
    DemoTruth truth =
        new DemoTruth(
            new EventTable("none", List.of()),
            Collections.nCopies(SCAN.frames(), motion),
            List.of());
    float[] frame = new float[SIZE * SIZE];
    new FilmMaker(SESSION, truth).next(frame);
    Speckle speckle = new Speckle(SCAN, SESSION.rho());
    speckle.next(new NormalStream(SESSION.seed(), Purpose.speckle(0)), true);
    double[] tissue = new double[frame.length];
    for (int v = 0; v < frame.length; v++) {
      tissue[v] = frame[v] / speckle.factor(v);
    }
    return tissue;
  }
}
