package nightjar.storage;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.concurrent.ConcurrentHashMap;

/** A classic or 64-bit offset file, its values read through mapped memory. */
final class ClassicContainer implements Container {
  /** Values taken at once: small enough to stay in the nearest cache. */
  private static final int PIECE_VALUES = 4096;

  private static final long LARGEST_MAP_BYTES = 1L << 30;

  /** A variable's rows on mapped memory, {@code rowsEach} of them a buffer. */
  private record Maps(long rowsEach, List<ByteBuffer> buffers) {}

  private final String fileName;
  private final FileChannel channel;
  private final boolean wideOffsets;
  private final Map<String, Attribute> attributes;
  private final Map<StoredVariable, ClassicLayout.Place> places;
  private final Map<String, Maps> maps = new ConcurrentHashMap<>();

  private ClassicContainer(String fileName, FileChannel channel) throws IOException {
    this.fileName = fileName;
    this.channel = channel;
    HeaderBytes bytes = new HeaderBytes(channel, fileName);
    ClassicHeader header = new ClassicHeader(bytes);
    this.wideOffsets = header.hasWideOffsets();
    this.attributes = header.attributes();
    this.places = new ClassicLayout(header, bytes, fileName).places();
  }

  /** Opens a file that begins with the classic magic number. */
  @SuppressWarnings("MustBeClosedChecker") // the container closes it
  static ClassicContainer open(Path file) {
    String name = Container.fileNameOf(file);
    try {
      FileChannel channel = FileChannel.open(file, StandardOpenOption.READ);
      try {
        return new ClassicContainer(name, channel);
      } catch (IOException | RuntimeException e) {
        channel.close();
        throw e;
      }
    } catch (IOException e) {
      throw Container.unreadable(name);
    }
  }

  @Override
  public String fileName() {
    return fileName;
  }

  @Override
  public String formatName() {
    return wideOffsets ? "64-bit offset" : "classic";
  }

  @Override
  public List<StoredVariable> variables() {
    return List.copyOf(places.keySet());
  }

  @Override
  public Map<String, Attribute> attributes() {
    return attributes;
  }

  @Override
  public void read(StoredVariable variable, long firstRow, long rows, RawValues into) {
    Objects.checkFromIndexSize(firstRow, rows, variable.rows());
    if (variable.values() == 0) {
      return;
    }
    ClassicLayout.Place place = Objects.requireNonNull(places.get(variable));
    Maps m = maps.computeIfAbsent(variable.name(), n -> map(place, variable.rows()));
    boolean contiguous = place.stride() == place.rowBytes();
    Object scratch = scratch(variable.type());
    for (long row = firstRow; row < firstRow + rows; ) {
      long rowInMap = row % m.rowsEach();
      long n = contiguous ? Math.min(firstRow + rows - row, m.rowsEach() - rowInMap) : 1;
      ByteBuffer piece =
          m.buffers()
              .get((int) (row / m.rowsEach()))
              .slice((int) (rowInMap * place.stride()), (int) (n * place.rowBytes()));
      take(piece, variable.type(), scratch, into);
      row += n;
    }
  }

  private Maps map(ClassicLayout.Place place, long rows) {
    long each = Math.max(1, LARGEST_MAP_BYTES / Math.max(place.stride(), 1));
    List<ByteBuffer> buffers = new ArrayList<>();
    try {
      for (long row = 0; row < rows; row += each) {
        long n = Math.min(each, rows - row);
        long length = (n - 1) * place.stride() + place.rowBytes();
        buffers.add(
            channel.map(
                FileChannel.MapMode.READ_ONLY, place.begin() + row * place.stride(), length));
      }
    } catch (IOException e) {
      throw new UncheckedIOException(fileName, e);
    }
    return new Maps(each, buffers);
  }

  private static Object scratch(ValueType type) {
    return switch (type) {
      case BYTE, CHAR -> new byte[PIECE_VALUES];
      case SHORT -> new short[PIECE_VALUES];
      case INT -> new int[PIECE_VALUES];
      case FLOAT -> new float[PIECE_VALUES];
      default -> new double[PIECE_VALUES];
    };
  }

  private static void take(ByteBuffer piece, ValueType type, Object scratch, RawValues into) {
    int values = piece.capacity() / type.bytes();
    for (int first = 0; first < values; first += PIECE_VALUES) {
      int n = Math.min(PIECE_VALUES, values - first);
      ByteBuffer part = piece.slice(first * type.bytes(), n * type.bytes());
      if (scratch instanceof byte[] a) {
        part.get(a, 0, n);
      } else if (scratch instanceof short[] a) {
        part.asShortBuffer().get(a, 0, n);
      } else if (scratch instanceof int[] a) {
        part.asIntBuffer().get(a, 0, n);
      } else if (scratch instanceof float[] a) {
        part.asFloatBuffer().get(a, 0, n);
      } else if (scratch instanceof double[] a) {
        part.asDoubleBuffer().get(a, 0, n);
      }
      into.take(scratch, 0, n);
    }
  }

  /** Maps stay until the last reader has let go of them. */
  @Override
  public void close() {
    try {
      channel.close();
    } catch (IOException e) {
      throw new UncheckedIOException(fileName, e);
    }
  }
}
