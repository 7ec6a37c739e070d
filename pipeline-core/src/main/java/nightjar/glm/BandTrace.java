package nightjar.glm;

import java.util.Arrays;

/**
 * {@code tr[((D - mK) V)^2]} from lag sums of two indicators: of kept rows, and of pairs of kept
 * neighbours (at the first row of the pair). With d the distance of two pairs, or of a row from a
 * pair's first row, the products of V's entries are powers of rho with exponents 2|d|, or 2|d| - 1
 * and 2|d| + 1 after and before the pair.
 */
final class BandTrace {
  private final double[] rows;
  private final double[] pairs;
  private final double[] pairThenRow;
  private final double[] rowThenPair;

  BandTrace(RowLinks links) {
    double[] one = new double[links.rows()];
    Arrays.fill(one, 1);
    double[] pair = new double[links.rows()];
    for (int r = 1; r < pair.length; r++) {
      pair[r - 1] = links.lag(r) == 1 ? 1 : 0;
    }
    rows = sums(links, one, one);
    pairs = sums(links, pair, pair);
    pairThenRow = sums(links, pair, one);
    rowThenPair = sums(links, one, pair);
  }

  private static double[] sums(RowLinks links, double[] x, double[] y) {
    GridLagSums s = new GridLagSums(links);
    s.add(x, y, 1);
    return s.sums();
  }

  double at(double rho, double m) {
    double r2 = rho * rho;
    double diagonal = rows[0];
    double mixed = rowThenPair[0] * rho;
    double off = pairs[0] * (1 + r2);
    double power = 1;
    for (int d = 1; d < rows.length; d++) {
      // rho^(2d-1), without dividing by rho.
      double before = power * rho;
      power *= r2;
      diagonal += 2 * rows[d] * power;
      mixed += pairThenRow[d] * before + rowThenPair[d] * power * rho;
      off += 4 * pairs[d] * power;
    }
    return m * m * diagonal - 2 * m * mixed + 0.5 * off;
  }
}
