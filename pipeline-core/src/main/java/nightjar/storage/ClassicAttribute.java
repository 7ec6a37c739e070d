package nightjar.storage;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;

/** The value of an attribute as classic NetCDF stores it: a type and big-endian bytes. */
final class ClassicAttribute {
  private final ClassicDefinition.Type type;
  private final byte[] bytes;

  private ClassicAttribute(ClassicDefinition.Type type, byte[] bytes) {
    this.type = type;
    this.bytes = bytes;
  }

  /**
   * Encodes a value.
   *
   * @param value text, Short, Integer, Long (stored as int where it fits, else as double), Float,
   *     Double, byte[] or double[]
   */
  static ClassicAttribute of(String name, Object value) {
    if (value instanceof String text) {
      return new ClassicAttribute(
          ClassicDefinition.Type.CHAR, text.getBytes(StandardCharsets.UTF_8));
    } else if (value instanceof byte[] b) {
      return new ClassicAttribute(ClassicDefinition.Type.BYTE, b.clone());
    } else if (value instanceof Short s) {
      return new ClassicAttribute(
          ClassicDefinition.Type.SHORT, ByteBuffer.allocate(2).putShort(s).array());
    } else if (value instanceof Integer i) {
      return new ClassicAttribute(
          ClassicDefinition.Type.INT, ByteBuffer.allocate(4).putInt(i).array());
    } else if (value instanceof Long l) {
      return l.intValue() == l ? of(name, l.intValue()) : of(name, l.doubleValue());
    } else if (value instanceof Float f) {
      return new ClassicAttribute(
          ClassicDefinition.Type.FLOAT, ByteBuffer.allocate(4).putFloat(f).array());
    } else if (value instanceof Double d) {
      return of(name, new double[] {d});
    } else if (value instanceof double[] all) {
      ByteBuffer buffer = ByteBuffer.allocate(8 * all.length);
      buffer.asDoubleBuffer().put(all);
      return new ClassicAttribute(ClassicDefinition.Type.DOUBLE, buffer.array());
    }
    throw new IllegalArgumentException("attribute " + name + " = " + value);
  }

  ClassicDefinition.Type type() {
    return type;
  }

  /** Number of values of the type. */
  int count() {
    return bytes.length / type.bytes();
  }

  /** Not to be modified. */
  byte[] bytes() {
    return bytes;
  }
}
