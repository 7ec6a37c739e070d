package nightjar.storage;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import nightjar.refusal.RefusedInput;

/**
 * A NetCDF file of either family, seen alike: variables, attributes, and stored values in rows. May
 * be read by several threads at once.
 */
sealed interface Container extends AutoCloseable permits ClassicContainer, Hdf5Container {
  /** Last name of the file. */
  String fileName();

  /** "classic", "64-bit offset" or "netCDF-4". */
  String formatName();

  /** The variables in the order of the file; names are unique. */
  List<StoredVariable> variables();

  /** The attributes of the whole file by name. */
  Map<String, Attribute> attributes();

  /**
   * Reads whole rows of a variable of this container as they are stored.
   *
   * @param variable one of {@link #variables()} with numbers in it
   * @param firstRow first row
   * @param rows number of rows
   * @param into takes the values in storage order, on the calling thread
   */
  void read(StoredVariable variable, long firstRow, long rows, RawValues into);

  @Override
  void close();

  /** The variable of the given name. */
  default Optional<StoredVariable> variable(String name) {
    return variables().stream().filter(v -> v.name().equals(name)).findFirst();
  }

  /** Begins a refusal of this file. */
  default RefusedInput refusal(String what) {
    return RefusedInput.because(what).in(fileName());
  }

  /** Begins a refusal of a variable of this file. */
  default RefusedInput refusal(StoredVariable variable, String what) {
    return refusal(what).at("variable " + variable.name());
  }

  /** Opens a file after looking at its first bytes. */
  static Container open(Path file) {
    String name = fileNameOf(file);
    byte[] magic = firstBytes(file, name);
    if (magic.length >= 4 && magic[0] == 'C' && magic[1] == 'D' && magic[2] == 'F') {
      if (magic[3] == 5) {
        throw RefusedInput.because("the 64-bit data variant of NetCDF (CDF-5) is not read")
            .in(name)
            .remedy("convert the file to 64-bit offset or netCDF-4");
      }
      return ClassicContainer.open(file);
    }
    if (Hdf5Superblock.beginsWithSignature(magic)) {
      return Hdf5Container.open(file);
    }
    throw RefusedInput.because("the file is not NetCDF")
        .in(name)
        .found(describe(magic))
        .remedy("export the recording as NetCDF (classic, 64-bit offset or netCDF-4)");
  }

  /** The last name of a path. */
  static String fileNameOf(Path file) {
    Path last = file.getFileName();
    return last == null ? file.toString() : last.toString();
  }

  private static byte[] firstBytes(Path file, String name) {
    if (!Files.isRegularFile(file)) {
      throw RefusedInput.because("there is no such file")
          .in(name)
          .remedy("check the name and the folder");
    }
    try (FileChannel channel = FileChannel.open(file, StandardOpenOption.READ)) {
      ByteBuffer b = ByteBuffer.allocate(8);
      while (b.hasRemaining() && channel.read(b) >= 0) {
        // until the buffer is full or the file ends
      }
      return java.util.Arrays.copyOf(b.array(), b.position());
    } catch (IOException e) {
      throw unreadable(name);
    }
  }

  /** The operating system does not let us read. */
  static RefusedInput unreadable(String name) {
    return RefusedInput.because("the file cannot be read")
        .in(name)
        .remedy("check that it exists and that its permissions allow reading");
  }

  private static String describe(byte[] magic) {
    if (magic.length == 0) {
      return "an empty file";
    }
    if (magic.length > 1 && magic[0] == 0x1f && magic[1] == (byte) 0x8b) {
      return "a file compressed with gzip";
    }
    StringBuilder s = new StringBuilder("first bytes");
    for (byte b : magic) {
      s.append(String.format(" %02x", b));
    }
    return s.toString();
  }
}
