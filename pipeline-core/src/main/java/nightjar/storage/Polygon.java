package nightjar.storage;

import java.util.BitSet;
import nightjar.recording.Grid;

/** A closed outline in the lateral-depth plane, mm. Immutable. */
final class Polygon {
  private final double[] lateral;
  private final double[] depth;

  /** Corners in order, closed by itself; as many laterals as depths. */
  Polygon(double[] lateral, double[] depth) {
    this.lateral = lateral.clone();
    this.depth = depth.clone();
  }

  /**
   * Sets the voxels of a plane whose centres lie inside by the even-odd rule: a ray towards larger
   * lateral crosses the outline an odd number of times. An edge belongs to its end of smaller depth
   * and not to that of larger depth, so polygons that share an edge share no voxel.
   *
   * @param voxels modified: by number on the grid
   */
  void fill(Grid grid, int plane, BitSet voxels) {
    for (int z = 0; z < grid.depths().size(); z++) {
      double[] crossings = crossings(grid.depths().at(z));
      for (int x = 0; x < grid.laterals().size(); x++) {
        if (countAbove(crossings, grid.laterals().at(x)) % 2 == 1) {
          voxels.set(grid.index(plane, z, x));
        }
      }
    }
  }

  private static int countAbove(double[] crossings, double from) {
    int count = 0;
    for (double c : crossings) {
      count += c > from ? 1 : 0;
    }
    return count;
  }

  /** Lateral positions at which the outline crosses a depth. */
  private double[] crossings(double z) {
    double[] found = new double[lateral.length];
    int count = 0;
    for (int i = 0, j = lateral.length - 1; i < lateral.length; j = i++) {
      if ((depth[i] <= z) != (depth[j] <= z)) {
        found[count++] = crossing(i, j, z);
      }
    }
    return java.util.Arrays.copyOf(found, count);
  }

  /** Always from the end of smaller depth, so neighbours with a common edge agree to the bit. */
  private double crossing(int i, int j, double z) {
    int a = depth[i] < depth[j] ? i : j;
    int b = a == i ? j : i;
    return lateral[a] + (z - depth[a]) / (depth[b] - depth[a]) * (lateral[b] - lateral[a]);
  }
}
