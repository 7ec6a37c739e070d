package nightjar.plan;

import nightjar.refusal.RefusedInput;
import org.snakeyaml.engine.v2.nodes.Node;

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

  String words() {
    return (openLow ? "above " : "") + plain(low) + " to " + plain(high);
  }

  private static String plain(double x) {
    return x == Math.rint(x) && Math.abs(x) < 1e15 ? Long.toString((long) x) : Double.toString(x);
  }

  double check(Section section, String name, Node node, double x) {
    boolean inside = (openLow ? x > low : x >= low) && x <= high;
    if (!inside) {
      RefusedInput r = section.refusal(node, name + " is out of range");
      throw r.found(plain(x)).expected(words()).remedy("give a value in this range");
    }
    return x;
  }
}
