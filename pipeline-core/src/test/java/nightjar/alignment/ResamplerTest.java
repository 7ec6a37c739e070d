package nightjar.alignment;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import nightjar.recording.RigidMotion;
import org.junit.jupiter.api.Test;

class ResamplerTest {
  private static final Slab SLAB =
      Slab.of(MovingTexture.plane(20, 24), AlignmentSettings.Scope.PLANE).get(0);

  private static float[] resampled(float[] frame, RigidMotion motion) {
    float[] aligned = new float[frame.length];
    new Resampler(SLAB).resample(frame, new Placement(SLAB, Pose.of(motion)), aligned);
    return aligned;
  }

  @Test
  void wholeVoxelsAreMovedAsTheyAre() {
    float[] frame = new float[480];
    for (int v = 0; v < 480; v++) {
      frame[v] = v * v % 97;
    }
    float[] aligned = resampled(frame, MovingTexture.shifted(0.2, -0.3));
    for (int z = 0; z < 18; z++) {
      for (int x = 3; x < 24; x++) {
        // Floats of up to 100: a few units in the last place.
        assertEquals(frame[(z + 2) * 24 + x - 3], aligned[z * 24 + x], 1e-4);
      }
    }
  }

  @Test
  void thereIsNoNegativePowerBesideAVesselButDifferencesMayBeNegative() {
    float[] frame = new float[480];
    frame[10 * 24 + 12] = 1000;
    RigidMotion half = MovingTexture.shifted(0.05, 0.05);
    for (float v : resampled(frame, half)) {
      assertTrue(Float.isNaN(v) || v >= 0, "power " + v);
    }
    frame[0] = -1;
    float least = 0;
    for (float v : resampled(frame, half)) {
      least = Math.min(least, v);
    }
    assertTrue(least < -10, "the spline undershoots: " + least);
  }

  @Test
  void oneMissingVoxelTakesItsNeighboursOnlyWhereTheyLeanOnIt() {
    float[] frame = new float[480];
    Arrays.fill(frame, 5);
    frame[10 * 24 + 12] = Float.NaN;
    assertEquals(1, missing(resampled(frame, RigidMotion.NONE)));
    assertEquals(2, missing(resampled(frame, MovingTexture.shifted(0.05, 0))));
    assertEquals(4, missing(resampled(frame, MovingTexture.shifted(0.03, 0.04))));
    for (float v : resampled(frame, MovingTexture.shifted(0.03, 0.04))) {
      assertTrue(Float.isNaN(v) || Math.abs(v - 5) < 1e-5);
    }
  }

  private static int missing(float[] values) {
    int count = 0;
    for (float v : values) {
      count += Float.isNaN(v) ? 1 : 0;
    }
    return count;
  }
}
