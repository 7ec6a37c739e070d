package nightjar.storage;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;

/**
 * Appends arrays to a file in the byte order of classic NetCDF, through one buffer. Each array is
 * padded with zeros to a multiple of four bytes. Not thread-safe.
 */
final class ValueWriter implements AutoCloseable {
  private final FileChannel channel;
  private final ByteBuffer buffer = ByteBuffer.allocateDirect(1 << 18);

  /** Creates {@code file}, replacing it. */
  ValueWriter(Path file) throws IOException {
    channel =
        FileChannel.open(
            file,
            StandardOpenOption.CREATE,
            StandardOpenOption.TRUNCATE_EXISTING,
            StandardOpenOption.WRITE);
  }

  void bytes(byte[] values) throws IOException {
    for (byte x : values) {
      makeRoom();
      buffer.put(x);
    }
    for (int i = values.length; i % 4 != 0; i++) {
      makeRoom();
      buffer.put((byte) 0);
    }
  }

  void ints(int[] values) throws IOException {
    for (int x : values) {
      makeRoom();
      buffer.putInt(x);
    }
  }

  /** NaN is written as {@code fill}. */
  void floats(float[] values, float fill) throws IOException {
    for (float x : values) {
      makeRoom();
      buffer.putFloat(Float.isNaN(x) ? fill : x);
    }
  }

  /** NaN is written as {@code fill}. */
  void doubles(double[] values, double fill) throws IOException {
    for (double x : values) {
      makeRoom();
      buffer.putDouble(Double.isNaN(x) ? fill : x);
    }
  }

  private void makeRoom() throws IOException {
    if (buffer.remaining() < Double.BYTES) {
      flush();
    }
  }

  private void flush() throws IOException {
    buffer.flip();
    while (buffer.hasRemaining()) {
      channel.write(buffer);
    }
    buffer.clear();
  }

  @Override
  public void close() throws IOException {
    try (channel) {
      flush();
    }
  }
}
