package nightjar.numeric;

import org.jtransforms.fft.DoubleFFT_1D;

/**
 * Discrete Fourier transform of complex images, {@code F(a, b) = sum over r, c of f(r, c) exp(-2 pi
 * i (a r/rows + b c/columns))}, and its inverse with the factor 1/(rows columns). Values are stored
 * row by row, real part before imaginary part. Not thread-safe; starts no threads.
 */
public final class ImageTransform {
  private final int rows;
  private final int columns;
  private final DoubleFFT_1D alongRows;
  private final DoubleFFT_1D alongColumns;
  private final double[] column;

  /** For images of the given size; sizes of small prime factors are fastest. */
  public ImageTransform(int rows, int columns) {
    this.rows = rows;
    this.columns = columns;
    alongRows = new DoubleFFT_1D(columns);
    alongColumns = new DoubleFFT_1D(rows);
    column = new double[2 * rows];
  }

  /** Number of values of an image array: two a pixel. */
  public int length() {
    return 2 * rows * columns;
  }

  /** Transforms {@code image} in place. */
  public void forward(double[] image) {
    for (int r = 0; r < rows; r++) {
      alongRows.complexForward(image, 2 * r * columns);
    }
    for (int c = 0; c < columns; c++) {
      take(image, c);
      alongColumns.complexForward(column);
      put(image, c);
    }
  }

  /** Transforms {@code spectrum} back in place. */
  public void inverse(double[] spectrum) {
    for (int r = 0; r < rows; r++) {
      alongRows.complexInverse(spectrum, 2 * r * columns, true);
    }
    for (int c = 0; c < columns; c++) {
      take(spectrum, c);
      alongColumns.complexInverse(column, true);
      put(spectrum, c);
    }
  }

  private void take(double[] image, int c) {
    for (int r = 0; r < rows; r++) {
      column[2 * r] = image[2 * (r * columns + c)];
      column[2 * r + 1] = image[2 * (r * columns + c) + 1];
    }
  }

  private void put(double[] image, int c) {
    for (int r = 0; r < rows; r++) {
      image[2 * (r * columns + c)] = column[2 * r];
      image[2 * (r * columns + c) + 1] = column[2 * r + 1];
    }
  }
}
