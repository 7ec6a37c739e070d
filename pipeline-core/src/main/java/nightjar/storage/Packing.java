package nightjar.storage;

import java.util.stream.DoubleStream;
import org.jspecify.annotations.Nullable;

/**
 * From stored to true values: {@code true = stored * scale_factor + add_offset}, missing ones NaN
 * (CF Conventions 1.11, sections 2.5.1 and 8.1; NetCDF User's Guide, appendix A, for the default
 * fill values, which mark what was never written, and for bounds of packed variables given in true
 * values). A value beyond what float32 can hold is no measurement and counts as missing. Immutable.
 */
final class Packing {
  private static final int PIECE_VALUES = 4096;

  /** Values within stay. */
  private record Bounds(double low, double high) {
    boolean exclude(double x) {
      return x < low || x > high;
    }
  }

  private final StoredVariable variable;
  private final double scale;
  private final double offset;
  private final boolean isUnsigned;
  private final double[] missing;
  private final Bounds storedBounds;
  private final Bounds trueBounds;

  private Packing(StoredVariable variable, double scale, double offset) {
    this.variable = variable;
    this.scale = scale;
    this.offset = offset;
    Attribute sign = variable.attribute("_Unsigned");
    isUnsigned =
        sign != null && variable.type().isWhole() && sign.display().equalsIgnoreCase("true");
    missing =
        DoubleStream.concat(fillValues(), missingValues())
            .filter(m -> !Double.isNaN(m))
            .distinct()
            .toArray();
    storedBounds = bounds(false);
    trueBounds = bounds(true);
  }

  /** The packing that the attributes of a variable describe. */
  static Packing of(Container container, StoredVariable variable) {
    double scale = number(container, variable, "scale_factor", 1);
    double offset = number(container, variable, "add_offset", 0);
    if (scale == 0 || !Double.isFinite(scale) || !Double.isFinite(offset)) {
      throw container
          .refusal(variable, "the packing loses every value")
          .found("scale_factor " + scale + ", add_offset " + offset)
          .remedy("write finite numbers, and a scale_factor other than 0");
    }
    return new Packing(variable, scale, offset);
  }

  /**
   * Unpacks to float32.
   *
   * @param primitives not modified: stored values of this variable
   * @param first where they begin
   * @param count number of values
   * @param into modified: gets {@code count} values
   * @param at where they go
   */
  void toFloats(Object primitives, int first, int count, float[] into, int at) {
    if (primitives instanceof float[] a && scale == 1 && offset == 0) {
      System.arraycopy(a, first, into, at, count);
      for (double m : missing) {
        blank((float) m, into, at, count);
      }
      keepWithin(storedBounds, into, at, count);
      return;
    }
    double[] scratch = new double[Math.min(count, PIECE_VALUES)];
    for (int done = 0; done < count; done += scratch.length) {
      int n = Math.min(scratch.length, count - done);
      toDoubles(primitives, first + done, n, scratch, 0);
      for (int i = 0; i < n; i++) {
        into[at + done + i] = (float) scratch[i];
      }
    }
  }

  /** Unpacks to float64; arguments as in {@link #toFloats}. */
  void toDoubles(Object primitives, int first, int count, double[] into, int at) {
    widen(primitives, first, count, into, at);
    for (int i = at; i < at + count; i++) {
      double stored = into[i];
      double x = stored * scale + offset;
      boolean out = storedBounds.exclude(stored) || trueBounds.exclude(x);
      for (double m : missing) {
        out |= stored == m;
      }
      into[i] = out ? Double.NaN : x;
    }
  }

  private static void blank(float missing, float[] a, int at, int count) {
    for (int i = at; i < at + count; i++) {
      a[i] = a[i] == missing ? Float.NaN : a[i];
    }
  }

  private static void keepWithin(Bounds bounds, float[] a, int at, int count) {
    float low = (float) bounds.low();
    float high = (float) bounds.high();
    for (int i = at; i < at + count; i++) {
      a[i] = a[i] >= low && a[i] <= high ? a[i] : Float.NaN;
    }
  }

  private void widen(Object primitives, int first, int count, double[] into, int at) {
    if (primitives instanceof byte[] a) {
      int mask = isUnsigned ? 0xff : -1;
      for (int i = 0; i < count; i++) {
        into[at + i] = a[first + i] & mask;
      }
    } else if (primitives instanceof short[] a) {
      int mask = isUnsigned ? 0xffff : -1;
      for (int i = 0; i < count; i++) {
        into[at + i] = a[first + i] & mask;
      }
    } else if (primitives instanceof int[] a) {
      long mask = isUnsigned ? 0xffffffffL : -1;
      for (int i = 0; i < count; i++) {
        into[at + i] = a[first + i] & mask;
      }
    } else if (primitives instanceof long[] a) {
      for (int i = 0; i < count; i++) {
        into[at + i] = a[first + i];
      }
    } else if (primitives instanceof float[] a) {
      for (int i = 0; i < count; i++) {
        into[at + i] = a[first + i];
      }
    } else {
      System.arraycopy((double[]) primitives, first, into, at, count);
    }
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

  private Bounds bounds(boolean inTrueValues) {
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

  private static double number(
      Container container, StoredVariable v, String name, double otherwise) {
    @Nullable Attribute a = v.attribute(name);
    if (a == null) {
      return otherwise;
    }
    if (a.numbers().length != 1) {
      throw container
          .refusal(v, "the attribute " + name + " is not one number")
          .found("\"" + a.display() + "\"")
          .remedy("write it as a number");
    }
    return a.numbers()[0];
  }
}
