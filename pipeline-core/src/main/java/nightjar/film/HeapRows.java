package nightjar.film;

/** Rows on the Java heap. */
final class HeapRows extends FloatRows {
  private float[][] data;

  HeapRows(int rows, int width) {
    super(rows, width);
    data = new float[rows][width];
  }

  @Override
  public void read(int row, int first, int count, float[] into, int offset) {
    System.arraycopy(data[row], first, into, offset, count);
  }

  @Override
  public void write(int row, int first, int count, float[] from, int offset) {
    System.arraycopy(from, offset, data[row], first, count);
  }

  @Override
  public void close() {
    data = new float[0][];
  }
}
