package nightjar.picture;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * Round numbers along an axis: multiples of 1, 2 or 5 times a power of ten.
 *
 * @param step distance of neighbours, positive
 * @param values ascending, within the axis
 */
public record NiceTicks(double step, List<Double> values) {
  private static final double ROUNDING = 1e-9;

  public NiceTicks {
    values = List.copyOf(values);
  }

  /**
   * The finest round numbers from {@code low} to {@code high} that are at most {@code most}.
   *
   * @throws IllegalArgumentException where an end is not finite, high is not above low or {@code
   *     most} is below 1
   */
  public static NiceTicks between(double low, double high, int most) {
    if (!Double.isFinite(low) || !Double.isFinite(high - low) || !(high > low) || most < 1) {
      throw new IllegalArgumentException(most + " ticks from " + low + " to " + high);
    }
    int exponent = (int) Math.floor(Math.log10((high - low) / most)) - 1;
    for (int e = exponent; ; e++) {
      for (int mantissa : new int[] {1, 2, 5}) {
        double step = mantissa * Math.pow(10, e);
        double first = Math.ceil(low / step - ROUNDING);
        double last = Math.floor(high / step + ROUNDING);
        if (last - first < most) {
          return new NiceTicks(step, multiples(first, last, step));
        }
      }
    }
  }

  private static List<Double> multiples(double first, double last, double step) {
    List<Double> values = new ArrayList<>();
    for (double k = first; k <= last; k++) {
      values.add(k == 0 ? 0.0 : k * step);
    }
    return values;
  }

  /** A value with as many decimals as the step needs, with a true minus sign. */
  public String label(double value) {
    int decimals = Math.max(0, -(int) Math.floor(Math.log10(step) + ROUNDING));
    String text = String.format(Locale.ROOT, "%." + decimals + "f", value);
    return text.startsWith("-") ? "\u2212" + text.substring(1) : text;
  }
}
