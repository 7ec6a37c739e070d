package nightjar.storage;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;
import nightjar.refusal.RefusedInput;

/**
 * The first block of an HDF5 file, which says how long the file has to be ("HDF5 File Format
 * Specification", section II.A). A file that was cut off is told by it before anything else is
 * believed.
 */
final class Hdf5Superblock {
  private static final byte[] SIGNATURE = {(byte) 0x89, 'H', 'D', 'F', '\r', '\n', 0x1a, '\n'};
  private static final int LONGEST_BYTES = 64;

  private Hdf5Superblock() {}

  static boolean beginsWithSignature(byte[] firstBytes) {
    return firstBytes.length >= SIGNATURE.length
        && java.util.Arrays.equals(SIGNATURE, 0, 8, firstBytes, 0, 8);
  }

  /** Refuses a file that is shorter than its superblock says. */
  static void check(FileChannel channel, String fileName) throws IOException {
    ByteBuffer b = ByteBuffer.allocate(LONGEST_BYTES).order(ByteOrder.LITTLE_ENDIAN);
    while (b.hasRemaining() && channel.read(b, b.position()) >= 0) {
      // until the buffer is full or the file ends
    }
    long length = channel.size();
    if (b.hasRemaining()) {
      throw cutOff(fileName, length, "at least " + LONGEST_BYTES);
    }
    int version = b.get(8);
    if (version < 0 || version > 2) {
      throw RefusedInput.because("this version of HDF5 is not read")
          .in(fileName)
          .found("superblock version " + version)
          .remedy("write the file again as netCDF-4 or 64-bit offset");
    }
    int addressBytes = version == 2 ? b.get(9) : b.get(13);
    if (addressBytes != 8) {
      throw RefusedInput.because("the header is damaged: its addresses have a wrong size")
          .in(fileName)
          .found(addressBytes + " bytes")
          .expected("8 bytes")
          .remedy("copy the file again from where it was recorded");
    }
    // Version 0: base address at 24; 1: four bytes later; 2: at 12. Two addresses on: end of file.
    int base = version == 2 ? 12 : version == 1 ? 28 : 24;
    long end = b.getLong(base + 16);
    if (end < LONGEST_BYTES || end > length || b.getLong(base) != 0) {
      throw cutOff(fileName, length, Long.toUnsignedString(end));
    }
  }

  private static RefusedInput cutOff(String fileName, long length, String expected) {
    return RefusedInput.because("the file is cut off or its header is damaged")
        .in(fileName)
        .found(length + " bytes")
        .expected(expected)
        .remedy("copy the file again from where it was recorded");
  }
}
