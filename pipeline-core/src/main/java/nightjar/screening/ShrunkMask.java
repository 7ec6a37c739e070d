package nightjar.screening;

import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.VoxelOrder;

/**
 * The voxels of one plane's mask that are at least two voxels from its edge, since edges come and
 * go with motion; fewer steps where a thin mask would vanish.
 */
final class ShrunkMask {
  private static final int STEPS = 2;
  private static final int ENOUGH = 30;

  private ShrunkMask() {}

  static VoxelOrder ofPlane(Mask mask, Grid grid, int plane) {
    Mask all = Mask.of(grid.voxels(), v -> grid.planeOf(v) == plane && mask.contains(v));
    for (int steps = STEPS; steps > 0; steps--) {
      VoxelOrder order = shrunk(all, grid, steps).order();
      if (order.size() >= ENOUGH) {
        return order;
      }
    }
    return all.order();
  }

  private static Mask shrunk(Mask mask, Grid grid, int steps) {
    return Mask.of(grid.voxels(), v -> mask.contains(v) && isDeep(v, mask, grid, steps));
  }

  private static boolean isDeep(int v, Mask mask, Grid grid, int steps) {
    int z = grid.depthOf(v);
    int x = grid.lateralOf(v);
    for (int dz = -steps; dz <= steps; dz++) {
      for (int dx = -steps; dx <= steps; dx++) {
        if (z + dz < 0
            || z + dz >= grid.depths().size()
            || x + dx < 0
            || x + dx >= grid.laterals().size()
            || !mask.contains(grid.index(grid.planeOf(v), z + dz, x + dx))) {
          return false;
        }
      }
    }
    return true;
  }
}
