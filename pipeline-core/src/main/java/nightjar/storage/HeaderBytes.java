package nightjar.storage;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import nightjar.refusal.RefusedInput;

/**
 * The bytes of a classic header, read forwards, big-endian. Nothing is read beyond the end of the
 * file, and nothing is allocated for a count before as many bytes are known to exist.
 */
final class HeaderBytes {
  private static final long LARGEST_HEADER_BYTES = 16L << 20;
  private static final int LONGEST_NAME_BYTES = 1024;

  private final FileChannel channel;
  private final String fileName;
  private final long fileBytes;
  private final ByteBuffer window = ByteBuffer.allocate(8192).limit(0);
  private long windowEnd;

  HeaderBytes(FileChannel channel, String fileName) throws IOException {
    this.channel = channel;
    this.fileName = fileName;
    this.fileBytes = channel.size();
  }

  long fileBytes() {
    return fileBytes;
  }

  /** Where the next byte is read from. */
  long position() {
    return windowEnd - window.remaining();
  }

  /** A refusal that names this place. */
  RefusedInput damaged(String what) {
    return RefusedInput.because("the header is damaged: " + what)
        .in(fileName)
        .at("byte " + position())
        .remedy("copy the file again from where it was recorded");
  }

  int int32() throws IOException {
    return take(4).getInt();
  }

  /** An unsigned 32-bit number, as counts and lengths are written. */
  long count() throws IOException {
    return Integer.toUnsignedLong(int32());
  }

  /** A count of things that take up at least {@code bytesEach} bytes of the file. */
  long count(String of, int bytesEach) throws IOException {
    long n = count();
    if (n > (fileBytes - position()) / bytesEach) {
      throw damaged(n + " " + of + " do not fit in the " + fileBytes + " bytes of the file");
    }
    return n;
  }

  long int64() throws IOException {
    return take(8).getLong();
  }

  String name() throws IOException {
    long n = count("bytes of a name", 1);
    if (n == 0 || n > LONGEST_NAME_BYTES) {
      throw damaged("a name is " + n + " bytes long");
    }
    return new String(padded((int) n), StandardCharsets.UTF_8);
  }

  /** Reads {@code n} bytes and skips the padding to a multiple of four. */
  byte[] padded(int n) throws IOException {
    byte[] b = new byte[n];
    for (int done = 0; done < n; ) {
      int piece = Math.min(n - done, window.capacity());
      take(piece).get(b, done, piece);
      done += piece;
    }
    int padding = -n & 3;
    take(padding).position(window.position() + padding);
    return b;
  }

  private ByteBuffer take(int n) throws IOException {
    if (n > fileBytes - position() || position() + n > LARGEST_HEADER_BYTES) {
      throw damaged("it goes on beyond " + Math.min(fileBytes, LARGEST_HEADER_BYTES) + " bytes");
    }
    if (window.remaining() < n) {
      window.compact();
      while (window.position() < n) {
        int got = channel.read(window, windowEnd);
        if (got < 0) {
          throw damaged("the file became shorter while it was read");
        }
        windowEnd += got;
      }
      window.flip();
    }
    return window;
  }
}
