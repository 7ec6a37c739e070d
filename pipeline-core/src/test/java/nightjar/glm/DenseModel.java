package nightjar.glm;

import nightjar.design.DesignBasis;
import nightjar.recording.FrameTimes;
import nightjar.recording.KeptFrames;

/**
 * The definitions of the noise model with full matrices: slow, plain, and written apart from the
 * fast forms.
 */
final class DenseModel {
  final int n;
  final double[][] x;
  final int[] position;
  final int[] segment;

  DenseModel(DesignBasis basis) {
    KeptFrames kept = basis.kept();
    FrameTimes times = kept.times();
    n = kept.count();
    x = new double[n][basis.design().columns().size()];
    position = new int[n];
    segment = new int[n];
    for (int r = 0; r < n; r++) {
      int f = kept.frame(r);
      position[r] = times.gridPosition(f);
      segment[r] = times.segment(f);
      for (int j = 0; j < x[r].length; j++) {
        x[r][j] = basis.design().columns().get(j).at(f);
      }
    }
  }

  double[][] correlation(double rho) {
    double[][] v = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        v[i][j] =
            segment[i] == segment[j]
                ? i == j ? 1 : Math.pow(rho, Math.abs(position[i] - position[j]))
                : 0;
      }
    }
    return v;
  }

  /** 1/2 between neighbouring frames. */
  double[][] neighbours() {
    double[][] d = new double[n][n];
    for (int i = 1; i < n; i++) {
      if (segment[i] == segment[i - 1] && position[i] - position[i - 1] == 1) {
        d[i][i - 1] = 0.5;
        d[i - 1][i] = 0.5;
      }
    }
    return d;
  }

  /** I - X (X'X)^-1 X' over the kept rows. */
  double[][] residualMaker() {
    double[][] hat = multiply(multiply(x, inverse(multiply(transpose(x), x))), transpose(x));
    double[][] r = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        r[i][j] = (i == j ? 1 : 0) - hat[i][j];
      }
    }
    return r;
  }

  /** Coefficients, then their covariance's rows: generalised least squares with V(rho). */
  double[][] generalised(double[] y, double rho) {
    double[][] w = inverse(correlation(rho));
    double[][] xtw = multiply(transpose(x), w);
    double[][] cov = inverse(multiply(xtw, x));
    double[] b = multiply(cov, multiply(xtw, y));
    double[] fitted = multiply(x, b);
    double[] e = new double[n];
    for (int i = 0; i < n; i++) {
      e[i] = y[i] - fitted[i];
    }
    double[] we = multiply(w, e);
    double rss = 0;
    for (int i = 0; i < n; i++) {
      rss += e[i] * we[i];
    }
    double s2 = rss / (n - b.length);
    double[][] out = new double[b.length + 1][];
    out[0] = b;
    for (int i = 0; i < b.length; i++) {
      out[i + 1] = cov[i].clone();
      for (int j = 0; j < b.length; j++) {
        out[i + 1][j] *= s2;
      }
    }
    return out;
  }

  static double[][] transpose(double[][] a) {
    double[][] t = new double[a[0].length][a.length];
    for (int i = 0; i < a.length; i++) {
      for (int j = 0; j < a[0].length; j++) {
        t[j][i] = a[i][j];
      }
    }
    return t;
  }

  static double[][] multiply(double[][] a, double[][] b) {
    double[][] c = new double[a.length][b[0].length];
    for (int i = 0; i < a.length; i++) {
      for (int k = 0; k < b.length; k++) {
        for (int j = 0; j < b[0].length; j++) {
          c[i][j] += a[i][k] * b[k][j];
        }
      }
    }
    return c;
  }

  static double[] multiply(double[][] a, double[] b) {
    double[] c = new double[a.length];
    for (int i = 0; i < a.length; i++) {
      for (int k = 0; k < b.length; k++) {
        c[i] += a[i][k] * b[k];
      }
    }
    return c;
  }

  static double trace(double[][] a) {
    double s = 0;
    for (int i = 0; i < a.length; i++) {
      s += a[i][i];
    }
    return s;
  }

  /** Gauss-Jordan with pivoting. */
  static double[][] inverse(double[][] matrix) {
    int n = matrix.length;
    double[][] a = new double[n][2 * n];
    for (int i = 0; i < n; i++) {
      System.arraycopy(matrix[i], 0, a[i], 0, n);
      a[i][n + i] = 1;
    }
    for (int c = 0; c < n; c++) {
      int best = c;
      for (int i = c; i < n; i++) {
        best = Math.abs(a[i][c]) > Math.abs(a[best][c]) ? i : best;
      }
      double[] swap = a[c];
      a[c] = a[best];
      a[best] = swap;
      double pivot = a[c][c];
      for (int j = 0; j < 2 * n; j++) {
        a[c][j] /= pivot;
      }
      for (int i = 0; i < n; i++) {
        double f = i == c ? 0 : a[i][c];
        for (int j = 0; f != 0 && j < 2 * n; j++) {
          a[i][j] -= f * a[c][j];
        }
      }
    }
    double[][] inverse = new double[n][];
    for (int i = 0; i < n; i++) {
      inverse[i] = java.util.Arrays.copyOfRange(a[i], n, 2 * n);
    }
    return inverse;
  }
}
