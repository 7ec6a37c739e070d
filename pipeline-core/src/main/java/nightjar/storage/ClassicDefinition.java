package nightjar.storage;

import java.io.ByteArrayOutputStream;
import java.io.DataOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * The header of a NetCDF file of the 64-bit offset variant without record variables [NetCDF Classic
 * Format Specification, Unidata]. Variables are stored in the order in which they are added, each
 * padded to four bytes. Not thread-safe.
 */
final class ClassicDefinition {
  private static final int DIMENSIONS = 10;
  private static final int VARIABLES = 11;
  private static final int ATTRIBUTES = 12;

  /** External types. */
  enum Type {
    BYTE(1, 1),
    CHAR(2, 1),
    SHORT(3, 2),
    INT(4, 4),
    FLOAT(5, 4),
    DOUBLE(6, 8);

    private final int code;
    private final int bytes;

    Type(int code, int bytes) {
      this.code = code;
      this.bytes = bytes;
    }

    /** Bytes of one value. */
    int bytes() {
      return bytes;
    }
  }

  private record Variable(
      String name, List<String> dimensions, Type type, Map<String, Object> attributes) {}

  private final Map<String, Integer> dimensions = new LinkedHashMap<>();
  private final Map<String, ?> global;
  private final List<Variable> variables = new ArrayList<>();

  /** A file with the given global attributes. */
  ClassicDefinition(Map<String, ?> global) {
    this.global = new LinkedHashMap<>(global);
  }

  /** Adds a dimension of at least one: zero would be the length of a record dimension. */
  void dimension(String name, int size) {
    if (size < 1 || dimensions.putIfAbsent(name, size) != null) {
      throw new IllegalArgumentException(
          "dimension " + name + " = " + size + " after " + dimensions);
    }
  }

  /**
   * Adds a variable.
   *
   * @param attributes values as {@link ClassicAttribute#of} takes them, in order
   */
  void variable(
      String name, List<String> dimensionNames, Type type, Map<String, Object> attributes) {
    if (variables.stream().anyMatch(v -> v.name.equals(name))) {
      throw new IllegalArgumentException("two variables " + name);
    }
    variables.add(
        new Variable(name, List.copyOf(dimensionNames), type, new LinkedHashMap<>(attributes)));
  }

  /** Number of values that a variable over these dimensions holds. */
  long values(List<String> dimensionNames) {
    long values = 1;
    for (String d : dimensionNames) {
      values = Math.multiplyExact(values, (long) size(d));
    }
    return values;
  }

  /** The header's bytes; the first variable's data follow at once. */
  byte[] bytes() {
    // Offsets have a fixed width, so the header's length is known from a first try.
    return encode(encode(0).length);
  }

  private byte[] encode(long firstBegin) {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try (DataOutputStream out = new DataOutputStream(bytes)) {
      out.write(new byte[] {'C', 'D', 'F', 2});
      out.writeInt(0);
      listHead(out, DIMENSIONS, dimensions.size());
      for (Map.Entry<String, Integer> d : dimensions.entrySet()) {
        name(out, d.getKey());
        out.writeInt(d.getValue());
      }
      attributes(out, global);
      listHead(out, VARIABLES, variables.size());
      long begin = firstBegin;
      for (Variable v : variables) {
        checkSize(v);
        variable(out, v, begin);
        begin += paddedBytes(v);
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return bytes.toByteArray();
  }

  private void variable(DataOutputStream out, Variable v, long begin) throws IOException {
    name(out, v.name);
    out.writeInt(v.dimensions.size());
    List<String> names = List.copyOf(dimensions.keySet());
    for (String d : v.dimensions) {
      out.writeInt(names.indexOf(d));
    }
    attributes(out, v.attributes);
    out.writeInt(v.type.code);
    // Sizes beyond 32 bits are written as 2^32 - 1 and computed from the shape by readers.
    out.writeInt((int) Math.min(paddedBytes(v), 0xFFFFFFFFL));
    out.writeLong(begin);
  }

  private long paddedBytes(Variable v) {
    return (values(v.dimensions) * v.type.bytes + 3) / 4 * 4;
  }

  /** In this variant at most the last variable may have 4 GiB or more. */
  private void checkSize(Variable v) {
    boolean isLast = v.name.equals(variables.get(variables.size() - 1).name);
    if (!isLast && paddedBytes(v) > 0xFFFFFFFCL) {
      throw new IllegalArgumentException(
          v.name + " of " + paddedBytes(v) + " bytes is not the last variable");
    }
  }

  private int size(String dimension) {
    Integer size = dimensions.get(dimension);
    if (size == null) {
      throw new IllegalArgumentException("no dimension " + dimension);
    }
    return size;
  }

  private static void listHead(DataOutputStream out, int tag, int count) throws IOException {
    out.writeInt(count == 0 ? 0 : tag);
    out.writeInt(count);
  }

  private static void name(DataOutputStream out, String name) throws IOException {
    byte[] text = name.getBytes(StandardCharsets.UTF_8);
    out.writeInt(text.length);
    padded(out, text);
  }

  private static void padded(DataOutputStream out, byte[] bytes) throws IOException {
    out.write(bytes);
    out.write(new byte[(4 - bytes.length % 4) % 4]);
  }

  private static void attributes(DataOutputStream out, Map<String, ?> attributes)
      throws IOException {
    listHead(out, ATTRIBUTES, attributes.size());
    for (Map.Entry<String, ?> a : attributes.entrySet()) {
      ClassicAttribute value = ClassicAttribute.of(a.getKey(), a.getValue());
      name(out, a.getKey());
      out.writeInt(value.type().code);
      out.writeInt(value.count());
      padded(out, value.bytes());
    }
  }
}
