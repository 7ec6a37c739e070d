package nightjar.storage;

/** The types of stored values. */
enum ValueType {
  BYTE("byte", 1),
  CHAR("char", 1),
  SHORT("short", 2),
  INT("int", 4),
  FLOAT("float", 4),
  DOUBLE("double", 8),
  LONG("64-bit integer", 8),
  OTHER("compound or text", 1);

  private final String label;
  private final int bytes;

  ValueType(String label, int bytes) {
    this.label = label;
    this.bytes = bytes;
  }

  /** As it is told to people. */
  String label() {
    return label;
  }

  /** Bytes a value. */
  int bytes() {
    return bytes;
  }

  boolean isWhole() {
    return this == BYTE || this == SHORT || this == INT || this == LONG;
  }

  boolean isNumber() {
    return isWhole() || this == FLOAT || this == DOUBLE;
  }

  /** Whether a recording's frames may have this type. */
  boolean holdsFrames() {
    return this == SHORT || this == INT || this == FLOAT || this == DOUBLE;
  }
}
