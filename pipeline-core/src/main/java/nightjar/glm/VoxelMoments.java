package nightjar.glm;

import nightjar.film.FloatRows;
import nightjar.numeric.LaggedProducts;

/**
 * The forms of {@link PrecisionWeights} between the basis and a block of series, and of the series
 * with themselves: all that generalised least squares needs, from one pass over the rows. Sums are
 * in double. One instance a thread, used for one block after the other.
 */
final class VoxelMoments {
  private static final int TILE_ROWS = 64;

  private final DesignMoments design;
  private final int capacity;
  private final double[][][] products;
  private final double[][] squares;
  private final double[][] tile;
  private final float[] row;
  private int width;

  VoxelMoments(DesignMoments design, int capacity) {
    this.design = design;
    this.capacity = capacity;
    int moments = design.links().moments();
    this.products = new double[moments][design.rank()][capacity];
    this.squares = new double[moments][capacity];
    // One row more: the last row of the tile before.
    this.tile = new double[TILE_ROWS + 1][capacity];
    this.row = new float[capacity];
  }

  /** Sums over all rows of the columns from {@code first} to {@code end}. */
  void sum(FloatRows rows, int first, int end) {
    width = end - first;
    if (width > capacity) {
      throw new IllegalArgumentException(width + " series for a block of " + capacity);
    }
    for (int m = 0; m < squares.length; m++) {
      java.util.Arrays.fill(squares[m], 0);
      for (double[] p : products[m]) {
        java.util.Arrays.fill(p, 0);
      }
    }
    double[][] window = new double[TILE_ROWS][];
    System.arraycopy(tile, 1, window, 0, TILE_ROWS);
    for (int from = 0; from < rows.rows(); from += TILE_ROWS) {
      int count = Math.min(TILE_ROWS, rows.rows() - from);
      for (int r = 0; r < count; r++) {
        rows.read(from + r, first, width, row, 0);
        widen(row, window[r], width);
      }
      for (int j = 0; j < design.rank(); j++) {
        LaggedProducts.add(design.vector(j), from, window, count, products[0][j], width);
        LaggedProducts.add(design.neighbourSum(j), from, window, count, products[1][j], width);
      }
      for (int r = 0; r < count; r++) {
        addSpecial(from + r, tile[r], tile[r + 1]);
      }
      System.arraycopy(tile[count], 0, tile[0], 0, width);
    }
  }

  private static void widen(float[] from, double[] to, int width) {
    for (int v = 0; v < width; v++) {
      to[v] = from[v];
    }
  }

  /** Squares of every row; ends of segments and pairs at long lags, which are few. */
  private void addSpecial(int r, double[] before, double[] now) {
    RowLinks links = design.links();
    LaggedProducts.addProduct(1, now, now, squares[0], width);
    int ends = (links.isFirst(r) ? 1 : 0) + (links.isLast(r) ? 1 : 0);
    if (ends > 0) {
      addPair(2, r, ends, now, now);
    }
    int h = links.lag(r);
    if (h == 1) {
      LaggedProducts.addProduct(2, before, now, squares[1], width);
    } else if (h > 1) {
      int m = links.momentOfLag(h);
      addPair(m, r, 1, now, now);
      addPair(m, r - 1, 1, before, before);
      addPair(m + 1, r, 1, before, now);
      addPair(m + 1, r - 1, 1, now, before);
    }
  }

  /** The basis at {@code basisRow} with {@code data}, and {@code data} with {@code other}. */
  private void addPair(int m, int basisRow, double weight, double[] data, double[] other) {
    for (int j = 0; j < design.rank(); j++) {
      LaggedProducts.addScaled(weight * design.vector(j)[basisRow], data, products[m][j], width);
    }
    LaggedProducts.addProduct(weight, data, other, squares[m], width);
  }

  /** Form {@code m} of basis vector {@code j} with series {@code v} of the block. */
  double product(int m, int j, int v) {
    return products[m][j][v];
  }

  /** Form {@code m} of series {@code v} with itself. */
  double square(int m, int v) {
    return squares[m][v];
  }
}
