package nightjar.plan;

/**
 * The values that a number may have.
 *
 * @param low the lowest
 * @param high the highest
 * @param openLow whether the lowest itself is excluded
 */
record Range(double low, double high, boolean openLow) {
  static Range of(double low, double high) {
    return new Range(low, high, false);
  }

  static Range above(double low, double high) {
    return new Range(low, high, true);
  }

  boolean holds(double x) {
    return (openLow ? x > low : x >= low) && x <= high;
  }

  String words() {
    return (openLow ? "above " : "") + plain(low) + " to " + plain(high);
  }

  /** Whole numbers without a decimal point. */
  static String plain(double x) {
    return x == Math.rint(x) && Math.abs(x) < 1e15 ? Long.toString((long) x) : Double.toString(x);
  }
}
