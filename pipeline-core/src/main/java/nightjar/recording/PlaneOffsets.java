package nightjar.recording;

/**
 * Acquisition time of each plane within the frame, s; zero where planes share one clock. Immutable.
 */
public final class PlaneOffsets {
  private final double[] seconds;

  private PlaneOffsets(double[] seconds) {
    this.seconds = seconds;
  }

  /** One offset a plane, s; copied. */
  public static PlaneOffsets of(double... seconds) {
    return new PlaneOffsets(seconds.clone());
  }

  /** Offset of plane {@code p}, s. */
  public double seconds(int p) {
    return seconds[p];
  }

  /** Whether planes were acquired at different times, so that each needs a clock of its own. */
  public boolean areSwept() {
    for (double s : seconds) {
      if (s != seconds[0]) {
        return true;
      }
    }
    return false;
  }

  /** The clocks that designs are needed for: one a plane where they differ, else one. */
  public double[] clocks() {
    return areSwept() ? seconds.clone() : new double[] {seconds[0]};
  }

  /** Mean offset with the given share of each plane, s. */
  public double mean(double[] shares) {
    double s = 0;
    for (int p = 0; p < shares.length; p++) {
      s += shares[p] * seconds[p];
    }
    return s;
  }
}
