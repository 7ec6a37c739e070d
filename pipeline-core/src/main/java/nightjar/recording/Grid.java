package nightjar.recording;

/**
 * The spatial grid {@code [plane][depth][lateral]}. A voxel's number is {@code (plane * depths +
 * depth) * laterals + lateral}.
 *
 * @param planes one position where the recording has no plane axis
 * @param depths depth axis
 * @param laterals lateral axis
 * @param hasPlaneAxis whether the recording has a plane axis; results then carry one too
 */
public record Grid(Axis planes, Axis depths, Axis laterals, boolean hasPlaneAxis) {
  /** Number of voxels of one plane. */
  public int planeVoxels() {
    return depths.size() * laterals.size();
  }

  /** Number of voxels of all planes. */
  public int voxels() {
    return planes.size() * planeVoxels();
  }

  /** Number of the voxel at the given place. */
  public int index(int plane, int depth, int lateral) {
    return (plane * depths.size() + depth) * laterals.size() + lateral;
  }

  /** The plane that voxel {@code v} lies in. */
  public int planeOf(int v) {
    return v / planeVoxels();
  }

  /** The depth position of voxel {@code v}. */
  public int depthOf(int v) {
    return v % planeVoxels() / laterals.size();
  }

  /** The lateral position of voxel {@code v}. */
  public int lateralOf(int v) {
    return v % laterals.size();
  }

  /** The smaller of the two spacings within a plane, mm. */
  public double smallerSpacingMillimetres() {
    return Math.min(depths.spacingMillimetres(), laterals.spacingMillimetres());
  }
}
