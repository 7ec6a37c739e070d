package nightjar.storage;

import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;

/**
 * A variable as a file describes it. Its first dimension counts rows; the others make up a row.
 *
 * @param name unique within the file
 * @param type type of the stored values
 * @param dimensions slowest first
 * @param attributes by name
 */
record StoredVariable(
    String name,
    ValueType type,
    List<StoredDimension> dimensions,
    Map<String, Attribute> attributes) {

  StoredVariable {
    dimensions = List.copyOf(dimensions);
    attributes = Map.copyOf(attributes);
  }

  int rank() {
    return dimensions.size();
  }

  List<String> dimensionNames() {
    return dimensions.stream().map(StoredDimension::name).toList();
  }

  /** The shape as people write it: {@code time=600, depth=64, lateral=80}. */
  String shape() {
    return dimensions.stream()
        .map(d -> d.name() + "=" + d.length())
        .collect(Collectors.joining(", ", "(", ")"));
  }

  /** Length of the first dimension; 1 for a scalar. */
  long rows() {
    return rank() == 0 ? 1 : dimensions.get(0).length();
  }

  /** Values a row; {@link Long#MAX_VALUE} where the product is larger. */
  long rowValues() {
    return product(dimensions.subList(Math.min(1, rank()), rank()));
  }

  /** All values; {@link Long#MAX_VALUE} where the product is larger. */
  long values() {
    return product(dimensions);
  }

  @Nullable Attribute attribute(String attributeName) {
    return attributes.get(attributeName);
  }

  private static long product(List<StoredDimension> dimensions) {
    long n = 1;
    for (StoredDimension d : dimensions) {
      n = times(n, d.length());
    }
    return n;
  }

  /** Product of two numbers that are not negative; {@link Long#MAX_VALUE} where it is larger. */
  static long times(long a, long b) {
    return a != 0 && b > Long.MAX_VALUE / a ? Long.MAX_VALUE : a * b;
  }

  /** Sum of two numbers that are not negative; {@link Long#MAX_VALUE} where it is larger. */
  static long plus(long a, long b) {
    return a > Long.MAX_VALUE - b ? Long.MAX_VALUE : a + b;
  }
}
