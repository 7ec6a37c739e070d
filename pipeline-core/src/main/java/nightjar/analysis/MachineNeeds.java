package nightjar.analysis;

import java.util.LinkedHashMap;
import java.util.Map;
import nightjar.recording.Grid;

/**
 * What an analysis needs of a machine: heap for the maps and the working rows of each thread, the
 * films on scratch files (or on the heap, where they fit a quarter of it).
 */
final class MachineNeeds {
  private static final double MEGABYTE = 1e6;

  /** The program itself, libraries and two threads' working rows on a small grid. */
  private static final double BASE_MEGABYTES = 200;

  /** Working rows of alignment and screening, maps of a few contrasts, a byte count a voxel. */
  private static final double BYTES_A_VOXEL = 2000;

  private MachineNeeds() {}

  static Map<String, Object> of(Grid grid, int frames) {
    double voxels = grid.voxels();
    Map<String, Object> m = new LinkedHashMap<>();
    m.put("heap_mb", (int) Math.ceil(BASE_MEGABYTES + voxels * BYTES_A_VOXEL / MEGABYTE));
    m.put("scratch_mb", (int) Math.ceil(2 * 4 * voxels * frames / MEGABYTE));
    return m;
  }
}
