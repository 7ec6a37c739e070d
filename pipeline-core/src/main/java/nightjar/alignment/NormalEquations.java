package nightjar.alignment;

import nightjar.numeric.Cholesky;

/** Weighted least squares on fixed columns. Holds scratch arrays: one instance a thread. */
final class NormalEquations {
  private final double[][] columns;
  private final double[] weighted;
  private final double[] factor;

  /** {@code columns}: of equal length, not modified. */
  NormalEquations(double[][] columns) {
    this.columns = columns;
    weighted = new double[columns[0].length];
    factor = new double[columns.length * columns.length];
  }

  /** Prepares {@link #solve}; false where the columns cannot be told apart. */
  boolean factor(double[] weights) {
    int n = columns.length;
    for (int i = 0; i < n; i++) {
      multiply(weights, columns[i], weighted);
      for (int j = 0; j <= i; j++) {
        factor[i * n + j] = dot(weighted, columns[j]);
      }
    }
    return Cholesky.factor(factor, n);
  }

  /** Stores the coefficients that fit {@code values} best under the factored weights. */
  void solve(double[] weights, double[] values, double[] coefficients) {
    multiply(weights, values, weighted);
    for (int i = 0; i < columns.length; i++) {
      coefficients[i] = dot(weighted, columns[i]);
    }
    Cholesky.solve(factor, columns.length, coefficients);
  }

  private static void multiply(double[] a, double[] b, double[] into) {
    for (int k = 0; k < into.length; k++) {
      into[k] = a[k] * b[k];
    }
  }

  /** Four sums side by side, so that additions do not wait for each other. */
  private static double dot(double[] a, double[] b) {
    double s0 = 0;
    double s1 = 0;
    double s2 = 0;
    double s3 = 0;
    int k = 0;
    for (; k + 3 < a.length; k += 4) {
      s0 = Math.fma(a[k], b[k], s0);
      s1 = Math.fma(a[k + 1], b[k + 1], s1);
      s2 = Math.fma(a[k + 2], b[k + 2], s2);
      s3 = Math.fma(a[k + 3], b[k + 3], s3);
    }
    for (; k < a.length; k++) {
      s0 = Math.fma(a[k], b[k], s0);
    }
    return (s0 + s1) + (s2 + s3);
  }
}
