package nightjar.recording;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class FrameTimesTest {
  @Test
  void stepsOfTwoToTenIntervalsAreMissingFrames() {
    FrameTimes t = FrameTimes.of(new double[] {0, 1, 2, 4, 14, 15, 16});
    assertEquals(1, t.intervalSeconds());
    assertEquals(1, t.segments());
    assertEquals(4, t.gridPosition(3));
    assertEquals(14, t.gridPosition(4));
    assertEquals(16, t.gridPosition(6));
    assertEquals(17, t.recordedLengthSeconds(), 1e-12);
  }

  @Test
  void aLongerStepIsAGapThatIsClosedToOneInterval() {
    FrameTimes t = FrameTimes.of(new double[] {0, 1, 2, 13, 14, 15});
    assertEquals(2, t.segments());
    assertEquals(0, t.segment(2));
    assertEquals(1, t.segment(3));
    assertEquals(3, t.gridPosition(3));
    assertEquals(3.5, t.recordedSeconds(3), 1e-12);
    assertEquals(6, t.recordedLengthSeconds(), 1e-12);
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3})
  void aJitteringClockIsNotCutToPieces(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    double[] t = new double[500];
    for (int i = 1; i < t.length; i++) {
      t[i] = t[i - 1] + 0.4 * (1 + 0.45 * (2 * random.nextDouble() - 1));
    }
    FrameTimes times = FrameTimes.of(t);
    assertEquals(1, times.segments());
    assertEquals(499, times.gridPosition(499), "seed " + seed);
  }

  @Test
  void aConstantOffsetMovesNothingOnTheGrid() {
    double[] a = {0, 0.4, 0.8, 1.6, 9.6, 10.0, 10.4};
    double[] b = a.clone();
    for (int i = 0; i < b.length; i++) {
      b[i] += 1024;
    }
    FrameTimes x = FrameTimes.of(a);
    FrameTimes y = FrameTimes.of(b);
    for (int i = 0; i < a.length; i++) {
      assertEquals(x.gridPosition(i), y.gridPosition(i));
      assertEquals(x.segment(i), y.segment(i));
      assertEquals(x.recordedSeconds(i), y.recordedSeconds(i), 1e-9);
    }
  }

  @Test
  void refusesTimesThatDoNotIncrease() {
    assertThrows(IllegalArgumentException.class, () -> FrameTimes.of(new double[] {0, 1, 1, 2}));
    assertThrows(IllegalArgumentException.class, () -> FrameTimes.of(new double[] {0}));
  }
}
