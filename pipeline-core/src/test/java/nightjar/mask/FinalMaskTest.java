package nightjar.mask;

import static nightjar.mask.TestFilm.get;
import static nightjar.mask.TestFilm.set;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import nightjar.checks.Grids;
import nightjar.film.FloatRows;
import nightjar.numeric.Workers;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.OutsideField;
import nightjar.recording.Progress;
import nightjar.refusal.RefusedInput;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class FinalMaskTest {
  private static final Grid GRID = Grids.of(1, 6, 7);
  private static final FrameTimes TIMES = Grids.everyFrame(40);

  private final FloatRows film = TestFilm.noise(40, GRID, 1);

  private FinalMask maskOf(MaskSettings setting, @Nullable Mask given, OutsideField outside) {
    try (Workers workers = new Workers(2)) {
      return FinalMask.of(
          new KeptFilm("a.nc", film, GRID, TestFilm.allBut(TIMES, 3)),
          new MaskSource(setting, given, 100),
          outside,
          workers,
          Progress.SILENT);
    }
  }

  @Test
  void voxelsThatCannotBeFittedLeaveAndAreCountedByCause() {
    set(film, 5, 0, Float.NaN);
    for (int t = 0; t < 40; t++) {
      set(film, t, 1, 0);
      set(film, t, 2, t == 3 ? 8 : 7);
      set(film, t, 3, -get(film, t, 3));
      set(film, t, 4, t < 2 ? Float.NaN : 100 + t);
    }
    FinalMask result = maskOf(MaskSettings.ALL, null, (t, v) -> v == 4);
    assertEquals(new LeftOut(1, 1, 2, 1), result.leftOut());
    assertEquals(Mask.of(GRID.voxels(), v -> v > 4), result.mask());
  }

  @Test
  void aValueMissingInARejectedFrameDoesNoHarm() {
    set(film, 3, 8, Float.NaN);
    assertTrue(maskOf(MaskSettings.ALL, null, OutsideField.NOWHERE).mask().contains(8));
  }

  @Test
  void aVoxelOutsideTheFieldInAFewFramesIsFilledFromTheNearestKeptFrame() {
    // Frames 3 and 5 are as near, but 3 is rejected.
    set(film, 4, 9, Float.NaN);
    float after = get(film, 5, 9);
    FinalMask result = maskOf(MaskSettings.ALL, null, (t, v) -> t == 4);
    assertTrue(result.mask().contains(9));
    assertEquals(after, get(film, 4, 9));
    double sum = 0;
    for (int t = 0; t < 40; t++) {
      sum += t == 3 ? 0 : get(film, t, 9);
    }
    // The same numbers summed in another order.
    assertEquals(sum / 39, result.meanPower(9), 1e-10);
  }

  @Test
  void ofTwoFramesAsNearTheEarlierIsTaken() {
    set(film, 20, 9, Float.NaN);
    float before = get(film, 19, 9);
    maskOf(MaskSettings.ALL, null, (t, v) -> true);
    assertEquals(before, get(film, 20, 9));
  }

  @Test
  void aValueThatTheRecordingLacksIsNotFilled() {
    set(film, 20, 9, Float.NaN);
    FinalMask result = maskOf(MaskSettings.ALL, null, OutsideField.NOWHERE);
    assertFalse(result.mask().contains(9));
    assertTrue(Float.isNaN(get(film, 20, 9)));
  }

  @Test
  void autoTakesTheBrightPart() {
    for (int t = 0; t < 40; t++) {
      for (int v = 0; v < GRID.voxels(); v++) {
        set(film, t, v, get(film, t, v) * (GRID.depthOf(v) < 3 ? 0.1f : 1));
      }
    }
    assertEquals(
        Mask.of(GRID.voxels(), v -> GRID.depthOf(v) >= 3),
        maskOf(MaskSettings.AUTO, null, OutsideField.NOWHERE).mask());
  }

  @Test
  void theRecordingsMaskIsTakenWhereAskedForAndRefusedWhereAbsent() {
    Mask given = Mask.of(GRID.voxels(), v -> v % 2 == 0);
    assertEquals(given, maskOf(MaskSettings.RECORDING, given, OutsideField.NOWHERE).mask());
    RefusedInput refused =
        assertThrows(
            RefusedInput.class, () -> maskOf(MaskSettings.RECORDING, null, OutsideField.NOWHERE));
    assertEquals(
        "a.nc, variable brain_mask: the plan takes the mask from the recording, which has none;"
            + " add the variable, or set the plan's mask source to auto or all.",
        refused.getMessage());
  }

  @Test
  void anEmptyMaskIsRefusedWithTheCauses() {
    Mask one = Mask.of(GRID.voxels(), v -> v == 6);
    set(film, 20, 6, Float.NaN);
    RefusedInput refused =
        assertThrows(
            RefusedInput.class, () -> maskOf(MaskSettings.RECORDING, one, OutsideField.NOWHERE));
    assertTrue(refused.getMessage().contains("1 miss a value"), refused.getMessage());
    assertEquals("a.nc", refused.facts().get("file"));
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 4})
  void isTheSameForAnyNumberOfThreads(int threads) {
    Grid grid = Grids.of(2, 60, 70);
    FloatRows wide = TestFilm.noise(45, grid, 7);
    double[] first = new double[grid.voxels()];
    for (int n : new int[] {3, threads}) {
      try (Workers workers = new Workers(n)) {
        FinalMask m =
            FinalMask.of(
                new KeptFilm("a.nc", wide, grid, TestFilm.allBut(Grids.everyFrame(45))),
                new MaskSource(MaskSettings.AUTO, null, 100),
                OutsideField.NOWHERE,
                workers,
                Progress.SILENT);
        for (int v = 0; v < first.length; v++) {
          assertTrue(n == 3 || first[v] == m.meanPower(v));
          first[v] = m.meanPower(v);
        }
      }
    }
  }
}
