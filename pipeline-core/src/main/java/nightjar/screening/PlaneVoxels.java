package nightjar.screening;

import java.util.stream.IntStream;
import nightjar.film.FloatRows;
import nightjar.numeric.FlooredLog;
import nightjar.numeric.Median;
import nightjar.recording.Grid;
import nightjar.recording.Mask;

/**
 * The voxels of one plane that frames are judged by: the mask, and the mask without its edge, which
 * comes and goes with motion. Each inner voxel has a level, its median ln(power) over a fixed
 * sample of frames: means over voxels are taken of differences from it, so that a missing voxel
 * does not shift them.
 */
final class PlaneVoxels {
  /** Voxels peeled off the mask's edge. */
  private static final int SHRINK = 2;

  /** Peeling stops before fewer voxels than these are left. */
  private static final int FEWEST = 50;

  private static final int LEVEL_FRAMES = 31;

  /** First voxel of the plane within a film row. */
  final int first;

  /** Mask voxels, from the plane's first. */
  final int[] mask;

  /** Mask voxels without the edge, from the plane's first. */
  final int[] inner;

  /** Median ln(power) of each inner voxel. */
  final float[] level;

  private PlaneVoxels(int first, int[] mask, int[] inner, float[] level) {
    this.first = first;
    this.mask = mask;
    this.inner = inner;
    this.level = level;
  }

  static PlaneVoxels of(int plane, Grid grid, Mask mask, FloatRows film, FlooredLog log) {
    int first = plane * grid.planeVoxels();
    boolean[] inside = new boolean[grid.planeVoxels()];
    for (int i = 0; i < inside.length; i++) {
      inside[i] = mask.contains(first + i);
    }
    int[] shrunk = voxels(inside);
    for (int step = 0; step < SHRINK; step++) {
      inside = peeled(inside, grid.depths().size(), grid.laterals().size());
      int[] smaller = voxels(inside);
      if (smaller.length < FEWEST) {
        break;
      }
      shrunk = smaller;
    }
    float[] levels = levels(film, first, shrunk, log);
    int[] known = IntStream.range(0, levels.length).filter(k -> !Float.isNaN(levels[k])).toArray();
    int[] inner = new int[known.length];
    float[] level = new float[known.length];
    for (int k = 0; k < known.length; k++) {
      inner[k] = shrunk[known[k]];
      level[k] = levels[known[k]];
    }
    int[] all =
        IntStream.range(0, grid.planeVoxels()).filter(i -> mask.contains(first + i)).toArray();
    return new PlaneVoxels(first, all, inner, level);
  }

  private static int[] voxels(boolean[] inside) {
    return IntStream.range(0, inside.length).filter(i -> inside[i]).toArray();
  }

  /** Cells whose eight neighbours are all inside; beyond the field is outside. */
  static boolean[] peeled(boolean[] inside, int depths, int laterals) {
    boolean[] left = new boolean[inside.length];
    for (int z = 1; z < depths - 1; z++) {
      for (int x = 1; x < laterals - 1; x++) {
        boolean all = true;
        for (int dz = -1; dz <= 1; dz++) {
          for (int dx = -1; dx <= 1; dx++) {
            all &= inside[(z + dz) * laterals + x + dx];
          }
        }
        left[z * laterals + x] = all;
      }
    }
    return left;
  }

  private static float[] levels(FloatRows film, int first, int[] voxels, FlooredLog log) {
    int[] frames = EvenSample.of(film.rows(), LEVEL_FRAMES);
    int span = span(voxels);
    float[] row = new float[span];
    float[][] ln = new float[voxels.length][frames.length];
    for (int i = 0; i < frames.length; i++) {
      film.read(frames[i], first, span, row, 0);
      for (int k = 0; k < voxels.length; k++) {
        ln[k][i] = (float) log.of(row[voxels[k]]);
      }
    }
    float[] level = new float[voxels.length];
    for (int k = 0; k < level.length; k++) {
      level[k] = Median.sorting(ln[k], frames.length);
    }
    return level;
  }

  /** Values of a film row that reach from the plane's first to the last of {@code voxels}. */
  private static int span(int[] voxels) {
    return voxels.length == 0 ? 0 : voxels[voxels.length - 1] + 1;
  }

  /** Values of a film row that hold all mask voxels of the plane. */
  int span() {
    return span(mask);
  }

  /** Mean level of the inner voxels; NaN where there is none. */
  double meanLevel() {
    double sum = 0;
    for (float l : level) {
      sum += l;
    }
    return sum / level.length;
  }
}
