package nightjar.storage;

import java.util.stream.DoubleStream;

/**
 * Which values of a variable are missing (CF Conventions 1.11, section 2.5.1; NetCDF User's Guide,
 * appendix A, for the default fill values, which mark what was never written, and for bounds of
 * packed variables given in true values). A value beyond what float32 can hold is no measurement
 * and is missing, too.
 */
final class MissingRules {
  /** Values within stay. */
  record Bounds(double low, double high) {
    boolean hold(double x) {
      return x >= low && x <= high;
    }
  }

  private final StoredVariable variable;
  private final double scale;
  private final double offset;
  private final boolean isUnsigned;

  MissingRules(StoredVariable variable, double scale, double offset) {
    this.variable = variable;
    this.scale = scale;
    this.offset = offset;
    Attribute sign = variable.attribute("_Unsigned");
    this.isUnsigned =
        sign != null && variable.type().isWhole() && sign.display().equalsIgnoreCase("true");
  }

  /** Whether the stored whole numbers have no sign. */
  boolean isUnsigned() {
    return isUnsigned;
  }

  /** The stored values that stand for a missing one; none is NaN. */
  double[] marks() {
    return DoubleStream.concat(fillValues(), missingValues())
        .filter(m -> !Double.isNaN(m))
        .distinct()
        .toArray();
  }

  private DoubleStream fillValues() {
    Attribute fill = variable.attribute("_FillValue");
    return fill != null && fill.numbers().length > 0
        ? DoubleStream.of(fill.numbers()).map(this::asStored)
        : DoubleStream.of(defaultFill());
  }

  /** NC_FILL_SHORT and so on of the C library's netcdf.h; bytes have none in practice. */
  private double defaultFill() {
    return switch (variable.type()) {
      case SHORT -> isUnsigned ? 65535 : -32767;
      case INT -> isUnsigned ? 4294967295.0 : -2147483647;
      case LONG -> -0x1p63;
      case FLOAT, DOUBLE -> 9.9692099683868690e36;
      default -> Double.NaN;
    };
  }

  private DoubleStream missingValues() {
    Attribute a = variable.attribute("missing_value");
    if (a == null) {
      return DoubleStream.empty();
    }
    return isInTrueValues(a)
        ? DoubleStream.of(a.numbers()).map(m -> Math.rint((m - offset) / scale))
        : DoubleStream.of(a.numbers()).map(this::asStored);
  }

  /** An attribute's number as a variable of this type would store it. */
  private double asStored(double number) {
    if (isUnsigned && number < 0) {
      return number + Math.pow(2, 8 * variable.type().bytes());
    }
    return variable.type() == ValueType.FLOAT ? (float) number : number;
  }

  /**
   * The bounds that {@code valid_range}, {@code valid_min} and {@code valid_max} set, either those
   * in stored or those in true values; what they leave open is bounded by float32.
   */
  Bounds bounds(boolean inTrueValues) {
    double low = -Float.MAX_VALUE;
    double high = Float.MAX_VALUE;
    double[] range = bound("valid_range", inTrueValues);
    if (range.length == 2) {
      return new Bounds(Math.max(low, range[0]), Math.min(high, range[1]));
    }
    double[] least = bound("valid_min", inTrueValues);
    double[] most = bound("valid_max", inTrueValues);
    return new Bounds(
        least.length == 1 ? Math.max(low, least[0]) : low,
        most.length == 1 ? Math.min(high, most[0]) : high);
  }

  private double[] bound(String name, boolean inTrueValues) {
    Attribute a = variable.attribute(name);
    return a == null || isInTrueValues(a) != inTrueValues
        ? new double[0]
        : DoubleStream.of(a.numbers()).map(this::asStored).filter(x -> !Double.isNaN(x)).toArray();
  }

  /**
   * Whether a bound of a packed variable is meant in true values: it is not a whole number though
   * the stored ones are (NetCDF User's Guide, appendix A, valid_range).
   */
  private boolean isInTrueValues(Attribute bound) {
    boolean isPacked =
        variable.attribute("scale_factor") != null || variable.attribute("add_offset") != null;
    return isPacked && variable.type().isWhole() && !bound.type().isWhole();
  }
}
