package nightjar.mask;

import nightjar.numeric.Workers;

/**
 * Fills the values of voxels that were outside the field in a few kept frames by the voxel's
 * nearest kept value in time (the earlier of two as near), so that a jerk does not cost the mask
 * its edge.
 */
final class EdgeFilling {
  private static final int VOXELS_A_BLOCK = 16;

  private EdgeFilling() {}

  /**
   * Fills the given voxels.
   *
   * @param film modified: no kept frame lacks a value of these voxels afterwards
   * @param voxels each with at least one value in a kept frame
   * @param sums modified: the values filled in are added
   */
  static void fill(KeptFilm film, int[] voxels, double[] sums, Workers workers) {
    workers.forEachBlock(
        voxels.length,
        VOXELS_A_BLOCK,
        (first, end) -> {
          float[] series = new float[film.kept().count()];
          for (int i = first; i < end; i++) {
            sums[voxels[i]] += fillOne(film, voxels[i], series);
          }
        });
  }

  private static double fillOne(KeptFilm film, int voxel, float[] series) {
    for (int r = 0; r < series.length; r++) {
      film.film().read(film.kept().frame(r), voxel, 1, series, r);
    }
    double filled = 0;
    int before = -1;
    for (int r = 0; r < series.length; r++) {
      if (!Float.isNaN(series[r])) {
        before = r;
        continue;
      }
      int source = nearer(film, r, before, nextValue(series, r));
      film.film().write(film.kept().frame(r), voxel, 1, series, source);
      filled += series[source];
    }
    return filled;
  }

  private static int nextValue(float[] series, int r) {
    int next = r;
    while (next < series.length && Float.isNaN(series[next])) {
      next++;
    }
    return next < series.length ? next : -1;
  }

  private static int nearer(KeptFilm film, int r, int before, int after) {
    if (before < 0 || after < 0) {
      return Math.max(before, after);
    }
    return seconds(film, r) - seconds(film, before) <= seconds(film, after) - seconds(film, r)
        ? before
        : after;
  }

  private static double seconds(KeptFilm film, int r) {
    return film.kept().times().at(film.kept().frame(r));
  }
}
