package nightjar.glm;

import nightjar.numeric.SymmetricEigen;

/**
 * The lag-1 correlation of ordinary residuals that AR(1) noise of coefficient rho is expected to
 * give under a design, and its inverse. With K the kept frames' indicator, Q an orthonormal basis
 * of the design, {@code R = K - QQ'}, D = 1/2 between kept neighbours and V the noise's
 * correlation:
 *
 * <pre>m(rho) = tr(R D R V) / tr(R V)</pre>
 *
 * the exact form of the trace correction of Worsley et al. 2002, NeuroImage 15:1. Traces are sums
 * over lags; lag sums come from Fourier transforms, after rotating Q by the eigenvectors of Q'DQ.
 */
final class ExpectedCorrelation {
  /** Limits of rho. */
  static final double LOWEST = -0.2;

  static final double HIGHEST = 0.95;
  private static final int STEPS = 460;

  private final LagPolynomial numerator;
  private final LagPolynomial denominator;
  private final double[] table = new double[STEPS + 1];

  ExpectedCorrelation(DesignMoments design) {
    int p = design.rank();
    RowLinks links = design.links();
    GridLagSums own = new GridLagSums(links);
    GridLagSums forward = new GridLagSums(links);
    GridLagSums backward = new GridLagSums(links);
    GridLagSums rotated = new GridLagSums(links);
    double[] half = new double[p * p];
    for (int i = 0; i < half.length; i++) {
      half[i] = design.matrix(1)[i] / 2;
    }
    SymmetricEigen eigen = SymmetricEigen.of(half, p);
    for (int j = 0; j < p; j++) {
      own.add(design.vector(j), design.vector(j), 1);
      forward.add(design.vector(j), design.neighbourSum(j), 0.5);
      backward.add(design.neighbourSum(j), design.vector(j), 0.5);
      double[] u = rotate(design, eigen, j);
      rotated.add(u, u, eigen.value(j));
    }
    numerator = numerator(links, forward.sums(), backward.sums(), rotated.sums());
    denominator = denominator(links, own.sums());
    for (int i = 0; i <= STEPS; i++) {
      table[i] = at(rho(i));
    }
  }

  private static double rho(int step) {
    return LOWEST + (HIGHEST - LOWEST) * step / STEPS;
  }

  private static double[] rotate(DesignMoments design, SymmetricEigen eigen, int k) {
    double[] u = new double[design.links().rows()];
    for (int j = 0; j < design.rank(); j++) {
      double c = eigen.component(k, j);
      double[] q = design.vector(j);
      for (int r = 0; r < u.length; r++) {
        u[r] += c * q[r];
      }
    }
    return u;
  }

  /** Lag sums of RDR = D - QQ'D - DQQ' + Q(Q'DQ)Q'. */
  private static LagPolynomial numerator(
      RowLinks links, double[] forward, double[] backward, double[] rotated) {
    double[] c = new double[forward.length];
    for (int k = 0; k < c.length; k++) {
      c[k] =
          k == 0 ? -2 * forward[0] + rotated[0] : -2 * (forward[k] + backward[k]) + 2 * rotated[k];
    }
    if (c.length > 1) {
      c[1] += links.neighbours();
    }
    return new LagPolynomial(c);
  }

  /** Lag sums of R = K - QQ'. */
  private static LagPolynomial denominator(RowLinks links, double[] own) {
    double[] c = new double[own.length];
    for (int k = 0; k < c.length; k++) {
      c[k] = k == 0 ? links.rows() - own[0] : -2 * own[k];
    }
    return new LagPolynomial(c);
  }

  /** m(rho). */
  double at(double rho) {
    return numerator.at(rho) / denominator.at(rho);
  }

  /** dm/drho. */
  double slopeAt(double rho) {
    double d = denominator.at(rho);
    return (numerator.slopeAt(rho) - at(rho) * denominator.slopeAt(rho)) / d;
  }

  /** tr(RV). */
  double residualTrace(double rho) {
    return denominator.at(rho);
  }

  /**
   * The rho within the limits whose expectation is {@code observed}, by linear interpolation; NaN
   * for NaN.
   */
  double invert(double observed) {
    if (Double.isNaN(observed)) {
      return Double.NaN;
    }
    if (observed <= table[0]) {
      return LOWEST;
    }
    if (observed >= table[STEPS]) {
      return HIGHEST;
    }
    int low = 0;
    int high = STEPS;
    while (high - low > 1) {
      int mid = (low + high) >>> 1;
      if (table[mid] <= observed) {
        low = mid;
      } else {
        high = mid;
      }
    }
    double share = (observed - table[low]) / (table[high] - table[low]);
    return rho(low) + share * (rho(high) - rho(low));
  }
}
