package nightjar.storage;

import java.math.BigDecimal;
import java.math.MathContext;

/**
 * Numbers as text: the value rounded to the fewest digits that read back as the same number. The
 * digits of {@link Double#toString(double)} differ between versions of Java; these do not.
 *
 * <p>Any decimal of 15 digits survives a double (6 a float) and 17 digits (9) tell all doubles
 * (floats) apart [IEEE 754-2019, 5.12.2], so a few tries are enough. At a power of two a text one
 * digit shorter may read back that is not the rounded value; it is not used.
 */
final class ShortestDecimal {
  private static final int LONGEST_PLAIN = 16;

  private ShortestDecimal() {}

  /** Text of a finite number or an infinity: plain from 1e-6 to 1e16, else with an exponent. */
  static String of(double value) {
    if (value == 0 || Double.isInfinite(value)) {
      return value == 0 ? "0" : Double.toString(value);
    }
    BigDecimal exact = new BigDecimal(value);
    for (int digits = 15; digits < 17; digits++) {
      BigDecimal rounded = exact.round(new MathContext(digits));
      if (rounded.doubleValue() == value) {
        return text(rounded);
      }
    }
    return text(exact.round(new MathContext(17)));
  }

  /** Text of a finite number or an infinity: plain from 1e-6 to 1e16, else with an exponent. */
  static String of(float value) {
    if (value == 0 || Float.isInfinite(value)) {
      return value == 0 ? "0" : Float.toString(value);
    }
    BigDecimal exact = new BigDecimal(value);
    for (int digits = 6; digits < 9; digits++) {
      BigDecimal rounded = exact.round(new MathContext(digits));
      if (rounded.floatValue() == value) {
        return text(rounded);
      }
    }
    return text(exact.round(new MathContext(9)));
  }

  private static String text(BigDecimal rounded) {
    BigDecimal d = rounded.stripTrailingZeros();
    boolean isShortInteger = d.scale() < 0 && d.precision() - d.scale() <= LONGEST_PLAIN;
    return isShortInteger ? d.toPlainString() : d.toString();
  }
}
