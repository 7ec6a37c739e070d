package nightjar.storage;

import org.jspecify.annotations.Nullable;

/**
 * From stored to true values: {@code true = stored * scale_factor + add_offset} (CF Conventions
 * 1.11, section 8.1), missing ones NaN. Immutable.
 */
final class Packing {
  private static final int PIECE_VALUES = 4096;

  private final double scale;
  private final double offset;
  private final boolean isUnsigned;
  private final double[] missing;
  private final MissingRules.Bounds storedBounds;
  private final MissingRules.Bounds trueBounds;

  private Packing(StoredVariable variable, double scale, double offset) {
    this.scale = scale;
    this.offset = offset;
    MissingRules rules = new MissingRules(variable, scale, offset);
    this.isUnsigned = rules.isUnsigned();
    this.missing = rules.marks();
    this.storedBounds = rules.bounds(false);
    this.trueBounds = rules.bounds(true);
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
      for (int k = 1; k < missing.length; k++) {
        blank((float) missing[k], into, at, count);
      }
      keep(into, at, count);
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
    for (int k = 1; k < missing.length; k++) {
      for (int i = at; i < at + count; i++) {
        into[i] = into[i] == missing[k] ? Double.NaN : into[i];
      }
    }
    double fill = firstMissing();
    for (int i = at; i < at + count; i++) {
      double stored = into[i];
      double x = stored * scale + offset;
      boolean stays = stored != fill && storedBounds.hold(stored) && trueBounds.hold(x);
      into[i] = stays ? x : Double.NaN;
    }
  }

  /** Most variables have one missing value; NaN, which equals nothing, where there is none. */
  private double firstMissing() {
    return missing.length == 0 ? Double.NaN : missing[0];
  }

  private static void blank(float missing, float[] a, int at, int count) {
    for (int i = at; i < at + count; i++) {
      a[i] = a[i] == missing ? Float.NaN : a[i];
    }
  }

  private void keep(float[] a, int at, int count) {
    float low = (float) storedBounds.low();
    float high = (float) storedBounds.high();
    float fill = (float) firstMissing();
    for (int i = at; i < at + count; i++) {
      float x = a[i];
      a[i] = x >= low && x <= high && x != fill ? x : Float.NaN;
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
