package nightjar.alignment;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Random;
import nightjar.recording.RigidMotion;
import org.junit.jupiter.api.Test;

class PoseTest {
  @Test
  void anglesComeBackFromTheMatrix() {
    Random random = new Random(31);
    for (int i = 0; i < 100; i++) {
      RigidMotion m = motion(random);
      assertClose(m, Pose.of(m).motion());
    }
  }

  @Test
  void aDisplacementAfterItsOwnInverseIsNone() {
    Random random = new Random(32);
    for (int i = 0; i < 100; i++) {
      Pose pose = Pose.of(motion(random));
      assertClose(RigidMotion.NONE, pose.afterInverseOf(pose).motion());
      assertClose(pose.motion(), pose.afterInverseOf(Pose.IDENTITY).motion());
    }
  }

  @Test
  void aPointOnTheAxisOfATurnStaysWhereItIs() {
    Pose turn = Pose.of(new RigidMotion(0, 0, 0, 90, 0, 0));
    assertEquals(0, turn.displacement(3, 0, 0), 1e-12);
    assertEquals(Math.sqrt(8), turn.displacement(3, 2, 0), 1e-12);
    assertEquals(5, Pose.of(new RigidMotion(3, 4, 0, 0, 0, 0)).displacement(1, 2, 3), 1e-12);
  }

  private static RigidMotion motion(Random random) {
    return new RigidMotion(
        random.nextGaussian(),
        random.nextGaussian(),
        random.nextGaussian(),
        20 * random.nextGaussian(),
        20 * random.nextGaussian(),
        20 * random.nextGaussian());
  }

  private static void assertClose(RigidMotion want, RigidMotion got) {
    assertEquals(want.shiftDepthMillimetres(), got.shiftDepthMillimetres(), 1e-12);
    assertEquals(want.shiftLateralMillimetres(), got.shiftLateralMillimetres(), 1e-12);
    assertEquals(want.shiftPlaneMillimetres(), got.shiftPlaneMillimetres(), 1e-12);
    assertEquals(want.rotationDegrees(), got.rotationDegrees(), 1e-9);
    assertEquals(want.tiltDepthDegrees(), got.tiltDepthDegrees(), 1e-9);
    assertEquals(want.tiltLateralDegrees(), got.tiltLateralDegrees(), 1e-9);
  }
}
