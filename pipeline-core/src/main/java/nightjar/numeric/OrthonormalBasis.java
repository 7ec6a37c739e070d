package nightjar.numeric;

import java.util.ArrayList;
import java.util.List;

/**
 * Orthonormal basis of columns taken one after the other, by Gram-Schmidt with reorthogonalisation
 * ("twice is enough", Giraud et al. 2005, Numer Math 101:87). A column whose norm after projection
 * on the earlier ones falls below a share of its own is dependent.
 */
public final class OrthonormalBasis {
  /** Below this share of its own norm a projected column counts as dependent. */
  public static final double DEPENDENT = 1e-7;

  private final List<double[]> vectors = new ArrayList<>();
  private final List<double[]> triangle = new ArrayList<>();

  /**
   * Takes the next column; the basis grows by one vector unless the column is dependent.
   *
   * @param column not modified
   * @return whether the column is independent of the earlier ones
   */
  public boolean add(double[] column) {
    double[] rest = column.clone();
    double[] row = new double[vectors.size() + 1];
    double own = norm(column);
    for (int pass = 0; pass < 2; pass++) {
      for (int k = 0; k < vectors.size(); k++) {
        double c = dot(vectors.get(k), rest);
        row[k] += c;
        subtract(rest, vectors.get(k), c);
      }
    }
    double left = norm(rest);
    if (!(left > DEPENDENT * own)) {
      return false;
    }
    for (int i = 0; i < rest.length; i++) {
      rest[i] /= left;
    }
    row[vectors.size()] = left;
    vectors.add(rest);
    triangle.add(row);
    return true;
  }

  /** Number of independent columns taken. */
  public int rank() {
    return vectors.size();
  }

  /** Basis vector {@code k}; shared, not copied. */
  public double[] vector(int k) {
    return vectors.get(k);
  }

  /** Norm of {@code column} after projection on the basis, over its own norm. */
  public double independentShare(double[] column) {
    double[] rest = column.clone();
    for (int pass = 0; pass < 2; pass++) {
      for (double[] v : vectors) {
        subtract(rest, v, dot(v, rest));
      }
    }
    return norm(rest) / norm(column);
  }

  /**
   * Coordinates g of a functional: with X = Q R of the independent columns, {@code c'beta =
   * g'(Q'y)} for least squares, {@code g = R^-T c}.
   *
   * @param weights c, one an independent column in the order taken
   */
  public double[] functional(double[] weights) {
    int p = rank();
    double[] g = new double[p];
    // R' g = c: column j of X holds triangle.get(j)[0..j].
    for (int j = 0; j < p; j++) {
      double s = weights[j];
      double[] r = triangle.get(j);
      for (int k = 0; k < j; k++) {
        s -= r[k] * g[k];
      }
      g[j] = s / r[j];
    }
    return g;
  }

  private static double dot(double[] a, double[] b) {
    double s = 0;
    for (int i = 0; i < a.length; i++) {
      s += a[i] * b[i];
    }
    return s;
  }

  private static void subtract(double[] from, double[] v, double c) {
    for (int i = 0; i < from.length; i++) {
      from[i] -= c * v[i];
    }
  }

  private static double norm(double[] a) {
    return Math.sqrt(dot(a, a));
  }
}
