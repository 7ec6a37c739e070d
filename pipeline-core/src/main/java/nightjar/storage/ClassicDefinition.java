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

  void dimension(String name, int size) {
    dimensions.put(name, size);
  }

  /**
   * @param attributes text, one Short, Integer, Float or Double, or a byte[]; in order
   */
  void variable(
      String name, List<String> dimensionNames, Type type, Map<String, Object> attributes) {
    variables.add(
        new Variable(name, List.copyOf(dimensionNames), type, new LinkedHashMap<>(attributes)));
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
    long values = 1;
    for (String d : v.dimensions) {
      values *= size(d);
    }
    return (values * v.type.bytes + 3) / 4 * 4;
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
      name(out, a.getKey());
      if (a.getValue() instanceof String t) {
        byte[] text = t.getBytes(StandardCharsets.UTF_8);
        out.writeInt(Type.CHAR.code);
        out.writeInt(text.length);
        padded(out, text);
      } else if (a.getValue() instanceof byte[] b) {
        out.writeInt(Type.BYTE.code);
        out.writeInt(b.length);
        padded(out, b);
      } else if (a.getValue() instanceof Short s) {
        out.writeInt(Type.SHORT.code);
        out.writeInt(1);
        out.writeShort(s);
        out.writeShort(0);
      } else if (a.getValue() instanceof Integer n) {
        out.writeInt(Type.INT.code);
        out.writeInt(1);
        out.writeInt(n);
      } else if (a.getValue() instanceof Float f) {
        out.writeInt(Type.FLOAT.code);
        out.writeInt(1);
        out.writeFloat(f);
      } else if (a.getValue() instanceof Double d) {
        out.writeInt(Type.DOUBLE.code);
        out.writeInt(1);
        out.writeDouble(d);
      } else {
        throw new IllegalArgumentException("attribute " + a.getKey() + " = " + a.getValue());
      }
    }
  }
}
