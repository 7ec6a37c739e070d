package nightjar.numeric;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Linear regression that outlying rows cannot pull: iteratively reweighted least squares [Holland &
 * Welsch 1977, Commun Stat A6:813], from least squares to Huber's weights (k = 1.345) [Huber 1964,
 * Ann Math Stat 35:73], which have one solution, and from there to the bisquare (c = 4.685) [Beaton
 * & Tukey 1974, Technometrics 16:147]. The scale is the median absolute residual over 0.6745 in
 * every step. Immutable.
 */
public final class RobustRegression {
  private static final double HUBER = 1.345;
  private static final double BISQUARE = 4.685;
  private static final double NORMAL_QUARTILE = 0.6745;
  private static final int MOST_STEPS = 100;

  /** Steps end when no fitted value moves by more than this share of the scale. */
  private static final double SETTLED = 1e-8;

  private final double[] coefficients;
  private final double[] weights;

  private RobustRegression(double[] coefficients, double[] weights) {
    this.coefficients = coefficients;
    this.weights = weights;
  }

  /**
   * Fits {@code y} by the columns.
   *
   * @param columns each as long as {@code y}; not modified; one that depends on earlier ones gets
   *     the coefficient 0
   * @param y finite; not modified
   */
  public static RobustRegression fit(List<double[]> columns, double[] y) {
    OrthonormalBasis basis = new OrthonormalBasis();
    List<Integer> independent = new ArrayList<>();
    for (int j = 0; j < columns.size(); j++) {
      if (basis.add(columns.get(j))) {
        independent.add(j);
      }
    }
    Iteration iteration = new Iteration(basis, y);
    iteration.settle(r -> Math.min(1, HUBER / r));
    iteration.settle(r -> r < BISQUARE ? square(1 - square(r / BISQUARE)) : 0);
    double[] coefficients = new double[columns.size()];
    for (int i = 0; i < basis.rank(); i++) {
      double[] unit = new double[basis.rank()];
      unit[i] = 1;
      double[] g = basis.functional(unit);
      for (int k = 0; k < g.length; k++) {
        coefficients[independent.get(i)] += g[k] * iteration.onBasis[k];
      }
    }
    return new RobustRegression(coefficients, iteration.weights);
  }

  /** Coefficient of column {@code j}. */
  public double coefficient(int j) {
    return coefficients[j];
  }

  /** Final weight of row {@code i}, 0 (left aside) to 1. */
  public double weight(int i) {
    return weights[i];
  }

  private static double square(double x) {
    return x * x;
  }

  private interface Weight {
    /** Of a residual's size in units of the scale. */
    double of(double r);
  }

  /** Coefficients on the basis, in turns with the rows' weights. */
  private static final class Iteration {
    final OrthonormalBasis basis;
    final double[] y;
    final double[] weights;
    double[] onBasis;

    Iteration(OrthonormalBasis basis, double[] y) {
      this.basis = basis;
      this.y = y;
      this.weights = new double[y.length];
      this.onBasis = new double[basis.rank()];
      Arrays.fill(weights, 1);
      solve();
    }

    void settle(Weight weight) {
      double[] fitted = fitted();
      for (int step = 0; step < MOST_STEPS; step++) {
        double scale = scale(fitted);
        if (!(scale > 0)) {
          return;
        }
        for (int i = 0; i < y.length; i++) {
          weights[i] = weight.of(Math.abs(y[i] - fitted[i]) / scale);
        }
        if (!solve()) {
          return;
        }
        double[] next = fitted();
        double moved = 0;
        for (int i = 0; i < y.length; i++) {
          moved = Math.max(moved, Math.abs(next[i] - fitted[i]));
        }
        fitted = next;
        if (moved <= SETTLED * scale) {
          return;
        }
      }
    }

    /** Weighted least squares; false, with nothing changed, where too few rows have weight. */
    private boolean solve() {
      int p = basis.rank();
      double[] normal = new double[p * p];
      double[] right = new double[p];
      for (int a = 0; a < p; a++) {
        double[] qa = basis.vector(a);
        for (int b = 0; b <= a; b++) {
          normal[a * p + b] = weightedProduct(qa, basis.vector(b));
        }
        right[a] = weightedProduct(qa, y);
      }
      if (!Cholesky.factor(normal, p)) {
        return false;
      }
      Cholesky.solve(normal, p, right);
      onBasis = right;
      return true;
    }

    private double weightedProduct(double[] a, double[] b) {
      double s = 0;
      for (int i = 0; i < a.length; i++) {
        s += weights[i] * a[i] * b[i];
      }
      return s;
    }

    private double[] fitted() {
      double[] f = new double[y.length];
      for (int k = 0; k < onBasis.length; k++) {
        LaggedProducts.addScaled(onBasis[k], basis.vector(k), f, f.length);
      }
      return f;
    }

    private double scale(double[] fitted) {
      double[] size = new double[y.length];
      for (int i = 0; i < y.length; i++) {
        size[i] = Math.abs(y[i] - fitted[i]);
      }
      return Median.sorting(size, size.length) / NORMAL_QUARTILE;
    }
  }
}
