package nightjar.film;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteOrder;
import java.nio.FloatBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;

/**
 * Rows on a mapped scratch file, which has no name left once it is open, so that nothing stays
 * behind.
 */
final class MappedRows extends FloatRows {
  private static final long LARGEST_PIECE_BYTES = 1L << 30;

  private final int rowsPerPiece;
  private FloatBuffer[] pieces;

  MappedRows(int rows, int width, Path folder) {
    super(rows, width);
    long rowBytes = 4L * width;
    rowsPerPiece = (int) Math.max(1, LARGEST_PIECE_BYTES / Math.max(1, rowBytes));
    int n = (rows + rowsPerPiece - 1) / rowsPerPiece;
    pieces = new FloatBuffer[n];
    try {
      Path file = Files.createTempFile(folder, "nightjar-film-", ".scratch");
      try (FileChannel c =
          FileChannel.open(
              file,
              StandardOpenOption.READ,
              StandardOpenOption.WRITE,
              StandardOpenOption.DELETE_ON_CLOSE)) {
        for (int i = 0; i < n; i++) {
          int count = Math.min(rowsPerPiece, rows - i * rowsPerPiece);
          pieces[i] =
              c.map(
                      FileChannel.MapMode.READ_WRITE,
                      (long) i * rowsPerPiece * rowBytes,
                      count * rowBytes)
                  .order(ByteOrder.nativeOrder())
                  .asFloatBuffer();
        }
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  @Override
  public void read(int row, int first, int count, float[] into, int offset) {
    int at = row % rowsPerPiece * width() + first;
    pieces[row / rowsPerPiece].get(at, into, offset, count);
  }

  @Override
  public void write(int row, int first, int count, float[] from, int offset) {
    int at = row % rowsPerPiece * width() + first;
    pieces[row / rowsPerPiece].put(at, from, offset, count);
  }

  @Override
  public void close() {
    pieces = new FloatBuffer[0];
  }
}
