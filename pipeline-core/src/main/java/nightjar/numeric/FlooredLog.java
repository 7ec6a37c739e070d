package nightjar.numeric;

/**
 * Natural logarithm of power floored at 1/1000 of the recording's median power, so that the zeros
 * of packed files do no harm. NaN stays NaN.
 *
 * @param floor smallest power, positive
 */
public record FlooredLog(double floor) {
  private static final double SHARE_OF_MEDIAN = 1e-3;

  public FlooredLog {
    if (!(floor > 0)) {
      throw new IllegalArgumentException("the floor of power must be positive, not " + floor);
    }
  }

  /** The floor that belongs to a recording of the given median power, positive. */
  public static FlooredLog ofMedianPower(double medianPower) {
    return new FlooredLog(SHARE_OF_MEDIAN * medianPower);
  }

  /** ln(max(power, floor)). */
  public double of(double power) {
    return Math.log(Math.max(power, floor));
  }
}
