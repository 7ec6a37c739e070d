package nightjar.film;

/**
 * Rows of float32 of equal width, one row a frame. Rows may be read by several threads at once;
 * different values may be written by several threads at once.
 */
public abstract sealed class FloatRows implements AutoCloseable permits HeapRows, MappedRows {
  private final int rows;
  private final int width;

  FloatRows(int rows, int width) {
    this.rows = rows;
    this.width = width;
  }

  /** Number of rows. */
  public final int rows() {
    return rows;
  }

  /** Values a row. */
  public final int width() {
    return width;
  }

  /** Copies {@code count} values of row {@code row} from column {@code first} to {@code into}. */
  public abstract void read(int row, int first, int count, float[] into, int offset);

  /** Stores {@code count} values into row {@code row} from column {@code first}. */
  public abstract void write(int row, int first, int count, float[] from, int offset);

  /** Frees the memory or the scratch file. */
  @Override
  public abstract void close();
}
