package nightjar.storage;

import org.jspecify.annotations.Nullable;

/** An attribute of a variable or of the whole file: a text or some numbers. Immutable. */
final class Attribute {
  /** More bytes than this are no attribute of a recording. */
  static final int LARGEST_BYTES = 1 << 20;

  private final ValueType type;
  private final @Nullable String text;
  private final double[] numbers;

  private Attribute(ValueType type, @Nullable String text, double[] numbers) {
    this.type = type;
    this.text = text;
    this.numbers = numbers;
  }

  /** A text; trailing NULs, which some writers append, are cut off. */
  static Attribute text(String text) {
    int end = text.length();
    while (end > 0 && text.charAt(end - 1) == 0) {
      end--;
    }
    return new Attribute(ValueType.CHAR, text.substring(0, end), new double[0]);
  }

  /** Numbers of a type; not copied. */
  static Attribute numbers(ValueType type, double[] numbers) {
    return new Attribute(type, null, numbers);
  }

  ValueType type() {
    return type;
  }

  boolean isText() {
    return text != null;
  }

  /** The text, or the numbers as text. */
  String display() {
    if (text != null) {
      return text.strip();
    }
    StringBuilder s = new StringBuilder();
    for (double n : numbers) {
      s.append(s.isEmpty() ? "" : ", ").append(display(n));
    }
    return s.toString();
  }

  private String display(double n) {
    if (n == Math.rint(n) && Math.abs(n) < 1e15) {
      return Long.toString((long) n);
    }
    return type == ValueType.FLOAT ? Float.toString((float) n) : Double.toString(n);
  }

  /** The numbers, none where it is a text; shared. */
  double[] numbers() {
    return numbers;
  }
}
