package nightjar.numeric;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;

/** Eigenvalues and orthonormal eigenvectors of a symmetric matrix. Immutable. */
public final class SymmetricEigen {
  private final double[] values;
  private final double[][] vectors;

  private SymmetricEigen(double[] values, double[][] vectors) {
    this.values = values;
    this.vectors = vectors;
  }

  /**
   * Decomposes a symmetric matrix.
   *
   * @param matrix {@code n x n}, row by row, not modified
   * @throws ArithmeticException where the iteration fails
   */
  public static SymmetricEigen of(double[] matrix, int n) {
    EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(n, true, true);
    if (!eigen.decompose(new DMatrixRMaj(n, n, true, matrix.clone()))) {
      throw new ArithmeticException("no eigenvalues found for a symmetric " + n + " x " + n);
    }
    double[] values = new double[n];
    double[][] vectors = new double[n][];
    for (int k = 0; k < n; k++) {
      values[k] = eigen.getEigenvalue(k).getReal();
      vectors[k] = eigen.getEigenVector(k).getData().clone();
    }
    return new SymmetricEigen(values, vectors);
  }

  /** Number of eigenvalues. */
  public int size() {
    return values.length;
  }

  /** Eigenvalue {@code k}. */
  public double value(int k) {
    return values[k];
  }

  /** Component {@code i} of eigenvector {@code k}. */
  public double component(int k, int i) {
    return vectors[k][i];
  }
}
