package nightjar.mask;

import static nightjar.mask.TestFilm.get;
import static nightjar.mask.TestFilm.set;
import static org.junit.jupiter.api.Assertions.assertEquals;

import nightjar.checks.CheckValues;
import nightjar.checks.Grids;
import nightjar.film.FloatRows;
import nightjar.numeric.Workers;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import org.junit.jupiter.api.Test;

class SmoothingTest {
  private static void smooth(FloatRows film, Grid grid, Mask mask, double fwhm, int threads) {
    try (Workers workers = new Workers(threads)) {
      Smoothing.smooth(film, grid, mask, fwhm, workers);
    }
  }

  @Test
  void aConstantInTheMaskStaysConstantWhateverIsOutside() {
    Grid grid = Grids.of(2, 15, 18);
    Mask mask = Mask.of(grid.voxels(), v -> (v * 7) % 5 != 0);
    FloatRows film = TestFilm.noise(2, grid, 5);
    for (int v = 0; v < grid.voxels(); v++) {
      set(film, 0, v, mask.contains(v) ? 12.5f : Float.NaN);
    }
    smooth(film, grid, mask, 0.35, 1);
    for (int v = 0; v < grid.voxels(); v++) {
      // Numerator and denominator are rounded apart, then to float.
      assertEquals(mask.contains(v) ? 12.5f : Float.NaN, get(film, 0, v), 1e-6f);
    }
  }

  @Test
  void aPointBecomesAGaussianOfTheWantedWidth() {
    Grid grid = Grids.of(3, 41, 43);
    int centre = grid.index(1, 20, 21);
    for (CheckValues.Row row : CheckValues.read("mask/fwhm_sigma.csv")) {
      FloatRows film = TestFilm.HEAP.allocate(1, grid.voxels());
      set(film, 0, centre, 1);
      double fwhmVoxels = row.number("fwhm");
      smooth(film, grid, Mask.all(grid.voxels()), 0.1 * fwhmVoxels, 1);
      double top = get(film, 0, centre);
      for (int step : new int[] {grid.laterals().size(), 1}) {
        // Two voxels off the centre of a Gaussian: top exp(-2^2 / (2 sigma^2)).
        double sigma = Math.sqrt(2 / Math.log(top / get(film, 0, centre + 2 * step)));
        // Float32 of a value down to 1.5e-5 of the top.
        assertEquals(row.number("sigma"), sigma, 1e-5);
      }
      assertEquals(0, get(film, 0, centre + grid.planeVoxels()), "planes are not mixed");
    }
  }

  @Test
  void equalsTheWeightedMeanOverTheMask() {
    Grid grid = Grids.of(1, 9, 8);
    Mask mask = Mask.of(grid.voxels(), v -> v % 3 != 1);
    FloatRows film = TestFilm.noise(1, grid, 2);
    float[] before = new float[grid.voxels()];
    film.read(0, 0, before.length, before, 0);
    smooth(film, grid, mask, 0.2, 1);
    double sigma = 2 / 2.354820045;
    int reach = (int) Math.ceil(4 * sigma);
    for (int v = 0; v < before.length; v++) {
      double sum = 0;
      double weights = 0;
      for (int u = 0; u < before.length; u++) {
        int dz = grid.depthOf(u) - grid.depthOf(v);
        int dx = grid.lateralOf(u) - grid.lateralOf(v);
        if (mask.contains(u) && Math.abs(dz) <= reach && Math.abs(dx) <= reach) {
          double w = Math.exp(-(dz * dz + dx * dx) / (2 * sigma * sigma));
          sum += w * before[u];
          weights += w;
        }
      }
      // Float32 rounding of values around 100.
      assertEquals(mask.contains(v) ? sum / weights : before[v], get(film, 0, v), 1e-5);
    }
  }

  @Test
  void isTheSameForAnyNumberOfThreadsAndNothingWithoutWidth() {
    Grid grid = Grids.of(2, 20, 22);
    Mask mask = Mask.of(grid.voxels(), v -> v % 11 != 0);
    FloatRows one = TestFilm.noise(50, grid, 3);
    FloatRows four = TestFilm.noise(50, grid, 3);
    FloatRows untouched = TestFilm.noise(50, grid, 3);
    smooth(one, grid, mask, 0.3, 1);
    smooth(four, grid, mask, 0.3, 4);
    FloatRows none = TestFilm.noise(50, grid, 3);
    smooth(none, grid, mask, 0, 1);
    for (int t = 0; t < 50; t++) {
      for (int v = 0; v < grid.voxels(); v++) {
        assertEquals(get(one, t, v), get(four, t, v));
        assertEquals(get(untouched, t, v), get(none, t, v));
      }
    }
  }
}
