package nightjar.storage;

import java.io.IOException;
import java.nio.file.Path;
import java.time.Duration;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import ucar.ma2.Array;
import ucar.nc2.NetcdfFile;
import ucar.nc2.Variable;
import ucar.nc2.iosp.hdf5.H5header;
import ucar.nc2.iosp.hdf5.H5iosp;
import ucar.unidata.io.RandomAccessFile;

/** One opening of a netCDF-4 file by the NetCDF library, on a thread of its own. */
final class Hdf5Handle implements AutoCloseable {
  private static final Duration OPEN_DEADLINE = Duration.ofSeconds(20);
  private static final Duration READ_DEADLINE = Duration.ofMinutes(2);
  private static final int BUFFER_BYTES = 64 << 10;

  /** Opens with the reader for HDF5 and no other, and without the library's ideas of locations. */
  private static final class Hdf5File extends NetcdfFile {
    Hdf5File(RandomAccessFile file, String name) throws IOException {
      super(new H5iosp(), file, name, null);
    }
  }

  private final LibraryThread library;
  private final NetcdfFile file;
  private final Map<String, Attribute> attributes;
  private final List<StoredVariable> described;
  private final Map<String, Variable> variables = new LinkedHashMap<>();

  private Hdf5Handle(LibraryThread library, NetcdfFile file) {
    this.library = library;
    this.file = file;
    this.attributes = Hdf5Description.attributes(file.getGlobalAttributes());
    for (Variable v : file.getRootGroup().getVariables()) {
      v.setCaching(false);
      variables.put(v.getShortName(), v);
    }
    this.described = variables.values().stream().map(Hdf5Description::variable).toList();
  }

  /**
   * Opens a file.
   *
   * @throws nightjar.refusal.RefusedInput if the library fails or does not come to an end in 20 s
   */
  static Hdf5Handle open(Path path, String fileName) {
    LibraryThread library = new LibraryThread(fileName);
    try {
      return library.call(OPEN_DEADLINE, () -> openHere(path, fileName, library));
    } catch (RuntimeException e) {
      library.close();
      throw e;
    }
  }

  private static Hdf5Handle openHere(Path path, String name, LibraryThread library)
      throws IOException {
    RandomAccessFile raw = new RandomAccessFile(path.toString(), "r", BUFFER_BYTES);
    try {
      return new Hdf5Handle(library, new Hdf5File(raw, name));
    } catch (IOException | RuntimeException | Error e) {
      raw.close();
      throw e;
    }
  }

  Map<String, Attribute> attributes() {
    return attributes;
  }

  List<StoredVariable> variables() {
    return described;
  }

  /** Values along each dimension of a compressed piece; none where the values lie in one piece. */
  int[] chunk(StoredVariable variable) {
    return variable(variable).getSPobject() instanceof H5header.Vinfo info && info.isChunked()
        ? Arrays.copyOf(info.getChunking(), variable.rank())
        : new int[0];
  }

  /** The stored values of some rows, as an array of primitives. */
  Object fetch(StoredVariable variable, long firstRow, long rows) {
    Variable v = variable(variable);
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

  private Variable variable(StoredVariable variable) {
    return Objects.requireNonNull(variables.get(variable.name()));
  }

  @Override
  public void close() {
    library.closeAfter(file::close);
  }
}
