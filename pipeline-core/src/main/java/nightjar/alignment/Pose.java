package nightjar.alignment;

import nightjar.recording.RigidMotion;

/**
 * Rigid displacement of content about the centre of the field: {@code u -> R u + s}, axes plane,
 * depth, lateral in mm. R turns by the lateral tilt first, then by the depth tilt, then in the
 * depth-lateral plane; the signs are those of {@link RigidMotion}. Immutable.
 */
final class Pose {
  /** No displacement. */
  static final Pose IDENTITY = of(RigidMotion.NONE);

  private final double[] r;
  private final double[] s;

  private Pose(double[] r, double[] s) {
    this.r = r;
    this.s = s;
  }

  static Pose of(RigidMotion m) {
    return of(
        new double[] {
          m.shiftPlaneMillimetres(), m.shiftDepthMillimetres(), m.shiftLateralMillimetres()
        },
        Math.toRadians(m.rotationDegrees()),
        Math.toRadians(m.tiltDepthDegrees()),
        Math.toRadians(m.tiltLateralDegrees()));
  }

  /** Angles in radians. */
  static Pose of(double[] shift, double rotation, double tiltDepth, double tiltLateral) {
    double ct = Math.cos(rotation);
    double st = Math.sin(rotation);
    double cd = Math.cos(tiltDepth);
    double sd = Math.sin(tiltDepth);
    double cl = Math.cos(tiltLateral);
    double sl = Math.sin(tiltLateral);
    double[] turn = {1, 0, 0, 0, ct, -st, 0, st, ct};
    double[] depth = {cd, -sd, 0, sd, cd, 0, 0, 0, 1};
    double[] lateral = {cl, 0, -sl, 0, 1, 0, sl, 0, cl};
    return new Pose(product(turn, product(depth, lateral)), shift.clone());
  }

  /** The same as angles and shifts. */
  RigidMotion motion() {
    return new RigidMotion(
        s[1],
        s[2],
        s[0],
        Math.toDegrees(Math.atan2(r[7], r[4])),
        Math.toDegrees(Math.asin(Math.max(-1, Math.min(1, 0 - r[1])))),
        Math.toDegrees(Math.atan2(0 - r[2], r[0])));
  }

  /** This displacement after the inverse of {@code first}. */
  Pose afterInverseOf(Pose first) {
    double[] transposed = {
      first.r[0], first.r[3], first.r[6],
      first.r[1], first.r[4], first.r[7],
      first.r[2], first.r[5], first.r[8]
    };
    double[] turn = product(r, transposed);
    double[] shift = new double[3];
    for (int i = 0; i < 3; i++) {
      shift[i] = s[i];
      for (int k = 0; k < 3; k++) {
        shift[i] -= turn[3 * i + k] * first.s[k];
      }
    }
    return new Pose(turn, shift);
  }

  /** Element of R. */
  double turn(int row, int column) {
    return r[3 * row + column];
  }

  /** Component of s, mm. */
  double shift(int axis) {
    return s[axis];
  }

  /** Length of the displacement of the point {@code (plane, depth, lateral)}, mm. */
  double displacement(double plane, double depth, double lateral) {
    double dp = (r[0] - 1) * plane + r[1] * depth + r[2] * lateral + s[0];
    double dz = r[3] * plane + (r[4] - 1) * depth + r[5] * lateral + s[1];
    double dx = r[6] * plane + r[7] * depth + (r[8] - 1) * lateral + s[2];
    return Math.sqrt(dp * dp + dz * dz + dx * dx);
  }

  private static double[] product(double[] a, double[] b) {
    double[] c = new double[9];
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        c[3 * i + j] = a[3 * i] * b[j] + a[3 * i + 1] * b[3 + j] + a[3 * i + 2] * b[6 + j];
      }
    }
    return c;
  }
}
