package nightjar.mask;

import static nightjar.mask.TestFilm.get;
import static nightjar.mask.TestFilm.set;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import nightjar.checks.Grids;
import nightjar.film.FloatRows;
import nightjar.film.PercentSeries;
import nightjar.numeric.Workers;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;
import nightjar.recording.Mask;
import nightjar.recording.Progress;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

class SeriesScalingTest {
  private static final Grid GRID = Grids.of(2, 40, 60);
  private static final Mask MASK = Mask.of(GRID.voxels(), v -> v % 3 != 0);
  private static final KeptFrames KEPT = TestFilm.allBut(Grids.everyFrame(30), 0, 7, 29);

  private final FloatRows film = TestFilm.noise(30, GRID, 11);

  private PercentSeries scaled(Scale scale, int threads) {
    try (Workers workers = new Workers(threads)) {
      return SeriesScaling.scale(
          new KeptFilm("a.nc", film, GRID, KEPT),
          MASK,
          scale,
          TestFilm.HEAP,
          workers,
          Progress.SILENT);
    }
  }

  @ParameterizedTest
  @EnumSource(Scale.class)
  void isPercentOfTheMeanOverKeptFrames(Scale scale) {
    set(film, 7, 1, Float.NaN);
    PercentSeries series = scaled(scale, 2);
    assertEquals(27, series.rows().rows());
    assertEquals(MASK.count(), series.rows().width());
    for (int k = 0; k < MASK.count(); k += 97) {
      int v = series.order().voxel(k);
      double b = 0;
      for (int r = 0; r < 27; r++) {
        b += get(film, KEPT.frame(r), v) / 27.0;
      }
      assertEquals(b, series.baseline(k), 1e-10);
      for (int r = 0; r < 27; r++) {
        double y = get(film, KEPT.frame(r), v);
        double want = scale == Scale.PERCENT ? 100 * (y / b - 1) : 100 * Math.log(y / b);
        // Float32 of values up to 11.
        assertEquals(want, get(series.rows(), r, k), 1e-6);
      }
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 4})
  void isTheSameForAnyNumberOfThreads(int threads) {
    PercentSeries a = scaled(Scale.PERCENT, threads);
    PercentSeries b = scaled(Scale.PERCENT, 3);
    for (int r = 0; r < 27; r++) {
      for (int k = 0; k < MASK.count(); k++) {
        assertEquals(get(a.rows(), r, k), get(b.rows(), r, k));
      }
    }
  }

  @Test
  void zerosArePlainPercentButNoLogarithm() {
    int frame = KEPT.frame(4);
    int voxel = GRID.index(1, 2, 4);
    assertTrue(MASK.contains(voxel));
    set(film, frame, voxel, 0);
    PercentSeries series = scaled(Scale.PERCENT, 1);
    assertEquals(-100, get(series.rows(), 4, series.order().firstAtOrAfter(voxel)));
    RefusedInput refused = assertThrows(RefusedInput.class, () -> scaled(Scale.LOG_PERCENT, 1));
    assertEquals(
        "a.nc, frame "
            + frame
            + ", plane 1, depth 0.20 mm, lateral 0.40 mm: log_percent needs positive power in the"
            + " mask (found 0.0); set the plan's scale to percent.",
        refused.getMessage());
  }

  @Test
  void zerosOutsideTheMaskOrInRejectedFramesAreNoReasonToRefuse() {
    set(film, 1, 0, 0);
    set(film, 7, 1, -3);
    assertEquals(27, scaled(Scale.LOG_PERCENT, 1).rows().rows());
  }

  @Test
  void aMissingValueInTheMaskIsAFaultOfOurs() {
    set(film, 1, 1, Float.NaN);
    assertThrows(IllegalArgumentException.class, () -> scaled(Scale.PERCENT, 1));
  }
}
