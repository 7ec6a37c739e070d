package nightjar.storage;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.time.Duration;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import nightjar.refusal.RefusedInput;
import ucar.ma2.Array;
import ucar.nc2.NetcdfFile;
import ucar.nc2.Variable;
import ucar.nc2.iosp.hdf5.H5header;
import ucar.nc2.iosp.hdf5.H5iosp;
import ucar.unidata.io.RandomAccessFile;

/**
 * A netCDF-4 file, read with the NetCDF library on a thread of its own.
 *
 * <p>Compressed data come in chunks of several frames, and a chunk is unpacked as a whole. So rows
 * are fetched in blocks as deep as the chunks, and the latest blocks are kept: reading frame by
 * frame unpacks each chunk once, as long as a block fits into a sixteenth of the memory.
 */
final class Hdf5Container implements Container {
  private static final Duration OPEN_DEADLINE = Duration.ofSeconds(20);
  private static final Duration READ_DEADLINE = Duration.ofMinutes(2);
  private static final int BUFFER_BYTES = 64 << 10;
  private static final long LARGEST_CHUNK_BYTES = 512L << 20;
  private static final long PIECE_BYTES = 16L << 20;
  private static final int KEPT_BLOCKS = 4;

  /** Opens with the reader for HDF5 and no other, and without the library's ideas of locations. */
  private static final class Handle extends NetcdfFile {
    Handle(RandomAccessFile file, String name) throws IOException {
      super(new H5iosp(), file, name, null);
    }
  }

  private record Block(String variable, long firstRow) {}

  private final String fileName;
  private final LibraryThread library;
  private final NetcdfFile file;
  private final Map<String, Attribute> attributes;
  private final Map<StoredVariable, Variable> variables = new LinkedHashMap<>();
  private final Map<Block, Object> kept = new LinkedHashMap<>(16, 0.75f, true);

  private Hdf5Container(String fileName, LibraryThread library, NetcdfFile file) {
    this.fileName = fileName;
    this.library = library;
    this.file = file;
    this.attributes = Hdf5Description.attributes(file.getGlobalAttributes());
    for (Variable v : file.getRootGroup().getVariables()) {
      v.setCaching(false);
      variables.put(Hdf5Description.variable(v), v);
    }
  }

  /** Opens a file that begins with the signature of HDF5. */
  static Hdf5Container open(Path path) {
    String name = Container.fileNameOf(path);
    try (FileChannel channel = FileChannel.open(path, StandardOpenOption.READ)) {
      Hdf5Superblock.check(channel, name);
    } catch (IOException e) {
      throw Container.unreadable(name);
    }
    LibraryThread library = new LibraryThread(name);
    try {
      return library.call(OPEN_DEADLINE, () -> openHere(path, name, library));
    } catch (RuntimeException e) {
      library.close();
      throw e;
    }
  }

  private static Hdf5Container openHere(Path path, String name, LibraryThread library)
      throws IOException {
    RandomAccessFile raw = new RandomAccessFile(path.toString(), "r", BUFFER_BYTES);
    try {
      return new Hdf5Container(name, library, new Handle(raw, name));
    } catch (IOException | RuntimeException | Error e) {
      raw.close();
      throw e;
    }
  }

  @Override
  public String fileName() {
    return fileName;
  }

  @Override
  public String formatName() {
    return "netCDF-4";
  }

  @Override
  public List<StoredVariable> variables() {
    return List.copyOf(variables.keySet());
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
    Variable v = Objects.requireNonNull(variables.get(variable));
    long depth = Math.min(chunkDepth(variable, v), variable.rows());
    long rowBytes = StoredVariable.times(variable.rowValues(), variable.type().bytes());
    boolean keep =
        depth > 1 && StoredVariable.times(depth, rowBytes) <= Runtime.getRuntime().maxMemory() / 16;
    long most = keep ? depth : Math.max(1, PIECE_BYTES / rowBytes);
    long end = firstRow + rows;
    for (long row = firstRow; row < end; ) {
      long from = keep ? row / depth * depth : row;
      long n = Math.min(end, from + most) - row;
      Object values =
          keep
              ? block(variable, v, from, Math.min(depth, variable.rows() - from))
              : fetch(variable, v, row, n);
      into.take(
          values, (int) ((row - from) * variable.rowValues()), (int) (n * variable.rowValues()));
      row += n;
    }
  }

  private synchronized Object block(StoredVariable variable, Variable v, long firstRow, long rows) {
    Block key = new Block(variable.name(), firstRow);
    Object values = kept.get(key);
    if (values == null) {
      if (kept.size() >= KEPT_BLOCKS) {
        kept.remove(kept.keySet().iterator().next());
      }
      values = fetch(variable, v, firstRow, rows);
      kept.put(key, values);
    }
    return values;
  }

  private Object fetch(StoredVariable variable, Variable v, long firstRow, long rows) {
    int[] shape = v.getShape();
    int[] origin = new int[shape.length];
    if (shape.length > 0) {
      origin[0] = (int) firstRow;
      shape[0] = (int) rows;
    }
    return library.call(
        READ_DEADLINE,
        () -> {
          Array a = v.read(origin, shape);
          Object values = a.get1DJavaArray(a.getElementType());
          long found = java.lang.reflect.Array.getLength(values);
          if (found != rows * variable.rowValues()) {
            throw new IOException(variable.name() + " has " + found + " values");
          }
          return values;
        });
  }

  /** Rows a chunk; 1 where the values lie in one piece. */
  private long chunkDepth(StoredVariable variable, Variable v) {
    if (!(v.getSPobject() instanceof H5header.Vinfo info) || !info.isChunked()) {
      return 1;
    }
    int[] chunk = Arrays.copyOf(info.getChunking(), variable.rank());
    long bytes = variable.type().bytes();
    for (int n : chunk) {
      bytes = StoredVariable.times(bytes, Math.max(0, n));
    }
    if (bytes <= 0 || bytes > LARGEST_CHUNK_BYTES) {
      throw refusal(variable, "its compressed pieces are too large")
          .found(Arrays.toString(chunk))
          .expected("at most " + (LARGEST_CHUNK_BYTES >> 20) + " MB a chunk")
          .remedy("write the file again with smaller chunks");
    }
    return chunk[0];
  }

  @Override
  public void close() {
    try {
      library.call(
          READ_DEADLINE,
          () -> {
            file.close();
            return true;
          });
    } catch (RefusedInput e) {
      // Nothing was written, so nothing is lost when the handle of a damaged file stays open.
    } finally {
      library.close();
    }
  }
}
