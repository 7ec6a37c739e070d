package nightjar.screening;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Set;
import nightjar.checks.Grids;
import nightjar.numeric.Workers;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.Progress;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class GrossPassTest {
  private static final Grid GRID = Grids.of(1, 20, 22);
  private static final int FRAMES = 120;
  private static final FrameTimes TIMES = Grids.everyFrame(FRAMES);

  private static GrossPass over(float[][] film, int threads) {
    try (Workers workers = new Workers(threads)) {
      return GrossPass.over("a.nc", Films.source(film, GRID, TIMES), workers, Progress.SILENT);
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3})
  void artefactsDoNotPassAndOthersDo(long seed) {
    float[][] film = Films.power(FRAMES, GRID, seed, t -> t == 5 ? 2 : t == 90 ? 0.5 : 1);
    Arrays.fill(film[33], 0, 60, Float.NaN);
    Arrays.fill(film[34], Float.NaN);
    film[35][4] = Float.NaN;
    GrossPass pass = over(film, 2);
    for (int t = 0; t < FRAMES; t++) {
      assertEquals(!Set.of(5, 90, 33, 34).contains(t), pass.passed(t), "frame " + t);
    }
    assertEquals(60, pass.missing(33));
    assertEquals(GRID.voxels(), pass.missing(34));
    assertEquals(1, pass.missing(35));
    assertEquals(0, pass.missing(36));
  }

  @Test
  void theMedianImageLeavesArtefactsAndMissingValuesOut() {
    float[][] film = Films.power(FRAMES, GRID, 4, t -> t >= 50 && t < 70 ? 5 : 1);
    for (float[] frame : film) {
      frame[17] = Float.NaN;
    }
    float[] image = over(film, 1).medianImage();
    for (int v = 0; v < image.length; v++) {
      float[] series = new float[FRAMES];
      int n = 0;
      for (int t = 0; t < FRAMES; t++) {
        if (t < 50 || t >= 70) {
          series[n++] = film[t][v];
        }
      }
      Arrays.sort(series, 0, n);
      // All 100 passed frames are within the limit of 101.
      float want = v == 17 ? Float.NaN : 0.5f * (series[49] + series[50]);
      assertEquals(want, image[v], "voxel " + v);
    }
  }

  @Test
  void theMostTypicalFramesAreNearestToTheMedianImage() {
    float[][] film = Films.power(FRAMES, GRID, 5, t -> 1);
    float[] image = over(film, 1).medianImage();
    for (int t = 0; t < FRAMES; t++) {
      for (int v = 0; v < image.length; v++) {
        // Frame t departs by t % 10 steps; every tenth frame is the image itself.
        film[t][v] = image[v] * (float) Math.exp(0.02 * (t % 10) * ((t + v) % 2 == 0 ? 1 : -1));
      }
    }
    GrossPass pass = over(film, 2);
    // 101 of the 120 frames are looked at, evenly spread: at least nine of each tenth.
    assertTrue(pass.typicalFrames(9).stream().allMatch(t -> t % 10 == 0));
    List<Integer> all = pass.typicalFrames(10_000);
    assertEquals(101, all.size());
    for (int i = 1; i < all.size(); i++) {
      assertTrue(all.get(i - 1) % 10 <= all.get(i) % 10, "frame " + all.get(i));
    }
    assertFalse(pass.typicalFrames(1).isEmpty());
  }

  @Test
  void medianPowerIsThatOfTheSampleOrOfWhatIsPositive() {
    float[][] film = Films.power(FRAMES, GRID, 6, t -> 1);
    // Half of ln(power) has an sd of 0.8 around 0 over 440 voxels: standard error 0.05.
    assertEquals(1, over(film, 1).medianPower(), 0.2);
    double positive = over(film, 1).medianPower();
    for (float[] frame : film) {
      for (int v = 0; v < frame.length; v++) {
        frame[v] = v % 4 == 0 ? frame[v] : v % 4 == 1 ? -1 : 0;
      }
    }
    GrossPass zeros = over(film, 1);
    assertEquals(positive, zeros.medianPower(), 0.4);
    assertEquals(-1, zeros.smallestPower());
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 4})
  void isTheSameForAnyNumberOfThreads(int threads) {
    float[][] film = Films.power(FRAMES, GRID, 7, t -> t % 40 == 0 ? 1.5 : 1);
    GrossPass a = over(film, threads);
    GrossPass b = over(film, 3);
    assertEquals(a.typicalFrames(50), b.typicalFrames(50));
    assertTrue(Arrays.equals(a.medianImage(), b.medianImage()));
    assertEquals(a.medianPower(), b.medianPower());
  }

  @Test
  void refusesARecordingWithoutValues() {
    float[][] film = new float[FRAMES][GRID.voxels()];
    for (float[] frame : film) {
      Arrays.fill(frame, Float.NaN);
    }
    assertEquals(
        "a.nc: the recording holds no value, every one is missing; check the fill value and the"
            + " valid range of its variable.",
        assertThrows(RefusedInput.class, () -> over(film, 1)).getMessage());
  }

  @Test
  void refusesAConstantRecordingAndOneWithoutPositivePower() {
    float[][] film = new float[FRAMES][GRID.voxels()];
    for (float[] frame : film) {
      Arrays.fill(frame, 7);
    }
    film[3][5] = Float.NaN;
    assertTrue(
        assertThrows(RefusedInput.class, () -> over(film, 1))
            .getMessage()
            .contains("every value is the same (found 7.0)"));
    for (float[] frame : film) {
      Arrays.fill(frame, -7);
    }
    film[3][5] = 0;
    assertTrue(
        assertThrows(RefusedInput.class, () -> over(film, 1))
            .getMessage()
            .contains("no positive power"));
  }
}
