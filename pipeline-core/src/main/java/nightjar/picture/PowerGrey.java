package nightjar.picture;

import java.util.Arrays;

/**
 * Neutral grey on a logarithmic scale, from the 1st to the 99.5th percentile of the power.
 *
 * @param low natural logarithm of the power that is black
 * @param high natural logarithm of the power that is white
 */
record PowerGrey(double low, double high) {
  private static final double BLACK_SHARE = 0.01;
  private static final double WHITE_SHARE = 0.995;
  private static final double DECIBEL = 10 / Math.log(10);

  /** The scale of a picture; values that are not positive are black. */
  static PowerGrey of(float[] power) {
    double[] logs = new double[power.length];
    int n = 0;
    for (float p : power) {
      if (p > 0 && p < Float.POSITIVE_INFINITY) {
        logs[n++] = Math.log(p);
      }
    }
    if (n == 0) {
      return new PowerGrey(0, 1);
    }
    Arrays.sort(logs, 0, n);
    double low = logs[(int) (BLACK_SHARE * (n - 1))];
    double high = logs[(int) (WHITE_SHARE * (n - 1))];
    return high > low ? new PowerGrey(low, high) : new PowerGrey(low - 1, low + 1);
  }

  /** Grey from 0 to 255. */
  int level(float power) {
    double share = power > 0 ? (Math.log(power) - low) / (high - low) : 0;
    return (int) Math.round(255 * Math.max(0, Math.min(1, share)));
  }

  /** From black to white, dB. */
  double rangeDecibel() {
    return (high - low) * DECIBEL;
  }
}
