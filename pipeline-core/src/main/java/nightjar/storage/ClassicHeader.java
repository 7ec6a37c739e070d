package nightjar.storage;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * The header of a classic (CDF-1) or 64-bit offset (CDF-2) file, as "The NetCDF Classic Format
 * Specification" (NetCDF User's Guide, appendix B) lays it down.
 *
 * <pre>
 * header  = magic numrecs dim_list att_list var_list
 * list    = ABSENT | tag count entry ...
 * dim     = name length               (length 0: the record dimension)
 * attr    = name type count values
 * var     = name rank dimids att_list type vsize begin
 * </pre>
 */
final class ClassicHeader {
  private static final int DIMENSIONS = 10;
  private static final int VARIABLES = 11;
  private static final int ATTRIBUTES = 12;
  private static final int LARGEST_RANK = 32;
  private static final ValueType[] TYPES = {
    ValueType.BYTE,
    ValueType.CHAR,
    ValueType.SHORT,
    ValueType.INT,
    ValueType.FLOAT,
    ValueType.DOUBLE
  };

  /**
   * A variable before its place is checked.
   *
   * @param dimensions numbers of its dimensions
   * @param writtenSize the size that the header claims, modulo 2^32
   * @param begin offset of its first value
   */
  record Entry(
      String name,
      ValueType type,
      List<Integer> dimensions,
      Map<String, Attribute> attributes,
      long writtenSize,
      long begin) {}

  private final HeaderBytes bytes;
  private final boolean wideOffsets;
  private final long recordCount;
  private final List<StoredDimension> dimensions = new ArrayList<>();
  private final Map<String, Attribute> attributes;
  private final Map<String, Entry> entries = new LinkedHashMap<>();
  private int recordDimension = -1;

  /** Reads a header from the start of a file. */
  ClassicHeader(HeaderBytes bytes) throws IOException {
    this.bytes = bytes;
    int magic = bytes.int32();
    int version = magic & 0xff;
    if (magic >>> 8 != 0x434446 || (version != 1 && version != 2)) {
      throw bytes.damaged("version " + version + " of the classic format is unknown");
    }
    wideOffsets = version == 2;
    recordCount = bytes.count();
    readDimensions();
    attributes = readAttributes();
    readVariables();
  }

  boolean hasWideOffsets() {
    return wideOffsets;
  }

  /** Number of records as written; 2^32 - 1 while the file is being written ("streaming"). */
  long recordCount() {
    return recordCount;
  }

  /** Number of the record dimension; -1 where there is none. */
  int recordDimension() {
    return recordDimension;
  }

  /** The dimensions; the record dimension has length 0 here. */
  List<StoredDimension> dimensions() {
    return dimensions;
  }

  Map<String, Attribute> attributes() {
    return attributes;
  }

  List<Entry> entries() {
    return List.copyOf(entries.values());
  }

  private long listCount(int tag, String of, int bytesEach) throws IOException {
    int found = bytes.int32();
    if (found == tag) {
      return bytes.count(of, bytesEach);
    }
    long n = bytes.count();
    if (found != 0 || n != 0) {
      throw bytes.damaged("a list of " + of + " begins with the tag " + found);
    }
    return 0;
  }

  private void readDimensions() throws IOException {
    long n = listCount(DIMENSIONS, "dimensions", 12);
    for (int i = 0; i < n; i++) {
      String name = bytes.name();
      long length = bytes.count();
      if (length == 0) {
        if (recordDimension >= 0) {
          throw bytes.damaged("there are two unlimited dimensions");
        }
        recordDimension = i;
      }
      dimensions.add(new StoredDimension(name, length));
    }
  }

  private Map<String, Attribute> readAttributes() throws IOException {
    Map<String, Attribute> read = new LinkedHashMap<>();
    long n = listCount(ATTRIBUTES, "attributes", 16);
    for (int i = 0; i < n; i++) {
      String name = bytes.name();
      ValueType type = readType();
      long count = bytes.count("values of the attribute " + name, type.bytes());
      if (count * type.bytes() > Attribute.LARGEST_BYTES) {
        throw bytes.damaged("the attribute " + name + " has " + count + " values");
      }
      byte[] values = bytes.padded((int) count * type.bytes());
      if (read.put(name, decode(type, values)) != null) {
        throw bytes.damaged("the attribute " + name + " occurs twice");
      }
    }
    return read;
  }

  private static Attribute decode(ValueType type, byte[] values) {
    if (type == ValueType.CHAR) {
      return Attribute.text(new String(values, StandardCharsets.UTF_8));
    }
    ByteBuffer b = ByteBuffer.wrap(values);
    double[] numbers = new double[values.length / type.bytes()];
    for (int i = 0; i < numbers.length; i++) {
      numbers[i] =
          switch (type) {
            case BYTE -> b.get();
            case SHORT -> b.getShort();
            case INT -> b.getInt();
            case FLOAT -> b.getFloat();
            default -> b.getDouble();
          };
    }
    return Attribute.numbers(type, numbers);
  }

  private ValueType readType() throws IOException {
    int code = bytes.int32();
    if (code < 1 || code > TYPES.length) {
      throw bytes.damaged("the type " + code + " does not exist");
    }
    return TYPES[code - 1];
  }

  private void readVariables() throws IOException {
    long n = listCount(VARIABLES, "variables", 32);
    for (int i = 0; i < n; i++) {
      String name = bytes.name();
      List<Integer> dims = readDimensionNumbers(name);
      Map<String, Attribute> attrs = readAttributes();
      ValueType type = readType();
      long size = bytes.count();
      long begin = wideOffsets ? bytes.int64() : bytes.count();
      if (entries.put(name, new Entry(name, type, dims, attrs, size, begin)) != null) {
        throw bytes.damaged("the variable " + name + " occurs twice");
      }
    }
  }

  private List<Integer> readDimensionNumbers(String variable) throws IOException {
    long rank = bytes.count("dimensions of the variable " + variable, 4);
    if (rank > LARGEST_RANK) {
      throw bytes.damaged("the variable " + variable + " has " + rank + " dimensions");
    }
    List<Integer> numbers = new ArrayList<>();
    for (int i = 0; i < rank; i++) {
      int number = bytes.int32();
      if (number < 0 || number >= dimensions.size()) {
        throw bytes.damaged("the variable " + variable + " uses dimension number " + number);
      }
      if (number == recordDimension && i > 0) {
        throw bytes.damaged("the unlimited dimension of " + variable + " is not its first");
      }
      numbers.add(number);
    }
    return numbers;
  }
}
