package nightjar.alignment;

import java.util.List;
import nightjar.film.FloatRows;
import nightjar.recording.FrameMotion;
import nightjar.recording.Grid;

/** Every frame with its content where the reference has it. Close it to free the rows. */
public final class AlignedFilm implements AutoCloseable {
  private final FloatRows rows;
  private final FrameMotion motion;
  private final List<Slab> slabs;

  AlignedFilm(Grid grid, FloatRows rows, FrameMotion motion) {
    this.rows = rows;
    this.motion = motion;
    slabs =
        Slab.of(
            grid,
            motion.wholeVolume() ? AlignmentSettings.Scope.VOLUME : AlignmentSettings.Scope.PLANE);
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

  /**
   * Whether voxel {@code v} of the grid has no value in a frame because its content lies outside
   * the field there.
   */
  public boolean isOutsideField(int frame, int v) {
    int unit = motion.units() == 1 ? 0 : v / slabs.get(0).voxels();
    Slab slab = slabs.get(unit);
    int within = v - slab.firstVoxel();
    int p = within / (slab.depths() * slab.laterals());
    int z = within / slab.laterals() % slab.depths();
    return !new Placement(slab, Pose.of(motion.at(frame, unit)))
        .inField(p, z, within % slab.laterals());
  }

  @Override
  public void close() {
    rows.close();
  }
}
