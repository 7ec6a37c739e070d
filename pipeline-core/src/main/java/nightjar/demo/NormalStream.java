package nightjar.demo;

import java.util.SplittableRandom;

/**
 * Independent standard normal numbers by Marsaglia's polar method [Marsaglia & Bray 1964, SIAM Rev
 * 6:260]. StrictMath throughout, so that the numbers are the same on every machine.
 */
final class NormalStream {
  private final SplittableRandom random;
  private double spare;
  private boolean hasSpare;

  /** A stream of its own for each purpose (and frame) of a session. */
  NormalStream(long seed, long purpose) {
    // The purpose is spread over all bits, so that neighbouring streams share nothing.
    random =
        new SplittableRandom(
            new SplittableRandom(seed ^ (purpose * 0x9E3779B97F4A7C15L)).nextLong());
  }

  /** Standard normal. */
  double normal() {
    if (hasSpare) {
      hasSpare = false;
      return spare;
    }
    double u;
    double v;
    double s;
    do {
      u = 2 * uniform() - 1;
      v = 2 * uniform() - 1;
      s = u * u + v * v;
    } while (s >= 1 || s == 0);
    double factor = Math.sqrt(-2 * StrictMath.log(s) / s);
    spare = v * factor;
    hasSpare = true;
    return u * factor;
  }

  /** Uniform on [0, 1). */
  double uniform() {
    return (random.nextLong() >>> 11) * 0x1p-53;
  }

  /** Uniform on [from, to). */
  double uniform(double from, double to) {
    return from + (to - from) * uniform();
  }

  /** A whole number from 0 to {@code end - 1}. */
  int below(int end) {
    return (int) (uniform() * end);
  }
}
