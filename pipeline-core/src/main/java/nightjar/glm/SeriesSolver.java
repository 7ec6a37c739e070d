package nightjar.glm;

import nightjar.numeric.Cholesky;
import nightjar.numeric.StudentT;

/**
 * Generalised least squares of one series after the other from the moments of a block (numerics
 * sections 8 and 9). Holds scratch arrays: one instance a thread.
 */
final class SeriesSolver {
  /** Residual sums of squares below this share of the total are rounding, not noise. */
  private static final double NO_RESIDUAL = 1e-12;

  private final LinearModel model;
  private final DesignMoments design;
  private final int p;
  private final double[] weights;
  private final double[] slopes;
  private final double[] factor;
  private final double[] slopeMatrix;
  private final double[] right;
  private final double[] beta;
  private final double[] solved;

  SeriesSolver(LinearModel model) {
    this.model = model;
    this.design = model.moments();
    this.p = design.rank();
    int m = design.links().moments();
    weights = new double[m];
    slopes = new double[m];
    factor = new double[p * p];
    slopeMatrix = new double[p * p];
    right = new double[p];
    beta = new double[p];
    solved = new double[p];
  }

  /** Residual sum of squares of ordinary least squares. */
  private double ordinaryResidual(VoxelMoments y, int v) {
    double rss = y.square(0, v);
    for (int j = 0; j < p; j++) {
      double b = y.product(0, j, v);
      rss -= b * b;
    }
    return rss > NO_RESIDUAL * y.square(0, v) ? rss : Double.NaN;
  }

  /**
   * q = sum of r_t r_(t-1) over kept neighbours / sum of r_t^2 of the ordinary residuals r; NaN
   * without residual variance.
   */
  double laggedCorrelation(VoxelMoments y, int v) {
    double lagged = y.square(1, v) / 2;
    double[] f = design.matrix(1);
    for (int i = 0; i < p; i++) {
      double b = y.product(0, i, v);
      double fb = 0;
      for (int j = 0; j < p; j++) {
        fb += f[i * p + j] * y.product(0, j, v);
      }
      lagged += b * (fb / 2 - y.product(1, i, v));
    }
    return lagged / ordinaryResidual(y, v);
  }

  /** Fits series {@code v} of the block as series {@code to} of the result. */
  void solve(VoxelMoments y, int v, double laggedCorrelation, GlmFit fit, int to) {
    // As used and as written: maps hold float32.
    double rho =
        model.firstOrder().isPresent()
            ? (float) model.firstOrder().get().expected().invert(laggedCorrelation)
            : 0;
    solveAt(rho, y, v, fit, to);
  }

  /** The same with a given AR(1) coefficient. */
  void solveAt(double rho, VoxelMoments y, int v, GlmFit fit, int to) {
    double ordinary = ordinaryResidual(y, v);
    int df = model.residualDegreesOfFreedom();
    double rss = Double.isNaN(ordinary) ? Double.NaN : generalised(y, v, rho);
    if (!(rss > 0)) {
      fit.leaveOut(to);
      return;
    }
    fit.autocorrelation[to] = rho;
    fit.residualSd[to] = Math.sqrt(ordinary / df);
    for (int e = 0; e < model.estimates(); e++) {
      fit.estimate[e][to] = dot(model.estimate(e), beta);
    }
    boolean effective =
        model.firstOrder().isPresent()
            && model.noise().degreesOfFreedom() == NoiseSettings.DegreesOfFreedom.EFFECTIVE;
    double rssSlope = effective ? residualSlope(y, v, rho) / rss : 0;
    for (int c = 0; c < model.contrasts(); c++) {
      contrast(c, rss / df, effective ? rssSlope : Double.NaN, rho, fit, to);
    }
  }

  /** Solves for beta at {@code rho}; returns the residual sum of squares of the whitened rows. */
  private double generalised(VoxelMoments y, int v, double rho) {
    if (model.firstOrder().isPresent()) {
      model.firstOrder().get().weights().at(rho, weights);
    } else {
      weights[0] = 1;
    }
    design.combine(weights, factor);
    double total = 0;
    java.util.Arrays.fill(right, 0);
    for (int m = 0; m < weights.length; m++) {
      total += weights[m] * y.square(m, v);
      for (int j = 0; j < p; j++) {
        right[j] += weights[m] * y.product(m, j, v);
      }
    }
    if (!Cholesky.factor(factor, p)) {
      throw new ArithmeticException("the design is singular after whitening at rho " + rho);
    }
    System.arraycopy(right, 0, beta, 0, p);
    Cholesky.solve(factor, p, beta);
    return total - dot(right, beta);
  }

  /**
   * d RSS / d rho at the solution (beta's own change does not count at a minimum); fills the slope
   * of the matrix.
   */
  private double residualSlope(VoxelMoments y, int v, double rho) {
    model.firstOrder().orElseThrow().weights().slopeAt(rho, slopes);
    design.combine(slopes, slopeMatrix);
    double slope = quadratic(slopeMatrix, beta);
    for (int m = 0; m < slopes.length; m++) {
      double cross = 0;
      for (int j = 0; j < p; j++) {
        cross += y.product(m, j, v) * beta[j];
      }
      slope += slopes[m] * (y.square(m, v) - 2 * cross);
    }
    return slope;
  }

  /**
   * Effect, standard error, t, degrees of freedom and p. Effective degrees of freedom
   * [Satterthwaite 1946; Kenward & Roger 1997]: {@code 2/df = 2/residual + (d ln v / d rho)^2
   * Var(rho^)}, v the contrast's estimated variance.
   */
  private void contrast(
      int c, double variance, double residualSlope, double rho, GlmFit fit, int to) {
    double[] g = model.contrast(c);
    System.arraycopy(g, 0, solved, 0, p);
    Cholesky.solve(factor, p, solved);
    double unit = dot(g, solved);
    double effect = dot(g, beta);
    double se = Math.sqrt(variance * unit);
    double df = model.residualDegreesOfFreedom();
    if (!Double.isNaN(residualSlope)) {
      double slope = residualSlope - quadratic(slopeMatrix, solved) / unit;
      double noise = model.firstOrder().orElseThrow().variance().at(rho);
      df = 2 / (2 / df + slope * slope * noise);
    }
    fit.effect[c][to] = effect;
    fit.standardError[c][to] = se;
    fit.t[c][to] = effect / se;
    fit.degreesOfFreedom[c][to] = df;
    fit.p[c][to] = StudentT.twoSided(effect / se, df);
  }

  private double quadratic(double[] matrix, double[] x) {
    double s = 0;
    for (int i = 0; i < p; i++) {
      double r = 0;
      for (int j = 0; j < p; j++) {
        r += matrix[i * p + j] * x[j];
      }
      s += x[i] * r;
    }
    return s;
  }

  private static double dot(double[] a, double[] b) {
    double s = 0;
    for (int i = 0; i < a.length; i++) {
      s += a[i] * b[i];
    }
    return s;
  }
}
