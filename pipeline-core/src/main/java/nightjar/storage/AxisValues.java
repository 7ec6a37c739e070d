package nightjar.storage;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.OptionalDouble;
import java.util.function.Function;
import nightjar.refusal.RefusedInput;

/** Reads the numbers along one dimension in the unit that is wanted. */
final class AxisValues {
  private final Container container;
  private final StoredVariable variable;
  private final Function<String, OptionalDouble> unit;
  private final String knownUnits;

  private AxisValues(
      Container container,
      StoredVariable variable,
      Function<String, OptionalDouble> unit,
      String knownUnits) {
    this.container = container;
    this.variable = variable;
    this.unit = unit;
    this.knownUnits = knownUnits;
  }

  /** A variable in seconds. */
  static double[] seconds(Container container, StoredVariable v, StoredDimension along) {
    return new AxisValues(container, v, Units::seconds, Units.TIMES).read(along);
  }

  /** A variable in millimetres. */
  static double[] millimetres(Container container, StoredVariable v, StoredDimension along) {
    return new AxisValues(container, v, Units::millimetres, Units.LENGTHS).read(along);
  }

  /** A number for people: nine digits, which hides what binary fractions add. */
  static String shown(double x) {
    return Double.isFinite(x)
        ? new BigDecimal(x, new MathContext(9)).stripTrailingZeros().toPlainString()
        : Double.toString(x);
  }

  private double[] read(StoredDimension along) {
    if (variable.rank() != 1 || !variable.dimensions().get(0).equals(along)) {
      throw refusal("the dimensions are wrong")
          .found(variable.shape())
          .expected("(" + along.name() + "=" + along.length() + ")")
          .remedy("give it one value for each position of " + along.name());
    }
    if (!variable.type().isNumber()) {
      throw refusal("the values are not numbers")
          .found("type " + variable.type().label())
          .remedy("write it as double");
    }
    double factor = factor();
    double[] values = new double[(int) along.length()];
    Packing packing = Packing.of(container, variable);
    int[] filled = {0};
    container.read(
        variable,
        0,
        along.length(),
        (primitives, first, count) -> {
          packing.toDoubles(primitives, first, count, values, filled[0]);
          filled[0] += count;
        });
    for (int i = 0; i < values.length; i++) {
      if (!Double.isFinite(values[i])) {
        throw refusal("position " + i + " has no value").remedy("write a number for each position");
      }
      // 1e-3 is not a binary number; dividing by 1000 keeps 2500 ms at 2.5 s.
      values[i] = factor < 1 ? values[i] / Math.rint(1 / factor) : values[i] * factor;
    }
    return values;
  }

  private double factor() {
    Attribute a = variable.attribute("units");
    if (a == null || a.display().isEmpty()) {
      throw refusal("the units are missing").expected(knownUnits).remedy("add the attribute units");
    }
    return unit.apply(a.display())
        .orElseThrow(
            () ->
                refusal("the units are unknown")
                    .found("\"" + a.display() + "\"")
                    .expected(knownUnits)
                    .remedy("convert the values and name the unit"));
  }

  private RefusedInput refusal(String what) {
    return container.refusal(variable, what);
  }
}
