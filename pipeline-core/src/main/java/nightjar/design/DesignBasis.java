package nightjar.design;

import nightjar.numeric.OrthonormalBasis;
import nightjar.recording.KeptFrames;

/**
 * Orthonormal basis of a design over the kept frames, columns taken in the order level, stimuli,
 * drift, steps, nuisance. Immutable after construction.
 */
public final class DesignBasis {
  private final DesignMatrix design;
  private final KeptFrames kept;
  private final OrthonormalBasis basis;
  private final int[] order;

  private DesignBasis(DesignMatrix design, KeptFrames kept, OrthonormalBasis basis, int[] order) {
    this.design = design;
    this.kept = kept;
    this.basis = basis;
    this.order = order;
  }

  /**
   * The basis of a design whose columns are independent.
   *
   * @throws IllegalArgumentException where a column depends on earlier ones
   */
  public static DesignBasis of(DesignMatrix design, KeptFrames kept) {
    OrthonormalBasis basis = new OrthonormalBasis();
    int[] order = DesignRank.order(design.columns());
    for (int j : order) {
      if (!basis.add(DesignRank.rows(design.columns().get(j), kept))) {
        throw new IllegalArgumentException(
            "column " + design.columns().get(j).name() + " depends on earlier ones");
      }
    }
    return new DesignBasis(design, kept, basis, order);
  }

  /** The design over every frame. */
  public DesignMatrix design() {
    return design;
  }

  /** The rows of the basis. */
  public KeptFrames kept() {
    return kept;
  }

  /** Number of basis vectors. */
  public int rank() {
    return basis.rank();
  }

  /** Basis vector {@code k}, one value a kept frame; shared, not copied. */
  public double[] vector(int k) {
    return basis.vector(k);
  }

  /**
   * The functional that gives a weighted sum of the columns' coefficients from coefficients of the
   * basis.
   *
   * @param weights one a column, in the design's order
   */
  public double[] functional(double[] weights) {
    double[] inOrder = new double[order.length];
    for (int k = 0; k < order.length; k++) {
      inOrder[k] = weights[order[k]];
    }
    return basis.functional(inOrder);
  }

  /** The functional of the coefficient of column {@code j} alone. */
  public double[] coefficient(int j) {
    double[] w = new double[order.length];
    w[j] = 1;
    return functional(w);
  }

  /**
   * Variance inflation factor of column {@code j} over the kept frames, unwhitened, against all
   * other columns [Marquardt 1970, Technometrics 12:591].
   */
  public double varianceInflation(int j) {
    double[] x = DesignRank.rows(design.columns().get(j), kept);
    double mean = 0;
    for (double v : x) {
      mean += v / x.length;
    }
    double ss = 0;
    for (double v : x) {
      ss += (v - mean) * (v - mean);
    }
    double inverse = 0;
    for (double g : coefficient(j)) {
      inverse += g * g;
    }
    return ss * inverse;
  }
}
