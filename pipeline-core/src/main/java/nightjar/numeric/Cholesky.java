package nightjar.numeric;

/**
 * Cholesky factors of small positive definite matrices in caller-owned arrays: no allocation, for
 * use per voxel.
 */
public final class Cholesky {
  private Cholesky() {}

  /**
   * Replaces the lower triangle of {@code a} by L with {@code a = L L'}.
   *
   * @param a {@code n x n}, row by row, modified; only the lower triangle is read
   * @return false where the matrix is not positive definite (contents then undefined)
   */
  public static boolean factor(double[] a, int n) {
    for (int i = 0; i < n; i++) {
      int ri = i * n;
      for (int j = 0; j < i; j++) {
        int rj = j * n;
        double s = a[ri + j];
        for (int k = 0; k < j; k++) {
          s -= a[ri + k] * a[rj + k];
        }
        a[ri + j] = s / a[rj + j];
      }
      double d = a[ri + i];
      for (int k = 0; k < i; k++) {
        d -= a[ri + k] * a[ri + k];
      }
      if (!(d > 0)) {
        return false;
      }
      a[ri + i] = Math.sqrt(d);
    }
    return true;
  }

  /** Solves {@code L L' x = b} in place. */
  public static void solve(double[] l, int n, double[] b) {
    for (int i = 0; i < n; i++) {
      double s = b[i];
      for (int k = 0; k < i; k++) {
        s -= l[i * n + k] * b[k];
      }
      b[i] = s / l[i * n + i];
    }
    for (int i = n - 1; i >= 0; i--) {
      double s = b[i];
      for (int k = i + 1; k < n; k++) {
        s -= l[k * n + i] * b[k];
      }
      b[i] = s / l[i * n + i];
    }
  }
}
