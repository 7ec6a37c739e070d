package nightjar.alignment;

/**
 * Where the content of every voxel of the reference lies in a frame, as a place among the frame's
 * voxels: an affine map of voxel positions. Immutable.
 */
final class Placement {
  private final Slab slab;
  private final double[] m = new double[9];
  private final double[] o = new double[3];

  Placement(Slab slab, Pose pose) {
    this.slab = slab;
    double[] step = {slab.planeStep(), slab.depthStep(), slab.lateralStep()};
    double[] centre = {
      0.5 * (slab.planes() - 1), 0.5 * (slab.depths() - 1), 0.5 * (slab.laterals() - 1)
    };
    for (int i = 0; i < 3; i++) {
      o[i] = centre[i] + pose.shift(i) / step[i];
      for (int k = 0; k < 3; k++) {
        m[3 * i + k] = pose.turn(i, k) * step[k] / step[i];
        o[i] -= m[3 * i + k] * centre[k];
      }
    }
  }

  double plane(int p, int z, int x) {
    return o[0] + m[0] * p + m[1] * z + m[2] * x;
  }

  double depth(int p, int z, int x) {
    return o[1] + m[3] * p + m[4] * z + m[5] * x;
  }

  double lateral(int p, int z, int x) {
    return o[2] + m[6] * p + m[7] * z + m[8] * x;
  }

  /** Whether the content lies in the field, which ends half a voxel beyond the outermost voxels. */
  boolean inField(int p, int z, int x) {
    return within(lateral(p, z, x), slab.laterals())
        && within(depth(p, z, x), slab.depths())
        && within(plane(p, z, x), slab.planes());
  }

  /** The first lateral position of a row that lies in the field, or the number of laterals. */
  int firstInField(int p, int z) {
    int x = 0;
    while (x < slab.laterals() && !inField(p, z, x)) {
      x++;
    }
    return x;
  }

  /**
   * One behind the last lateral position of a row that lies in the field, at least {@code first}.
   * The field is convex, so all positions between are inside.
   */
  int endInField(int p, int z, int first) {
    int x = slab.laterals();
    while (x > first && !inField(p, z, x - 1)) {
      x--;
    }
    return x;
  }

  private static boolean within(double position, int size) {
    return position >= -0.5 && position <= size - 0.5;
  }
}
