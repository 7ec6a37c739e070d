package nightjar.glm;

import nightjar.design.DesignBasis;

/**
 * The quadratic forms of {@link PrecisionWeights} among the vectors of a design's basis, and the
 * rows' weights for data.
 */
final class DesignMoments {
  private final RowLinks links;
  private final double[][] basis;
  private final double[][] neighbourSums;
  private final double[][] matrices;

  DesignMoments(DesignBasis basis, RowLinks links) {
    this.links = links;
    int p = basis.rank();
    int n = links.rows();
    this.basis = new double[p][];
    this.neighbourSums = new double[p][n];
    for (int j = 0; j < p; j++) {
      this.basis[j] = basis.vector(j);
      for (int r = 1; r < n; r++) {
        if (links.lag(r) == 1) {
          neighbourSums[j][r] += this.basis[j][r - 1];
          neighbourSums[j][r - 1] += this.basis[j][r];
        }
      }
    }
    this.matrices = new double[links.moments()][p * p];
    for (int i = 0; i < p; i++) {
      for (int j = 0; j <= i; j++) {
        fill(i, j, p);
      }
    }
  }

  private void fill(int i, int j, int p) {
    double[] x = basis[i];
    double[] y = basis[j];
    double[] sums = new double[matrices.length];
    for (int r = 0; r < x.length; r++) {
      double own = x[r] * y[r];
      sums[0] += own;
      sums[2] += (links.isFirst(r) ? own : 0) + (links.isLast(r) ? own : 0);
      int h = links.lag(r);
      if (h == 0) {
        continue;
      }
      double product = x[r] * y[r - 1] + x[r - 1] * y[r];
      if (h == 1) {
        sums[1] += product;
      } else {
        int m = links.momentOfLag(h);
        sums[m] += own + x[r - 1] * y[r - 1];
        sums[m + 1] += product;
      }
    }
    for (int m = 0; m < sums.length; m++) {
      matrices[m][i * p + j] = sums[m];
      matrices[m][j * p + i] = sums[m];
    }
  }

  int rank() {
    return basis.length;
  }

  RowLinks links() {
    return links;
  }

  /** Basis vector j; shared. */
  double[] vector(int j) {
    return basis[j];
  }

  /** Sum of basis vector j over the neighbours of each row; shared. */
  double[] neighbourSum(int j) {
    return neighbourSums[j];
  }

  /** Form {@code m} among the basis vectors, {@code rank x rank}; shared. */
  double[] matrix(int m) {
    return matrices[m];
  }

  /** {@code sum over m of weights[m] matrix(m)} into {@code a}. */
  void combine(double[] weights, double[] a) {
    java.util.Arrays.fill(a, 0);
    for (int m = 0; m < matrices.length; m++) {
      double w = weights[m];
      double[] f = matrices[m];
      for (int i = 0; i < a.length; i++) {
        a[i] += w * f[i];
      }
    }
  }
}
