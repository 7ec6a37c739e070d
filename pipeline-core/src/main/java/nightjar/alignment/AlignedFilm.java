package nightjar.alignment;

import java.util.List;
import nightjar.film.FloatRows;
import nightjar.recording.FrameMotion;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;
import nightjar.recording.Mask;

/** Every frame with its content where the reference has it. Close it to free the rows. */
public final class AlignedFilm implements AutoCloseable {
  private final FloatRows rows;
  private final FrameMotion motion;
  private final List<Slab> slabs;
  private final int voxels;

  AlignedFilm(Grid grid, FloatRows rows, FrameMotion motion) {
    this.rows = rows;
    this.motion = motion;
    slabs =
        Slab.of(
            grid,
            motion.wholeVolume() ? AlignmentSettings.Scope.VOLUME : AlignmentSettings.Scope.PLANE);
    voxels = grid.voxels();
  }

  /**
   * Power, one row a frame, {@code [p][z][x]} of the whole grid; NaN where the value is missing or
   * the content lies outside the field.
   */
  public FloatRows rows() {
    return rows;
  }

  /** How every frame had moved. */
  public FrameMotion motion() {
    return motion;
  }

  /** Per voxel, the number of kept frames in which its content lies outside the field. */
  public int[] framesOutside(KeptFrames kept) {
    int[] outside = new int[voxels];
    for (int i = 0; i < kept.count(); i++) {
      for (int u = 0; u < slabs.size(); u++) {
        countOutside(kept.frame(i), u, outside);
      }
    }
    return outside;
  }

  /** Share of the voxels of {@code mask} whose content lies outside the field in a frame. */
  public double outsideShare(int frame, Mask mask) {
    int[] outside = new int[voxels];
    for (int u = 0; u < slabs.size(); u++) {
      countOutside(frame, u, outside);
    }
    int lost = 0;
    for (int v = 0; v < voxels; v++) {
      if (outside[v] > 0 && mask.contains(v)) {
        lost++;
      }
    }
    return mask.count() == 0 ? 0 : (double) lost / mask.count();
  }

  private void countOutside(int frame, int unit, int[] outside) {
    Slab slab = slabs.get(unit);
    Placement place = new Placement(slab, Pose.of(motion.at(frame, unit)));
    for (int p = 0; p < slab.planes(); p++) {
      for (int z = 0; z < slab.depths(); z++) {
        int row = slab.firstVoxel() + (p * slab.depths() + z) * slab.laterals();
        int first = place.firstInField(p, z);
        int end = place.endInField(p, z, first);
        for (int x = 0; x < first; x++) {
          outside[row + x]++;
        }
        for (int x = end; x < slab.laterals(); x++) {
          outside[row + x]++;
        }
      }
    }
  }

  @Override
  public void close() {
    rows.close();
  }
}
