package nightjar.design;

import nightjar.numeric.Gamma;

/**
 * The gamma density {@code t^(a-1) exp(-t/s) / (Gamma(a) s^a)} as a haemodynamic kernel [Boynton et
 * al. 1996, J Neurosci 16:4207].
 *
 * @param peakSeconds mode, {@code (shape - 1) * scale}
 * @param widthSeconds full width at half maximum
 * @param shape a
 * @param scaleSeconds s
 */
public record GammaKernel(
    double peakSeconds, double widthSeconds, double shape, double scaleSeconds) implements Kernel {

  /**
   * The kernel with the given mode and full width at half maximum, shape and scale solved to full
   * precision.
   *
   * @throws IllegalArgumentException where no gamma density with shape of 1.05 to 400 has them
   */
  public static GammaKernel of(double peakSeconds, double widthSeconds) {
    if (!(peakSeconds > 0) || !(widthSeconds > 0)) {
      throw new IllegalArgumentException("peak and width must be positive");
    }
    double ratio = widthSeconds / peakSeconds;
    double low = 1.05;
    double high = 400;
    if (!(relativeWidth(low) >= ratio && relativeWidth(high) <= ratio)) {
      throw new IllegalArgumentException(
          "no gamma kernel has a width of " + ratio + " times its peak time");
    }
    for (int i = 0; i < 200 && low < high; i++) {
      double mid = 0.5 * (low + high);
      if (mid == low || mid == high) {
        break;
      }
      if (relativeWidth(mid) > ratio) {
        low = mid;
      } else {
        high = mid;
      }
    }
    double a = 0.5 * (low + high);
    return new GammaKernel(peakSeconds, widthSeconds, a, peakSeconds / (a - 1));
  }

  /**
   * Width at half maximum over mode for shape {@code a}: the two roots of ln x - x + 1 = -ln 2 / (a
   * - 1).
   */
  private static double relativeWidth(double a) {
    double level = -Math.log(2) / (a - 1);
    return root(level, 1, 2 + 4 * Math.max(1, -level)) - root(level, 1, 0);
  }

  private static double root(double level, double inside, double outside) {
    double in = inside;
    double out = outside;
    for (int i = 0; i < 200; i++) {
      double mid = 0.5 * (in + out);
      if (mid == in || mid == out) {
        break;
      }
      if (Math.log(mid) - mid + 1 > level) {
        in = mid;
      } else {
        out = mid;
      }
    }
    return 0.5 * (in + out);
  }

  @Override
  public double at(double seconds) {
    return seconds <= 0 ? 0 : Gamma.density(shape, seconds / scaleSeconds) / scaleSeconds;
  }

  @Override
  public double cumulative(double seconds) {
    return seconds <= 0 ? 0 : Gamma.regularised(shape, seconds / scaleSeconds);
  }

  @Override
  public double slope(double seconds) {
    return seconds <= 0 ? 0 : at(seconds) * ((shape - 1) / seconds - 1 / scaleSeconds);
  }
}
