package nightjar.glm;

import java.util.Arrays;

/**
 * Sampling variance of the estimated rho under a design: {@code 2 tr[(E V)^2] / tr(RV)^2 /
 * m'(rho)^2} with {@code E = R (D - mK) R}, the variance of a ratio of quadratic forms by the delta
 * method, tabulated over rho. E is the band matrix D - mK less a part of low rank, {@code E = (D -
 * mK) - U S U'} with {@code U = [Q, DQ]}, so that the trace needs lag sums and products of U with V
 * alone. For long recordings the leading term {@code (1 - rho^2) / (neighbouring pairs m'^2)}.
 */
final class CorrelationVariance {
  private static final int VALUES = 32;

  /** Above this number of rows the leading term is used. */
  static final int LONGEST_EXACT = 1500;

  private final DesignMoments design;
  private final ExpectedCorrelation expected;
  private final double[] table = new double[VALUES];

  CorrelationVariance(DesignMoments design, ExpectedCorrelation expected) {
    this.design = design;
    this.expected = expected;
    if (design.links().rows() > LONGEST_EXACT) {
      for (int i = 0; i < VALUES; i++) {
        double rho = rho(i);
        table[i] = (1 - rho * rho) / design.links().neighbours() / square(expected.slopeAt(rho));
      }
    } else {
      BandTrace band = new BandTrace(design.links());
      for (int i = 0; i < VALUES; i++) {
        table[i] = exact(rho(i), band);
      }
    }
  }

  private static double rho(int i) {
    return ExpectedCorrelation.LOWEST
        + (ExpectedCorrelation.HIGHEST - ExpectedCorrelation.LOWEST) * i / (VALUES - 1);
  }

  private static double square(double x) {
    return x * x;
  }

  /** Var(rho^) at {@code rho}, linear between the tabulated values. */
  double at(double rho) {
    double x =
        (rho - ExpectedCorrelation.LOWEST)
            / (ExpectedCorrelation.HIGHEST - ExpectedCorrelation.LOWEST)
            * (VALUES - 1);
    int i = Math.max(0, Math.min(VALUES - 2, (int) x));
    return table[i] + (x - i) * (table[i + 1] - table[i]);
  }

  private double exact(double rho, BandTrace band) {
    double m = expected.at(rho);
    int p = design.rank();
    double[][] u = new double[2 * p][];
    double[][] vu = new double[2 * p][];
    double[][] dvu = new double[2 * p][];
    for (int j = 0; j < p; j++) {
      u[j] = design.vector(j);
      u[p + j] = halved(design.neighbourSum(j));
    }
    for (int j = 0; j < 2 * p; j++) {
      vu[j] = timesCorrelation(u[j], rho);
      dvu[j] = timesBand(vu[j], m);
    }
    double[][] g = products(u, vu);
    double[][] b = products(vu, dvu);
    double[][] s = middle(m);
    double[][] sg = multiply(s, g);
    double trace = band.at(rho, m) - 2 * traceOfProduct(s, b) + traceOfProduct(sg, sg);
    return 2 * trace / square(expected.residualTrace(rho)) / square(expected.slopeAt(rho));
  }

  private static double[] halved(double[] x) {
    return Arrays.stream(x).map(v -> v / 2).toArray();
  }

  /** S = [[-(Q'DQ + mI), I], [I, 0]]. */
  private double[][] middle(double m) {
    int p = design.rank();
    double[][] s = new double[2 * p][2 * p];
    for (int i = 0; i < p; i++) {
      for (int j = 0; j < p; j++) {
        s[i][j] = -design.matrix(1)[i * p + j] / 2 - (i == j ? m : 0);
      }
      s[i][p + i] = 1;
      s[p + i][i] = 1;
    }
    return s;
  }

  /** V x by one recursion forwards and one backwards over the rows of each segment. */
  private double[] timesCorrelation(double[] x, double rho) {
    RowLinks links = design.links();
    double[] out = new double[x.length];
    double carried = 0;
    for (int r = 0; r < x.length; r++) {
      carried = links.isFirst(r) ? 0 : Math.pow(rho, links.lag(r)) * (carried + x[r - 1]);
      out[r] = x[r] + carried;
    }
    carried = 0;
    for (int r = x.length - 2; r >= 0; r--) {
      carried = links.isLast(r) ? 0 : Math.pow(rho, links.lag(r + 1)) * (carried + x[r + 1]);
      out[r] += carried;
    }
    return out;
  }

  /** (D - mK) x. */
  private double[] timesBand(double[] x, double m) {
    RowLinks links = design.links();
    double[] out = new double[x.length];
    for (int r = 0; r < x.length; r++) {
      out[r] -= m * x[r];
      if (links.lag(r) == 1) {
        out[r] += x[r - 1] / 2;
        out[r - 1] += x[r] / 2;
      }
    }
    return out;
  }

  private static double[][] products(double[][] a, double[][] b) {
    double[][] c = new double[a.length][b.length];
    for (int i = 0; i < a.length; i++) {
      for (int j = 0; j < b.length; j++) {
        double s = 0;
        for (int r = 0; r < a[i].length; r++) {
          s += a[i][r] * b[j][r];
        }
        c[i][j] = s;
      }
    }
    return c;
  }

  private static double[][] multiply(double[][] a, double[][] b) {
    double[][] c = new double[a.length][b[0].length];
    for (int i = 0; i < a.length; i++) {
      for (int k = 0; k < b.length; k++) {
        for (int j = 0; j < c[i].length; j++) {
          c[i][j] += a[i][k] * b[k][j];
        }
      }
    }
    return c;
  }

  private static double traceOfProduct(double[][] a, double[][] b) {
    double s = 0;
    for (int i = 0; i < a.length; i++) {
      for (int j = 0; j < b.length; j++) {
        s += a[i][j] * b[j][i];
      }
    }
    return s;
  }
}
