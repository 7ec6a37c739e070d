package nightjar.picture;

import java.util.Arrays;
import nightjar.recording.Mask;

/**
 * Values over the power on the diverging scale. Voxels that are not significant are shown too, the
 * fainter the weaker their evidence, instead of being cut off [Allen, Erhardt & Calhoun 2012,
 * Neuron 74:603]. Immutable; arrays are shared and must not be changed.
 */
public final class Overlay {
  private static final double LIMIT_SHARE = 0.995;
  private static final double STRONGEST_FADED = 0.7;
  private static final double LEAST_STRONG_T = 4;

  private final String name;
  private final String unit;
  private final float[] values;
  private final float[] t;
  private final Mask significant;
  private final double limit;
  private final double strongT;

  /**
   * @param name what is shown, for the legend
   * @param unit its unit, empty for a bare number
   * @param values per voxel of the grid, NaN = not shown
   * @param t evidence per voxel of the grid
   * @param significant voxels that are shown in full
   */
  public Overlay(String name, String unit, float[] values, float[] t, Mask significant) {
    this.name = name;
    this.unit = unit;
    this.values = values;
    this.t = t;
    this.significant = significant;
    this.limit = limitOf(values);
    this.strongT = strongOf(t, significant);
  }

  /** The 99.5th percentile of the magnitude, rounded up to a number that reads well. */
  private static double limitOf(float[] values) {
    double[] sizes = new double[values.length];
    int n = 0;
    for (float v : values) {
      if (Float.isFinite(v)) {
        sizes[n++] = Math.abs(v);
      }
    }
    Arrays.sort(sizes, 0, n);
    double size = n == 0 ? 0 : sizes[(int) Math.ceil(LIMIT_SHARE * (n - 1))];
    if (!(size > 0)) {
      return 1;
    }
    double power = Math.pow(10, Math.floor(Math.log10(size)));
    for (double mantissa : new double[] {1, 1.5, 2, 3, 4, 5, 6, 8}) {
      if (size <= mantissa * power) {
        return mantissa * power;
      }
    }
    return 10 * power;
  }

  /** The weakest evidence that is significant, or the largest where nothing is. */
  private static double strongOf(float[] t, Mask significant) {
    double weakest = Double.POSITIVE_INFINITY;
    double largest = LEAST_STRONG_T;
    for (int v = 0; v < t.length; v++) {
      double size = Math.abs(t[v]);
      if (Double.isFinite(size)) {
        largest = Math.max(largest, size);
        weakest = significant.contains(v) ? Math.min(weakest, size) : weakest;
      }
    }
    return weakest > 0 && weakest < largest ? weakest : largest;
  }

  /** Pixel of voxel {@code v}, transparent where there is no value. */
  int pixel(int v) {
    if (!Float.isFinite(values[v])) {
      return 0;
    }
    return PngImage.translucent(Palette.diverging(values[v] / limit), opacity(v));
  }

  private double opacity(int v) {
    if (significant.contains(v)) {
      return 1;
    }
    double share = Float.isNaN(t[v]) ? 0 : Math.min(1, Math.abs(t[v]) / strongT);
    return STRONGEST_FADED * share * share;
  }

  /** What stands over the legend. */
  String heading() {
    return unit.isEmpty() ? name : name + " (" + unit + ")";
  }

  /** The value that takes the last colour. */
  double limit() {
    return limit;
  }
}
